// The firewall zone of a right-hand-drive pickup of no make. Vehicle axes, mm; the floor is z = 0, the firewall's lower edge
// x = 0. What the three scenes differ in comes as choices.
import { FORK_LENGTH, pedalTravel, type Params } from '#shared/parts';
import type { Component, PairRule, Scene, Vec3 } from '#shared/scene';
import { sinCosDegrees } from '#shared/units';
import { block, drum, joint, plainPart, readyMade, scanned, zeroedAt } from './draw';

const RAKE = 9;
/** The column's line, and the middle of the pedal box on it. */
const COLUMN_ACROSS = 400;
const FIREWALL_LOW = 60;
const COWL_UNDER = 702.2;
const PIVOT_DEPTH = 155;
const PIVOT_UP = 474;
const PEDAL_PITCH = 100;

const radians = (degrees: number): number => (degrees * Math.PI) / 180;
const tenth = (x: number): number => Math.round(x * 10) / 10;

/** The x of a place `behind` the firewall's rear face, square to it, at a height. */
const behindFirewall = (behind: number, z: number): number =>
  tenth((behind + (z - FIREWALL_LOW) * Math.sin(radians(RAKE))) / Math.cos(radians(RAKE)));

const [RAKE_SINE, RAKE_COSINE] = sinCosDegrees(RAKE);
/** What the laser throws on this car, besides the centre and the floor that every scene has. */
export const LASERS: Scene['lasers'] = [
  { id: 'column-line', name: 'Column line', point: [0, COLUMN_ACROSS, 0], normal: [0, 1, 0] },
  {
    id: 'firewall-plane',
    name: 'Firewall plane',
    point: [0, 0, FIREWALL_LOW],
    normal: [RAKE_COSINE, 0, -RAKE_SINE],
  },
];

export interface ZoneChoices {
  readonly clutchCylinderLength: number;
  /** The steering joint ahead of the firewall; minus is in the cabin. */
  readonly steeringJoint: number;
  readonly jointDiameter: number;
  /** Where the brace under the cowl hangs, across. */
  readonly braceAcross: number;
  readonly brakeReservoir: Vec3;
  /** Whether the clutch line is laid already. */
  readonly clutchLine: boolean;
  /** How far the harness clip reaches towards the clutch pedal, across. */
  readonly clipReach: number;
}

const PEDAL: Params = {
  armLength: 320,
  clevisRadius: 48,
  restAngle: 15 + RAKE,
  padLean: 34,
  padWidth: 54,
  stroke: 25.4,
};
const travel = pedalTravel({
  armLength: 320,
  clevisRadius: 48,
  stroke: 25.4,
  workingTravel: 76,
  restAngle: 15 + RAKE,
});

function pedalBox(c: ZoneChoices): Component[] {
  const group = 'pedal-box';
  const half = PEDAL_PITCH / 2;
  // the rod ends where the pedal's fork begins
  const rodLength = tenth(PIVOT_DEPTH + travel.clevis[0] - FORK_LENGTH);
  const cylinder = (id: string, name: string, y: number, bodyLength: number): Component =>
    readyMade(
      'master-cylinder',
      id,
      name,
      { bodyLength, rodLength, outlet: 'up', drawOut: 45 },
      {
        group,
        source: 'sheet',
        at: [-PIVOT_DEPTH, y, -46],
      },
    );
  const line = (id: string, name: string, y: number, across: number, bodyLength: number): Component =>
    readyMade(
      'hard-line',
      id,
      name,
      { ahead: 60, across, down: 60 },
      {
        group,
        source: 'guess',
        at: [-PIVOT_DEPTH - bodyLength + 24, y, -46 + 19.9],
        turn: [0, 90, 0],
      },
    );
  return [
    readyMade(
      'pedal-bracket',
      'pedal-bracket',
      'Pedal bracket',
      {
        plateWidth: 230,
        pivotDepth: PIVOT_DEPTH,
        pedalSpacing: PEDAL_PITCH,
        cowlReach: tenth((COWL_UNDER - 0.1 - PIVOT_UP) / Math.cos(radians(RAKE))),
        rake: RAKE,
      },
      { group, source: 'sheet' },
    ),
    readyMade(
      'hanging-pedal',
      'clutch-pedal',
      'Clutch pedal',
      { ...PEDAL, padOffset: -24, springPeg: 'left' },
      {
        group,
        source: 'sheet',
        at: [0, -half, 0],
      },
    ),
    readyMade(
      'hanging-pedal',
      'brake-pedal',
      'Brake pedal',
      { ...PEDAL, padOffset: 20 },
      {
        group,
        source: 'sheet',
        at: [0, half, 0],
      },
    ),
    cylinder('clutch-cylinder', 'Clutch cylinder', -half, c.clutchCylinderLength),
    cylinder('brake-cylinder', 'Brake cylinder', half, 140),
    ...(c.clutchLine ? [line('clutch-line', 'Clutch line', -half, -60, c.clutchCylinderLength)] : []),
    line('brake-line', 'Brake line', half, 60, 140),
  ];
}

