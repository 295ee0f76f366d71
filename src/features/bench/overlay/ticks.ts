// The tick marks a laser leaves on the selected part: short red strokes outwards from the middle of each side of its box.
import { project, type Frame } from '../viewport/frame';
import { centreOf, type Box, type Triple } from '../viewport/vectors';
import type { Mark } from './mark';

const LENGTH = 16;
const APART = 5;

export function laserTicks(frame: Frame, box: Box): Mark[] {
  const middle = centreOf(box);
  const centre = project(frame, middle);
  if (centre === null) return [];
  return [0, 1, 2].flatMap((axis) =>
    (['low', 'high'] as const).flatMap((side): Mark[] => {
      const at = middle.map((x, k) => (k === axis ? box[side][axis]! : x)) as unknown as Triple;
      const p = project(frame, at);
      if (p === null) return [];
      const [dx, dy] = [p.x - centre.x, p.y - centre.y];
      const size = Math.hypot(dx, dy);
      // a side that faces the eye has no outwards on the screen
      if (size < 6) return [];
      const [ux, uy] = [dx / size, dy / size];
      return [
        {
          kind: 'line',
          points: [
            [p.x + ux * APART, p.y + uy * APART],
            [p.x + ux * (APART + LENGTH), p.y + uy * (APART + LENGTH)],
          ],
          ink: 'laser',
          width: 1.8,
        },
        {
          kind: 'line',
          points: [
            [p.x + ux * (APART + LENGTH) - uy * 4, p.y + uy * (APART + LENGTH) + ux * 4],
            [p.x + ux * (APART + LENGTH) + uy * 4, p.y + uy * (APART + LENGTH) - ux * 4],
          ],
          ink: 'laser',
          width: 1.8,
        },
      ];
    }),
  );
}
