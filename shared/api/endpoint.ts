// An endpoint, described once for both ends.
import { z } from 'zod';
import type { Action } from '#shared/access';
import type { ErrorCode } from './errors';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** Kinds of things an actor can have a standing towards. */
export type ThingKind = 'team' | 'project' | 'scene' | 'mesh' | 'dry-fit' | 'revision' | 'picture' | 'share';

/** Who may call: anyone; anyone signed in; who may do an action on the thing that a path parameter names. */
export type Who =
  | { readonly kind: 'anyone' }
  | { readonly kind: 'signed-in' }
  | { readonly kind: 'may'; readonly action: Action; readonly on: ThingKind; readonly param: string };

export interface Endpoint<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  R extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** With `:name` for parameters, under /api. */
  readonly path: string;
  readonly who: Who;
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly response: R;
  /** How the body comes, and how the answer goes, where it is not JSON. */
  readonly takes: 'json' | 'multipart';
  /** Whether a whole scene document may come with the request; other bodies are small. */
  readonly takesDocument: boolean;
  readonly gives: 'json' | 'file';
  readonly status: number;
  readonly errors: readonly ErrorCode[];
}

const nothing = z.object({});
export const none = z.null();

type Parts<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType> = {
  readonly method: Method;
  readonly path: string;
  readonly who: Who;
  readonly params?: P;
  readonly query?: Q;
  readonly body?: B;
  readonly response?: R;
  readonly takes?: 'json' | 'multipart';
  readonly takesDocument?: boolean;
  readonly gives?: 'json' | 'file';
  readonly status?: number;
  readonly errors?: readonly ErrorCode[];
};

export function defineEndpoint<
  P extends z.ZodType = typeof nothing,
  Q extends z.ZodType = typeof nothing,
  B extends z.ZodType = typeof nothing,
  R extends z.ZodType = typeof none,
>(parts: Parts<P, Q, B, R>): Endpoint<P, Q, B, R> {
  return {
    params: nothing as unknown as P,
    query: nothing as unknown as Q,
    body: nothing as unknown as B,
    response: none as unknown as R,
    takes: 'json',
    takesDocument: false,
    gives: 'json',
    status: 200,
    errors: [],
    ...parts,
  };
}

export const anyone: Who = { kind: 'anyone' };
export const signedIn: Who = { kind: 'signed-in' };
export const may = (action: Action, on: ThingKind, param: string): Who => ({ kind: 'may', action, on, param });

/** Ids of rows. */
export const rowId = z.uuid();
/** Ids of people, as the accounts make them. */
export const personId = z.string().min(1).max(64);
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
export const when = z.iso.datetime();

const UNPRINTABLE = 'must not have control characters';

export const nameField = z
  .string()
  .trim()
  .min(1, 'must not be empty')
  .max(120, 'must have at most 120 characters')
  .refine((text) => !/\p{Cc}|\p{Surrogate}/u.test(text), UNPRINTABLE);
export const textField = (most: number) =>
  z
    .string()
    .trim()
    .max(most, `must have at most ${most} characters`)
    // tabs and line ends are text
    .refine((text) => !/[^\P{Cc}\t\r\n]|\p{Surrogate}/u.test(text), UNPRINTABLE);
export const displayField = z.enum(['mm', 'in', 'in-decimal']);

/** A page of a list: `after` is the cursor that the page before gave. */
export const pageQuery = z.object({
  after: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
});
