// The door of review: the roll-call, the mounting of pedal boxes, the sentence that opens a report, the cautions.
export { CAUTIONS, CAUTION_BEFORE_WORK, CAUTION_SHORT } from './cautions';
export { movesOf } from './directions';
export type { Move } from './directions';
export { looseBoxes } from './mounting';
export type { LooseBox } from './mounting';
export { missingFrom, ROLL_CALL_KEYS, rollCall, rollCallLabel } from './roll-call';
export type { RollCallEntry, RollCallKey } from './roll-call';
export { decidingFinding, depthOf, freeingParts, poseParts, reportSentence, sentenceText } from './sentence';
export type { Sentence, SentencePart } from './sentence';
