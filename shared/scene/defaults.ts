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
  /** Where the figure comes from, for the person who has to stand by it. */
  readonly origin: string;
}

const PRACTICE = 'common practice, no source';

/** General gaps of a new scene, mm. */
export const DEFAULT_GENERAL = {
  gap: { value: 6, origin: `${PRACTICE}: two fixed parts, room for a finger and for paint` },
  movingGap: { value: 12, origin: `${PRACTICE}: a moving part to anything, a finger's width` },
} as const;

/** The table of gaps by kind of part that a new scene begins with. */
export const DEFAULT_GAPS: readonly DefaultGap[] = [
  { between: ['pedal', 'pedal'], gap: 25, origin: `${PRACTICE}: arms apart, so that a shoe meets one pedal only` },
  { between: ['pedal', 'column'], gap: 12, origin: `${PRACTICE}: arm to column or shaft over the whole sweep` },
  { between: ['wiper', 'cowl'], gap: 8, origin: `${PRACTICE}: crank and link to anything` },
  { between: ['wiper', 'bracket'], gap: 8, origin: `${PRACTICE}: crank and link to anything` },
  { between: ['engine', 'firewall'], gap: 15, origin: `${PRACTICE}: engine to any fixed part, it rocks` },
  { between: ['engine', 'master-cylinder'], gap: 15, origin: `${PRACTICE}: engine to any fixed part, it rocks` },
  { between: ['engine', 'column'], gap: 15, origin: `${PRACTICE}: engine to any fixed part, it rocks` },
  { between: ['engine', 'inner-fender'], gap: 15, origin: `${PRACTICE}: engine to any fixed part, it rocks` },
  { between: ['engine', 'reservoir'], gap: 15, origin: `${PRACTICE}: engine to any fixed part, it rocks` },
  { between: ['hood', 'engine'], gap: 19, origin: `${PRACTICE}: hood shut over an engine that lifts` },
  { between: ['hood', 'master-cylinder'], gap: 12, origin: `${PRACTICE}: hood shut, with its pad` },
  { between: ['hood', 'reservoir'], gap: 12, origin: `${PRACTICE}: hood shut, with its pad` },
  { between: ['exhaust', 'line'], gap: 76, origin: `${PRACTICE}: brake or fuel line to exhaust, 3 in` },
  { between: ['exhaust', 'hose'], gap: 76, origin: `${PRACTICE}: brake or fuel line to exhaust, 3 in` },
  { between: ['exhaust', 'master-cylinder'], gap: 75, origin: `${PRACTICE}: cylinder to header, with a shield` },
  { between: ['exhaust', 'wiring'], gap: 75, origin: `${PRACTICE}: bare wiring to exhaust` },
  { between: ['belt', 'wiring'], gap: 25, origin: `${PRACTICE}: wiring to belt or pulley` },
  { between: ['belt', 'hose'], gap: 25, origin: `${PRACTICE}: hose to belt or pulley` },
  { between: ['driver', 'dash'], gap: 40, origin: `${PRACTICE}: knee and shin to dash` },
  { between: ['driver', 'column'], gap: 40, origin: `${PRACTICE}: knee and shin to column drop` },
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
