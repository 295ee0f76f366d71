// Accounts and sessions: better-auth behind a small interface. Roles, teams and rights are ours; it knows people only.
import type { IncomingHttpHeaders } from 'node:http';
import { betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { fromNodeHeaders, toNodeHandler } from 'better-auth/node';
import express, { Router, type NextFunction, type Request, type Response } from 'express';
import type { Logger } from 'pino';
import { nameField } from '#shared/api';
import type { Config } from '../config';
import { tables, type Database } from '../db/client';
import { ApiError } from '../http/api-error';
import { assertJson } from '../http/guards';
import type { Limits } from '../http/limits';
import type { Mailer } from '../mail/mailer';

export interface Person {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly emailVerified: boolean;
  readonly display: 'mm' | 'in' | 'in-decimal' | null;
  readonly words: 'us' | 'uk';
}

export interface Auth {
  /** The routes under /api/auth. */
  readonly router: Router;
  readonly personOf: (headers: IncomingHttpHeaders) => Promise<Person | null>;
  readonly hashPassword: (password: string) => Promise<string>;
}

/** The only paths that are open; all others of the library's answer 404. */
export const OPEN_AUTH_PATHS = [
  '/sign-up/email',
  '/sign-in/email',
  '/sign-out',
  '/get-session',
  '/verify-email',
  '/send-verification-email',
  '/request-password-reset',
  '/reset-password',
  '/reset-password/:token',
  '/change-password',
] as const;

export const LEAST_PASSWORD = 10;

/** The header in which Express hands on the address it has established; whatever a client sends there is overwritten. */
const ADDRESS_HEADER = 'x-gapwright-address';

/** No limit that a test would meet. */
const WIDE = 10_000;

function isOpen(path: string): boolean {
  return OPEN_AUTH_PATHS.some((open) =>
    open.includes(':')
      ? path.startsWith(open.slice(0, open.indexOf(':'))) && path.split('/').length === 3
      : path === open,
  );
}

function createLibrary(db: Database, config: Config, mailer: Mailer, options: AuthOptions) {
  const { strict, log } = options;
  const later = (send: Promise<void>): Promise<void> => {
    // the answer must not tell by its time whether the address is known
    send.catch(() => undefined);
    return Promise.resolve();
  };
  return betterAuth({
    appName: 'Gapwright',
    baseURL: config.baseUrl,
    basePath: '/api/auth',
    secret: config.secret,
    trustedOrigins: [config.baseUrl, ...config.origins],
    database: drizzleAdapter(db, { provider: 'pg', schema: tables, transaction: true }),
    telemetry: { enabled: false },
    // its words only: what it hands along may hold addresses and tokens
    logger: { level: 'error', log: (level, message) => log.warn({ level, message }, 'accounts') },
    emailAndPassword: {
      enabled: true,
      requireEmailVerification: true,
      minPasswordLength: LEAST_PASSWORD,
      maxPasswordLength: 200,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: ({ user, url }) => later(mailer.sendReset({ name: user.name, address: user.email }, url)),
    },
    emailVerification: {
      sendOnSignUp: true,
      sendOnSignIn: true,
      autoSignInAfterVerification: true,
      sendVerificationEmail: ({ user, url }) =>
        later(mailer.sendVerification({ name: user.name, address: user.email }, url)),
    },
    user: {
      // set through our own endpoint only: `input: false` keeps a sign-up from setting them
      additionalFields: {
        display: { type: 'string', required: false, input: false },
        words: { type: 'string', required: false, input: false, defaultValue: 'us' },
      },
    },
    session: { cookieCache: { enabled: false }, expiresIn: 60 * 60 * 24 * 30, updateAge: 60 * 60 * 24 },
    verification: { storeIdentifier: 'hashed' },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: strict ? 100 : WIDE,
      // each written out: for these paths the library has rules of its own otherwise
      customRules: {
        '/sign-in/email': { window: 60, max: strict ? 20 : WIDE },
        '/sign-up/email': { window: 60, max: strict ? 10 : WIDE },
        '/request-password-reset': { window: 60, max: strict ? 5 : WIDE },
        '/send-verification-email': { window: 60, max: strict ? 5 : WIDE },
      },
    },
    advanced: {
      cookiePrefix: 'gapwright',
      useSecureCookies: config.baseUrl.startsWith('https:'),
      defaultCookieAttributes: { httpOnly: true, sameSite: 'lax' },
      // said aloud: a variable TEST in the environment would switch them off
      disableOriginCheck: false,
      disableCSRFCheck: false,
      ipAddress: { ipAddressHeaders: [ADDRESS_HEADER] },
    },
  });
}

const DISPLAYS = ['mm', 'in', 'in-decimal'] as const;

interface AuthOptions {
  readonly log: Logger;
  /** False for tests that sign in many people from one address. */
  readonly strict: boolean;
}

export function createAuth(db: Database, config: Config, mailer: Mailer, limits: Limits, options: AuthOptions): Auth {
  const library = createLibrary(db, config, mailer, options);
  const handler = toNodeHandler(library);
  const router = Router();
  router.use((req: Request, _res: Response, next: NextFunction) => {
    if (!isOpen(req.path)) throw new ApiError('thing/missing');
    req.headers[ADDRESS_HEADER] = req.ip ?? '0.0.0.0';
    if (req.method === 'POST') assertJson(req);
    next();
  });
  router.use(express.json({ limit: '32kb' }));
  router.use((req: Request, _res: Response, next: NextFunction) => {
    assertName(req);
    limitAccount(req, limits).then(() => next(), next);
  });
  router.use((req: Request, res: Response, next: NextFunction) => {
    handler(req, res).catch(next);
  });
  return {
    router,
    async personOf(headers) {
      if (headers.cookie === undefined) return null;
      const found = await library.api.getSession({ headers: fromNodeHeaders(headers) });
      if (found === null) return null;
      const { id, name, email, emailVerified, display, words } = found.user as typeof found.user & {
        readonly display?: unknown;
        readonly words?: unknown;
      };
      return {
        id,
        name,
        email,
        emailVerified,
        display: DISPLAYS.find((d) => d === display) ?? null,
        words: words === 'uk' ? 'uk' : 'us',
      };
    },
    hashPassword: async (password) => (await library.$context).password.hash(password),
  };
}

/** The library takes a name of any kind; everywhere else a name is a line of at most 120 characters. */
function assertName(req: Request): void {
  if (req.path !== '/sign-up/email') return;
  const body = req.body as { name?: unknown } | undefined;
  const name = nameField.safeParse(body?.name);
  if (!name.success) {
    throw new ApiError('request/invalid', {
      faults: name.error.issues.map((i) => ({ path: 'name', reason: i.message })),
    });
  }
  req.body = { ...body, name: name.data };
}

/** Guesses at one account from many addresses, and mails to one address, are limited by the account. */
async function limitAccount(req: Request, limits: Limits): Promise<void> {
  if (req.method !== 'POST') return;
  const email: unknown = (req.body as { email?: unknown } | undefined)?.email;
  if (typeof email !== 'string') return;
  const key = email.trim().toLowerCase();
  if (req.path === '/sign-in/email') await limits.use('signIn', key);
  else if (req.path !== '/change-password') await limits.use('mailTo', key);
}
