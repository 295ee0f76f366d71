// The roll-call: what belongs in a firewall zone, and whether it is there. The worst mistake is a part that was left out, so
// a thing is placed, or said not to be on this car, or missing; there is no fourth.
import type { Component, Scene } from '#shared/scene';

export const ROLL_CALL_KEYS = [
  'column',
  'wiper',
  'heater',
  'liner',
  'hood',
  'engine',
  'exhaust',
  'booster',
  'lines',
  'seat',
  'throttle',
] as const;
export type RollCallKey = (typeof ROLL_CALL_KEYS)[number];

export interface RollCallEntry {
  readonly key: RollCallKey;
  /** As the shop calls it, without article. */
  readonly label: string;
  readonly state: 'placed' | 'not-on-this-car' | 'missing';
  /** Components that stand for it. */
  readonly components: readonly string[];
  /** Where only a part of it is placed: what lacks ("joint", "accessories"). */
  readonly lacks: string | null;
}

interface Item {
  readonly label: string;
  readonly fits: (c: Component) => boolean;
  /** A second thing that the entry needs, found among all components. */
  readonly also?: { readonly name: string; readonly fits: (c: Component) => boolean };
}

const named = (c: Component, words: RegExp): boolean =>
  words.test(c.name) || c.solids.some((s) => words.test(s.name ?? '') || words.test(s.id.replaceAll('-', ' ')));

const JOINT = /\b(u-?joint|joint|coupling|universal)\b/i;
const ACCESSORIES =
  /\b(accessor(y|ies)|alternator|generator|dynamo|compressor|pump|pulley|belt|fan|distributor|starter|air cleaner|water neck)\b/i;

const ITEMS: Readonly<Record<RollCallKey, Item>> = {
  column: {
    label: 'steering column and joint',
    fits: (c) => c.category === 'column',
    also: { name: 'joint', fits: (c) => c.category === 'column' && named(c, JOINT) },
  },
  wiper: { label: 'wiper motor and linkage', fits: (c) => c.category === 'wiper' },
  heater: { label: 'heater', fits: (c) => c.category === 'heater' },
  liner: { label: 'fender liner', fits: (c) => c.category === 'fender-liner' },
  hood: { label: 'hood', fits: (c) => c.category === 'hood' },
  engine: {
    label: 'engine with accessories',
    fits: (c) => c.category === 'engine',
    also: {
      name: 'accessories',
      fits: (c) => c.category === 'belt' || (c.category === 'engine' && named(c, ACCESSORIES)),
    },
  },
  exhaust: { label: 'exhaust', fits: (c) => c.category === 'exhaust' },
  booster: { label: 'brake booster', fits: (c) => c.category === 'booster' },
  lines: { label: 'lines and hoses', fits: (c) => c.category === 'line' || c.category === 'hose' },
  seat: { label: 'seat', fits: (c) => c.category === 'seat' },
  throttle: { label: 'throttle', fits: (c) => c.category === 'throttle' },
};

/** The label of an entry, as in a sentence. */
export function rollCallLabel(key: RollCallKey): string {
  return ITEMS[key].label;
}

/** Calls the roll of a scene; `absent` are the things that the shop says are not on this car. */
export function rollCall(scene: Scene, absent: readonly RollCallKey[]): RollCallEntry[] {
  return ROLL_CALL_KEYS.map((key) => {
    const item = ITEMS[key];
    const found = scene.components.filter(item.fits);
    const lacks = item.also !== undefined && !scene.components.some(item.also.fits) ? item.also.name : null;
    const whole = found.length > 0 && lacks === null;
    const state = whole ? 'placed' : found.length === 0 && absent.includes(key) ? 'not-on-this-car' : 'missing';
    return {
      key,
      label: item.label,
      state,
      components: found.map((c) => c.id),
      lacks: found.length > 0 ? lacks : null,
    };
  });
}

/** The entries that are missing, whole or in part. */
export function missingFrom(entries: readonly RollCallEntry[]): RollCallEntry[] {
  return entries.filter((e) => e.state === 'missing');
}
