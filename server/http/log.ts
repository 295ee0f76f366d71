// The log. It says what happened and where; it never holds what people typed, their secrets or their addresses.
import { pino, stdSerializers, type DestinationStream, type Logger } from 'pino';

interface Described {
  readonly type: string;
  readonly code?: string;
  readonly message: string;
  readonly query?: string;
  readonly stack?: string;
}

/**
 * A failed query carries its parameters in its message, and the database's own fault carries values of the row: of both, only
 * the statement and the fault's message go into the log.
 */
export function describeError(error: unknown): Described {
  if (!(error instanceof Error)) return { type: typeof error, message: 'something that is no error was thrown' };
  const { query, cause } = error as { query?: unknown; cause?: unknown };
  if (typeof query === 'string' && 'params' in error) {
    const inner = cause instanceof Error ? cause : new Error('the query failed');
    return { ...describeError(inner), type: error.constructor.name, query };
  }
  const { code } = error as { code?: unknown };
  const { type, message, stack } = stdSerializers.err(error);
  return { type, message, ...(stack === undefined ? {} : { stack }), ...(typeof code === 'string' ? { code } : {}) };
}

export function createLog(level: string, to?: DestinationStream): Logger {
  const options = { level, serializers: { err: describeError } };
  return to === undefined ? pino(options) : pino(options, to);
}

/** Secrets in addresses stay out of the log. */
export const withoutSecrets = (url: string): string =>
  url
    .replace(/\/(s|api\/shared|invitations?|reset-password)\/[^/?]+/g, '/$1/…')
    .replace(/([?&])([^=&]+)=[^&]*/g, '$1$2=…');
