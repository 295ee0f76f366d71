// A seat: cushion, back and head rest on their rails.
import type { Solid } from '#shared/scene';
import { angle, BY_EYE, defineRecipe, length, MEMORY } from './define';
import { bar, box, cylinder, hanging } from './solids';

export const seat = defineRecipe({
  kind: 'seat',
  name: 'Seat',
  category: 'seat',
  about: 'Driver’s seat as cushion, back and head rest; where the heel and knee are measured from.',
  frame: 'Origin on the floor under the middle of the cushion’s front edge. The seat lies behind (+X).',
  params: {
    width: length('Width', [350, 500, 700], 'Across the car.', BY_EYE),
    cushionDepth: length('Cushion depth', [350, 480, 600], 'Front edge to back.', BY_EYE),
    cushionHeight: length('Cushion height', [150, 300, 420], 'Floor to the top of the front edge.', MEMORY),
    backHeight: length('Back height', [300, 560, 800], 'Along the back.', BY_EYE),
    recline: angle('Recline', [0, 18, 45], 'Of the back from the vertical.', BY_EYE),
  },
  build: (p) => {
    const thick = 130;
    const foot = p.cushionHeight - thick;
    const start = [p.cushionDepth - 40, 0, p.cushionHeight - 60] as const;
    const top = hanging(p.backHeight, 180 - p.recline, [start[0], start[1], start[2]]);
    const head = hanging(p.backHeight + 130, 180 - p.recline, [start[0], start[1], start[2]]);
    const solids: Solid[] = [
      box('cushion', 'Cushion', [p.cushionDepth, p.width * 0.7, thick], [p.cushionDepth / 2, 0, foot + thick / 2]),
      ...[-1, 1].map((side) =>
        box(
          `bolster-${side < 0 ? 1 : 2}`,
          'Cushion bolster',
          [p.cushionDepth, p.width * 0.16, thick + 30],
          [p.cushionDepth / 2, side * p.width * 0.42, foot + thick / 2 + 15],
        ),
      ),
      bar('back', 'Back', { wide: 110, thick: p.width * 0.9 }, [start[0], 0, start[2]], top),
      bar('head', 'Head rest', { wide: 80, thick: p.width * 0.5 }, top, head),
      ...[-1, 1].map((side) =>
        box(
          `rail-${side < 0 ? 1 : 2}`,
          'Seat rail',
          [p.cushionDepth * 0.9, 40, foot],
          [p.cushionDepth / 2, side * p.width * 0.34, foot / 2],
        ),
      ),
      cylinder('hinge', 'Back hinge', 60, p.width * 0.98, [start[0], 0, start[2]], 'y'),
    ];
    return { solids, motions: [], holes: [] };
  },
});
