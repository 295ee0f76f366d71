// The driver's floor: pan with its ribs, the toe board that slopes up to the firewall, and the tunnel's side.
import type { Solid } from '#shared/scene';
import { sinCosDegrees } from '#shared/units';
import { angle, BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { bar, box } from './solids';

export const floorPanel = defineRecipe({
  kind: 'floor-panel',
  name: 'Floor and toe board',
  category: 'floor',
  about: 'Floor pan with ribs, toe board up to the firewall, and the side of the tunnel.',
  frame: 'Origin on the top of the floor where the toe board begins, in the middle. The floor lies behind (+X).',
  params: {
    width: length('Width', [300, 560, 1600], 'Across the car.', BY_EYE),
    depth: length('Floor depth', [300, 700, 1600], 'Behind the toe board.', BY_EYE),
    toeLength: length('Toe board length', [100, 300, 500], 'Along the slope.', BY_EYE),
    toeAngle: angle('Toe board angle', [20, 50, 75], 'From the vertical.', MEMORY),
    thickness: length('Sheet thickness', [0.7, 1.2, 20], 'With carpet and pad, if they are in.', BY_EYE),
    tunnel: choice('Tunnel side', { left: 'on the left', right: 'on the right', none: 'none' }, 'left', ''),
    tunnelHeight: length('Tunnel height', [50, 180, 350], '', BY_EYE),
  },
  build: (p) => {
    const t = p.thickness;
    const [s, c] = sinCosDegrees(p.toeAngle);
    const solids: Solid[] = [
      box('pan', 'Floor pan', [p.depth, p.width, t], [p.depth / 2, 0, -t / 2]),
      bar(
        'toe',
        'Toe board',
        { wide: t, thick: p.width },
        [-(t / 2) * c, 0, -(t / 2) * s],
        [-p.toeLength * s - (t / 2) * c, 0, p.toeLength * c - (t / 2) * s],
      ),
      ...[-0.3, -0.1, 0.1, 0.3].map((k, i) =>
        box(`rib-${i + 1}`, 'Floor rib', [p.depth * 0.8, 18, 5], [p.depth / 2, k * p.width, 2.5]),
      ),
    ];
    if (p.tunnel !== 'none') {
      const side = p.tunnel === 'left' ? -1 : 1;
      const y = side * (p.width / 2 + t / 2);
      solids.push(
        box(
          'tunnel',
          'Tunnel side',
          [p.depth + p.toeLength * s, t, p.tunnelHeight],
          [(p.depth - p.toeLength * s) / 2, y, p.tunnelHeight / 2 - t],
        ),
        box(
          'tunnel-top',
          'Tunnel top',
          [p.depth + p.toeLength * s, 60, t],
          [(p.depth - p.toeLength * s) / 2, y + side * 30, p.tunnelHeight - t],
        ),
      );
    }
    return { solids, motions: [], holes: [] };
  },
});
