// A vacuum brake booster, between firewall and master cylinder.
import type { Hole, Motion, Solid, Vec3 } from '#shared/scene';
import { BY_EYE, choice, defineRecipe, length, MEMORY, PRACTICE } from './define';
import { add, box, cylinder, hex, rod } from './solids';

export const booster = defineRecipe({
  kind: 'booster',
  name: 'Brake booster',
  ukName: 'Brake servo',
  category: 'booster',
  about: 'Vacuum can with rolled rim, studs to the firewall, check valve and input rod, and its draw-out.',
  frame: 'Origin in the middle of the rear mounting face; the master cylinder goes on the front (-X).',
  params: {
    diameter: length('Diameter', [120, 229, 320], 'Over the rolled rim.', PRACTICE),
    depth: length(
      'Depth',
      [80, 140, 240],
      'Rear mounting face to front mounting face; single can 110 to 160, double 150 to 200.',
      MEMORY,
    ),
    studLength: length('Studs', [10, 24, 60], 'How far the studs reach behind the mounting face.', BY_EYE),
    studSpacing: length('Stud spacing', [40, 72, 120], 'Side of the square of four studs.', BY_EYE),
    rodLength: length('Input rod', [30, 95, 250], 'From the mounting face to the rod’s end.', BY_EYE),
    drawOut: length(
      'Draw-out',
      [20, 100, 300],
      'Stud length and rod: how far it is pulled forward to come off.',
      MEMORY,
    ),
    valve: choice('Check valve', { left: 'on the left', right: 'on the right' }, 'left', 'Side of the vacuum hose.'),
  },
  faults: (p) =>
    p.studSpacing * 1.6 > p.diameter
      ? [{ key: 'studSpacing', message: 'Stud spacing is too wide for this diameter.' }]
      : [],
  build: (p) => {
    const d = p.diameter;
    const at = (share: number): Vec3 => [-p.depth * share, 0, 0];
    const disc = (id: string, name: string, k: number, a: number, b: number): Solid =>
      rod(id, name, d * k, at(a), at(b));
    const side = p.valve === 'left' ? -1 : 1;
    const h = p.studSpacing / 2;
    const studs: Vec3[] = [
      [0, -h, h],
      [0, h, h],
      [0, -h, -h],
      [0, h, -h],
    ];
    const valveAt: Vec3 = [-p.depth * 0.86, side * d * 0.27, d * 0.27];
    const solids: Solid[] = [
      disc('rear-1', 'Rear shell', 0.56, 0, 0.14),
      disc('rear-2', 'Rear shell', 0.82, 0.1, 0.28),
      disc('rear-3', 'Rear shell', 0.95, 0.26, 0.42),
      disc('rim', 'Rolled rim', 1, 0.4, 0.5),
      disc('front-1', 'Front shell', 0.95, 0.5, 0.66),
      disc('front-2', 'Front shell', 0.84, 0.64, 0.82),
      disc('front-3', 'Front shell', 0.58, 0.8, 0.94),
      disc('pilot', 'Front face', 0.32, 0.92, 1),
      ...studs.flatMap((s, i) => [rod(`stud-${i + 1}`, 'Stud', 8, s, add(s, [p.studLength, 0, 0]))]),
      ...[-41, 41].map((y, i) =>
        rod(`front-stud-${i + 1}`, 'Front stud', 9, add(at(0.9), [0, y, 0]), add(at(1), [-20, y, 0])),
      ),
      rod('snout', 'Valve body', 38, [-2, 0, 0], [Math.min(34, p.rodLength * 0.5), 0, 0]),
      rod('input-rod', 'Input rod', 12, [0, 0, 0], [p.rodLength - 16, 0, 0]),
      box('clevis', 'Clevis', [20, 20, 16], [p.rodLength - 10, 0, 0]),
      rod('valve', 'Check valve', 26, valveAt, add(valveAt, [-d * 0.06 - 10, 0, 0])),
      rod(
        'valve-spigot',
        'Vacuum spigot',
        12,
        add(valveAt, [-d * 0.06 - 4, 0, 0]),
        add(valveAt, [-d * 0.06 - 4, side * 34, 14]),
      ),
      ...hex('rod-nut', 'Lock nut', 17, 6, [p.rodLength - 26, 0, 0], 'x'),
      cylinder('pilot-rod', 'Output rod', 10, 14, add(at(1), [-7, 0, 0]), 'x'),
    ];
    const motion: Motion = {
      id: 'draw-out',
      name: 'Draw out',
      use: 'service',
      steps: [{ kind: 'slide', along: [-1, 0, 0], from: 0, to: p.drawOut }],
    };
    const axis: Vec3 = [1, 0, 0];
    const holes: Hole[] = [
      ...studs.map((s, i) => ({ id: `stud-${i + 1}`, at: s, axis, diameter: 9 })),
      { id: 'rod', at: [0, 0, 0], axis, diameter: 44 },
    ];
    return { solids, motions: [motion], holes };
  },
});
