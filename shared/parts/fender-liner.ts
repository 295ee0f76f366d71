// A fender liner: a shell of flats around the wheel, with the wall towards the engine and a rolled edge.
import type { Solid, Vec3 } from '#shared/scene';
import { angle, BY_EYE, choice, defineRecipe, length } from './define';
import { bar, box, hanging, tangent } from './solids';

const FLATS = 12;

export const fenderLiner = defineRecipe({
  kind: 'fender-liner',
  name: 'Fender liner',
  ukName: 'Wing liner',
  category: 'fender-liner',
  about: 'Curved shell over the wheel, of twelve flats, with its inner wall. A mesh of the real one replaces it.',
  frame: 'Origin on the wheel’s axis, in the middle of the shell’s width. It arches over the top (+Z).',
  params: {
    radius: length('Radius', [250, 375, 520], 'Wheel’s axis to the inside of the shell.', BY_EYE),
    width: length('Width', [100, 240, 400], 'Across the car.', BY_EYE),
    thickness: length('Thickness', [1, 3, 8], 'Of the shell.', BY_EYE),
    frontEnd: angle('Front end', [30, 100, 150], 'Where it ends ahead, from straight up.', BY_EYE),
    rearEnd: angle('Rear end', [30, 105, 150], 'Where it ends behind, from straight up.', BY_EYE),
    inner: choice('Inner wall', { left: 'on its left', right: 'on its right' }, 'left', 'The side of the engine.'),
    wallDepth: length('Wall depth', [10, 70, 250], 'How far the inner wall reaches down from the shell.', BY_EYE),
  },
  build: (p) => {
    const step = (p.frontEnd + p.rearEnd) / FLATS;
    const side = p.inner === 'left' ? -1 : 1;
    const solids: Solid[] = [];
    // degrees from straight up, positive ahead; hanging() counts from straight down and rearward
    const on = (radius: number, degrees: number, y = 0): Vec3 => {
      const [x, , z] = hanging(radius, 180 + degrees);
      return [x, y, z];
    };
    const middle = p.radius + p.thickness / 2;
    const chord = 2 * (p.radius + p.thickness) * tangent(step / 2);
    for (let i = 0; i < FLATS; i += 1) {
      const degrees = -p.rearEnd + (i + 0.5) * step;
      solids.push(
        box(`flat-${i + 1}`, 'Shell', [chord, p.width, p.thickness], on(middle, degrees), [0, -degrees, 0]),
        box(
          `wall-${i + 1}`,
          'Inner wall',
          [chord, p.thickness, p.wallDepth],
          on(p.radius - p.wallDepth / 2, degrees, side * (p.width / 2 - p.thickness / 2)),
          [0, -degrees, 0],
        ),
        box(
          `edge-${i + 1}`,
          'Rolled edge',
          [chord, 8, 12],
          on(p.radius + p.thickness + 4, degrees, -side * (p.width / 2 - 4)),
          [0, -degrees, 0],
        ),
      );
    }
    for (const [id, degrees] of [
      ['front', p.frontEnd],
      ['rear', -p.rearEnd],
    ] as const) {
      const from = on(p.radius - 14, degrees);
      const to = on(p.radius + p.thickness, degrees);
      solids.push(
        bar(`lip-${id}`, 'End lip', { wide: p.width, thick: p.thickness, flat: on(1, degrees + 90) }, from, to),
      );
    }
    return { solids, motions: [], holes: [] };
  },
});
