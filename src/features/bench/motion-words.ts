// Where a motion stands, in words: as everywhere else.
export { sayPosition, sayStepValue, stepAt, strokeEnds } from '../../lib/motion-words';
