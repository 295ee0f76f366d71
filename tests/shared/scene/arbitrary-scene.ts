// Valid scenes at random, for property tests. Ids come from a small pool, so that two scenes share some of their records.
import fc from 'fast-check';
import { CATEGORIES, SOURCES, type Component, type Group, type Laser, type PairRule, type Pose } from '#shared/scene';
import type { Hole, Motion, Recipe, Scene, Shape, Side, Solid, Step, Vec3 } from '#shared/scene';

/** Small whole and decimal millimetres, so that failures are readable. */
const mm = fc.integer({ min: -20_000, max: 20_000 }).map((x) => x / 8 + 0);
const positive = fc.integer({ min: 1, max: 8000 }).map((x) => x / 8);
const degrees = fc.integer({ min: -3600, max: 3600 }).map((x) => x / 10 + 0);
const vec3: fc.Arbitrary<Vec3> = fc.tuple(mm, mm, mm);
const direction: fc.Arbitrary<Vec3> = fc
  .tuple(fc.integer({ min: -3, max: 3 }), fc.integer({ min: -3, max: 3 }), fc.integer({ min: -3, max: 3 }))
  .filter((v) => v.some((x) => x !== 0));
const name = fc.oneof(
  fc.constantFrom('Brake pedal', 'Wiper motor', '½ plate', 'Säule', '🔧'),
  fc.string({ minLength: 1, maxLength: 12, unit: 'grapheme' }).filter((s) => s !== '' && !s.includes('\0')),
);
/** `constructor` is an id that careless code takes for something else. */
const idPool = ['a', 'b', 'c', 'd', 'e', 'f', 'constructor', '0-9', '-'] as const;
const ids = (least: number, most: number): fc.Arbitrary<string[]> =>
  fc.uniqueArray(fc.constantFrom(...idPool), { minLength: least, maxLength: most });

export const arbitraryPose: fc.Arbitrary<Pose> = fc.record(
  { at: vec3, turn: fc.tuple(degrees, degrees, degrees) },
  { requiredKeys: [] },
);

export const arbitraryShape: fc.Arbitrary<Shape> = fc.oneof(
  fc.record({ kind: fc.constant('box' as const), size: fc.tuple(positive, positive, positive) }),
  fc.record({ kind: fc.constant('cylinder' as const), diameter: positive, length: positive }),
  fc.record({
    kind: fc.constant('mesh' as const),
    mesh: fc.constantFrom('pad.stl', 'meshes/liner.stl', '0f'.repeat(32)),
    scale: fc.constantFrom(1, 25.4, 1000),
  }),
);

const solidOf = (id: string): fc.Arbitrary<Solid> =>
  fc.record(
    { id: fc.constant(id), shape: arbitraryShape, name, pose: arbitraryPose },
    { requiredKeys: ['id', 'shape'] },
  );

const stepOf = (isFirst: boolean): fc.Arbitrary<Step> => {
  const from = isFirst ? fc.integer({ min: -30, max: 30 }) : fc.constant(0);
  return fc.oneof(
    fc.record({
      kind: fc.constant('swing' as const),
      point: vec3,
      axis: direction,
      from,
      to: fc.integer({ min: -360, max: 360 }),
    }),
    fc.record({
      kind: fc.constant('slide' as const),
      along: direction,
      from,
      to: fc.integer({ min: -400, max: 400 }),
    }),
  );
};
const steps: fc.Arbitrary<Step[]> = fc.oneof(
  stepOf(true).map((s) => [s]),
  fc.tuple(stepOf(true), stepOf(false)),
  fc.tuple(stepOf(true), stepOf(false), stepOf(false)),
);

/** Motions in which no solid is carried by two operating ones. */
function motionsOf(solids: readonly Solid[]): fc.Arbitrary<Motion[]> {
  const some = fc.subarray(
    solids.map((s) => s.id),
    { minLength: 1 },
  );
  const one = (id: string): fc.Arbitrary<Motion> =>
    fc.record(
      { id: fc.constant(id), name, use: fc.constantFrom('operating', 'service'), steps, solids: some },
      { requiredKeys: ['id', 'name', 'use', 'steps'] },
    );
  return ids(0, 3)
    .chain((all) => fc.tuple(...all.map(one)))
    .map((motions) => {
      const taken = new Set<string>();
      return motions.map((motion): Motion => {
        const moved = motion.solids ?? solids.map((s) => s.id);
        if (motion.use === 'service' || moved.some((id) => taken.has(id))) return { ...motion, use: 'service' };
        moved.forEach((id) => taken.add(id));
        return motion;
      });
    });
}

