import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { loadScene, poseFromRigid, rigidOf, worldPose, type Scene, type Vec3 } from '#shared/scene';
import { applyRigid, composeRigid, rigidFromPose } from '#shared/units';
import { sampleDocument, spoiled } from './sample';

function loaded(document: unknown): Scene {
  const result = loadScene(document);
  if (!result.ok) throw new Error(result.refusals[0].reason);
  return result.scene;
}

const close = (a: ArrayLike<number>, b: ArrayLike<number>, by: number): void => {
  for (let i = 0; i < 12; i += 1) expect(Math.abs(a[i]! - b[i]!)).toBeLessThan(by);
};

describe('where things stand', () => {
  it('puts group, component and solid one inside the other', () => {
    let document = spoiled(sampleDocument(), 'groups[0].pose', { at: [100, 0, 0], turn: [0, 0, 90] });
    document = spoiled(document, 'components[0].pose', { at: [10, 0, 0], turn: [90, 0, 0] });
    document = spoiled(document, 'components[0].solids[0].pose', { at: [0, 0, 1] });
    const scene = loaded(document);
    const pedal = scene.components[0]!;
    // solid: z + 1; component: z turns to -y, then x + 10; group: x turns to y, -y to x, then x + 100
    const place = applyRigid(worldPose(scene, pedal, pedal.solids[0]), [0, 0, 0]);
    [101, 10, 0].forEach((x, i) => expect(place[i]).toBeCloseTo(x, 12));
    const frame = applyRigid(worldPose(scene, pedal), [0, 0, 0]);
    [100, 10, 0].forEach((x, i) => expect(frame[i]).toBeCloseTo(x, 12));
  });

  it('takes what is left out as zero', () => {
    const scene = loaded(sampleDocument());
    const firewall = scene.components[2]!;
    expect([...worldPose(scene, firewall, firewall.solids[0])]).toEqual([1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0]);
    expect([...rigidOf({ at: [1, 2, 3] })].map((x) => x + 0)).toEqual([1, 0, 0, 1, 0, 1, 0, 2, 0, 0, 1, 3]);
    expect([...rigidOf({ turn: [0, 0, 90] })]).toEqual([...rigidFromPose([0, 0, 0], [0, 0, 90])]);
  });
});

describe('a placement as a pose', () => {
  const angle = fc.double({ min: -360, max: 360, noNaN: true });
  const length = fc.double({ min: -50_000, max: 50_000, noNaN: true });

  it('places the same', () => {
    fc.assert(
      fc.property(fc.tuple(length, length, length), fc.tuple(angle, angle, angle), (at, turn) => {
        const rigid = rigidFromPose(at, turn);
        close(rigidOf(poseFromRigid(rigid)), rigid, 1e-8);
      }),
    );
  });

  it('is the pose itself where the second angle lies within ±90 degrees', () => {
    const within = (most: number): fc.Arbitrary<number> =>
      fc.integer({ min: -most * 10, max: most * 10 }).map((x) => x / 10);
    fc.assert(
      fc.property(fc.tuple(within(179), within(89), within(179)), (turn) => {
        const pose = poseFromRigid(rigidFromPose([0, 0, 0], turn));
        turn.forEach((x, i) => expect(pose.turn![i]).toBeCloseTo(x, 9));
      }),
    );
  });

  it.each([90, -90, 270])('holds where two angles turn about one line: %s degrees about y', (ry) => {
    for (const [rx, rz] of [
      [0, 0],
      [30, 0],
      [0, 40],
      [25, -70],
      [180, 90],
    ] as const) {
      const rigid = composeRigid(rigidFromPose([1, 2, 3]), rigidFromPose([0, 0, 0], [rx, ry, rz]));
      const pose = poseFromRigid(rigid);
      close(rigidOf(pose), rigid, 1e-9);
      expect(pose.turn![2]).toBe(0);
    }
  });

  it('leaves no noise and no negative zero', () => {
    const pose = poseFromRigid(rigidFromPose([-0, 1e-12, 5], [0, -0, 45]));
    const flat = [...(pose.at as Vec3), ...(pose.turn as Vec3)];
    expect(flat.map((x) => (Object.is(x, -0) ? 'negative' : x))).toEqual([0, 0, 5, 0, 0, 45]);
  });
});
