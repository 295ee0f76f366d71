// An electronic throttle: module on the firewall, thin arm, narrow pad.
import type { Motion, Solid, Vec3 } from '#shared/scene';
import { angle, BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { add, arcLength, bar, box, cylinder, hanging, placed } from './solids';

export const throttlePedal = defineRecipe({
  kind: 'throttle-pedal',
  name: 'Throttle pedal',
  ukName: 'Accelerator pedal',
  category: 'throttle',
  about: 'Electronic throttle module with sensor, plug, arm and pad, swinging through its travel.',
  frame:
    'Origin on the pivot’s axis, in the arm’s mid-plane. The module’s plate stands ahead (-X); the foot pushes the pad forward.',
  seenFrom: 'behind',
  params: {
    armLength: length('Arm length', [100, 190, 300], 'Pivot to the middle of the pad.', MEMORY),
    travel: angle('Pedal travel', [8, 17, 30], 'Swing from rest to the stop.', MEMORY),
    restAngle: angle(
      'Arm behind the vertical',
      [0, 22, 45],
      'At rest, from the pivot to the middle of the pad.',
      BY_EYE,
    ),
    moduleWidth: length('Module width', [60, 96, 150], 'Across the car.', MEMORY),
    moduleHeight: length('Module height', [60, 100, 200], 'Of the mounting plate.', BY_EYE),
    plateAhead: length(
      'Plate ahead of pivot',
      [25, 55, 120],
      'From the pivot’s axis to the face that is bolted down.',
      BY_EYE,
    ),
    padWidth: length('Pad width', [25, 42, 80], 'Across the car.', BY_EYE),
    padHeight: length('Pad height', [50, 95, 160], 'Along the face.', BY_EYE),
    padLean: angle('Pad lean', [0, 32, 70], 'Of the face from the vertical, at rest.', BY_EYE),
    plug: choice('Plug', { left: 'on the left', right: 'on the right' }, 'right', 'Side of the sensor and its plug.'),
  },
  faults: (p) =>
    p.padHeight / 2 + 50 > p.armLength
      ? [{ key: 'padHeight', message: 'Pad height reaches up into the module; the arm must be longer.' }]
      : [],
  facts: (p) => [{ key: 'padTravel', label: 'Pad travel', unit: 'length', value: arcLength(p.armLength, p.travel) }],
  build: (p) => {
    const side = p.plug === 'left' ? -1 : 1;
    const back = -p.plateAhead;
    const body = p.moduleWidth - 40;
    const top = p.moduleHeight / 2;
    const pad = hanging(p.armLength, p.restAngle);
    const armEnd = add(hanging(p.armLength, p.restAngle), [-14, 0, -2]);
    const ribs = Array.from({ length: 6 }, (_, i) =>
      box(`pad-rib-${i + 1}`, 'Pad rib', [5, p.padWidth - 8, 5], [6.5, 0, (i - 2.5) * (p.padHeight / 7)]),
    );
    const fixed: Solid[] = [
      box('plate', 'Mounting plate', [5, p.moduleWidth, p.moduleHeight], [back + 2.5, 0, 0]),
      ...[-1, 1].flatMap((y) =>
        [-1, 1].map((z) =>
          cylinder(
            `bolt-${y < 0 ? 'l' : 'r'}${z < 0 ? 'l' : 'h'}`,
            'Bolt head',
            12,
            6,
            [back + 8, y * (p.moduleWidth / 2 - 9), z * (top - 9)],
            'x',
          ),
        ),
      ),
      box(
        'housing',
        'Module',
        [p.plateAhead + 8, body, p.moduleHeight * 0.7],
        [back / 2 + 6, 0, p.moduleHeight * 0.12],
      ),
      box(
        'housing-cap',
        'Module',
        [p.plateAhead * 0.7, body - 8, p.moduleHeight * 0.2],
        [back * 0.6, 0, p.moduleHeight * 0.5],
      ),
      cylinder('sensor', 'Sensor', Math.min(52, p.moduleHeight * 0.6), 18, [0, side * (body / 2 + 8), 4], 'y'),
      box('plug', 'Plug', [20, 22, 34], [-6, side * (body / 2 + 14), p.moduleHeight * 0.3 + 16], [0, -20, 0]),
      box('plug-latch', 'Plug', [6, 12, 20], [6, side * (body / 2 + 14), p.moduleHeight * 0.3 + 14], [0, -20, 0]),
    ];
    const moving: Solid[] = [
      bar('arm', 'Arm', { wide: 18, thick: 12 }, hanging(10, p.restAngle), armEnd),
      bar(
        'arm-rib',
        'Arm',
        { wide: 26, thick: 5 },
        hanging(18, p.restAngle),
        hanging(p.armLength * 0.7, p.restAngle + 1),
      ),
      ...placed([box('pad', 'Pad', [8, p.padWidth, p.padHeight], [0, 0, 0]), ...ribs], {
        at: pad,
        turn: [0, -p.padLean, 0],
      }),
    ];
    const motion: Motion = {
      id: 'travel',
      name: 'Throttle travel',
      use: 'operating',
      solids: moving.map((s) => s.id),
      steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: p.travel }],
    };
    const axis: Vec3 = [1, 0, 0];
    const holes = [-1, 1].flatMap((y) =>
      [-1, 1].map((z): { id: string; at: Vec3; axis: Vec3; diameter: number } => ({
        id: `bolt-${y < 0 ? 'l' : 'r'}${z < 0 ? 'l' : 'h'}`,
        at: [back, y * (p.moduleWidth / 2 - 9), z * (top - 9)],
        axis,
        diameter: 6.6,
      })),
    );
    return { solids: [...fixed, ...moving], motions: [motion], holes };
  },
});
