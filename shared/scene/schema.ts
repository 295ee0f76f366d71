// The shape of a scene document, version 1. What one value can say about itself is here; what needs two values to see
// (duplicates, dangling ids, sums) is in references.ts.
import { z } from 'zod';
import { listOf, recordOf } from './bounded';
import {
  LEAST_ACCURACY,
  MAX_COMPONENTS,
  MAX_MOTIONS,
  MAX_NAME,
  MAX_NOTE,
  MAX_REACH,
  MAX_SOLIDS,
  MAX_STEPS,
} from './limits';
import { CATEGORIES, SOURCES, type Scene } from './types';

const finite = z.number();
const above0 = finite.gt(0);
const notBelow0 = finite.gte(0);
const withinReach = finite.gte(-MAX_REACH).lte(MAX_REACH);
/** A place: 100 m from the origin at most, in a straight line. */
const point = z
  .tuple([withinReach, withinReach, withinReach])
  .refine(([x, y, z]) => x * x + y * y + z * z <= MAX_REACH * MAX_REACH, {
    error: 'must lie within 100 m of the origin',
  });
const triple = z.tuple([finite, finite, finite]);
const direction = triple.refine((v) => v.some((x) => x !== 0), { error: 'must not be zero' });

const ID = /^[a-z0-9-]{1,64}$/;
const id = z.string().regex(ID, { error: 'must be 1 to 64 of a-z, 0-9 and -' });
/** Characters as people count them, not UTF-16 units; none that no database stores. */
const characters = (least: number, most: number, what: string) =>
  z
    .string()
    .refine((s) => s.length <= 2 * most && s.length >= least && [...s].length <= most, { error: what })
    .refine((s) => !/\0|\p{Surrogate}/u.test(s), { error: 'must not hold NUL or half a character' });
const name = characters(1, MAX_NAME, `must have 1 to ${MAX_NAME} characters`);

const pose = z.strictObject({ at: point.optional(), turn: triple.optional() });

const box = z.strictObject({ kind: z.literal('box'), size: z.tuple([above0, above0, above0]) });
const cylinder = z.strictObject({ kind: z.literal('cylinder'), diameter: above0, length: above0 });

/**
 * Why a mesh's path is refused, or null. It is relative and stays inside the document's folder on every system; a SHA-256
 * is such a path too. `a/../b.stl` does not leave the folder and is taken.
 */
export function meshPathFault(path: string): string | null {
  if (path === '') return 'must not be empty';
  if (path.length > 1024) return 'must have at most 1024 characters';
  if (/\p{Cc}|\p{Surrogate}/u.test(path)) return 'must not hold control characters';
  if (/^[/\\]|^[a-z]:/i.test(path)) return 'must not be an absolute path';
  if (/^[a-z][a-z0-9+.-]*:/i.test(path)) return 'must be a path, not an address';
  let depth = 0;
  for (const part of path.split(/[/\\]/)) {
    if (part === '..') depth -= 1;
    else if (part !== '.' && part !== '') depth += 1;
    if (depth < 0) return "must not leave the document's folder";
  }
  if (path.includes('\\')) return 'must be written with / between folders';
  if (/(^|\/)\.{0,2}$/.test(path)) return 'must name a file';
  return null;
}

const meshPath = z.string().check((context) => {
  const fault = meshPathFault(context.value);
  if (fault !== null) context.issues.push({ code: 'custom', message: fault, input: context.value });
});
const mesh = z.strictObject({ kind: z.literal('mesh'), mesh: meshPath, scale: above0 });
const shape = z.discriminatedUnion('kind', [box, cylinder, mesh]);

const solid = z.strictObject({ id, name: name.optional(), shape, pose: pose.optional() });

// `from` belongs to the first step. A later one may say 0, as a document written out with its defaults does; any other value
// is refused in references.ts.
const swing = z.strictObject({
  kind: z.literal('swing'),
  point,
  axis: direction,
  from: finite.default(0),
  to: finite,
});
const slide = z.strictObject({ kind: z.literal('slide'), along: direction, from: finite.default(0), to: finite });
const step = z.discriminatedUnion('kind', [swing, slide]);

const motion = z.strictObject({
  id,
  name,
  use: z.enum(['operating', 'service']),
  solids: z.array(id).min(1).max(MAX_SOLIDS).optional(),
  steps: z.array(step).min(1).max(MAX_STEPS),
});

const hole = z.strictObject({ id, at: point, axis: direction, diameter: above0 });

/** What a recipe was given. The check has no use for it, so it is held to what a recipe could ever ask for. */
const recipe = z.strictObject({
  kind: name,
  params: recordOf(
    (key) => key.length <= 64 && key !== '__proto__',
    z.union([finite, characters(0, 200, 'must have at most 200 characters'), z.boolean()]),
  ),
});

const component = z.strictObject({
  id,
  name,
  category: z.enum(CATEGORIES),
  group: id.optional(),
  pose: pose.default({}),
  tolerance: notBelow0.default(0),
  source: z.enum(SOURCES).optional(),
  note: characters(0, MAX_NOTE, `must have at most ${MAX_NOTE} characters`).optional(),
  recipe: recipe.optional(),
  solids: z.array(solid).min(1).max(MAX_SOLIDS),
  motions: z.array(motion).max(MAX_MOTIONS).default([]),
  holes: listOf(hole).default([]),
});

const side = z.union([
  z.strictObject({ component: id }),
  z.strictObject({ group: id }),
  z.strictObject({ category: z.enum(CATEGORIES) }),
]);

const pair = z.strictObject({
  between: z.tuple([side, side]),
  gap: notBelow0.optional(),
  joint: z.strictObject({ allow: notBelow0.default(1) }).optional(),
});

const rules = z.strictObject({
  gap: notBelow0.default(6),
  movingGap: notBelow0.default(10),
  touch: finite.gte(LEAST_ACCURACY).default(0.01),
  pairs: listOf(pair).default([]),
});

const laser = z.strictObject({ id, name, point, normal: direction });
const group = z.strictObject({ id, name, pose: pose.default({}) });

/** Version 1 of the document, defaults filled in. */
export const sceneSchema = z.strictObject({
  format: z.literal('gapwright-scene'),
  version: z.literal(1),
  name,
  display: z.enum(['mm', 'in', 'in-decimal']).default('mm'),
  lasers: listOf(laser).default([]),
  groups: listOf(group).default([]),
  components: z.array(z.unknown()).max(MAX_COMPONENTS).pipe(listOf(component)),
  rules: rules.prefault({}),
  accuracy: finite.gte(LEAST_ACCURACY).default(0.05),
}) satisfies z.ZodType<Scene>;

/** The records that differences carry one by one. */
export const recordSchemas = { laser, group, component, pair } as const;
export const headSchema = z.strictObject({
  name,
  display: z.enum(['mm', 'in', 'in-decimal']),
  accuracy: finite.gte(LEAST_ACCURACY),
});
export const ruleHeadSchema = z.strictObject({
  gap: notBelow0,
  movingGap: notBelow0,
  touch: finite.gte(LEAST_ACCURACY),
});
