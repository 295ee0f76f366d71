// The typed side of the API: an endpoint of shared/api goes in, its parsed answer comes out, or an ApiProblem is thrown.
import type { z } from 'zod';
import type { Endpoint } from '#shared/api';
import { localProblem, problemFrom } from './api-problem';

/** A part of the request is left out where its schema has nothing to say. */
type Part<K extends string, S extends z.ZodType> =
  Record<never, never> extends z.input<S> ? { readonly [k in K]?: z.input<S> } : { readonly [k in K]: z.input<S> };

export type CallOf<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> = Part<'params', P> &
  Part<'query', Q> &
  Part<'body', B> & { readonly signal?: AbortSignal };

export type AnswerOf<E> = E extends Endpoint<z.ZodType, z.ZodType, z.ZodType, infer R> ? z.output<R> : never;

type Loose = Readonly<Record<string, unknown>>;
const asLoose = (value: unknown): Loose => (typeof value === 'object' && value !== null ? (value as Loose) : {});

/** The address of an endpoint, with its parameters and its query filled in. Also for <img src> and downloads. */
export function addressOf(endpoint: Endpoint, params?: unknown, query?: unknown): string {
  const filled = endpoint.path.replace(/:([A-Za-z0-9]+)/g, (_, name: string) => {
    const value = asLoose(params)[name];
    if (typeof value !== 'string' && typeof value !== 'number') throw new Error(`${endpoint.path} needs ${name}`);
    return encodeURIComponent(String(value));
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(asLoose(query))) {
    if (typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean')
      search.set(name, `${value}`);
  }
  const tail = search.toString();
  return `/api${filled}${tail === '' ? '' : `?${tail}`}`;
}

export async function callApi<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>,
  call: CallOf<P, Q, B>,
): Promise<z.output<R>> {
  const { params, query, body, signal } = call as Loose & { readonly signal?: AbortSignal };
  const hasBody = body !== undefined;
  const answer = await reach(addressOf(endpoint, params, query), {
    method: endpoint.method,
    ...(hasBody ? { body: JSON.stringify(body), headers: { 'Content-Type': 'application/json' } } : {}),
    ...(signal === undefined ? {} : { signal }),
  });
  return parseAnswer(endpoint, answer);
}

export function parseAnswer<R extends z.ZodType>(
  endpoint: Endpoint<z.ZodType, z.ZodType, z.ZodType, R>,
  answer: unknown,
): z.output<R> {
  const parsed = endpoint.response.safeParse(answer);
  if (!parsed.success) throw localProblem('answer/unreadable');
  return parsed.data;
}

/** A JSON request; the body of a success, or the problem. An abort goes through as it is. */
export async function reach(address: string, init: RequestInit): Promise<unknown> {
  let response: Response;
  try {
    response = await fetch(address, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw localProblem('network/unreachable');
  }
  const body = await readBody(response);
  if (!response.ok) throw problemFrom(response.status, body);
  return body;
}

async function readBody(response: Response): Promise<unknown> {
  const text = await response.text().catch(() => {
    throw localProblem('network/unreachable');
  });
  if (text === '') return null;
  try {
    return JSON.parse(text) as unknown;
  } catch {
    if (response.ok) throw localProblem('answer/unreadable');
    return null;
  }
}

/** The bytes of an endpoint that gives a file. */
export async function fetchFile(
  endpoint: Endpoint,
  params: Readonly<Record<string, unknown>>,
  signal?: AbortSignal,
): Promise<ArrayBuffer> {
  const init: RequestInit = { credentials: 'same-origin', ...(signal === undefined ? {} : { signal }) };
  const response = await fetch(addressOf(endpoint, params), init).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw localProblem('network/unreachable');
  });
  if (!response.ok) throw problemFrom(response.status, await readBody(response));
  return response.arrayBuffer();
}
