// A remote fluid reservoir, with the lift that its cap needs.
import type { Motion, Solid, Vec3 } from '#shared/scene';
import { BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { add, bar, box, cylinder, rod } from './solids';

const WAYS: Readonly<Record<'rear' | 'left' | 'right', Vec3>> = { rear: [1, 0, 0], left: [0, -1, 0], right: [0, 1, 0] };

export const reservoir = defineRecipe({
  kind: 'reservoir',
  name: 'Remote reservoir',
  category: 'reservoir',
  about: 'Round fluid pot with its strap, hose barb and screw cap; the cap lifts off for filling.',
  frame: 'Origin in the middle of the pot’s base; the pot stands up (+Z), its tab reaches to one side.',
  params: {
    diameter: length('Diameter', [35, 60, 110], 'Of the pot.', MEMORY),
    height: length('Height', [50, 96, 180], 'From the base to the top of the cap.', MEMORY),
    capLift: length('Cap lift', [20, 75, 200], 'Room straight above that the cap and a hand need.', MEMORY),
    mount: choice(
      'Tab',
      { rear: 'to the rear', left: 'to the left', right: 'to the right' },
      'rear',
      'Where the pot is held.',
    ),
    reach: length('Tab reach', [22, 44, 160], 'From the pot’s axis to the face that the tab is bolted to.', BY_EYE),
    barb: length('Hose barb', [6, 10, 16], 'Outside diameter of the hose end below.', MEMORY),
  },
  faults: (p) =>
    p.reach < p.diameter / 2 + 3
      ? [
          {
            key: 'reach',
            message: 'Tab reach must be at least 3 mm more than half the diameter, or the pot stands in its wall.',
          },
        ]
      : [],
  build: (p) => {
    const capHeight = Math.min(22, p.height * 0.25);
    const pot = p.height - capHeight - 5;
    const capDiameter = p.diameter * 0.86;
    const capAt: Vec3 = [0, 0, p.height - capHeight / 2];
    const knurl = capDiameter + 3;
    const way = WAYS[p.mount];
    const at = (x: number, z: number): Vec3 => add([way[0] * x, way[1] * x, 0], [0, 0, z]);
    const across = p.mount === 'rear';
    const band = pot * 0.55;
    const tab: Vec3 = across ? [3, 26, 44] : [26, 3, 44];
    const solids: Solid[] = [
      rod('pot', 'Pot', p.diameter, [0, 0, 6], [0, 0, pot]),
      rod('base', 'Pot', p.diameter * 0.86, [0, 0, 0], [0, 0, 6]),
      rod('level-line', 'Level mark', p.diameter + 2, [0, 0, pot - 12], [0, 0, pot - 9]),
      rod('neck', 'Neck', p.diameter * 0.72, [0, 0, pot], [0, 0, p.height - capHeight]),
      rod('strap', 'Strap', p.diameter + 4, [0, 0, band - 9], [0, 0, band + 9]),
      bar(
        'tab-arm',
        'Tab',
        { wide: 18, thick: 10, flat: [way[1], way[0], 0] },
        at(p.diameter / 2 - 2, band),
        at(p.reach - 3, band),
      ),
      box('tab', 'Tab', tab, at(p.reach - 1.5, band)),
      ...[-1, 1].map((side) =>
        cylinder(
          `tab-bolt-${side < 0 ? 1 : 2}`,
          'Bolt head',
          10,
          5,
          at(p.reach - 5.5, band + side * 16),
          across ? 'x' : 'y',
        ),
      ),
      rod('spigot', 'Hose barb', p.barb, [0, 0, -24], [0, 0, 0]),
      rod('spigot-ring', 'Hose barb', p.barb + 3, [0, 0, -19], [0, 0, -15]),
      rod('cap', 'Cap', capDiameter, [0, 0, p.height - capHeight], [0, 0, p.height - 2]),
      rod('cap-top', 'Cap', capDiameter * 0.8, [0, 0, p.height - 2], [0, 0, p.height]),
      ...[0, 30, 60, 90, 120, 150].map((spin, i) =>
        box(`cap-grip-${i + 1}`, 'Cap grip', [knurl, 5, capHeight - 5], add(capAt, [0, 0, -1.5]), [0, 0, spin]),
      ),
    ];
    const lift: Motion = {
      id: 'cap-off',
      name: 'Lift the cap off',
      use: 'service',
      solids: solids.filter((s) => s.id.startsWith('cap')).map((s) => s.id),
      steps: [{ kind: 'slide', along: [0, 0, 1], from: 0, to: p.capLift }],
    };
    const axis: Vec3 = [way[0], way[1], way[2]];
    const holes = [-1, 1].map((side) => ({
      id: side < 0 ? 'tab-low' : 'tab-high',
      at: at(p.reach, band + side * 16),
      axis,
      diameter: 6.6,
    }));
    return { solids, motions: [lift], holes };
  },
});
