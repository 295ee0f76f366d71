// The door of the ready-made parts: a recipe with measurements gives solids, motions and holes.
export { RECIPES, recipeOf } from './shelf';
export { newPart, rebuildPart, STAND_IN_NOTE } from './part';
export type { NewPart, PartResult } from './part';
export { FORK_LENGTH, padDrop, pedalTravel } from './hanging-pedal';
export type { PedalMeasures, PedalTravel } from './hanging-pedal';
export { pedalPlaces } from './pedal-bracket';
export type {
  BuildResult,
  Built,
  ChoiceParam,
  Fact,
  Fault,
  NumberParam,
  Origin,
  Param,
  Params,
  ParamsResult,
  PartRecipe,
} from './types';
