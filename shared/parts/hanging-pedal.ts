// A pedal that hangs from its pivot. The swing is about +Y with a positive angle: what hangs below the pivot goes forward (-X),
// as under a foot, and the pad is lowest where it passes straight below the pivot.
import type { Motion, Solid, Vec3 } from '#shared/scene';
import { sinCosDegrees } from '#shared/units';
import { BY_EYE, choice, defineRecipe, length, angle, MEMORY, PRACTICE } from './define';
import {
  add,
  arcLength,
  asinDegrees,
  bar,
  box,
  cylinder,
  hanging,
  hollow,
  lengthOf,
  placed,
  rod,
  times,
} from './solids';

export interface PedalMeasures {
  readonly armLength: number;
  readonly clevisRadius: number;
  readonly stroke: number;
  readonly workingTravel: number;
  readonly restAngle: number;
}

export interface PedalTravel {
  readonly ratio: number;
  /** Degrees from rest until the cylinder bottoms, its rod square to the clevis arm in mid-stroke. */
  readonly sweep: number;
  /** mm along the pad's arc at bottom-out. */
  readonly padTravel: number;
  /** Position in the motion, 0 to 1, at the end of the working travel. */
  readonly workingPosition: number;
  /** The clevis pin at rest, from the pivot, in the plane of X and Z. */
  readonly clevis: Vec3;
}

/** Travel of a hanging pedal. A rod that is square in mid-stroke moves the clevis through the chord of its arc. */
export function pedalTravel(p: PedalMeasures): PedalTravel {
  const sweep = 2 * asinDegrees(p.stroke / (2 * p.clevisRadius));
  const padTravel = arcLength(p.armLength, sweep);
  return {
    ratio: p.armLength / p.clevisRadius,
    sweep,
    padTravel,
    workingPosition: Math.min(1, p.workingTravel / padTravel),
    clevis: hanging(p.clevisRadius, sweep / 2),
  };
}

/** Length of the push-rod fork, clevis pin to its closed end, mm. */
export const FORK_LENGTH = 26;
const MOST_SWEEP = 60;

interface Arm {
  readonly bend: number;
  readonly padOffset: number;
  readonly armWidth: number;
  readonly armThickness: number;
}

/** A place on the straight line from the pivot to the arm's end, `drop` mm from the pivot. */
const onLine = (end: Vec3, drop: number): Vec3 => times(end, drop / lengthOf(end));

/** Upper arm, the set across to the pad's side, lower arm: flat steel on edge. `end` lies in the pivot's mid-plane. */
function armSolids(p: Arm, top: number, end: Vec3): Solid[] {
  const size = { wide: p.armWidth, thick: p.armThickness };
  const half = setReach(p.padOffset);
  const across: Vec3 = [0, p.padOffset, 0];
  if (Math.abs(p.padOffset) < 1) return [bar('arm', 'Arm', size, onLine(end, top), end)];
  return [
    bar('arm', 'Arm', size, onLine(end, top), onLine(end, p.bend - half)),
    // a little longer than the step, so that the three pieces close at the bends
    bar(
      'arm-set',
      'Arm, set across',
      size,
      onLine(end, p.bend - half - 3),
      add(onLine(end, p.bend + half + 3), across),
    ),
    bar('arm-low', 'Arm, lower', size, add(onLine(end, p.bend + half), across), add(end, across)),
  ];
}

/** Half of the arm's length that the set across takes. */
const setReach = (padOffset: number): number => Math.abs(padOffset) * 0.45;

