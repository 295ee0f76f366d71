// A wiper motor: round motor across a gearbox, and the crank that goes round with the end of the link on it.
import type { Hole, Motion, Solid, Vec3 } from '#shared/scene';
import { angle, BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { bar, box, cylinder, hanging, rod } from './solids';

const PLATE = 4;

export const wiperMotor = defineRecipe({
  kind: 'wiper-motor',
  name: 'Wiper motor',
  category: 'wiper',
  about: 'Motor and gearbox on their plate, with the crank turning all the way round and the link’s ball end on it.',
  frame:
    'Origin on the crank’s axis in the face that is bolted down. The gearbox lies ahead (-X), the crank behind (+X).',
  seenFrom: 'behind',
  params: {
    motorDiameter: length('Motor diameter', [45, 64, 90], 'Of the round body.', MEMORY),
    motorLength: length('Motor length', [70, 108, 150], 'Of the round body, without the gearbox.', MEMORY),
    side: choice('Motor lies', { left: 'to the left', right: 'to the right' }, 'left', 'Seen from the driver’s seat.'),
    gearboxDiameter: length('Gearbox diameter', [60, 86, 120], '', BY_EYE),
    gearboxDepth: length('Gearbox depth', [25, 44, 80], 'Ahead of the plate.', BY_EYE),
    crankRadius: length('Crank radius', [20, 45, 70], 'Axis to the pin that drives the link.', MEMORY),
    crankBehind: length('Crank behind plate', [12, 34, 90], 'Plate’s rear face to the middle of the crank.', BY_EYE),
    parkAngle: angle(
      'Park angle',
      [-180, 35, 180],
      'Of the crank at rest, from straight down; positive to the right.',
      BY_EYE,
    ),
    linkStub: length('Link end', [0, 60, 200], 'Length of the link drawn on the pin; 0 leaves it off.', BY_EYE),
  },
  build: (p) => {
    const way = p.side === 'left' ? -1 : 1;
    const near = p.gearboxDiameter * 0.28;
    const far = near + p.motorLength;
    const mid = -PLATE - p.gearboxDepth / 2;
    const across = (y: number, x = mid, z = 0): Vec3 => [x, way * y, z];
    // the crank turns about X: the plane of its circle is Y and Z
    const [reach, , drop] = hanging(p.crankRadius, p.parkAngle);
    const pin: Vec3 = [p.crankBehind, reach, drop];
    const ears: Vec3[] = [
      [0, -way * p.gearboxDiameter * 0.46, p.gearboxDiameter * 0.4],
      [0, -way * p.gearboxDiameter * 0.46, -p.gearboxDiameter * 0.4],
      [0, way * p.gearboxDiameter * 0.62, p.gearboxDiameter * 0.5],
    ];
    const crank: Solid[] = [
      bar('crank', 'Crank', { wide: 22, thick: 6, flat: [1, 0, 0] }, [p.crankBehind, 0, 0], pin),
      cylinder('crank-nut', 'Crank nut', 18, 10, [p.crankBehind + 7, 0, 0], 'x'),
      cylinder('pin', 'Crank pin', 10, 22, [pin[0] + 9, pin[1], pin[2]], 'x'),
      cylinder('ball', 'Link ball', 24, 14, [pin[0] + 17, pin[1], pin[2]], 'x'),
      ...(p.linkStub >= 1
        ? [
            bar(
              'link-end',
              'Link end',
              { wide: 14, thick: 5, flat: [1, 0, 0] },
              [pin[0] + 17, pin[1], pin[2]],
              [pin[0] + 17, pin[1] - way * p.linkStub, pin[2]],
            ),
          ]
        : []),
    ];
    const fixed: Solid[] = [
      box('plate', 'Mounting plate', [PLATE, p.gearboxDiameter * 1.1, p.gearboxDiameter * 1.05], [-PLATE / 2, 0, 0]),
      ...ears.map((at, i) => cylinder(`ear-${i + 1}`, 'Rubber mount', 22, 14, at, 'x')),
      cylinder('gearbox', 'Gearbox', p.gearboxDiameter, p.gearboxDepth, [mid, 0, 0], 'x'),
      cylinder('gear-cover', 'Gearbox cover', p.gearboxDiameter * 0.8, 6, [-PLATE - p.gearboxDepth - 3, 0, 0], 'x'),
      rod('neck', 'Motor neck', p.motorDiameter * 0.72, across(0), across(near + 6)),
      rod('motor', 'Motor', p.motorDiameter, across(near), across(far)),
      rod('motor-band', 'Motor', p.motorDiameter + 4, across(near + 12), across(near + 22)),
      rod('motor-cap', 'Motor cap', p.motorDiameter * 0.8, across(far), across(far + 8)),
      rod('motor-tip', 'Motor cap', 18, across(far + 8), across(far + 14)),
      box('plug', 'Plug', [22, 30, 18], across(near - 4, mid - 2, p.gearboxDiameter / 2 + 4)),
      cylinder('spindle', 'Crank spindle', 12, p.crankBehind + 14, [(p.crankBehind + 10) / 2, 0, 0], 'x'),
      cylinder('boss', 'Spindle boss', 28, 12, [6, 0, 0], 'x'),
    ];
    const turn: Motion = {
      id: 'turn',
      name: 'Crank turn',
      use: 'operating',
      solids: crank.map((s) => s.id),
      steps: [{ kind: 'swing', point: [0, 0, 0], axis: [1, 0, 0], from: 0, to: 360 }],
    };
    const axis: Vec3 = [1, 0, 0];
    const holes: Hole[] = [
      ...ears.map((at, i) => ({ id: `mount-${i + 1}`, at, axis, diameter: 8 })),
      { id: 'spindle', at: [0, 0, 0], axis, diameter: 30 },
    ];
    return { solids: [...fixed, ...crank], motions: [turn], holes };
  },
});
