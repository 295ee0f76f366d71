// Closed forms of swings, slides and sweeps, and published samples of continuous collision. The source stands beside each.
import { describe, expect, test } from 'vitest';
import { displacementAt, pathOf, type PathStep } from '#shared/geometry';
import { applyRigid } from '#shared/units';
import { block, findingOf, mesh, motion, part, reportOf, rod, sceneOf, slide, swing } from '../fixtures/scenes';

type Triple = readonly [number, number, number];
const ACCURACY = 0.001;
const ratio = (degrees: number, from: number, to: number): number => (degrees - from) / (to - from);

describe('a point swung; Rodrigues, closed form', () => {
  const unit = ([x, y, z]: Triple): Triple => {
    const l = Math.hypot(x, y, z);
    return [x / l, y / l, z / l];
  };
  test.each([
    [[1, 0, 0], [0, 0, 0], [1, 1, 1], 120, [0, 1, 0]],
    [[300, 0, 0], [0, 0, 0], [0, 1, 0], 30, [259.807621, 0, -150]],
    [[0, 0, -300], [0, 0, 0], [0, 1, 0], 20, [-102.606043, 0, -281.907786]],
    [[120, 35, -260], [20, 35, 40], [0, 1, 0], 25, [-16.1547, 35, -274.154162]],
    [[1, 2, 3], [0, 0, 0], [1, -2, 2], 37, [-1.140293, 1.262423, 3.33257]],
  ] as const)('%j about %j along %j by %d degrees', (p, point, axis, to, expected) => {
    const step: PathStep = { kind: 'swing', point, axis: unit(axis), from: 0, to };
    const end = applyRigid(displacementAt(pathOf([step]), 1), p);
    for (const k of [0, 1, 2] as const) expect(end[k]).toBeCloseTo(expected[k], 6);
  });
});

describe('a hanging pedal is lowest in mid-stroke; closed form: pivot at 400, radius 300, from -15 to +10 degrees', () => {
  // a pin of no length to speak of, 0.002 thick, above a floor whose top is at 0; the pivot's axis is the car's Y
  const pad = rod(0.002, 0.002, { at: [0, 0, -300], turn: [90, 0, 0] });
  const arm = (from: number, to: number): Readonly<Record<string, unknown>> =>
    part('arm', [pad], { pose: { at: [0, 0, 400] }, motions: [motion([swing(to, { from })])] });
  const floor = part('floor', [block([2000, 2000, 10], { at: [0, 0, -5] })]);
  const lowest = (from: number, to: number): ReturnType<typeof findingOf> =>
    findingOf(reportOf(sceneOf([arm(from, to), floor], { accuracy: ACCURACY })), 'arm', 'floor', ['arm']);

  test('over the whole stroke: 100.0000, at 0 degrees', () => {
    const f = lowest(-15, 10);
    expect(f.gap).toBeGreaterThan(100 - 0.003);
    expect(f.gap).toBeLessThan(100 + ACCURACY);
    expect(f.gapAtLeast).toBeLessThanOrEqual(100);
    // within the accuracy in height it may be so far from the vertical
    const spread = (Math.acos(1 - (ACCURACY + 0.003) / 300) * 180) / Math.PI;
    expect(Math.abs(f.at.positions[0]! - ratio(0, -15, 10))).toBeLessThan(spread / 25);
  });

  test.each([
    [-15, -14.999999, 110.2223],
    [10, 10.000001, 104.5577],
  ])('at %d degrees', (from, to, height) => {
    expect(Math.abs(lowest(from, to).gap - height)).toBeLessThan(0.003);
  });
});