const recipe: fc.Arbitrary<Recipe> = fc.record({
  kind: fc.constantFrom('hanging-pedal', 'fender-liner'),
  params: fc.dictionary(
    fc.constantFrom('arm', 'hand', 'constructor', 'pad'),
    fc.oneof(positive, fc.constantFrom('left', ''), fc.boolean()),
    { noNullPrototype: true },
  ),
});

function componentOf(id: string, groups: readonly string[]): fc.Arbitrary<Component> {
  const base = ids(1, 4)
    .chain((all) => fc.tuple(...all.map(solidOf)))
    .chain((solids) => fc.record({ solids: fc.constant(solids), motions: motionsOf(solids) }));
  const holes = ids(0, 2).chain((all) =>
    fc.tuple(
      ...all.map((hole): fc.Arbitrary<Hole> =>
        fc.record({ id: fc.constant(hole), at: vec3, axis: direction, diameter: positive }),
      ),
    ),
  );
  const rest = fc.record(
    {
      id: fc.constant(id),
      name,
      category: fc.constantFrom(...CATEGORIES),
      pose: arbitraryPose,
      tolerance: fc.constantFrom(0, 1, 2, 3, 12, 4.5),
      holes,
      source: fc.constantFrom(...SOURCES),
      note: fc.string({ maxLength: 20, unit: 'grapheme' }).filter((s) => !s.includes('\0')),
      recipe,
      ...(groups.length === 0 ? {} : { group: fc.constantFrom(...groups) }),
    },
    { requiredKeys: ['id', 'name', 'category', 'pose', 'tolerance', 'holes'] },
  );
  return fc.tuple(base, rest).map(([a, b]) => ({ ...b, ...a }));
}

function sideOf(components: readonly string[], groups: readonly string[]): fc.Arbitrary<Side> {
  return fc.oneof(
    fc.record({ category: fc.constantFrom(...CATEGORIES.slice(0, 4)) }),
    ...(components.length === 0 ? [] : [fc.record({ component: fc.constantFrom(...components) })]),
    ...(groups.length === 0 ? [] : [fc.record({ group: fc.constantFrom(...groups) })]),
  );
}

/** Gap rules and joints, repeats of a pair among them. */
function pairsOf(components: readonly string[], groups: readonly string[]): fc.Arbitrary<PairRule[]> {
  const side = sideOf(components, groups);
  const rule = fc
    .record({ between: fc.tuple(side, side), gap: positive, isJoint: fc.boolean() })
    .filter(({ between: [a, b] }) => !('component' in a && 'component' in b && a.component === b.component))
    .map(({ between, gap, isJoint }): PairRule => {
      const canJoin = between.every((s) => 'component' in s);
      return isJoint && canJoin ? { between, joint: { allow: gap } } : { between, gap };
    });
  return fc.array(rule, { maxLength: 6 });
}

const laserOf = (id: string): fc.Arbitrary<Laser> =>
  fc.record({ id: fc.constant(id), name, point: vec3, normal: direction });
const groupOf = (id: string): fc.Arbitrary<Group> => fc.record({ id: fc.constant(id), name, pose: arbitraryPose });

/** A valid scene of up to six components, three groups and three lasers. */
export const arbitraryScene: fc.Arbitrary<Scene> = fc
  .record({ lasers: ids(0, 3), groups: ids(0, 3), components: ids(0, 6) })
  .chain((all) =>
    fc.record({
      format: fc.constant('gapwright-scene' as const),
      version: fc.constant(1 as const),
      name,
      display: fc.constantFrom('mm', 'in', 'in-decimal'),
      lasers: fc.tuple(...all.lasers.map(laserOf)),
      groups: fc.tuple(...all.groups.map(groupOf)),
      components: fc.tuple(...all.components.map((id) => componentOf(id, all.groups))),
      rules: fc.record({
        gap: positive,
        movingGap: positive,
        touch: fc.constantFrom(0.0001, 0.01, 0.1),
        pairs: pairsOf(all.components, all.groups),
      }),
      accuracy: fc.constantFrom(0.0001, 0.05, 1),
    }),
  );

/** A component that fits in any scene of arbitraryScene: no group, an id of its own. */
export const arbitraryNewComponent: fc.Arbitrary<Component> = componentOf('newcomer', []);
