// What went wrong with a call, as the person is told and as code decides on it.
import { problemSchema, type ErrorCode, type Problem } from '#shared/api';

/** Codes that never come from the server, because no answer came or none that can be read. */
const LOCAL = {
  'network/unreachable': 'The server could not be reached. Check the connection and try again.',
  'network/stopped': 'You stopped this. Nothing was kept of it.',
  'answer/unreadable':
    'The server answered with something this page cannot read. Load the page again; if it stays, tell whoever runs the server.',
} as const;
type LocalCode = keyof typeof LOCAL;

export type ProblemCode = ErrorCode | LocalCode;

export class ApiProblem extends Error {
  constructor(
    readonly code: ProblemCode,
    readonly status: number,
    /** What happened and what to do. */
    readonly sentence: string,
    readonly more: Pick<Problem, 'detail' | 'instance' | 'faults' | 'data'> = {},
  ) {
    super(sentence);
    this.name = 'ApiProblem';
  }
}

export function localProblem(code: LocalCode): ApiProblem {
  return new ApiProblem(code, 0, LOCAL[code]);
}

/** Reads an answer that was not a success. */
export function problemFrom(status: number, body: unknown): ApiProblem {
  const parsed = problemSchema.safeParse(body);
  if (!parsed.success) {
    // a proxy in front answers in its own way while the server is away
    return status === 502 || status === 503 || status === 504
      ? localProblem('network/unreachable')
      : localProblem('answer/unreadable');
  }
  const { code, title, ...more } = parsed.data;
  return new ApiProblem(code as ProblemCode, status, title, more);
}

export interface Told {
  readonly sentence: string;
  /** What in particular, if the server said it. */
  readonly detail: string | null;
  /** To find the request in the server's log; only where the server itself failed. */
  readonly requestNumber: string | null;
}

/** How to tell a person of an error of any kind. */
export function tell(error: unknown): Told {
  if (error instanceof ApiProblem) {
    const { detail, instance, data } = error.more;
    return {
      sentence: error.sentence,
      detail: detail ?? waitOf(data),
      requestNumber: error.status >= 500 ? (instance ?? null) : null,
    };
  }
  return {
    sentence: 'Something on this page failed. Load it again; what was saved is safe.',
    detail: error instanceof Error ? error.message : null,
    requestNumber: null,
  };
}

function waitOf(data: unknown): string | null {
  if (typeof data !== 'object' || data === null || !('seconds' in data)) return null;
  const seconds = Number(data.seconds);
  if (!Number.isFinite(seconds)) return null;
  return seconds > 90
    ? `It works again in ${Math.ceil(seconds / 60)} minutes.`
    : `It works again in ${seconds} seconds.`;
}

/** The sentence alone, with what is particular if there is any. */
export function sayProblem(error: unknown): string {
  const { sentence, detail } = tell(error);
  return detail === null ? sentence : detail;
}

export const isProblem = (error: unknown, ...codes: readonly ProblemCode[]): boolean =>
  error instanceof ApiProblem && codes.includes(error.code);
