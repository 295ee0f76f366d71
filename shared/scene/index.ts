// The door of the scene document.
export * from './limits';
export { loadScene, loadSceneText } from './load';
export type { LoadResult } from './load';
export { CURRENT_VERSION, migrate, MIGRATIONS } from './migrations';
export type { Migration } from './migrations';
export { poseFromRigid, rigidOf, worldPose } from './pose';
export type { Refusal } from './references';
export { pathText, refusalsOf } from './refusals';
export { meshPathFault, sceneSchema } from './schema';
export { CATEGORIES, SOURCES } from './types';
export type {
  BoxShape,
  Category,
  Component,
  CylinderShape,
  Display,
  Group,
  Hole,
  Laser,
  MeshShape,
  Motion,
  PairRule,
  Pose,
  Recipe,
  Rules,
  Scene,
  Shape,
  Side,
  SlideStep,
  Solid,
  Source,
  Step,
  SwingStep,
  Vec3,
} from './types';
export { canonicalSceneText, sceneForExport } from './canonical';
export { fixedSolids, movedSolids, operatingMotions, serviceMotions } from './motions';
export {
  DEFAULT_GAPS,
  DEFAULT_GENERAL,
  defaultFor,
  defaultTolerance,
  isBodyPanel,
  newScene,
  ruleOrigin,
} from './defaults';
export type { DefaultGap } from './defaults';
export { applyDifference } from './apply-difference';
export type { ApplyResult } from './apply-difference';
export { differenceSchema } from './difference-schema';
export { diffScenes, invertDifference, isEmptyDifference, pairKey, sameValue, touchedComponents } from './differences';
export type { Difference } from './differences';
export * from './edit-components';
export * from './edit-groups';
export * from './edit-lasers';
export * from './edit-rules';
export * from './edit-solids';
export { edits } from './named-edits';
export type { NamedEdit } from './named-edits';