function cabin(c: ZoneChoices): Component[] {
  const throttleUp = 290;
  const brace: Vec3 = [257, c.braceAcross, 0];
  return [
    readyMade(
      'steering-column',
      'column',
      'Steering column',
      {
        rake: 40,
        tubeDiameter: 44.5,
        lengthBehind: 760,
        jointAhead: c.steeringJoint,
        jointDiameter: c.jointDiameter,
        shaftAhead: c.steeringJoint < 0 ? 330 : 120,
      },
      { at: [14.3, COLUMN_ACROSS, 150] },
    ),
    readyMade(
      'throttle-pedal',
      'throttle',
      'Throttle pedal',
      { armLength: 160 },
      {
        source: 'sheet',
        at: [behindFirewall(55.1, throttleUp), 560, throttleUp],
        turn: [0, RAKE, 0],
      },
    ),
    wiper(),
    zeroedAt(
      plainPart('cowl-brace', 'Cowl brace', 'bracket', [
        block('strut', 'Strut', [20, 20, 200], [brace[0], brace[1], COWL_UNDER - 0.1 - 100]),
        block('foot', 'Foot', [40, 60, 4], [brace[0], brace[1], COWL_UNDER - 0.1 - 2]),
      ]),
      [brace[0], brace[1], COWL_UNDER - 0.1],
    ),
    readyMade(
      'heater-box',
      'heater',
      'Heater box',
      { width: 340, pipeAhead: 20 },
      {
        at: [behindFirewall(42, 390), -440, 390],
        turn: [0, RAKE, 0],
      },
    ),
    zeroedAt(
      plainPart(
        'harness-clip',
        'Harness clip',
        'bracket',
        [
          block('stay', 'Stay', [12, 12, 350], [pegPlace()[0], 240, COWL_UNDER - 0.1 - 175]),
          block('blade', 'Blade', [1, c.clipReach - 240, 16], [pegPlace()[0], (240 + c.clipReach) / 2, pegPlace()[2]]),
        ],
        { note: 'Thin sheet: only a swept check sees what passes it.' },
      ),
      [pegPlace()[0], 240, COWL_UNDER - 0.1],
    ),
    readyMade('seat', 'seat', 'Driver’s seat', { width: 440 }, { at: [730, COLUMN_ACROSS, 0] }),
  ];
}

/** Where the clutch pedal's spring peg is when the pedal has swung by 12.5 degrees, in the car. */
function pegPlace(): Vec3 {
  const degrees = 15 - 12.5;
  const drop = 130;
  // the arm's line to its end lies a little ahead of the line to the pad
  const lead = 4.6;
  const angle = radians(degrees - lead);
  return [tenth(pivotX() + drop * Math.sin(angle)), 0, tenth(PIVOT_UP - drop * Math.cos(angle))];
}

const pivotX = (): number => behindFirewall(PIVOT_DEPTH + 0.05, PIVOT_UP);

function wiper(): Component {
  const pin: Vec3 = [40, 36, -27];
  return plainPart(
    'wiper',
    'Wiper motor',
    'wiper',
    [
      scanned('motor', 'Motor', 'wiper-motor.stl', 1),
      block('mount', 'Mount', [6, 40, 108], [-30, 0, COWL_UNDER - 0.1 - 570 - 54]),
      drum('spindle', 'Spindle', 12, 30, [20, 0, 0], [0, 90, 0]),
      block('crank', 'Crank', [6, 58, 20], [38, 18, -13.5], [-36.9, 0, 0]),
      drum('pin', 'Crank pin', 10, 24, [48, pin[1], pin[2]], [0, 90, 0]),
      block('link', 'Link end', [5, 70, 14], [57, pin[1] + 29, pin[2]]),
    ],
    {
      at: [200, -100, 570],
      motions: [
        {
          id: 'turn',
          name: 'Crank turn',
          use: 'operating',
          solids: ['crank', 'pin', 'link'],
          steps: [{ kind: 'swing', point: [0, 0, 0], axis: [1, 0, 0], from: 0, to: 360 }],
        },
      ],
    },
  );
}

function body(): Component[] {
  return [
    readyMade(
      'firewall-panel',
      'firewall',
      'Firewall',
      {
        height: 650,
        rake: RAKE,
        columnAcross: COLUMN_ACROSS,
        columnUp: 91,
        columnOpening: 120,
        boxAcross: COLUMN_ACROSS,
        boxUp: tenth((452.8 - FIREWALL_LOW) / Math.cos(radians(RAKE))),
        boxWidth: 176,
        boxHeight: 124,
        swages: 'no',
      },
      { at: [0, 0, FIREWALL_LOW] },
    ),
    readyMade('cowl', 'cowl', 'Cowl', {}, { at: [101.7, 0, COWL_UNDER] }),
    readyMade('floor-panel', 'floor', 'Floor and toe board', { toeLength: 100, width: 540 }, { at: [118, 400, 0] }),
    readyMade('hood', 'hood', 'Hood', { lipBehind: 0, skinAbove: 10 }, { at: [70, 0, 815] }),
  ];
}

