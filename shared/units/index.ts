// The door of units: what people type and read, trigonometry and placements.
export { MM_PER_INCH, degrees, millimetres } from './brands';
export type { Degrees, LengthDisplay, Millimetres } from './brands';
export { parseAngle } from './parse-angle';
export type { AngleResult } from './parse-angle';
export { LENGTH_EXAMPLE, parseLength } from './parse-length';
export type { LengthOptions, LengthResult } from './parse-length';
export { formatAngle, formatGap, formatLength, formatNeed, formatPercent, gapParts, lengthParts } from './print';
export type { LengthParts, PrintOptions, Rounding } from './print';
export {
  applyRigid,
  composeRigid,
  identityRigid,
  invertRigid,
  rigidFromPose,
  rigidFromSlide,
  rigidFromSwing,
  turnByRigid,
} from './rigid';
export type { Rigid } from './rigid';
export { atan2Degrees, atan2Radians, radiansOf, sinCosDegrees } from './trig';