/** Pad with a rim and a ribbed tread, drawn with its face to +X and then leaned. */
function padSolids(wide: number, high: number, thick: number, centre: Vec3, lean: number): Solid[] {
  const backing = thick * 0.45;
  const tread = thick - backing;
  const ribs = 5;
  const pitch = (high - 6) / ribs;
  const flat: Solid[] = [
    box('pad', 'Pad', [backing, wide, high], [-thick / 2 + backing / 2, 0, 0]),
    box('pad-side-1', 'Pad rim', [tread, 3, high], [thick / 2 - tread / 2, -wide / 2 + 1.5, 0]),
    box('pad-side-2', 'Pad rim', [tread, 3, high], [thick / 2 - tread / 2, wide / 2 - 1.5, 0]),
    box('pad-end-1', 'Pad rim', [tread, wide - 6, 3], [thick / 2 - tread / 2, 0, -high / 2 + 1.5]),
    box('pad-end-2', 'Pad rim', [tread, wide - 6, 3], [thick / 2 - tread / 2, 0, high / 2 - 1.5]),
    ...Array.from({ length: ribs }, (_, i) =>
      box(
        `tread-${i + 1}`,
        'Tread rib',
        [tread, wide - 12, pitch * 0.55],
        [thick / 2 - tread / 2, 0, (i - (ribs - 1) / 2) * pitch],
      ),
    ),
  ];
  // the face looks rearward and up: the lean takes +X towards +Z
  return placed(flat, { at: centre, turn: [0, -lean, 0] });
}

/** The fork that takes the push rod: it looks straight forward at rest, on the clevis pin. */
function forkSolids(clevis: Vec3, thick: number): Solid[] {
  const inside = thick / 2 + 0.5;
  const cheek = 4;
  const [x, , z] = clevis;
  return [
    cylinder('clevis-pin', 'Clevis pin', 8, 2 * (inside + cheek) + 8, clevis, 'y'),
    ...[-1, 1].map((side) =>
      box(
        `fork-${side < 0 ? 1 : 2}`,
        'Push-rod clevis',
        [FORK_LENGTH + 4, cheek, 14],
        [x - (FORK_LENGTH - 8) / 2, side * (inside + cheek / 2), z],
      ),
    ),
    box('fork-end', 'Push-rod clevis', [8, 2 * (inside + cheek), 14], [x - FORK_LENGTH + 4, 0, z]),
  ];
}

