// How findings are said on the bench: as everywhere else.
export { findingKey, heightOf, motionName, nameOf, pairName, readingOf } from '../../lib/finding-words';
export type { Reading } from '../../lib/finding-words';
