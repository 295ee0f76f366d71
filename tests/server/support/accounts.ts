// Signing up and in as a browser does it, and reading the mails that come.
import { desc, eq } from 'drizzle-orm';
import { tables } from '../../../server/db/client';
import type { TestServer } from './server';
import { until } from './things';

export const PASSWORD = 'a long enough one';

export interface AuthAnswer {
  readonly status: number;
  readonly body: unknown;
  readonly code: string | undefined;
  readonly headers: Headers;
  /** What the browser would send next: name=value. */
  readonly cookie: string | null;
}

export async function auth(
  server: TestServer,
  path: string,
  body: unknown,
  headers: Readonly<Record<string, string>> = {},
): Promise<AuthAnswer> {
  const response = await fetch(`${server.url}/api/auth${path}`, {
    method: body === undefined ? 'GET' : 'POST',
    redirect: 'manual',
    headers: {
      ...(body === undefined ? {} : { 'content-type': 'application/json', origin: server.config.baseUrl }),
      ...headers,
    },
    ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
  });
  const text = await response.text();
  const parsed: unknown = /json/.test(response.headers.get('content-type') ?? '') ? JSON.parse(text) : text;
  const code = (parsed as { code?: string } | null)?.code;
  const cookie = response.headers.getSetCookie().find((c) => c.includes('session_token='));
  return {
    status: response.status,
    body: parsed,
    code,
    headers: response.headers,
    cookie: cookie?.split(';')[0] ?? null,
  };
}

export const signUp = (server: TestServer, email: string, more: object = {}): Promise<AuthAnswer> =>
  auth(server, '/sign-up/email', { email, password: PASSWORD, name: 'Nora New', ...more });

export const signIn = (
  server: TestServer,
  email: string,
  password = PASSWORD,
  headers: Readonly<Record<string, string>> = {},
): Promise<AuthAnswer> => auth(server, '/sign-in/email', { email, password }, headers);

/** Mails to an address, the newest first. */
export async function mailsTo(server: TestServer, email: string) {
  const { shelvedMail } = tables;
  return server.db.select().from(shelvedMail).where(eq(shelvedMail.to, email)).orderBy(desc(shelvedMail.sentAt));
}

/** The link in the newest of so many mails, without the server's name. */
export async function linkIn(server: TestServer, email: string, count = 1): Promise<string> {
  await until(`mail number ${count} to ${email}`, async () => (await mailsTo(server, email)).length >= count);
  const link = /https?:\S+/.exec((await mailsTo(server, email))[0]!.text)![0];
  return link.slice(server.config.baseUrl.length);
}

/** Signs up and confirms the address. */
export async function newAccount(server: TestServer, email: string): Promise<void> {
  await signUp(server, email);
  const link = await linkIn(server, email);
  await fetch(server.url + link, { redirect: 'manual' });
}
