// A dressed engine as blocks: what its rear end, heads and accessories take of the bay.
import type { Solid, Vec3 } from '#shared/scene';
import { sinCosDegrees } from '#shared/units';
import { BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { add, bar, box, cylinder, rod } from './solids';

const PLUGS = 4;

/** One bank: head, valve cover with its cap, plug boots. `lean` is from the vertical, degrees, to the right. */
function bank(id: string, long: number, foot: Vec3, high: number, lean: number): Solid[] {
  const [s, c] = sinCosDegrees(lean);
  const up = (h: number, out = 0): Vec3 => add(foot, [0, s * h + c * out, c * h - s * out]);
  const turn: Vec3 = [-lean, 0, 0];
  return [
    box(`${id}-head`, 'Cylinder head', [long * 0.86, 150, high * 0.5], up(high * 0.25), turn),
    box(`${id}-cover`, 'Valve cover', [long * 0.84, 110, high * 0.42], up(high * 0.7), turn),
    box(`${id}-cover-top`, 'Valve cover', [long * 0.78, 70, high * 0.1], up(high * 0.95), turn),
    cylinder(`${id}-cap`, 'Oil filler cap', 44, 20, add(up(high * 1.05), [-long * 0.28, 0, 0]), 'z'),
    ...Array.from({ length: PLUGS }, (_, i) => {
      const x = ((i + 0.5) / PLUGS - 0.5) * long * 0.76;
      const way = lean === 0 ? 1 : Math.sign(lean);
      return rod(
        `${id}-plug-${i + 1}`,
        'Plug boot',
        20,
        add(up(high * 0.25, way * 70), [x, 0, 0]),
        add(up(high * 0.3, way * 105), [x, 0, 0]),
      );
    }),
  ];
}

const BLADES = 6;

function fanBlade(i: number, hub: Vec3): Solid {
  const [s, c] = sinCosDegrees((360 / BLADES) * i);
  const on = (r: number): Vec3 => add(hub, [0, r * s, r * c]);
  return bar(`fan-${i + 1}`, 'Fan blade', { wide: 60, thick: 6, flat: [1, 0.4 * c, -0.4 * s] }, on(40), on(205));
}

export const engineEnvelope = defineRecipe({
  kind: 'engine-envelope',
  name: 'Engine with accessories',
  category: 'engine',
  about: 'Block, heads with valve covers, intake with air cleaner, distributor, pulleys and alternator.',
  frame: 'Origin on the crankshaft’s axis in the rear face of the block. The engine lies ahead (-X).',
  params: {
    layout: choice('Layout', { v: 'two banks', inline: 'one bank' }, 'v', ''),
    length: length('Length', [400, 600, 900], 'Rear face of the block to the fan.', MEMORY),
    width: length('Width', [350, 620, 800], 'Over the valve covers, two banks.', MEMORY),
    height: length('Height above crank', [300, 470, 650], 'Crankshaft to the top of the air cleaner.', MEMORY),
    sump: length('Sump below crank', [100, 190, 300], '', BY_EYE),
    distributor: choice(
      'Distributor',
      { rear: 'at the rear', none: 'none' },
      'rear',
      'It stands right ahead of the firewall.',
    ),
  },
  build: (p) => {
    const block = p.length - 130;
    const mid = -block / 2;
    const deck = p.height * 0.3;
    const high = p.height * 0.38;
    const isV = p.layout === 'v';
    const spread = isV ? p.width / 2 - 150 : 0;
    const top = deck + high * (isV ? 0.62 : 1.05);
    const front = -block;
    const solids: Solid[] = [
      box('block', 'Block', [block, isV ? p.width * 0.48 : 220, deck + 70], [mid, 0, deck / 2 - 35]),
      box('sump', 'Sump', [block * 0.9, 240, p.sump - 70], [mid, 0, -70 - (p.sump - 70) / 2]),
      cylinder('bell', 'Bellhousing face', 380, 16, [-8, 0, 0], 'x'),
      ...(isV
        ? [
            ...bank('left', block, [mid, -spread, deck * 0.75], high, -45),
            ...bank('right', block, [mid, spread, deck * 0.75], high, 45),
          ]
        : bank('bank', block, [mid, 0, deck], high, 0)),
      box(
        'intake',
        'Intake',
        [block * 0.7, isV ? p.width * 0.36 : 120, high * 0.5],
        [mid, isV ? 0 : -140, deck + high * 0.35],
      ),
      cylinder(
        'carburettor',
        'Throttle body',
        90,
        Math.max(30, p.height - top - 60),
        [mid, isV ? 0 : -140, (top + p.height - 60) / 2 - 20],
        'z',
      ),
      cylinder('air-cleaner', 'Air cleaner', 320, 60, [mid, isV ? 0 : -140, p.height - 38], 'z'),
      cylinder('air-cleaner-lid', 'Air cleaner', 300, 8, [mid, isV ? 0 : -140, p.height - 4], 'z'),
      cylinder('crank-pulley', 'Crank pulley', 170, 50, [front - 25, 0, 0], 'x'),
      cylinder('water-pump', 'Water pump pulley', 140, 46, [front - 40, 0, deck * 0.7], 'x'),
      cylinder('fan-hub', 'Fan hub', 90, 30, [front - 100, 0, deck * 0.7], 'x'),
      ...Array.from({ length: BLADES }, (_, i) => fanBlade(i, [front - 105, 0, deck * 0.7])),
      cylinder('alternator', 'Alternator', 140, 150, [front + 30, p.width * 0.36, deck * 0.95], 'x'),
      cylinder('alternator-pulley', 'Alternator pulley', 74, 30, [front - 55, p.width * 0.36, deck * 0.95], 'x'),
    ];
    if (p.distributor === 'rear') {
      const at = (z: number): Vec3 => [-56, 0, z];
      solids.push(
        rod('distributor', 'Distributor', 64, at(deck), at(top + 30)),
        rod('distributor-cap', 'Distributor cap', 100, at(top + 30), at(top + 92)),
      );
    }
    return { solids, motions: [], holes: [] };
  },
});
