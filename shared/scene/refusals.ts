// zod's findings in the document's own words: the path of the offender and what it must be.
import type { z } from 'zod';
import { MAX_REFUSALS } from './limits';
import type { Refusal } from './references';

type Issue = z.core.$ZodIssue;

/** `components[3].solids[0].shape.size[1]` */
export function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, key) => {
    if (typeof key === 'number') return `${text}[${key}]`;
    const word = String(key);
    const plain = /^[A-Za-z_][A-Za-z0-9_-]*$/.test(word) ? word : JSON.stringify(word.slice(0, 80));
    return text === '' ? plain : `${text}.${plain}`;
  }, '');
}

const TYPES: Readonly<Record<string, string>> = {
  number: 'a finite number',
  string: 'text',
  object: 'an object',
  record: 'an object',
  array: 'a list',
  tuple: 'a list',
  boolean: 'true or false',
};

const listed = (values: readonly unknown[]): string => values.map((v) => JSON.stringify(v)).join(', ');

function sizeText(issue: Issue & { readonly origin: string }, word: string, size: number | bigint): string {
  const plural = Number(size) === 1 ? 'entry' : 'entries';
  return issue.origin === 'number' ? `must be ${word} ${size}` : `must have ${word} ${size} ${plural}`;
}

function reasonOf(issue: Issue, isMissing: boolean): string {
  if (isMissing) return 'is missing';
  switch (issue.code) {
    case 'invalid_type': {
      const expected = TYPES[issue.expected] ?? issue.expected;
      return `must be ${expected}`;
    }
    case 'too_small':
      if (issue.origin === 'number')
        return sizeText(issue, issue.inclusive ? 'at least' : 'greater than', issue.minimum);
      return issue.minimum === 1 ? 'must not be empty' : sizeText(issue, 'at least', issue.minimum);
    case 'too_big':
      return sizeText(issue, issue.inclusive === false ? 'less than' : 'at most', issue.maximum);
    case 'invalid_value':
      return issue.values.length === 1 ? `must be ${listed(issue.values)}` : `must be one of ${listed(issue.values)}`;
    case 'unrecognized_keys':
      return 'is not known';
    case 'invalid_union':
      return issue.path.at(-2) === 'between'
        ? 'must name one component, group or category'
        : 'must be a finite number, text, true or false';
    default:
      return issue.message;
  }
}

/** The value at a path, or undefined. */
function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  let value = input;
  for (const key of path) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
    value = (value as Record<PropertyKey, unknown>)[key];
  }
  return value;
}

/** A discriminated union that met no branch: the kind itself is at fault. */
function kindRefusal(issue: Issue, input: unknown): Refusal | null {
  if (issue.code !== 'invalid_union' || !('discriminator' in issue) || typeof issue.discriminator !== 'string')
    return null;
  const isAtKind = issue.path.at(-1) === issue.discriminator;
  const holder = isAtKind ? issue.path.slice(0, -1) : issue.path;
  const value = valueAt(input, holder);
  if (typeof value !== 'object' || value === null) {
    const isMissing = value === undefined && typeof holder.at(-1) === 'string';
    return { path: pathText(holder), reason: isMissing ? 'is missing' : 'must be an object' };
  }
  const at = [...holder, issue.discriminator];
  const known = String(at.at(-3)) === 'steps' ? ['swing', 'slide'] : ['box', 'cylinder', 'mesh'];
  const missing = valueAt(input, at) === undefined;
  return { path: pathText(at), reason: missing ? 'is missing' : `must be one of ${listed(known)}` };
}

/** The findings of the one branch of a union that the value was meant for; null if that is not clear. */
function branchIssues(issue: Issue, input: unknown): Issue[] | null {
  if (issue.code !== 'invalid_union') return null;
  const fits = issue.errors.filter((branch) =>
    branch.every(
      ({ code, path }) =>
        (code !== 'invalid_type' && code !== 'invalid_value') ||
        (path.length > 0 && valueAt(input, [...issue.path, ...path]) !== undefined),
    ),
  );
  const [branch, ...others] = fits;
  if (branch === undefined || others.length > 0) return null;
  return branch.map((inner) => ({ ...inner, path: [...issue.path, ...inner.path] }));
}

function refusalsOfIssue(issue: Issue, input: unknown): Refusal[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ path: pathText([...issue.path, key]), reason: 'is not known' }));
  }
  const kind = kindRefusal(issue, input);
  if (kind !== null) return [kind];
  const branch = branchIssues(issue, input);
  if (branch !== null) return branch.flatMap((inner) => refusalsOfIssue(inner, input));
  const isMissing =
    issue.path.length > 0 &&
    valueAt(input, issue.path) === undefined &&
    typeof issue.path.at(-1) === 'string' &&
    (issue.code === 'invalid_type' ||
      issue.code === 'invalid_value' ||
      issue.code === 'invalid_union' ||
      issue.code === 'custom');
  return [{ path: pathText(issue.path), reason: reasonOf(issue, isMissing) }];
}

/** The findings of zod as refusals, the first hundred; `input` is what was read. */
export function refusalsOf(error: z.core.$ZodError, input: unknown): Refusal[] {
  return error.issues.flatMap((issue) => refusalsOfIssue(issue, input)).slice(0, MAX_REFUSALS);
}
