// What a new scene begins with: tolerances by source, and one table of gaps, each row with where it comes from.
import type { Category, Display, PairRule, Scene, Source } from './types';
import { pairKey } from './differences';

/** Panels of a body that was never straight. */
const BODY_PANELS: readonly Category[] = [
  'firewall',
  'cowl',
  'toe-board',
  'floor',
  'tunnel',
  'inner-fender',
  'fender-liner',
  'hood',
  'dash',
];
const BY_SOURCE: Readonly<Record<Source, number>> = { measured: 2, sheet: 1, guess: 12 };
const BODY_PANEL = 3;

/** The tolerance, mm, that a part starts with: by its source, a body panel at least 3. */
export function defaultTolerance(source: Source, category: Category): number {
  return Math.max(BY_SOURCE[source], BODY_PANELS.includes(category) ? BODY_PANEL : 0);
}

export function isBodyPanel(category: Category): boolean {
  return BODY_PANELS.includes(category);
}

export interface DefaultGap {
  readonly between: readonly [Category, Category];
  readonly gap: number;
  /** Where the figure comes from and why, for the person who has to stand by it; the document has no field for it. */
  readonly origin: string;
}

const PRACTICE = 'common practice, no source';

/** General gaps of a new scene, mm. */
export const DEFAULT_GENERAL = {
  gap: { value: 10, origin: `${PRACTICE}: two fixed parts, or a hose or harness past metal` },
  movingGap: { value: 13, origin: `${PRACTICE}: a moving part to anything, a finger's width; 20 is better` },
} as const;

function rows(gap: number, reason: string, one: Category, others: readonly Category[]): DefaultGap[] {
  return others.map((other) => ({ between: [one, other], gap, origin: `${PRACTICE}: ${reason}` }));
}

/** The table of gaps by kind of part that a new scene begins with. */
export const DEFAULT_GAPS: readonly DefaultGap[] = [
  ...rows(25, 'pads apart, so that a shoe meets one pedal only; 50 between brake and clutch', 'pedal', [
    'pedal',
    'throttle',
  ]),
  ...rows(12, 'arm to column or shaft over the whole sweep; 20 is better', 'pedal', ['column']),
  ...rows(25, 'room for the side of a shoe; 40 is better', 'throttle', ['tunnel']),
  ...rows(8, 'crank and link to anything; 12 is better', 'wiper', [
    'cowl',
    'firewall',
    'dash',
    'heater',
    'bracket',
    'column',
    'pedal-box',
  ]),
  ...rows(15, 'engine to any fixed part, as it rocks on its mounts; 25 is better', 'engine', [
    'firewall',
    'cowl',
    'inner-fender',
    'fender-liner',
    'column',
    'pedal-box',
    'master-cylinder',
    'reservoir',
    'booster',
    'bracket',
  ]),
  ...rows(19, 'hood shut over what stands highest; 25 and the lift of the engine are better', 'hood', [
    'engine',
    'belt',
    'master-cylinder',
    'reservoir',
    'booster',
  ]),
  ...rows(76, 'brake or fuel line to exhaust, 3 in; nearer only behind a shield', 'exhaust', ['line', 'hose']),
  ...rows(75, 'fluid to a header with a shield; 125 without one', 'exhaust', ['master-cylinder', 'reservoir']),
  ...rows(75, 'bare wiring to exhaust; 40 with sleeve and shield', 'exhaust', ['wiring']),
  ...rows(25, 'to belt or pulley, belts stretch and whip; 40 on the slack side', 'belt', ['wiring', 'hose', 'line']),
  ...rows(40, 'knee and shin, with the pedal at rest and pressed; 50 is better', 'driver', ['dash', 'column']),
];

const ruleOf = (row: DefaultGap): PairRule => ({
  between: [{ category: row.between[0] }, { category: row.between[1] }],
  gap: row.gap,
});

/** Where a rule comes from: the table's words if it stands as the table has it, null if it is the shop's own. */
export function ruleOrigin(rule: PairRule): string | null {
  const key = pairKey(rule);
  const row = DEFAULT_GAPS.find((r) => pairKey(ruleOf(r)) === key);
  return row !== undefined && rule.gap === row.gap ? row.origin : null;
}

/** The table's row for a rule's pair, whatever gap the rule has now. */
export function defaultFor(rule: PairRule): DefaultGap | null {
  const key = pairKey(rule);
  return DEFAULT_GAPS.find((r) => pairKey(ruleOf(r)) === key) ?? null;
}

/** An empty scene with the table of gaps. */
export function newScene(name: string, display: Display): Scene {
  return {
    format: 'gapwright-scene',
    version: 1,
    name,
    display,
    lasers: [
      { id: 'centre-line', name: 'Centre line', point: [0, 0, 0], normal: [0, 1, 0] },
      { id: 'floor-line', name: 'Floor line', point: [0, 0, 0], normal: [0, 0, 1] },
    ],
    groups: [],
    components: [],
    rules: {
      gap: DEFAULT_GENERAL.gap.value,
      movingGap: DEFAULT_GENERAL.movingGap.value,
      touch: 0.01,
      pairs: DEFAULT_GAPS.map(ruleOf),
    },
    accuracy: 0.05,
  };
}