export const hangingPedal = defineRecipe({
  kind: 'hanging-pedal',
  name: 'Hanging pedal',
  ukName: 'Pendant pedal',
  category: 'pedal',
  about: 'Brake or clutch pedal that hangs from a pivot, with its pad, push-rod clevis and whole stroke to bottom-out.',
  frame: 'Origin on the pivot’s axis, in the arm’s mid-plane. The pad hangs below; the foot pushes it forward (-X).',
  seenFrom: 'behind',
  params: {
    armLength: length('Arm length', [150, 290, 420], 'Pivot to the middle of the pad.', MEMORY),
    clevisRadius: length(
      'Clevis radius',
      [25, 48, 100],
      'Pivot to the push rod’s pin. Arm length over it is the pedal’s ratio.',
      MEMORY,
    ),
    stroke: length(
      'Cylinder stroke',
      [10, 25.4, 50],
      'What the rod moves until the piston bottoms: the motion ends there.',
      MEMORY,
    ),
    workingTravel: length('Working travel', [20, 76, 150], 'What the pad moves in driving, along its arc.', PRACTICE),
    restAngle: angle(
      'Arm behind the vertical',
      [-10, 15, 40],
      'At rest, from the pivot to the middle of the pad.',
      MEMORY,
    ),
    padOffset: length(
      'Pad to the right',
      [-90, 24, 90],
      'How far the arm is set across to the right of the pivot; minus is left.',
      BY_EYE,
    ),
    bend: length('Bend below pivot', [60, 160, 360], 'Where the arm is set across.', BY_EYE),
    armWidth: length('Arm width', [15, 30, 50], 'Of the flat steel, seen from the side.', MEMORY),
    armThickness: length('Arm thickness', [4, 8, 20], 'Of the flat steel, seen from behind.', MEMORY),
    padWidth: length('Pad width', [30, 60, 110], 'Across the car.', MEMORY),
    padHeight: length('Pad height', [30, 62, 110], 'Along the face.', MEMORY),
    padLean: angle(
      'Pad lean',
      [-30, 25, 70],
      'Of the face from the vertical, at rest; it looks rearward and up.',
      BY_EYE,
    ),
    hubWidth: length('Hub width', [15, 44, 120], 'Along the pivot.', BY_EYE),
    shaftDiameter: length('Pivot shaft', [8, 16, 30], 'Diameter; the hub’s bore is 0.4 mm larger.', BY_EYE),
    springPeg: choice(
      'Return-spring peg',
      { none: 'none', left: 'on the left', right: 'on the right' },
      'none',
      'A wire peg on the side of the arm that takes the spring’s hook.',
    ),
    pegDrop: length('Peg below pivot', [40, 130, 400], 'Along the arm.', BY_EYE),
    pegDiameter: length('Peg diameter', [2, 3, 10], 'Of the wire.', BY_EYE),
  },
  faults: (p) => {
    const faults = [];
    if (p.stroke > p.clevisRadius) {
      faults.push({
        key: 'stroke',
        message: `Cylinder stroke swings the pedal more than ${MOST_SWEEP}°; it may be as long as the clevis radius at most.`,
      });
    }
    if (p.clevisRadius > p.armLength / 2) {
      faults.push({ key: 'clevisRadius', message: 'Clevis radius must be at most half the arm length.' });
    }
    if (p.clevisRadius < p.shaftDiameter / 2 + 14) {
      faults.push({
        key: 'clevisRadius',
        message: 'Clevis radius leaves no metal between the pivot’s bore and the clevis pin.',
      });
    }
    const slant = setReach(p.padOffset) + 5;
    if (p.bend + slant > p.armLength - p.padHeight / 2 || p.bend - slant < p.shaftDiameter) {
      faults.push({
        key: 'bend',
        message: 'Bend below pivot must lie between the hub and the pad, with room for the set.',
      });
    }
    if (p.springPeg !== 'none' && p.pegDrop > p.armLength) {
      faults.push({ key: 'pegDrop', message: 'Peg below pivot lies beyond the end of the arm.' });
    }
    return faults;
  },
  facts: (p) => {
    const travel = pedalTravel(p);
    return [
      { key: 'ratio', label: 'Pedal ratio', unit: 'ratio', value: travel.ratio },
      { key: 'sweep', label: 'Swing to bottom-out', unit: 'angle', value: travel.sweep },
      { key: 'padTravel', label: 'Pad travel to bottom-out', unit: 'length', value: travel.padTravel },
      { key: 'workingPosition', label: 'Working travel ends at', unit: 'share', value: travel.workingPosition },
    ];
  },
  build: (p) => {
    const { clevis, sweep } = pedalTravel(p);
    const bore = p.shaftDiameter + 0.4;
    const hubRadius = bore / 2 + 6;
    const padThickness = 14;
    const padCentre = add(hanging(p.armLength, p.restAngle), [0, p.padOffset, 0]);
    // the arm runs down behind the pad and carries it on its rear edge
    const [lean, upright] = sinCosDegrees(p.padLean);
    const behind = padThickness / 2 + p.armWidth / 2 - 1;
    const end: Vec3 = add(hanging(p.armLength, p.restAngle), [-upright * behind, 0, -lean * behind]);
    const solids: Solid[] = [
      ...hollow('hub', 'Hub', bore, 6, p.hubWidth, [0, 0, 0]),
      ...armSolids(p, hubRadius - 1, end),
      ...padSolids(p.padWidth, p.padHeight, padThickness, padCentre, p.padLean),
      bar(
        'clevis-arm',
        'Clevis arm',
        { wide: 22, thick: p.armThickness },
        hanging(hubRadius - 1, sweep / 2),
        hanging(p.clevisRadius + 9, sweep / 2),
      ),
      ...forkSolids(clevis, p.armThickness),
    ];
    if (p.springPeg !== 'none') {
      const side = p.springPeg === 'left' ? -1 : 1;
      const across = (p.pegDrop > p.bend ? p.padOffset : 0) + (side * p.armThickness) / 2;
      const root = add(onLine(end, p.pegDrop), [0, across, 0]);
      solids.push(rod('spring-peg', 'Return-spring peg', p.pegDiameter, root, add(root, [0, side * 12, 0])));
    }
    const stroke: Motion = {
      id: 'stroke',
      name: 'Stroke to bottom-out',
      use: 'operating',
      steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: Math.round(sweep * 1e4) / 1e4 }],
    };
    return { solids, motions: [stroke], holes: [] };
  },
});

/** Height of the pad's middle below the pivot when the pedal has swung by `degrees`, mm. */
export function padDrop(p: PedalMeasures, degrees: number): number {
  const [, c] = sinCosDegrees(p.restAngle - degrees);
  return p.armLength * c;
}
