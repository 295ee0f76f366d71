// A fault that the caller is told of, by its code in the catalogue.
import { ERRORS, sentenceOf, statusOf, type ErrorCode, type Problem } from '#shared/api';

export interface ErrorDetail {
  readonly detail?: string;
  readonly faults?: readonly { readonly path: string; readonly reason: string }[];
  readonly data?: unknown;
}

export class ApiError extends Error {
  constructor(
    readonly code: ErrorCode,
    readonly more: ErrorDetail = {},
  ) {
    super(more.detail ?? sentenceOf(code));
  }
}

export function problemOf(error: ApiError, requestId: string): Problem {
  const { code, more } = error;
  return {
    type: `urn:gapwright:${code}`,
    title: ERRORS[code][1],
    status: statusOf(code),
    code,
    detail: more.detail,
    instance: requestId,
    faults: more.faults === undefined ? undefined : [...more.faults],
    data: more.data,
  };
}