describe('a pad swung against a wall 150 ahead of its pivot, radius 300; closed form', () => {
  // the pad's facing point, as a very thin pin across; the wall's face at x = -150
  const wall = part('wall', [block([10, 500, 1000], { at: [-155, 0, 0] })]);
  const start = (diameter: number): number => {
    const arm = part('arm', [rod(diameter, 20, { at: [0, 0, -300], turn: [90, 0, 0] })], {
      motions: [motion([swing(40)])],
    });
    const f = findingOf(reportOf(sceneOf([arm, wall], { accuracy: 0.01 })), 'arm', 'wall', ['arm']);
    expect(f.verdict).toBe('hits');
    return f.hitSpans![0]![0] * 40;
  };
  // a hit begins `touch` (0.01) before contact, and its end is good to the accuracy of travel
  const slackDegrees = ((0.01 / Math.cos(Math.PI / 6) + 0.02) / 300) * (180 / Math.PI);
  test('a point: contact at 30.000 degrees', () => {
    expect(Math.abs(start(0.001) - 30)).toBeLessThan(slackDegrees);
  });
  test('a round pad of radius 20: contact at 25.679289 degrees', () => {
    expect(Math.abs(start(40) - 25.679289)).toBeLessThan(slackDegrees);
  });
});

test('a pin met between two samples: a point on a radius of 300, a pin of radius 12 centred 310 from the pivot at 12.5 degrees; closed form', () => {
  const at = (degrees: number, r: number): Triple => {
    const a = (degrees * Math.PI) / 180;
    return [-r * Math.sin(a), 0, -r * Math.cos(a)];
  };
  const tip = part('tip', [rod(0.001, 10, { at: [0, 0, -300], turn: [90, 0, 0] })], { motions: [motion([swing(25)])] });
  const pin = part('pin', [rod(24, 10, { at: at(12.5, 310), turn: [90, 0, 0] })]);
  const f = findingOf(reportOf(sceneOf([tip, pin], { accuracy: 0.01 })), 'pin', 'tip', ['tip']);
  // 300 and 310 from the pivot: 10 apart at 12.5 degrees, 2 deep; contact from 11.253719 to 13.746281
  expect(f.verdict).toBe('hits');
  expect(f.hitSpans).toHaveLength(1);
  const [from, to] = f.hitSpans![0]!;
  expect(Math.abs(from * 25 - 11.253719)).toBeLessThan(0.01);
  expect(Math.abs(to * 25 - 13.746281)).toBeLessThan(0.01);
  // what samples at 10 and 15 degrees would have seen: +4.644242
  for (const degrees of [10, 15]) {
    const [x, y, z] = at(degrees, 300);
    const still = part('tip', [rod(0.001, 10, { at: [x, y, z], turn: [90, 0, 0] })]);
    expect(findingOf(reportOf(sceneOf([still, pin])), 'pin', 'tip').gap).toBeCloseTo(4.644242 - 0.0005, 4);
  }
});

describe('a cylinder drawn out past a corner; closed form', () => {
  const corner = (y: number): Readonly<Record<string, unknown>> =>
    part('corner', [block([400, 40, 100], { at: [100, y + 20, 0] })]);
  const drawn = (tilt: number): Readonly<Record<string, unknown>> => {
    const a = (tilt * Math.PI) / 180;
    const out = motion([slide([Math.cos(a), Math.sin(a), 0], 180)], { use: 'service' });
    return part('cylinder', [rod(60, 180, { turn: [0, 90, 0] })], { motions: [out] });
  };
  test('radius 30, a face 36 off its axis: 6.000 all the way', () => {
    const f = findingOf(reportOf(sceneOf([drawn(0), corner(36)])), 'corner', 'cylinder', ['cylinder']);
    expect(f.gap).toBeCloseTo(6, 6);
    expect(f.gapAtLeast).toBeGreaterThan(6 - 0.05);
  });
  test('drawn 180 at 5 degrees off: 15.688 sideways, so it hits; at 1 degree 3.141, so it does not', () => {
    const at5 = findingOf(reportOf(sceneOf([drawn(5), corner(36)])), 'corner', 'cylinder', ['cylinder']);
    expect(at5.verdict).toBe('hits');
    // contact after 6 / sin 5° = 68.84 of 180
    expect(Math.abs(at5.hitSpans![0]![0] * 180 - 6 / Math.sin((5 * Math.PI) / 180))).toBeLessThan(0.05 + 0.12);
    const at1 = findingOf(reportOf(sceneOf([drawn(1), corner(36)])), 'corner', 'cylinder', ['cylinder']);
    expect(at1.gap).toBeCloseTo(6 - 180 * Math.sin(Math.PI / 180), 1);
    expect(at1.gapAtLeast).toBeLessThanOrEqual(6 - 180 * Math.sin(Math.PI / 180) + 1e-9);
  });
});

