// Where a motion stands, in words and figures.
import type { Motion, Step } from '#shared/scene';
import { formatAngle, formatLength, formatPercent, type LengthDisplay } from '#shared/units';

/** The value of the step under way at a position 0 to 1. */
export function stepAt(motion: Motion, position: number): { readonly step: Step; readonly value: number } | null {
  const n = motion.steps.length;
  const i = Math.min(n - 1, Math.max(0, Math.floor(position * n)));
  const step = motion.steps[i];
  if (step === undefined) return null;
  return { step, value: step.from + (position * n - i) * (step.to - step.from) };
}

export function sayStepValue(step: Step, value: number, display: LengthDisplay): string {
  return step.kind === 'swing' ? formatAngle(value) : formatLength(value, display);
}

/** `62 % · 15.1°`. */
export function sayPosition(motion: Motion, position: number, display: LengthDisplay): string {
  const found = stepAt(motion, position);
  const share = formatPercent(position);
  return found === null ? share : `${share} \u00b7 ${sayStepValue(found.step, found.value, display)}`;
}

/** What the two ends of a stroke are called. */
export function strokeEnds(motion: Motion, category: string): readonly [string, string] {
  if (motion.use === 'service') return ['fitted', 'out'];
  return category === 'pedal' || category === 'throttle' ? ['rest', 'bottoms out'] : ['start', 'end'];
}
