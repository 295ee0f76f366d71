// Where a person stands to look, and the three square-on looks of a drawing; worked out from where the parts are.
import type { Category, Scene } from '#shared/scene';
import { componentBox } from '../viewport/extent';
import type { MeshSource } from '../viewport/mesh-source';
import { fitView, type FreeArea, type View } from '../viewport/view';
import { centreOf, joinBoxes, type Box, type Triple } from '../viewport/vectors';

export const STANDPOINTS = [
  'driver',
  'footwell',
  'bay',
  'overhead',
  'left-fender',
  'right-fender',
  'side',
  'plan',
  'front',
] as const;
export type StandpointId = (typeof STANDPOINTS)[number];

export const STANDPOINT_NAME: Readonly<Record<StandpointId, string>> = {
  driver: "Driver's seat",
  footwell: 'Footwell',
  bay: 'Engine bay',
  overhead: 'Overhead',
  'left-fender': 'Left fender',
  'right-fender': 'Right fender',
  side: 'Side',
  plan: 'Plan',
  front: 'Bay',
};

export const isSquareOn = (id: StandpointId): boolean => id === 'side' || id === 'plan' || id === 'front';

/** The places that standpoints are set off from. */
export interface Zone {
  /** Everything. */
  readonly all: Box;
  /** What the work is about: pedals, cylinders, column, wiper. */
  readonly work: Box;
  /** Where feet are. */
  readonly feet: Box;
  /** +1: the driver sits on the right. */
  readonly driver: 1 | -1;
}

const WORK: readonly Category[] = [
  'pedal',
  'pedal-box',
  'master-cylinder',
  'reservoir',
  'booster',
  'column',
  'throttle',
];
const FEET: readonly Category[] = ['pedal', 'throttle'];
const EMPTY: Box = { low: [-600, -700, 0], high: [600, 700, 900] };

function boxOf(scene: Scene, meshes: MeshSource, categories: readonly Category[] | null): Box | null {
  return joinBoxes(
    scene.components.flatMap((c) => {
      if (categories !== null && !categories.includes(c.category)) return [];
      const box = componentBox(scene, c, meshes);
      return box === null ? [] : [box];
    }),
  );
}

/** The side the driver sits on: where the column is, else pedals, else seat. */
function driverSide(scene: Scene, meshes: MeshSource): 1 | -1 {
  for (const category of ['column', 'pedal', 'pedal-box', 'driver', 'seat'] as const) {
    const box = boxOf(scene, meshes, [category]);
    if (box !== null) return centreOf(box)[1] < 0 ? -1 : 1;
  }
  return -1;
}

export function zoneOf(scene: Scene, meshes: MeshSource): Zone {
  const all = boxOf(scene, meshes, null) ?? EMPTY;
  const work = boxOf(scene, meshes, WORK) ?? all;
  return { all, work, feet: boxOf(scene, meshes, FEET) ?? work, driver: driverSide(scene, meshes) };
}

/** From where one looks: degrees around from the rear (+X) towards the right, degrees above the level. */
interface Stand {
  readonly around: number;
  readonly above: number;
  readonly box: Box;
  readonly isSquare?: true;
  /** How much room is left around the box. */
  readonly room: number;
}

const STANDS: Readonly<Record<StandpointId, (zone: Zone) => Stand>> = {
  driver: ({ work, driver }) => ({ around: -17 * driver, above: 24, box: work, room: 1.3 }),
  footwell: ({ feet, driver }) => ({ around: -22 * driver, above: 9, box: feet, room: 1.35 }),
  bay: ({ all, work, driver }) => ({
    around: 180 + 32 * driver,
    above: 27,
    box: mixBoxes(all, work, 0.72),
    room: 1.02,
  }),
  overhead: ({ all, work }) => ({ around: 0, above: 76, box: mixBoxes(all, work, 0.4), room: 1.05 }),
  'left-fender': ({ all, work }) => ({ around: -118, above: 32, box: mixBoxes(all, work, 0.62), room: 1.02 }),
  'right-fender': ({ all, work }) => ({ around: 118, above: 32, box: mixBoxes(all, work, 0.62), room: 1.02 }),
  side: ({ all, driver }) => ({ around: 90 * driver, above: 0, box: all, isSquare: true, room: 1.08 }),
  plan: ({ all }) => ({ around: 0, above: 90, box: all, isSquare: true, room: 1.08 }),
  front: ({ all }) => ({ around: 180, above: 0, box: all, isSquare: true, room: 1.08 }),
};

/** Between two boxes, so that what matters is large and the rest still in sight. */
function mixBoxes(a: Box, b: Box, t: number): Box {
  const at = (p: Triple, q: Triple): Triple => [0, 1, 2].map((k) => p[k]! + (q[k]! - p[k]!) * t) as unknown as Triple;
  return { low: at(a.low, b.low), high: at(a.high, b.high) };
}

export function viewFrom(id: StandpointId, zone: Zone, area: FreeArea): View {
  const { around, above, box, isSquare = false, room } = STANDS[id](zone);
  return fitView({ around, above, isSquare }, box, area, room);
}
