// @vitest-environment happy-dom
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findingKey } from '#shared/check';
import { lengthParts } from '#shared/units';
import { lengthRuns } from '../../../../src/features/bench/overlay/mark';
import { placeLabels } from '../../../../src/features/bench/overlay/place-labels';
import { scaleLength } from '../../../../src/features/bench/overlay/scale-bar';
import { chooseWitnesses } from '../../../../src/features/bench/overlay/witness-choice';
import { nameWidth } from '../../../../src/features/bench/rail/tag-width';
import { meetsBox, meetsCylinder, pickAll } from '../../../../src/features/bench/viewport/picking';
import { bodiesOf, bodyPose } from '../../../../src/features/bench/viewport/bodies';
import { fitView, pannedView, pictureAxes } from '../../../../src/features/bench/viewport/view';
import { viewFrom, zoneOf } from '../../../../src/features/bench/standpoints/standpoints';
import { planeInBox } from '../../../../src/features/bench/viewport/curtain';
import { box, finding, NO_MESHES, smallScene } from './support';

const SEED = 4711;
const ROOM = { left: 0, top: 0, right: 1000, bottom: 700 };

describe('labels in the picture', () => {
  it('lie beside their anchor, inside, and not under the tape', () => {
    const label = { anchor: [100, 400], width: 120, height: 26 } as const;
    const tape = { x: 0, y: 300, width: 300, height: 390 };
    const [free] = placeLabels([label], ROOM);
    expect(Math.hypot(free!.x - 100, free!.y - 400)).toBeLessThan(80);
    const [moved] = placeLabels([label], ROOM, [tape]);
    const isUnder = moved!.x < 300 && moved!.y + 26 > 300;
    expect(isUnder).toBe(false);
  });

  it(`do not cover one another while there is room (seed ${SEED})`, () => {
    // anchors on a coarse grid: there is room for each label next to its own
    const spot = fc.record({ x: fc.integer({ min: 1, max: 4 }), y: fc.integer({ min: 1, max: 4 }) });
    fc.assert(
      fc.property(fc.uniqueArray(spot, { maxLength: 8, selector: (s) => s.x * 10 + s.y }), (spots) => {
        const labels = spots.map((s) => ({ anchor: [s.x * 200, s.y * 140] as const, width: 100, height: 26 }));
        const places = placeLabels(labels, ROOM);
        places.forEach((p, i) => {
          expect(p.x).toBeGreaterThanOrEqual(ROOM.left);
          expect(p.y + 26).toBeLessThanOrEqual(ROOM.bottom + 1);
          for (const q of places.slice(0, i)) {
            expect(Math.abs(p.x - q.x) >= 100 || Math.abs(p.y - q.y) >= 26).toBe(true);
          }
        });
      }),
      { seed: SEED, numRuns: 200 },
    );
  });

  it('set a length as a real fraction', () => {
    expect(lengthRuns(lengthParts(136.525, 'in')).map((r) => r.text)).toEqual(['5', '3', '\u2044', '8', '"']);
    expect(lengthRuns(lengthParts(136.5, 'mm')).map((r) => r.text)).toEqual(['136.5', '\u00a0mm']);
  });
});

describe('the scale bar', () => {
  it('is the longest round length that fits', () => {
    expect(scaleLength(1, 'mm', 200)).toMatchObject({ mm: 200, label: '200 mm' });
    expect(scaleLength(1, 'in', 200).label).toBe('6 in');
    expect(scaleLength(1, 'in', 200).mm).toBeCloseTo(152.4);
    expect(scaleLength(0.06, 'in', 200)).toMatchObject({ mm: 6.35, label: '1/4 in' });
  });
});

