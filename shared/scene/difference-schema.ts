// A difference as it comes over the wire: hostile until it has been through here. What its records may say is the
// document's own schema; whether the document still holds together is seen when it is applied and loaded.
import { z } from 'zod';
import { listOf, recordOf } from './bounded';
import { LISTS, pairKey, type Changes, type Difference, type RecordChange } from './differences';
import { headSchema, recordSchemas, ruleHeadSchema } from './schema';
import type { PairRule } from './types';

const LONGEST_KEY = 400;
/** More records than 4 MB hold. */
const MAX_KEYS = 100_000;

const isKey = (key: string): boolean => key !== '' && key.length <= LONGEST_KEY && key !== '__proto__';

const changeOf = <R>(record: z.ZodType<R>) =>
  z
    .strictObject({ before: record.nullable(), after: record.nullable() })
    .refine((change: RecordChange<R>) => change.before !== null || change.after !== null, {
      error: 'must change something',
    });

/** Changes under the keys of their records; a record under another's key would be applied in its place. */
const changesOf = <R>(record: z.ZodType<R>, isKeyOf: (key: string, record: R) => boolean) =>
  recordOf(isKey, changeOf(record)).superRefine((changes: Changes<R>, context) => {
    for (const [key, { before, after }] of Object.entries(changes)) {
      if ((before !== null && !isKeyOf(key, before)) || (after !== null && !isKeyOf(key, after))) {
        context.addIssue({ code: 'custom', message: 'is not the key of this record', path: [key] });
      }
    }
  });

const isId = (key: string, record: { readonly id: string }): boolean => record.id === key;
/** The second of two equal rules has a number behind its key. */
const isPairKey = (key: string, rule: PairRule): boolean => pairKey(rule) === key.replace(/ #[1-9]\d*$/, '');

const keys = z
  .array(z.unknown())
  .max(MAX_KEYS)
  .pipe(listOf(z.string().refine(isKey, { error: 'is not a valid key' })));
const orders = Object.fromEntries(
  LISTS.map((list) => [list, z.strictObject({ before: keys, after: keys }).optional()]),
);

export const differenceSchema = z.strictObject({
  head: z.strictObject({ before: headSchema, after: headSchema }).optional(),
  ruleHead: z.strictObject({ before: ruleHeadSchema, after: ruleHeadSchema }).optional(),
  lasers: changesOf(recordSchemas.laser, isId).optional(),
  groups: changesOf(recordSchemas.group, isId).optional(),
  components: changesOf(recordSchemas.component, isId).optional(),
  pairs: changesOf(recordSchemas.pair, isPairKey).optional(),
  order: z.strictObject(orders).optional(),
}) as unknown as z.ZodType<Difference>;
