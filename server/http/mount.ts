// Puts an endpoint on a router. Everything that must happen before a handler happens here, in one order, for all: session,
// parameters, right, body. A handler gets parsed input and says what the answer is.
import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import type { z } from 'zod';
import { can, type Role, type Standing } from '#shared/access';
import type { Endpoint } from '#shared/api';
import type { Person } from '../auth/auth';
import { ApiError } from './api-error';
import type { LimitKind } from './limits';
import type { Services } from './services';
import { assertJson } from './guards';
import { findStanding } from './standing';

export interface Call<P, Q, B> {
  readonly services: Services;
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly req: Request;
  readonly res: Response;
}

/** For endpoints that need a session. */
export interface SignedCall<P, Q, B> extends Call<P, Q, B> {
  readonly person: Person;
  /** The person's role in the thing's team; set where the endpoint names a thing. */
  readonly role: Role;
}

type Handler<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType> = (
  call: SignedCall<z.output<P>, z.output<Q>, z.output<B>>,
) => Promise<z.input<R> | typeof SENT>;

/** Returned by a handler that has answered by itself (a file). */
export const SENT = Symbol('sent');

function faultsOf(error: z.ZodError): { path: string; reason: string }[] {
  return error.issues.map((issue) => ({ path: issue.path.map(String).join('.'), reason: issue.message }));
}

function parse<T extends z.ZodType>(schema: T, value: unknown): z.output<T> {
  const result = schema.safeParse(value ?? {});
  if (!result.success) throw new ApiError('request/invalid', { faults: faultsOf(result.error) });
  return result.data;
}

async function authorise(
  services: Services,
  endpoint: Endpoint,
  req: Request,
): Promise<{ person: Person | null; standing: Standing }> {
  const { who } = endpoint;
  const outside: Standing = { role: null, addedToProject: false };
  if (who.kind === 'anyone') return { person: null, standing: outside };
  const person = await services.auth.personOf(req.headers);
  if (person === null) throw new ApiError('session/missing');
  if (who.kind === 'signed-in') return { person, standing: outside };
  // an id that cannot be one names nothing
  if (!endpoint.params.safeParse(req.params).success) throw new ApiError('thing/missing');
  const params = req.params as Record<string, string>;
  const standing = await findStanding(services.db, person.id, who.on, params[who.param] ?? '', params);
  const verdict = can(standing, who.action);
  if (verdict === 'stranger') throw new ApiError('thing/missing');
  if (verdict === 'no') throw new ApiError('access/denied');
  return { person, standing };
}

const NOBODY: Person = { id: '', name: '', email: '', emailVerified: false, display: null, words: 'us' };

/** A scene of 4 MB and its difference fit; so do the longest notes. */
const MOST_JSON = { document: '12mb', other: '256kb' } as const;
const jsonReaders = {
  document: express.json({ limit: MOST_JSON.document, strict: true }),
  other: express.json({ limit: MOST_JSON.other, strict: true }),
};

/** Reads the body only now, when the caller has the right: others cannot make the server parse megabytes. */
async function readJson(endpoint: Endpoint, req: Request, res: Response): Promise<void> {
  if (endpoint.method === 'GET') return;
  assertJson(req);
  await runBefore(endpoint.takesDocument ? jsonReaders.document : jsonReaders.other, req, res);
}

export interface MountOptions {
  /** Reads the body of a form. */
  readonly reader?: RequestHandler;
  /** Counted by person before the body is read. */
  readonly limit?: LimitKind;
}

export function mount<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  router: Router,
  services: Services,
  endpoint: Endpoint<P, Q, B, R>,
  handler: Handler<P, Q, B, R>,
  options: MountOptions = {},
): void {
  const run = async (req: Request, res: Response): Promise<void> => {
    const { person, standing } = await authorise(services, endpoint, req);
    const params = endpoint.params.safeParse(req.params);
    if (!params.success) throw new ApiError('thing/missing');
    const query = parse(endpoint.query, req.query);
    if (options.limit !== undefined) await services.limits.use(options.limit, (person ?? NOBODY).id);
    if (options.reader !== undefined) await runBefore(options.reader, req, res);
    if (endpoint.takes === 'json') await readJson(endpoint, req, res);
    const body = endpoint.takes === 'json' ? parse(endpoint.body, req.body) : ({} as z.output<B>);
    const answer = await handler({
      services,
      params: params.data,
      query,
      body,
      req,
      res,
      person: person ?? NOBODY,
      role: standing.role ?? 'guest',
    });
    if (answer === SENT) return;
    // the schema also strips: what an answer does not declare does not leave the server
    res.status(endpoint.status).json(endpoint.response.parse(answer));
  };
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  router[method](endpoint.path, (req, res, next) => {
    run(req, res).catch(next);
  });
}

function runBefore(before: RequestHandler, req: Request, res: Response): Promise<void> {
  return new Promise((resolve, reject) => {
    const done = (error?: unknown): void => {
      if (error === undefined || error === null) resolve();
      else
        reject(error instanceof Error ? error : new Error(typeof error === 'string' ? error : 'the body was not read'));
    };
    void before(req, res, done);
  });
}
