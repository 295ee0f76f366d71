// Which kinds of part answer which entry of the roll-call.
import { RECIPES } from '#shared/parts';
import type { RollCallKey } from '#shared/review';
import type { Category } from '#shared/scene';

export const CATEGORY_FOR: Readonly<Record<RollCallKey, Category>> = {
  column: 'column',
  wiper: 'wiper',
  heater: 'heater',
  liner: 'fender-liner',
  hood: 'hood',
  engine: 'engine',
  exhaust: 'exhaust',
  booster: 'booster',
  lines: 'line',
  seat: 'seat',
  throttle: 'throttle',
};

export const isFor = (key: RollCallKey | null, category: Category): boolean =>
  key !== null && CATEGORY_FOR[key] === category;

export const hasRecipe = (key: RollCallKey): boolean => RECIPES.some((r) => isFor(key, r.category));
