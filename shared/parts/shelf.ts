// The shelf, in the order in which it is laid out.
import { booster } from './booster';
import { hangingPedal } from './hanging-pedal';
import { masterCylinder } from './master-cylinder';
import { pedalBracket } from './pedal-bracket';
import { reservoir } from './reservoir';
import { throttlePedal } from './throttle-pedal';
import type { PartRecipe } from './types';

export const RECIPES: readonly PartRecipe[] = [
  hangingPedal,
  pedalBracket,
  masterCylinder,
  reservoir,
  booster,
  throttlePedal,
];

export function recipeOf(kind: string): PartRecipe | null {
  return RECIPES.find((r) => r.kind === kind) ?? null;
}
