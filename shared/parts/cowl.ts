// A cowl: the plenum box under the windscreen, with its slotted top. The pedal box hangs from its underside.
import type { Solid } from '#shared/scene';
import { atan2Degrees } from '#shared/units';
import { BY_EYE, count, defineRecipe, length, MEMORY } from './define';
import { box } from './solids';

export const cowl = defineRecipe({
  kind: 'cowl',
  name: 'Cowl',
  ukName: 'Scuttle',
  category: 'cowl',
  about: 'Plenum under the windscreen: floor, front and rear wall, and the slotted top that lets the air in.',
  frame: 'Origin in the middle of the underside’s front edge. It reaches rearward (+X) and up (+Z).',
  params: {
    width: length('Width', [500, 1300, 1900], 'Across the car.', BY_EYE),
    depth: length('Depth', [120, 240, 400], 'Front wall to rear wall.', MEMORY),
    height: length('Height', [60, 130, 220], 'Of the front wall.', MEMORY),
    rise: length('Rise to the screen', [0, 30, 120], 'How much higher the rear edge of the top is.', BY_EYE),
    thickness: length('Sheet thickness', [0.7, 1.2, 5], '', MEMORY),
    slots: count('Slots', [4, 14, 40], 'In the top.', BY_EYE),
  },
  build: (p) => {
    const t = p.thickness;
    const rail = p.depth * 0.24;
    const rearHeight = p.height + p.rise;
    const share = p.rise / p.depth;
    const topAt = (x: number): number => p.height + share * x - t / 2;
    const lean = -atan2Degrees(p.rise, p.depth);
    const slope = Math.sqrt(1 + share * share);
    const pitch = (p.width - 2 * t) / p.slots;
    const solids: Solid[] = [
      box('floor', 'Plenum floor', [p.depth, p.width, t], [p.depth / 2, 0, t / 2]),
      box('front', 'Front wall', [t, p.width, p.height], [t / 2, 0, p.height / 2]),
      box('rear', 'Rear wall', [t, p.width, rearHeight], [p.depth - t / 2, 0, rearHeight / 2]),
      ...[-1, 1].map((side) =>
        box(
          `end-${side < 0 ? 1 : 2}`,
          'End plate',
          [p.depth, t, p.height],
          [p.depth / 2, side * (p.width / 2 - t / 2), p.height / 2],
        ),
      ),
      box('top-front', 'Top', [rail * slope, p.width, t], [rail / 2, 0, topAt(rail / 2)], [0, lean, 0]),
      box(
        'top-rear',
        'Top',
        [rail * slope, p.width, t],
        [p.depth - rail / 2, 0, topAt(p.depth - rail / 2)],
        [0, lean, 0],
      ),
      box('screen-rail', 'Screen rail', [22, p.width, 10], [p.depth - 11, 0, rearHeight + 5]),
      ...Array.from({ length: p.slots + 1 }, (_, i) =>
        box(
          `slat-${i + 1}`,
          'Slat',
          [(p.depth - 2 * rail) * slope, Math.min(pitch * 0.45, 40), t],
          [p.depth / 2, -p.width / 2 + t + i * pitch, topAt(p.depth / 2)],
          [0, lean, 0],
        ),
      ),
    ];
    return { solids, motions: [], holes: [] };
  },
});
