// A heater under the dash: case, blower, ducts, and the two hose pipes that go through the firewall.
import type { Hole, Solid, Vec3 } from '#shared/scene';
import { BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { box, cylinder, rod } from './solids';

export const heaterBox = defineRecipe({
  kind: 'heater-box',
  name: 'Heater box',
  category: 'heater',
  about: 'Case with blower and ducts on the cabin side of the firewall, its hose pipes through it.',
  frame: 'Origin in the middle of the case’s front face, which sits on the firewall. The case reaches rearward (+X).',
  params: {
    width: length('Width', [250, 420, 650], 'Across the car, without the blower.', MEMORY),
    height: length('Height', [150, 230, 320], '', MEMORY),
    depth: length('Depth', [140, 210, 320], 'Behind the firewall.', MEMORY),
    blower: choice('Blower', { left: 'on the left', right: 'on the right' }, 'left', ''),
    blowerDiameter: length('Blower diameter', [100, 165, 240], '', BY_EYE),
    pipeSpacing: length('Hose pipe spacing', [40, 64, 150], 'From pipe to pipe.', BY_EYE),
    pipeAhead: length('Hose pipes ahead', [20, 60, 150], 'What reaches into the engine bay.', BY_EYE),
  },
  build: (p) => {
    const way = p.blower === 'left' ? -1 : 1;
    const pipes: Vec3[] = [-1, 1].map((k): Vec3 => [
      0,
      -way * p.width * 0.22 + (k * p.pipeSpacing) / 2,
      p.height * 0.12,
    ]);
    const side = way * (p.width / 2);
    const solids: Solid[] = [
      box('case', 'Case', [p.depth, p.width * 0.62, p.height], [p.depth / 2, -way * p.width * 0.19, 0]),
      box(
        'case-step',
        'Case',
        [p.depth * 0.8, p.width * 0.4, p.height * 0.72],
        [p.depth * 0.4, way * p.width * 0.3, 0],
      ),
      box('seam', 'Case seam', [8, p.width * 0.64, p.height + 8], [p.depth * 0.5, -way * p.width * 0.19, 0]),
      cylinder('blower', 'Blower', p.blowerDiameter, p.height * 0.5, [p.depth * 0.45, side, 0], 'z'),
      cylinder(
        'blower-motor',
        'Blower motor',
        p.blowerDiameter * 0.45,
        50,
        [p.depth * 0.45, side, -p.height * 0.25 - 25],
        'z',
      ),
      ...[-0.3, 0, 0.3].map((k, i) =>
        cylinder(
          `duct-${i + 1}`,
          'Duct',
          60,
          40,
          [p.depth * 0.5, -way * p.width * 0.19 + k * p.width * 0.55, p.height / 2 + 20],
          'z',
        ),
      ),
      ...pipes.flatMap((at, i) => [
        rod(`pipe-${i + 1}`, 'Hose pipe', 18, at, [-p.pipeAhead, at[1], at[2]]),
        rod(`bead-${i + 1}`, 'Hose bead', 21, [-p.pipeAhead + 6, at[1], at[2]], [-p.pipeAhead + 10, at[1], at[2]]),
      ]),
    ];
    const holes: Hole[] = pipes.map((at, i) => ({ id: `pipe-${i + 1}`, at, axis: [1, 0, 0], diameter: 24 }));
    return { solids, motions: [], holes };
  },
});
