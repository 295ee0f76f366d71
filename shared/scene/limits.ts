// The limits of the scene document. Beyond them a document is refused, never cut down.

export const MAX_DOCUMENT_BYTES = 4 * 1024 * 1024;
export const MAX_COMPONENTS = 500;
export const MAX_SOLIDS = 2000;
export const MAX_MOTIONS = 16;
export const MAX_STEPS = 32;
/** Degrees of one motion's swings together. */
export const MAX_SWING = 3600;
/** mm of one motion's slides together. */
export const MAX_SLIDE = 20_000;
/** mm from the origin. */
export const MAX_REACH = 100_000;
export const LEAST_ACCURACY = 0.0001;
export const MAX_NAME = 120;
export const MAX_NOTE = 2000;

/** More faults than a person reads: the list of refusals ends here, per list of the document and in all. */
export const MAX_REFUSALS = 100;
