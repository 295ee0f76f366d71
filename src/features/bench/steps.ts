// Steps of nudging: by keys, by the tape's buttons, by the handles.
import { MM_PER_INCH, formatLength, type LengthDisplay } from '#shared/units';

const STEPS_IN = [1 / 16, 1 / 8, 1 / 4, 1 / 2, 1].map((n) => n * MM_PER_INCH);
const STEPS_MM = [1, 2, 5, 10, 25];

export const stepsFor = (display: LengthDisplay): readonly number[] => (display === 'mm' ? STEPS_MM : STEPS_IN);

/** The step in use, mm; one of another unit is none of this one's. */
export function stepFor(display: LengthDisplay, chosen: number | null): number {
  const steps = stepsFor(display);
  return chosen !== null && steps.includes(chosen) ? chosen : steps[0]!;
}

export const sayStep = (mm: number, display: LengthDisplay): string => formatLength(mm, display);

/** Degrees that turning goes by. */
export const TURN_STEP = 1;
