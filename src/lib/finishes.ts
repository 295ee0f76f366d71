// Which shop finish a part wears, by its category. The colours themselves are tokens.
import type { Category } from '#shared/scene';

export const FINISHES = [
  'primer-grey',
  'red-oxide',
  'etch-green',
  'zinc-yellow',
  'raw-aluminium',
  'cadmium-gold',
  'black-oxide',
  'ghost',
] as const;
export type Finish = (typeof FINISHES)[number];

export const FINISH_NAME: Readonly<Record<Finish, string>> = {
  'primer-grey': 'primer grey',
  'red-oxide': 'red oxide',
  'etch-green': 'etch-primer green',
  'zinc-yellow': 'zinc yellow',
  'raw-aluminium': 'raw aluminium',
  'cadmium-gold': 'cadmium gold',
  'black-oxide': 'black oxide',
  ghost: 'clear',
};

const FINISH_OF: Readonly<Record<Category, Finish>> = {
  firewall: 'primer-grey',
  cowl: 'primer-grey',
  'toe-board': 'primer-grey',
  floor: 'primer-grey',
  tunnel: 'primer-grey',
  'inner-fender': 'etch-green',
  'fender-liner': 'etch-green',
  hood: 'ghost',
  dash: 'ghost',
  column: 'raw-aluminium',
  pedal: 'black-oxide',
  'pedal-box': 'black-oxide',
  'master-cylinder': 'raw-aluminium',
  reservoir: 'cadmium-gold',
  booster: 'cadmium-gold',
  throttle: 'raw-aluminium',
  wiper: 'zinc-yellow',
  heater: 'zinc-yellow',
  engine: 'red-oxide',
  exhaust: 'red-oxide',
  belt: 'red-oxide',
  line: 'cadmium-gold',
  hose: 'cadmium-gold',
  wiring: 'zinc-yellow',
  seat: 'etch-green',
  driver: 'ghost',
  bracket: 'black-oxide',
  other: 'primer-grey',
};

export const finishOf = (category: Category): Finish => FINISH_OF[category];
