// The frame that carries hanging pedals between the two planes it is bolted to: the firewall and the underside of the cowl.
import type { Hole, Solid, Vec3 } from '#shared/scene';
import { sinCosDegrees } from '#shared/units';
import { angle, BY_EYE, count, defineRecipe, length, MEMORY } from './define';
import { panel, type Patch } from './panel';
import { add, bar, box, cylinder, placed } from './solids';

const CHEEK = 5;
const PLATE_BOLT = 9;
const CYLINDER_BOLT = 9;

interface Measures {
  readonly plateWidth: number;
  readonly plateHeight: number;
  readonly plateThickness: number;
  readonly pivotDepth: number;
  readonly rodDrop: number;
  readonly pedals: number;
  readonly pedalSpacing: number;
  readonly opening: number;
  readonly boltSpacing: number;
  readonly shaftDiameter: number;
  readonly cowlReach: number;
  readonly cowlSet: number;
  readonly rake: number;
}

/** Where the pedals sit along the shaft. */
export function pedalPlaces(p: Pick<Measures, 'pedals' | 'pedalSpacing'>): number[] {
  return Array.from({ length: p.pedals }, (_, i) => (i - (p.pedals - 1) / 2) * p.pedalSpacing);
}

function plateSolids(p: Measures): Solid[] {
  const front = -p.pivotDepth;
  const half: Vec3 = [0, p.plateWidth / 2, p.plateHeight / 2];
  const openings: Patch[] = pedalPlaces(p).map((y) => ({
    y: [y - p.opening / 2, y + p.opening / 2],
    z: [-p.opening / 2, p.opening / 2],
  }));
  const whole: Patch = { y: [-half[1], half[1]], z: [-half[2], half[2]] };
  const plate = placed(panel('plate', 'Mounting plate', p.plateThickness, whole, openings), {
    at: [front + p.plateThickness, 0, -p.rodDrop],
  });
  const heads = plateBolts(p).map((at, i) =>
    cylinder(`bolt-${i + 1}`, 'Bolt head', 14, 7, add(at, [p.plateThickness + 3.5, 0, 0]), 'x'),
  );
  return [...plate, ...heads];
}

function plateBolts(p: Measures): Vec3[] {
  const y = p.plateWidth / 2 - 14;
  const z = p.plateHeight / 2 - 14;
  return [
    [-p.pivotDepth, -y, z - p.rodDrop],
    [-p.pivotDepth, y, z - p.rodDrop],
    [-p.pivotDepth, -y, -z - p.rodDrop],
    [-p.pivotDepth, y, -z - p.rodDrop],
  ];
}

/** One side: a top rail, a stay from the plate's lower edge, and the boss that holds the shaft. */
function cheekSolids(p: Measures, y: number, side: string): Solid[] {
  const front = -p.pivotDepth + p.plateThickness;
  const low = -p.rodDrop - p.plateHeight / 2;
  const high = -p.rodDrop + p.plateHeight / 2;
  const rail = { wide: 30, thick: CHEEK };
  const top = Math.max(high - 15, 0);
  return [
    box(`cheek-${side}-foot`, 'Cheek plate', [26, CHEEK, p.plateHeight], [front + 13, y, -p.rodDrop]),
    bar(`cheek-${side}-rail`, 'Cheek plate', rail, [front, y, top], [10, y, 4]),
    bar(`cheek-${side}-stay`, 'Cheek plate', rail, [front + 4, y, low + 16], [2, y, -4]),
    cylinder(`boss-${side}`, 'Shaft boss', p.shaftDiameter + 24, CHEEK + 6, [0, y, 0], 'y'),
    cylinder(`nut-${side}`, 'Shaft nut', p.shaftDiameter + 8, 8, [0, y + Math.sign(y) * 7, 0], 'y'),
  ];
}

/** The way up to the cowl: two straps and a pad that lies level when the bracket is turned by the firewall's rake. */
function cowlSolids(p: Measures, y: number): Solid[] {
  const [s, c] = sinCosDegrees(p.rake);
  const thick = 5;
  // the pad's upper face goes through this place; its normal is the car's vertical, seen from the bracket
  const top: Vec3 = [p.cowlSet, 0, p.cowlReach];
  const centre = add(top, [(s * thick) / 2, 0, (-c * thick) / 2]);
  const under = add(top, [s * thick, 0, -c * thick]);
  const flange = placed(
    [
      box('cowl-pad', 'Cowl pad', [46, 2 * y + 40, thick], [0, 0, 0]),
      ...[-1, 1].map((side) =>
        cylinder(`cowl-bolt-${side < 0 ? 1 : 2}`, 'Bolt head', 14, 7, [10, side * (y - 14), -thick / 2 - 3.5], 'z'),
      ),
    ],
    { at: centre, turn: [0, -p.rake, 0] },
  );
  const straps = [-1, 1].map((side) =>
    bar(
      `cowl-strap-${side < 0 ? 1 : 2}`,
      'Strap to the cowl',
      { wide: 28, thick: CHEEK },
      [0, side * y, 0],
      [under[0], side * y, under[2]],
    ),
  );
  return [...flange, ...straps];
}