/** The engine: a scanned corner where it matters, blocks elsewhere. Crankshaft at y = 0. */
function engineBay(c: ZoneChoices): Component[] {
  const crank = 270;
  const cover: Vec3 = [-150, 318, 464];
  return [
    zeroedAt(
      plainPart('engine', 'Engine with accessories', 'engine', [
        scanned('corner', 'Right head and valve cover', 'engine-corner.stl', 1, cover, [-45, 0, 0]),
        block('port-face', 'Exhaust port face', [330, 30, 60], [-375, 365, 350]),
        block('block', 'Block', [470, 400, 210], [-345, 0, crank + 35]),
        block('left-head', 'Left head', [400, 150, 90], [-350, -225, 400], [45, 0, 0]),
        block('left-port-face', 'Exhaust port face', [330, 95, 60], [-360, -332.5, 385]),
        block('left-cover', 'Left valve cover', [390, 110, 76], [-350, -286, 455], [45, 0, 0]),
        block('intake', 'Intake', [330, 260, 90], [-350, 0, 470]),
        drum('air-cleaner', 'Air cleaner', 320, 60, [-350, 0, 660]),
        drum('throttle-body', 'Throttle body', 90, 120, [-350, 0, 572]),
        drum('distributor', 'Distributor', 90, 190, [-150, 0, 500]),
        drum('alternator', 'Alternator', 140, 150, [-560, 230, 500], [0, 90, 0]),
        drum('pulley', 'Crank pulley', 170, 50, [-606, 0, crank], [0, 90, 0]),
      ]),
      [-150, 0, crank],
    ),
    readyMade(
      'exhaust-header',
      'header-right',
      'Right header',
      { drop: 450, portSpacing: 80 },
      {
        at: [-375, 380, 350],
      },
    ),
    readyMade(
      'exhaust-header',
      'header-left',
      'Left header',
      { side: 'left', drop: 450, portSpacing: 80 },
      {
        at: [-375, -380, 350],
      },
    ),
    plainPart(
      'liner-right',
      'Right fender liner',
      'fender-liner',
      [scanned('shell', 'Shell', 'fender-liner-right.stl', 25.4)],
      { at: [-470, 690, 110] },
    ),
    plainPart(
      'liner-left',
      'Left fender liner',
      'fender-liner',
      [scanned('shell', 'Shell', 'fender-liner-left.stl', 1)],
      { at: [-470, -690, 110] },
    ),
    readyMade(
      'reservoir',
      'clutch-reservoir',
      'Clutch reservoir',
      { mount: 'rear', reach: 50 },
      {
        source: 'sheet',
        at: [-10, 230, 560],
      },
    ),
    readyMade(
      'reservoir',
      'brake-reservoir',
      'Brake reservoir',
      { mount: 'rear', reach: 50 },
      {
        source: 'sheet',
        at: c.brakeReservoir,
      },
    ),
  ];
}

export interface Zone {
  readonly groups: Scene['groups'];
  readonly components: readonly Component[];
}

export function zone(c: ZoneChoices): Zone {
  return {
    groups: [
      { id: 'pedal-box', name: 'Pedal box', pose: { at: [pivotX(), COLUMN_ACROSS, PIVOT_UP], turn: [0, RAKE, 0] } },
    ],
    components: [...body(), ...cabin(c), ...pedalBox(c), ...engineBay(c)],
  };
}

/** What touches what on purpose. */
export const JOINTS: readonly PairRule[] = [
  joint('firewall', 'cowl'),
  joint('pedal-bracket', 'firewall'),
  joint('pedal-bracket', 'cowl'),
  joint('clutch-pedal', 'pedal-bracket'),
  joint('brake-pedal', 'pedal-bracket'),
  joint('clutch-cylinder', 'pedal-bracket'),
  joint('brake-cylinder', 'pedal-bracket'),
  joint('clutch-cylinder', 'clutch-pedal'),
  joint('brake-cylinder', 'brake-pedal'),
  joint('clutch-line', 'clutch-cylinder'),
  joint('brake-line', 'brake-cylinder'),
  joint('throttle', 'firewall'),
  joint('cowl-brace', 'cowl'),
  joint('wiper', 'cowl'),
  joint('harness-clip', 'cowl'),
  joint('header-right', 'engine'),
  joint('header-left', 'engine'),
  joint('seat', 'floor'),
];