describe('witness marks', () => {
  const findings = Array.from({ length: 30 }, (_, i) =>
    finding(`a${String(i).padStart(2, '0')}`, 'z', i < 12 ? 'hits' : i < 20 ? 'tight' : 'clears', { margin: i - 20 }),
  );
  const choice = {
    findings,
    open: null,
    hovered: null,
    selected: new Set<string>(),
    isOff: () => false,
  };

  it('show what is wrong and no more than can be read, few with a label', () => {
    const shown = chooseWitnesses(choice);
    expect(shown).toHaveLength(14);
    expect(shown.every((w) => w.finding.verdict !== 'clears')).toBe(true);
    expect(shown.filter((w) => w.isQuiet !== true)).toHaveLength(7);
  });

  it('show one for each pair', () => {
    const twice = [findings[0]!, { ...findings[0]!, motions: [{ component: 'a00', motion: 'm' }] }];
    expect(chooseWitnesses({ ...choice, findings: twice })).toHaveLength(1);
  });

  it('put what is selected first, with its nearest neighbours, and leave the others their marks', () => {
    const shown = chooseWitnesses({ ...choice, selected: new Set(['a19', 'a25']) });
    expect(shown.some((w) => w.finding.between[0] === 'a25')).toBe(false);
    expect(shown[0]!.finding.between[0]).toBe('a19');
    expect(shown.filter((w) => w.isQuiet !== true)).toHaveLength(1);
    const near = chooseWitnesses({ ...choice, findings: findings.slice(20), selected: new Set(['a25']) });
    expect(near.map((w) => w.finding.between[0])).toEqual(['a25']);
  });

  it('show the open finding alone', () => {
    const open = findingKey(findings[25]!);
    expect(chooseWitnesses({ ...choice, open }).map((w) => findingKey(w.finding))).toEqual([open]);
  });

  it('show nothing of what is off the bench', () => {
    expect(chooseWitnesses({ ...choice, isOff: (id) => id === 'z' })).toEqual([]);
  });
});

describe('picking', () => {
  it('meets a box and a cylinder where a ray goes in and out', () => {
    expect(meetsBox([-1, -1, -1], [1, 1, 1], { from: [-5, 0, 0], along: [1, 0, 0] })).toEqual([4, 6]);
    expect(meetsBox([-1, -1, -1], [1, 1, 1], { from: [-5, 3, 0], along: [1, 0, 0] })).toEqual([]);
    expect(meetsCylinder(2, 5, { from: [-5, 0, 0], along: [1, 0, 0] })).toEqual([3, 7]);
    expect(meetsCylinder(2, 5, { from: [0, 0, -9], along: [0, 0, 1] })).toEqual([4, 14]);
    expect(meetsCylinder(2, 5, { from: [-5, 0, 6], along: [1, 0, 0] })).toEqual([]);
  });

  const where = {
    scene: smallScene(),
    positions: {},
    meshes: NO_MESHES,
    isOff: () => false,
    isFaded: () => false,
    cut: null,
  };
  // from the front through firewall and pedals' brake arm
  const ray = { from: [-900, 440, 480], along: [1, 0, 0] } as const;

  it('finds the solid thing before the sheet that it is seen through', () => {
    expect(pickAll(where, ray).map((h) => h.component)).toEqual(['brake-pedal', 'firewall']);
  });

  it('passes what is off the bench, and takes faded parts last', () => {
    expect(pickAll({ ...where, isOff: (id) => id === 'brake-pedal' }, ray).map((h) => h.component)).toEqual([
      'firewall',
    ]);
    expect(pickAll({ ...where, isFaded: (id) => id === 'brake-pedal' }, ray)[0]!.component).toBe('firewall');
  });

  it('does not touch what is cut away', () => {
    const cut = { point: [0, 300, 0], towards: [0, 1, 0] } as const;
    expect(pickAll({ ...where, cut }, ray)).toEqual([]);
  });

  it('meets a pedal where its stroke has it', () => {
    // 80 mm below the pivot, 20 degrees take the arm's front face some 29 mm forward of where it was
    const low = { from: [-900, 440, 400], along: [1, 0, 0] } as const;
    const rest = pickAll(where, low).find((h) => h.component === 'brake-pedal')!;
    const pressed = pickAll({ ...where, positions: { 'brake-pedal.stroke': 1 } }, low).find(
      (h) => h.component === 'brake-pedal',
    )!;
    // where the turned face crosses the line: 80 tan 20 and what the face's own half thickness gives back
    const expected = 80 * Math.tan(Math.PI / 9) + 10 / Math.cos(Math.PI / 9) - 10;
    expect(Math.abs(pressed.distance - rest.distance)).toBeCloseTo(expected, 6);
  });
});

