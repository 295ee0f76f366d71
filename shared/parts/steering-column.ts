// A steering column: tube through the firewall, shaft, and the joint ahead of it that turns with the wheel.
import type { Hole, Solid, Vec3 } from '#shared/scene';
import { sinCosDegrees } from '#shared/units';
import { angle, BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { add, box, placed, rod, times } from './solids';

const RIM_PIECES = 16;
/** Middle of the joint to the end of a yoke. */
const JOINT_HALF = 34;

const isInCabin = (p: { readonly jointAhead: number }): boolean => p.jointAhead < 0;

/** The wheel's rim and spokes about the axis X, drawn in the column's own frame. */
function wheelSolids(diameter: number, at: number): Solid[] {
  const r = diameter / 2;
  const on = (degrees: number): Vec3 => {
    const [s, c] = sinCosDegrees(degrees);
    return [at, r * s, r * c];
  };
  const turn = 360 / RIM_PIECES;
  const rim = Array.from({ length: RIM_PIECES }, (_, i) =>
    rod(`rim-${i + 1}`, 'Wheel rim', 26, on(i * turn - 1), on((i + 1) * turn + 1)),
  );
  const spokes = [90, 270, 180].map((degrees, i) =>
    rod(`spoke-${i + 1}`, 'Wheel spoke', 18, [at - 18, 0, 0], on(degrees)),
  );
  return [...rim, ...spokes, rod('wheel-hub', 'Wheel hub', 80, [at - 34, 0, 0], [at, 0, 0])];
}

export const steeringColumn = defineRecipe({
  kind: 'steering-column',
  name: 'Steering column',
  category: 'column',
  about: 'Column tube with its firewall collar, shaft and steering joint, and the wheel; it stands at its rake.',
  frame: 'Origin on the column’s axis where it goes through the firewall. The wheel is behind and above (+X, +Z).',
  params: {
    rake: angle('Rake', [5, 25, 60], 'Of the axis from the horizontal.', MEMORY),
    lengthBehind: length('Length behind firewall', [300, 760, 1140], 'Along the axis, to the end of the tube.', MEMORY),
    pastFirewall: length('Tube past firewall', [10, 55, 127], 'What reaches into the engine bay.', MEMORY),
    tubeDiameter: length('Tube diameter', [40, 51, 63], '', MEMORY),
    shaftDiameter: length('Shaft diameter', [16, 19, 30], '', MEMORY),
    jointAhead: length(
      'Joint ahead of firewall',
      [-500, 115, 400],
      'Along the axis, to the middle of the joint; minus is behind it, in the cabin.',
      BY_EYE,
    ),
    jointDiameter: length('Joint swing diameter', [30, 42, 60], 'What it sweeps as it turns.', MEMORY),
    shaftAhead: length(
      'Shaft ahead of joint',
      [30, 120, 500],
      'On the column’s own line; real shafts bend here.',
      BY_EYE,
    ),
    wheel: choice('Wheel', { yes: 'on the column', no: 'left off' }, 'yes', 'The rim matters to knees and dash.'),
    wheelDiameter: length('Wheel diameter', [300, 380, 450], 'Outside of the rim less its thickness.', MEMORY),
  },
  faults: (p) => {
    const faults = [];
    if (p.jointDiameter < p.shaftDiameter + 8) {
      faults.push({
        key: 'jointDiameter',
        message: 'Joint swing diameter must be at least 8 mm more than the shaft’s.',
      });
    }
    if (!isInCabin(p) && p.jointAhead < p.pastFirewall + JOINT_HALF + 10) {
      faults.push({
        key: 'jointAhead',
        message: 'Joint ahead of firewall would stand in the tube; it must be 44 mm ahead of the tube’s end.',
      });
    }
    if (p.lengthBehind < 200 - p.jointAhead + JOINT_HALF) {
      faults.push({ key: 'jointAhead', message: 'Joint ahead of firewall leaves no column behind the joint.' });
    }
    return faults;
  },
  build: (p) => {
    const at = (x: number): Vec3 => [x, 0, 0];
    // a joint in the cabin: the tube ends behind it, and the lower shaft goes through the firewall
    const joint = -p.jointAhead;
    const front = isInCabin(p) ? joint + JOINT_HALF + 26 : -p.pastFirewall;
    const yoke = p.jointDiameter * 0.62;
    const end = p.lengthBehind;
    const level: Solid[] = [
      rod('tube', 'Column tube', p.tubeDiameter, at(front), at(end - 150)),
      rod('bell', 'Column head', p.tubeDiameter * 1.35, at(end - 150), at(end)),
      rod('collar', 'Firewall collar', p.tubeDiameter + 36, at(0), at(7)),
      rod('bearing', 'Lower bearing', p.tubeDiameter * 0.8, at(front - 10), at(front)),
      rod('shaft', 'Steering shaft', p.shaftDiameter, at(joint + 20), at(front)),
      rod('joint-rear', 'Steering joint', yoke, at(joint + 8), at(joint + 34)),
      rod('joint-front', 'Steering joint', yoke, at(joint - 34), at(joint - 8)),
      rod(
        'joint-cross-1',
        'Steering joint',
        14,
        add(at(joint), [0, -p.jointDiameter / 2, 0]),
        add(at(joint), [0, p.jointDiameter / 2, 0]),
      ),
      rod(
        'joint-cross-2',
        'Steering joint',
        14,
        add(at(joint), [0, 0, -p.jointDiameter / 2]),
        add(at(joint), [0, 0, p.jointDiameter / 2]),
      ),
      rod(
        'joint-bolt',
        'Joint pinch bolt',
        10,
        [joint + 26, -(p.jointDiameter / 2 - 4), yoke * 0.3],
        [joint + 26, p.jointDiameter / 2 + 24, yoke * 0.3],
      ),
      ...[-1, 1].flatMap((side) => [
        box(
          `joint-ear-r${side < 0 ? 1 : 2}`,
          'Steering joint',
          [22, 8, 20],
          [joint + 2, side * (p.jointDiameter / 2 - 5), 0],
        ),
        box(
          `joint-ear-f${side < 0 ? 1 : 2}`,
          'Steering joint',
          [22, 20, 8],
          [joint - 2, 0, side * (p.jointDiameter / 2 - 5)],
        ),
      ]),
      rod('lower-shaft', 'Lower shaft', p.shaftDiameter, at(joint - 30 - p.shaftAhead), at(joint - 30)),
      rod('stalk', 'Signal stalk', 10, at(end - 60), add(at(end - 40), [0, -150, 10])),
      ...(p.wheel === 'yes' ? wheelSolids(p.wheelDiameter, end + 40) : []),
    ];
    const [s, c] = sinCosDegrees(p.rake);
    const axis: Vec3 = [c, 0, s];
    const holes: Hole[] = [{ id: 'column', at: times(axis, 0), axis, diameter: p.tubeDiameter + 1 }];
    return { solids: placed(level, { turn: [0, -p.rake, 0] }), motions: [], holes };
  },
});