describe('continuous collision: unit queries of Wang and others, ACM Trans. Graph. 40(5) 188 (2021), corner and face, both on straight ways; times by closed form', () => {
  // the corner is a tiny triangle about (0, y, 0); the face stands in the plane of its y
  const scale = 100;
  const tiny = [0, 0, 0, 1e-6, 0, 0, 0, 0, 1e-6];
  const face = [-1, 0, 1, 1, 0, 1, 0, 0, -1].map((x) => x * scale);
  test.each([
    [1, 2, 0, 0.5, null],
    [1, 2, 0, 1, null],
    [1, 2, 0, 2, 1],
    [1, 0.5, 0, 0, null],
    [1, 0.5, 0, 0.5, 1],
    [1, 0.5, 0, 1, 2 / 3],
    [1, 0.5, 0, 2, 0.4],
    [1, 0, 0, 0, 1],
    [1, 0, 0, -1, null],
  ])('corner %d to %d, face %d to %d', (v0, v1, f0, f1, time) => {
    // seen from the face, only the corner moves: y from v0 - f0 to v1 - f1, at the same even rate
    const way = (v1 - f1 - (v0 - f0)) * scale;
    const moving = part('corner', [mesh('tiny', { at: [0, (v0 - f0) * scale, 0] })], {
      motions: [motion([slide([0, 1, 0], way)])],
    });
    const f = findingOf(
      reportOf(sceneOf([moving, part('face', [mesh('face')])], { accuracy: ACCURACY }), { tiny, face }),
      'corner',
      'face',
      ['corner'],
    );
    expect(f.verdict === 'hits').toBe(time !== null);
    if (time === null) expect(f.gap).toBeCloseTo(Math.min(v0 - f0, v1 - f1) * scale, 3);
    else expect(Math.abs(f.hitSpans![0]![0] * Math.abs(way) - time * Math.abs(way))).toBeLessThan(0.01 + ACCURACY);
  });
});

describe('continuous collision: the same source, edge and edge', () => {
  const scale = 100;
  const thin = 1e-6;
  const along = [-1 * scale, 0, 0, scale, 0, 0, 0, 0, thin];
  const across = [0, 0, -1 * scale, 0, 0, scale, thin, 0, 0];
  test.each([
    [-1, -1, 1, 1, null],
    [-1, 0, 1, 0, 1],
    [-1, 1, 1, -1, 0.5],
    [-1, -2, 1, 2, null],
  ])('first %d to %d, second %d to %d', (a0, a1, b0, b1, time) => {
    const one = part('one', [mesh('along', { at: [0, a0 * scale, 0] })], {
      motions: a0 === a1 ? [] : [motion([slide([0, 1, 0], (a1 - a0) * scale)])],
    });
    const rate = (b1 - b0 - (a1 - a0)) * scale;
    // relative to the first, only the second moves
    const other = part('other', [mesh('across', { at: [0, b0 * scale, 0] })], {
      motions: rate === 0 ? [] : [motion([slide([0, 1, 0], rate)])],
    });
    const still = part('one', [mesh('along', { at: [0, a0 * scale, 0] })]);
    const meshes = { along, across };
    const both = reportOf(sceneOf([one, other]), meshes);
    const f = reportOf(sceneOf([still, other]), meshes).findings.find(
      (g) => g.motions.length === (rate === 0 ? 0 : 1),
    )!;
    expect(f.verdict === 'hits').toBe(time !== null);
    if (time !== null) {
      expect(Math.abs(f.hitSpans![0]![0] - time) * Math.abs(rate)).toBeLessThan(0.01 + 0.05);
      // both moving, in every combination, they meet as well
      expect(both.findings[0]!.verdict).toBe('hits');
    }
  });
});