describe('bodies', () => {
  it('part what an operating motion moves from what stays', () => {
    const pedal = box('throttle', 'throttle', [1, 1, 1], [0, 0, 0], {
      solids: [
        { id: 'plate', shape: { kind: 'box', size: [1, 1, 1] } },
        { id: 'arm', shape: { kind: 'box', size: [1, 1, 1] } },
      ],
      motions: [
        {
          id: 'travel',
          name: 'Travel',
          use: 'operating',
          solids: ['arm'],
          steps: [{ kind: 'slide', along: [0, 0, 2], from: 0, to: 30 }],
        },
      ],
    });
    const bodies = bodiesOf(pedal);
    expect(bodies.map((b) => b.solids)).toEqual([[0], [1]]);
    const scene = { ...smallScene(), components: [pedal] };
    const pose = bodyPose(scene, pedal, bodies[1]!, { 'throttle.travel': 0.5 });
    // a direction is only a direction: its length does not count
    expect(pose[11]).toBeCloseTo(15);
    expect(bodyPose(scene, pedal, bodies[0]!, { 'throttle.travel': 0.5 })[11]).toBeCloseTo(0);
  });
});

describe('looks', () => {
  const area = { width: 1440, height: 900, left: 24, right: 368, top: 150, bottom: 150 };
  const zone = zoneOf(smallScene(), NO_MESHES);

  it('put the driver where the column is', () => {
    expect(zone.driver).toBe(1);
    const left = smallScene().components.map((c) => (c.id === 'column' ? { ...c, pose: { at: [400, -300, 600] } } : c));
    expect(zoneOf({ ...smallScene(), components: left as never }, NO_MESHES).driver).toBe(-1);
  });

  it('are square-on or from where a person stands', () => {
    expect(viewFrom('side', zone, area)).toMatchObject({ isSquare: true, above: 0, around: 90 });
    expect(viewFrom('footwell', zone, area)).toMatchObject({ isSquare: false });
    expect(viewFrom('plan', zone, area)).toMatchObject({ isSquare: true, above: 90 });
  });

  it('show a whole box in what is left of the picture', () => {
    const view = fitView(
      { around: 180, above: 0, isSquare: true },
      { low: [0, -500, 0], high: [10, 500, 100] },
      area,
      1,
    );
    const perPixel = view.span / area.height;
    expect(1000 / perPixel).toBeCloseTo(area.width - area.left - area.right);
    expect(view.target).toEqual([5, 0, 50]);
  });

  it('shift with the sheet by as many px as they are told', () => {
    const view = fitView({ around: 90, above: 0, isSquare: true }, zone.all, area, 1);
    const panned = pannedView(view, 100, 0, area.height);
    const by = panned.target.map((x, k) => x - view.target[k]!);
    const { right } = pictureAxes(view);
    const mm = (100 * view.span) / area.height;
    by.forEach((x, k) => expect(x).toBeCloseTo(right[k]! * mm));
  });
});

describe('a laser’s curtain', () => {
  it('is the plane’s cut through the zone, or nothing where it misses', () => {
    const cube = { low: [0, 0, 0], high: [10, 10, 10] } as const;
    expect(planeInBox([5, 5, 5], [1, 0, 0], cube)).toHaveLength(4);
    expect(planeInBox([5, 5, 5], [1, 1, 1], cube)).toHaveLength(6);
    expect(planeInBox([50, 0, 0], [1, 0, 0], cube)).toEqual([]);
  });
});

describe('a tag', () => {
  it('is no wider than its name on two lines asks for', () => {
    expect(nameWidth('Master cylinder front')).toBeLessThan(nameWidth('Mastercylinderfront'));
    expect(nameWidth('Cowl')).toBeGreaterThanOrEqual(30);
    expect(nameWidth('A name that somebody has written much too long for any tag in any shop')).toBeLessThanOrEqual(
      118,
    );
  });
});