function bracketHoles(p: Measures): Hole[] {
  const axis: Vec3 = [1, 0, 0];
  const holes: Hole[] = plateBolts(p).map((at, i) => ({ id: `plate-${i + 1}`, at, axis, diameter: PLATE_BOLT }));
  pedalPlaces(p).forEach((y, i) => {
    const at: Vec3 = [-p.pivotDepth, y, -p.rodDrop];
    holes.push({ id: `rod-${i + 1}`, at, axis, diameter: p.opening });
    for (const side of [-1, 1] as const) {
      const id = `cylinder-${i + 1}-${side < 0 ? 'low' : 'high'}`;
      holes.push({ id, at: add(at, [0, 0, (side * p.boltSpacing) / 2]), axis, diameter: CYLINDER_BOLT });
    }
  });
  return holes;
}

export const pedalBracket = defineRecipe({
  kind: 'pedal-bracket',
  name: 'Pedal bracket',
  category: 'pedal-box',
  about:
    'Frame for hanging pedals: plate on the firewall, cheeks, pivot shaft, and the tie to the underside of the cowl.',
  frame: 'Origin on the pivot shaft, midway between the cheeks. The plate stands ahead (-X), its front face upright.',
  seenFrom: 'behind',
  params: {
    plateWidth: length('Plate width', [90, 230, 400], 'Across the car.', MEMORY),
    plateHeight: length('Plate height', [80, 150, 260], 'Along the firewall.', MEMORY),
    plateThickness: length('Plate thickness', [2, 5, 12], 'Of the mounting plate.', MEMORY),
    pivotDepth: length(
      'Pivot behind firewall',
      [60, 155, 300],
      'From the plate’s front face to the shaft’s axis.',
      MEMORY,
    ),
    rodDrop: length('Rods below pivot', [25, 46, 110], 'From the shaft’s axis to the line of the push rods.', MEMORY),
    pedals: count('Pedals', [1, 2, 3], 'Push-rod openings in the plate.', BY_EYE),
    pedalSpacing: length('Pedal spacing', [40, 96, 160], 'From arm to arm at the shaft.', BY_EYE),
    opening: length('Rod opening', [16, 36, 60], 'Width of the square opening for a cylinder’s boot.', BY_EYE),
    boltSpacing: length(
      'Cylinder bolts',
      [40, 57, 100],
      'From bolt to bolt of a cylinder’s flange, one above the other.',
      MEMORY,
    ),
    shaftDiameter: length('Pivot shaft', [8, 16, 30], 'Diameter.', BY_EYE),
    cowlReach: length(
      'Cowl above pivot',
      [50, 120, 350],
      'From the shaft’s axis to the underside of the cowl, along the plate.',
      BY_EYE,
    ),
    cowlSet: length('Cowl pad behind pivot', [-150, 0, 150], 'Minus is ahead of it.', BY_EYE),
    rake: angle('Firewall rake', [-10, 8, 30], 'The cowl pad lies level when the bracket is turned by it.', MEMORY),
  },
  faults: (p) => {
    const faults = [];
    const needed = (p.pedals - 1) * p.pedalSpacing + p.opening + 40;
    if (needed > p.plateWidth) {
      faults.push({
        key: 'plateWidth',
        message: `Plate width must be at least ${Math.ceil(needed)} mm for these rod openings.`,
      });
    }
    if (p.pedals > 1 && p.opening + 6 > p.pedalSpacing) {
      faults.push({ key: 'pedalSpacing', message: 'Pedal spacing leaves no metal between the rod openings.' });
    }
    if (Math.max(p.boltSpacing + 14, p.opening + 20) > p.plateHeight) {
      faults.push({
        key: 'plateHeight',
        message: 'Plate height leaves no metal around the cylinder bolts and openings.',
      });
    }
    return faults;
  },
  build: (p) => {
    const y = p.plateWidth / 2 - CHEEK / 2 - 2;
    const solids: Solid[] = [
      ...plateSolids(p),
      ...cheekSolids(p, -y, 'left'),
      ...cheekSolids(p, y, 'right'),
      cylinder('shaft', 'Pivot shaft', p.shaftDiameter, 2 * y + 16, [0, 0, 0], 'y'),
      cylinder(
        'tie',
        'Tie tube',
        14,
        2 * y,
        [-p.pivotDepth * 0.55, 0, Math.max(p.plateHeight / 2 - p.rodDrop - 15, 0) * 0.6 + 6],
        'y',
      ),
      ...cowlSolids(p, y),
    ];
    return { solids, motions: [], holes: bracketHoles(p) };
  },
});
