// A hard line: bent tube with a nut at each end.
import type { Solid, Vec3 } from '#shared/scene';
import { BY_EYE, defineRecipe, length, MEMORY } from './define';
import { bent, hex, pipe, roundVec } from './solids';

export const hardLine = defineRecipe({
  kind: 'hard-line',
  name: 'Hard line',
  ukName: 'Brake pipe',
  category: 'line',
  about: 'Brake or clutch line in three runs with its bends, and a tube nut at each end.',
  frame: 'Origin at the rear end’s nut. It runs forward (-X), then across, then down.',
  params: {
    diameter: length('Tube diameter', [4, 4.76, 10], '3/16 in is usual for brakes.', MEMORY),
    bendRadius: length('Bend radius', [12, 16, 60], 'To the middle of the tube; three diameters at least.', MEMORY),
    ahead: length('Run ahead', [40, 120, 1000], '', BY_EYE),
    across: length('Run across', [-1200, 160, 1200], 'Minus is to the left.', BY_EYE),
    down: length('Run down', [-800, 200, 800], 'Minus is upwards.', BY_EYE),
  },
  faults: (p) => {
    const faults = [];
    if (p.bendRadius < 3 * p.diameter - 0.5) {
      faults.push({ key: 'bendRadius', message: 'Bend radius must be three tube diameters at least.' });
    }
    for (const key of ['across', 'down'] as const) {
      if (Math.abs(p[key]) < 3 * p.bendRadius) {
        faults.push({ key, message: 'This run is too short for its bends; it needs three bend radii.' });
      }
    }
    if (p.ahead < 2 * p.bendRadius) faults.push({ key: 'ahead', message: 'Run ahead needs two bend radii.' });
    return faults;
  },
  build: (p) => {
    const corners: Vec3[] = [
      [0, 0, 0],
      [-p.ahead, 0, 0],
      [-p.ahead, p.across, 0],
      [-p.ahead, p.across, -p.down],
    ];
    const end = corners[3]!;
    const nut = p.diameter * 2.2;
    const solids: Solid[] = [
      ...pipe('run', 'Tube', p.diameter, bent(corners, p.bendRadius, 4)),
      ...hex('nut-rear', 'Tube nut', nut, 14, [-8, 0, 0], 'x'),
      ...hex('nut-front', 'Tube nut', nut, 14, roundVec([end[0], end[1], end[2] + Math.sign(p.down) * 8]), 'z'),
    ];
    return { solids, motions: [], holes: [] };
  },
});
