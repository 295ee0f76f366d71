// Random pairs of boxes, cylinders and closed meshes against a general-purpose geometry library that shares no code with
// the kernel: manifold-3d (its minGap where two are apart, the volume of its intersection where they are not).
// The reference works on triangles in single precision: a cylinder is given to it twice, inscribed and circumscribed, so
// that the true cylinder's gap lies between its two answers.
import fc from 'fast-check';
import Module, { type Manifold } from 'manifold-3d';
import { beforeAll, describe, expect, test } from 'vitest';
import { rigidFromPose, applyRigid } from '#shared/units';
import { meshFromSoup } from '#shared/geometry';
import { block, findingOf, mesh, part, reportOf, rod, sceneOf } from '../fixtures/scenes';
import { angleSoup, boxSoup, movedSoup, torusSoup, tubeSoup, type Soup } from '../fixtures/soups';

const FACETS = 96;
/** Single precision at 200 mm from the origin, both sides, and a placement done in it, mm. */
const REFERENCE_ERROR = 2e-4;
const FAR = 500;
const POSES = 60;

type Triple = [number, number, number];
interface Thing {
  readonly kind: 'box' | 'cylinder' | 'mesh';
  readonly solid: (pose: object) => Readonly<Record<string, unknown>>;
  /** The same from inside and from outside. */
  readonly inner: Soup;
  readonly outer: Soup;
}

const MESHES: Readonly<Record<string, Soup>> = {
  torus: torusSoup(40, 12, 32, 16),
  angle: movedSoup(angleSoup(60, 6, 40), [-20, -20, -20]),
  block: boxSoup(30, 50, 20),
  tube: tubeSoup(15, 80, 24),
};

const boxThing = (size: Triple): Thing => {
  const soup = boxSoup(...size);
  return { kind: 'box', solid: (pose) => block(size, { ...pose }), inner: soup, outer: soup };
};
const rodThing = (diameter: number, length: number): Thing => ({
  kind: 'cylinder',
  solid: (pose) => rod(diameter, length, { ...pose }),
  inner: tubeSoup(diameter / 2, length, FACETS),
  outer: tubeSoup(diameter / 2 / Math.cos(Math.PI / FACETS), length, FACETS),
});
const meshThing = (name: string): Thing => ({
  kind: 'mesh',
  solid: (pose) => mesh(name, { ...pose }),
  inner: MESHES[name]!,
  outer: MESHES[name]!,
});

const size = fc.double({ min: 5, max: 80, noNaN: true });
const things: Readonly<Record<Thing['kind'], fc.Arbitrary<Thing>>> = {
  box: fc.tuple(size, size, size).map(boxThing),
  cylinder: fc.tuple(size, size).map(([d, l]) => rodThing(d, l)),
  mesh: fc.constantFrom(...Object.keys(MESHES)).map(meshThing),
};
const place = fc.double({ min: -45, max: 45, noNaN: true });
const turn = fc.double({ min: -180, max: 180, noNaN: true });
const pose = fc
  .tuple(place, place, place, turn, turn, turn)
  .map(([x, y, z, rx, ry, rz]) => ({ at: [x, y, z] as Triple, turn: [rx, ry, rz] as Triple }));

let library: Awaited<ReturnType<typeof Module>>;
beforeAll(async () => {
  library = await Module();
  library.setup();
});

function solidOf(soup: Soup, at: { at: Triple; turn: Triple }): Manifold {
  const rigid = rigidFromPose(at.at, at.turn);
  const made = meshFromSoup(Float64Array.from(soup, (x) => x + 0));
  if (!made.ok) throw new Error(made.reason);
  const { corners, triangles } = made.mesh;
  const vertProperties = new Float32Array(corners.length);
  for (let k = 0; k < corners.length; k += 3) {
    vertProperties.set(applyRigid(rigid, [corners[k]!, corners[k + 1]!, corners[k + 2]!]), k);
  }
  return library.Manifold.ofMesh(new library.Mesh({ numProp: 3, vertProperties, triVerts: triangles }));
}

/** The reference's gap and shared volume. */
function reference(a: Soup, b: Soup, p: Parameters<typeof solidOf>[1], q: typeof p): { gap: number; volume: number } {
  const [x, y] = [solidOf(a, p), solidOf(b, q)];
  const both = x.intersect(y);
  const answer = { gap: x.minGap(y, FAR), volume: both.isEmpty() ? 0 : both.volume() };
  for (const m of [x, y, both]) m.delete();
  return answer;
}

describe.each([
  ['box', 'box', 601],
  ['box', 'cylinder', 602],
  ['cylinder', 'cylinder', 603],
  ['box', 'mesh', 604],
  ['cylinder', 'mesh', 605],
  ['mesh', 'mesh', 606],
] as const)('%s and %s', (one, other, seed) => {
  test(`${POSES} random poses agree with the reference library (seed ${seed})`, () => {
    let apart = 0;
    let overlapping = 0;
    fc.assert(
      fc.property(things[one], things[other], pose, pose, (a, b, p, q) => {
        const f = findingOf(
          reportOf(sceneOf([part('a', [a.solid(p)]), part('b', [b.solid(q)])], { accuracy: 0.001 }), MESHES),
          'a',
          'b',
        );
        const inner = reference(a.inner, b.inner, p, q);
        const outer = a.inner === a.outer && b.inner === b.outer ? inner : reference(a.outer, b.outer, p, q);
        if (inner.volume > 1e-3) {
          expect(f.verdict).toBe('hits');
          expect(f.gap).toBe(0);
          overlapping += 1;
        }
        if (f.gap > REFERENCE_ERROR) {
          expect(inner.volume).toBeLessThanOrEqual(1e-3);
          apart += 1;
        }
        expect(f.gap).toBeLessThanOrEqual(inner.gap + 0.001 + REFERENCE_ERROR);
        expect(f.gapAtLeast).toBeGreaterThanOrEqual(outer.gap - 0.001 - REFERENCE_ERROR);
      }),
      { seed, numRuns: POSES },
    );
    // both kinds of pose were really met
    expect(apart).toBeGreaterThan(10);
    expect(overlapping).toBeGreaterThan(10);
  });
});
