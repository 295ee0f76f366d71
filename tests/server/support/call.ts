// Calls of endpoints as a browser makes them, with the answer read.
import type { z } from 'zod';
import type { Endpoint } from '#shared/api';
import type { TestPerson } from './people';
import type { TestServer } from './server';

export interface Parts {
  readonly params?: Readonly<Record<string, string | number>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly body?: unknown;
  readonly form?: FormData;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface Answer<T> {
  readonly status: number;
  readonly headers: Headers;
  readonly body: T;
  /** The problem's code; undefined for a success. */
  readonly code: string | undefined;
  readonly detail: string | undefined;
}

export interface ProblemBody {
  readonly code?: string;
  readonly detail?: string;
  readonly data?: unknown;
  readonly instance?: string;
  readonly faults?: readonly { readonly path: string; readonly reason: string }[];
}

export const problemOf = (answer: Answer<unknown>): ProblemBody => answer.body as ProblemBody;

export function addressOf(endpoint: Endpoint, parts: Parts = {}): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(parts.params?.[name] ?? '-'));
  const query = parts.query === undefined ? '' : `?${new URLSearchParams(parts.query).toString()}`;
  return `/api${path}${query}`;
}

/** Calls an endpoint; `person` null is somebody without a session. */
export async function call<E extends Endpoint>(
  server: TestServer,
  person: TestPerson | null,
  endpoint: E,
  parts: Parts = {},
): Promise<Answer<z.output<E['response']>>> {
  const response = await fetch(server.url + addressOf(endpoint, parts), {
    method: endpoint.method,
    redirect: 'manual',
    headers: {
      ...(person === null ? {} : { cookie: person.cookie }),
      ...(parts.body === undefined ? {} : { 'content-type': 'application/json' }),
      ...parts.headers,
    },
    ...(parts.form !== undefined
      ? { body: parts.form }
      : parts.body !== undefined
        ? { body: JSON.stringify(parts.body) }
        : {}),
  });
  const bytes = await response.arrayBuffer();
  const isJson = /json/.test(response.headers.get('content-type') ?? '');
  const body: unknown = isJson ? JSON.parse(new TextDecoder().decode(bytes)) : new Uint8Array(bytes);
  const problem = response.ok ? {} : (body as ProblemBody);
  return {
    status: response.status,
    headers: response.headers,
    body: body as z.output<E['response']>,
    code: problem.code,
    detail: problem.detail,
  };
}

/** As `call`, for what must succeed. */
export async function must<E extends Endpoint>(
  server: TestServer,
  person: TestPerson | null,
  endpoint: E,
  parts: Parts = {},
): Promise<z.output<E['response']>> {
  const answer = await call(server, person, endpoint, parts);
  if (answer.status !== endpoint.status) {
    throw new Error(`${endpoint.method} ${endpoint.path}: ${answer.status} ${JSON.stringify(answer.body)}`);
  }
  return answer.body;
}

export function fileForm(bytes: Uint8Array, name = 'part.stl', field = 'file'): FormData {
  const form = new FormData();
  form.append(field, new Blob([bytes as Uint8Array<ArrayBuffer>]), name);
  return form;
}
