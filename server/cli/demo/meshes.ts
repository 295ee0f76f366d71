// The demo's meshes, made from a few numbers: fender liners as open shells, a wiper motor and an engine corner as closed
// bodies. All are our own shapes.
import { encodeStl, sweep, turned, type Soup, type Triple } from './soup';

const ARC = 30;

/** A liner's shell about the wheel's axis (Y), with the ledge that leans over towards the engine. An open surface. */
function liner(side: 1 | -1, unit: number): Soup {
  const radius = 375;
  const profile = (degrees: number): Triple[] => {
    const angle = (degrees * Math.PI) / 180;
    // over the wheel's top the shell swells a little
    const r = radius + 14 * Math.sin(2 * angle) ** 2;
    const at = (rr: number, y: number): Triple => [-rr * Math.sin(angle), -side * y, rr * Math.cos(angle)];
    return [at(r - 95, 118), at(r - 12, 121), at(r, 108), at(r + 6, 0), at(r, -112), at(r + 10, -120)];
  };
  const rows = Array.from({ length: ARC + 1 }, (_, i) => profile(-105 + (i * 205) / ARC));
  const soup = sweep(rows, { closed: false });
  // the ledge: a stiffening shelf that stands out from the wall, ahead of the arch's top
  const shelf = Array.from({ length: 9 }, (_, i): Triple[] => {
    const x = -300 + (i * 240) / 8;
    const drop = 6 * Math.sin((i / 8) * Math.PI);
    return [
      [x, -side * 121, 392],
      [x, -side * 160, 400 + drop],
      [x, -side * 196, 400 + drop],
      [x, -side * 200, 388],
    ];
  });
  return [...soup, ...sweep(shelf, { closed: false })].map((p) => p / unit);
}

/** A wiper motor turned about Y, with its gearbox about X beside it. Two shells, both closed. */
function wiperMotor(): Soup {
  const motor = turned(
    [
      [0, 18],
      [12, 18],
      [12, 30],
      [20, 32],
      [92, 32],
      [98, 26],
      [104, 26],
      [108, 10],
      [112, 10],
    ],
    { axis: 'y', pieces: 32 },
  ).map((p, i) => (i % 3 === 1 ? p + 30 : p));
  const gearbox = turned(
    [
      [-46, 30],
      [-44, 36],
      [-8, 42],
      [-4, 42],
      [-4, 20],
      [6, 14],
    ],
    { axis: 'x', pieces: 36 },
  );
  return [...motor, ...gearbox];
}

/** The rear corner of a head with its valve cover, swept along X, with an oil cap on it. Closed. */
function engineCorner(): Soup {
  // seen from behind, y to the right and z up, about the middle of the cover
  const outline: [number, number][] = [
    [-96, -78],
    [62, -78],
    [66, -20],
    [58, 4],
    [64, 10],
    [62, 40],
    [44, 58],
    [10, 65],
    [-44, 65],
    [-72, 52],
    [-84, 22],
    [-92, 8],
  ];
  const long = 400;
  const stations = 24;
  const rows = Array.from({ length: stations + 1 }, (_, i): Triple[] => {
    const share = i / stations;
    // ribs across the cover, and rounded ends
    const end = Math.min(share, 1 - share) * stations;
    const rib = i % 4 === 0 ? 1.03 : 1;
    const k = (end < 1 ? 0.93 : 1) * rib;
    return outline.map(([y, z]): Triple => [-long * share, z > 8 ? y * k : y, z > 8 ? z * k : z]);
  });
  const cap = turned(
    [
      [60, 20],
      [82, 20],
      [86, 16],
      [88, 8],
    ],
    { axis: 'z', pieces: 24 },
  ).map((p, i) => (i % 3 === 0 ? p - 300 : i % 3 === 1 ? p - 18 : p));
  return [...sweep(rows, { closed: true }), ...cap];
}

export const DEMO_MESHES: Readonly<Record<string, () => Uint8Array>> = {
  // a supplier's file in inches: the scenes scale it by 25.4
  'fender-liner-right.stl': () => encodeStl(liner(1, 25.4), 'fender liner, right hand, inches'),
  'fender-liner-left.stl': () => encodeStl(liner(-1, 1), 'fender liner, left hand, millimetres'),
  'wiper-motor.stl': () => encodeStl(wiperMotor(), 'wiper motor, millimetres'),
  'engine-corner.stl': () => encodeStl(engineCorner(), 'engine corner, millimetres'),
};
