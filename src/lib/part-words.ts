// US and UK names of parts. Only the product's own words are turned; names that people gave stay as they are.
import type { Category } from '#shared/scene';

export type WordChoice = 'us' | 'uk';

/** US to UK, longer phrases first so that "inner fender" is not read as "fender". */
const PAIRS: readonly (readonly [string, string])[] = [
  ['inner fender', 'inner wing'],
  ['fender liner', 'wing liner'],
  ['fender', 'wing'],
  ['firewall', 'bulkhead'],
  ['hood', 'bonnet'],
  ['cowl', 'scuttle'],
];
const PATTERN = new RegExp(`\\b(${PAIRS.map(([us]) => us).join('|')})(s?)\\b`, 'gi');
const TO_UK = new Map(PAIRS);

/** A text of the product's own, in the person's words. */
export function inWords(text: string, choice: WordChoice): string {
  if (choice === 'us') return text;
  return text.replace(PATTERN, (_, found: string, plural: string) => {
    const uk = TO_UK.get(found.toLowerCase()) ?? found;
    const first = found.charAt(0);
    const isCapital = first !== first.toLowerCase();
    return `${isCapital ? uk.charAt(0).toUpperCase() + uk.slice(1) : uk}${plural}`;
  });
}

const LABELS: Readonly<Record<Category, string>> = {
  firewall: 'firewall',
  cowl: 'cowl',
  'toe-board': 'toe board',
  floor: 'floor',
  tunnel: 'tunnel',
  'inner-fender': 'inner fender',
  'fender-liner': 'fender liner',
  hood: 'hood',
  dash: 'dash',
  column: 'steering column',
  pedal: 'pedal',
  'pedal-box': 'pedal box',
  'master-cylinder': 'master cylinder',
  reservoir: 'reservoir',
  booster: 'brake booster',
  throttle: 'throttle',
  wiper: 'wiper',
  heater: 'heater',
  engine: 'engine',
  exhaust: 'exhaust',
  belt: 'belt drive',
  line: 'line',
  hose: 'hose',
  wiring: 'wiring',
  seat: 'seat',
  driver: 'driver',
  bracket: 'bracket',
  other: 'other',
};

/** The label of a part's category. */
export function categoryLabel(category: Category, choice: WordChoice): string {
  return inWords(LABELS[category], choice);
}
