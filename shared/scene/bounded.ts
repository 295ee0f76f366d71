// Lists and keyed records that stop at their first hundred faults. The document limits neither the number of lasers nor of
// pair rules, so 4 MB of junk in one of them would make millions of findings: seconds of work and a gigabyte for nothing.
import { z } from 'zod';
import { MAX_REFUSALS } from './limits';

type Context = z.RefinementCtx;

/** Reads one entry; its findings go to `context` under `key`. */
function readEntry<T extends z.ZodType>(
  record: T,
  value: unknown,
  key: string | number,
  context: Context,
): z.output<T> | null {
  const read = record.safeParse(value);
  if (read.success) return read.data;
  for (const issue of read.error.issues.slice(0, MAX_REFUSALS - context.issues.length)) {
    context.issues.push({ ...issue, path: [key, ...issue.path], input: value } as Context['issues'][number]);
  }
  return null;
}

/** A list of `record`, in full or refused. */
export function listOf<T extends z.ZodType>(record: T) {
  return z.array(z.unknown()).transform((values, context): z.output<T>[] => {
    const list: z.output<T>[] = [];
    for (const [i, value] of values.entries()) {
      const entry = readEntry(record, value, i, context);
      if (entry !== null) list.push(entry);
      if (context.issues.length >= MAX_REFUSALS) break;
    }
    return list;
  });
}

// zod's own objects and records pass over a key __proto__ in silence
const anObject = z.custom<Readonly<Record<string, unknown>>>(
  (value) => typeof value === 'object' && value !== null && !Array.isArray(value),
  { error: 'must be an object' },
);

/** An object whose keys and values are all of one kind, in full or refused. */
export function recordOf<T extends z.ZodType>(isKey: (key: string) => boolean, record: T) {
  return anObject.transform((values, context): Record<string, z.output<T>> => {
    const entries: [string, z.output<T>][] = [];
    for (const [key, value] of Object.entries(values)) {
      if (isKey(key)) {
        const entry = readEntry(record, value, key, context);
        if (entry !== null) entries.push([key, entry]);
      } else {
        context.issues.push({ code: 'custom', message: 'is not a valid key', input: key, path: [key.slice(0, 80)] });
      }
      if (context.issues.length >= MAX_REFUSALS) break;
    }
    // fromEntries defines own properties, so that no key reaches the prototype
    return Object.fromEntries(entries);
  });
}
