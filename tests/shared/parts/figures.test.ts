// The usual measurements of ready-made parts against the trade's ranges, and their motions against closed forms.
import { describe, expect, test } from 'vitest';
import { padDrop, pedalTravel, recipeOf, type Built } from '#shared/parts';

const usual = (kind: string, key: string): number => {
  const param = recipeOf(kind)?.params.find((p) => p.key === key);
  if (param === undefined || param.unit === 'choice') throw new Error(`${kind} has no measurement ${key}`);
  return param.default;
};
const built = (kind: string, params = {}): Built => {
  const made = recipeOf(kind)!.build(params);
  if (!made.ok) throw new Error(made.faults[0].message);
  return made.part;
};

/** mm and degrees; from memory unless marked: common practice, no source. */
const RANGES: readonly (readonly [kind: string, key: string, least: number, most: number])[] = [
  ['pedal-bracket', 'plateWidth', 180, 280],
  ['pedal-bracket', 'plateHeight', 110, 180],
  ['hanging-pedal', 'armLength', 250, 330],
  ['hanging-pedal', 'clevisRadius', 40, 65],
  ['hanging-pedal', 'armThickness', 6, 12],
  ['hanging-pedal', 'armWidth', 25, 40],
  ['hanging-pedal', 'padWidth', 50, 65],
  ['hanging-pedal', 'padHeight', 50, 75],
  ['hanging-pedal', 'stroke', 25.4, 35.6],
  // common practice, no source: 76, at most 102
  ['hanging-pedal', 'workingTravel', 76, 102],
  ['master-cylinder', 'bodyDiameter', 32, 45],
  ['master-cylinder', 'bodyLength', 105, 150],
  ['master-cylinder', 'boltSpacing', 57, 57],
  ['master-cylinder', 'rodLength', 100, 160],
  ['reservoir', 'diameter', 50, 75],
  ['reservoir', 'height', 80, 120],
  ['booster', 'diameter', 178, 279],
  ['throttle-pedal', 'moduleWidth', 90, 120],
  ['throttle-pedal', 'travel', 14, 20],
  ['steering-column', 'tubeDiameter', 44.5, 57],
  ['steering-column', 'shaftDiameter', 19, 25],
  ['steering-column', 'jointDiameter', 38, 50],
  ['steering-column', 'lengthBehind', 430, 1140],
  ['steering-column', 'pastFirewall', 38, 127],
  ['steering-column', 'rake', 20, 50],
  ['wiper-motor', 'motorDiameter', 60, 75],
  ['wiper-motor', 'motorLength', 102, 114],
  ['wiper-motor', 'crankRadius', 35, 55],
  ['firewall-panel', 'thickness', 0.9, 1.2],
  ['firewall-panel', 'rake', 5, 20],
  ['floor-panel', 'toeAngle', 40, 60],
  ['cowl', 'depth', 150, 350],
  ['cowl', 'height', 100, 180],
  ['heater-box', 'width', 380, 600],
  ['heater-box', 'height', 180, 280],
  ['heater-box', 'depth', 180, 300],
  ['engine-envelope', 'width', 610, 710],
  ['seat', 'cushionHeight', 150, 300],
];

test.each(RANGES)('%s: the usual %s lies from %d to %d', (kind, key, least, most) => {
  expect(usual(kind, key)).toBeGreaterThanOrEqual(least);
  expect(usual(kind, key)).toBeLessThanOrEqual(most);
});

test('a hard line bends no tighter than three diameters', () => {
  expect(usual('hard-line', 'bendRadius')).toBeGreaterThanOrEqual(3 * usual('hard-line', 'diameter'));
});

describe('a hanging pedal', () => {
  const measures = { armLength: 300, clevisRadius: 50, stroke: 30, workingTravel: 76, restAngle: 12 };

  test('swings until the rod has gone through the chord of the clevis’ arc', () => {
    const travel = pedalTravel(measures);
    expect(travel.ratio).toBe(6);
    // chord = 2 r sin(sweep / 2)
    expect(2 * 50 * Math.sin((travel.sweep * Math.PI) / 360)).toBeCloseTo(30, 9);
    expect(travel.padTravel).toBeCloseTo((300 * travel.sweep * Math.PI) / 180, 9);
    expect(travel.workingPosition).toBeCloseTo(76 / travel.padTravel, 9);
    const [step] = built('hanging-pedal', { ...measures, bend: 150 }).motions[0]!.steps;
    expect(step).toMatchObject({ kind: 'swing', axis: [0, 1, 0] });
    expect(step!.to).toBeCloseTo(travel.sweep, 3);
  });

  test('hangs lowest where its arm is plumb', () => {
    expect(padDrop(measures, 12)).toBeCloseTo(300, 9);
    expect(padDrop(measures, 0)).toBeLessThan(300);
    expect(padDrop(measures, 30)).toBeLessThan(300);
  });
});

test('a master cylinder is drawn out along its own axis, for service', () => {
  const [drawOut] = built('master-cylinder', { drawOut: 70 }).motions;
  expect(drawOut).toMatchObject({ use: 'service', steps: [{ kind: 'slide', along: [-1, 0, 0], to: 70 }] });
});

test('a wiper crank turns all the way round, and takes the link’s end along but not the motor', () => {
  const part = built('wiper-motor');
  const [turn] = part.motions;
  expect(turn).toMatchObject({ use: 'operating', steps: [{ kind: 'swing', axis: [1, 0, 0], to: 360 }] });
  expect(turn!.solids).toContain('link-end');
  expect(turn!.solids).not.toContain('motor');
});

test('a hood opens upwards about its rear edge', () => {
  const [open] = built('hood', { opens: 60 }).motions;
  expect(open).toMatchObject({ use: 'service', steps: [{ kind: 'swing', axis: [0, 1, 0], to: 60 }] });
});

test('a steering joint in the cabin stands behind the firewall, one in the bay ahead of it', () => {
  const jointX = (jointAhead: number): number => {
    const solid = built('steering-column', { jointAhead, rake: 5 }).solids.find((s) => s.id === 'joint-cross-1')!;
    return solid.pose?.at?.[0] ?? 0;
  };
  expect(jointX(200)).toBeLessThan(-190);
  expect(jointX(-200)).toBeGreaterThan(190);
});
