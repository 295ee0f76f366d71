// How a dry fit is told while it runs and when it has ended.
import type { DryFit } from '#shared/api';
import { countOf } from '../../lib/format';

/** 0 to 1; null while nobody knows how much there is. */
export function shareOf({ state, done, total }: Pick<DryFit, 'state' | 'done' | 'total'>): number | null {
  if (state === 'queued' || total === 0) return null;
  return Math.min(1, done / total);
}

/** "12 of 340 findings". */
export function progressNote({ state, done, total }: Pick<DryFit, 'state' | 'done' | 'total'>): string {
  if (state === 'queued') return 'waiting for its turn';
  return total === 0 ? 'reading the parts' : `${done} of ${countOf(total, 'finding')}`;
}

/** The sentence for one that ended without a report. */
export function endSentence({ state, problem }: Pick<DryFit, 'state' | 'problem'>): string {
  if (state === 'cancelled') return 'Cancelled before it was through. Nothing of it was kept.';
  return problem ?? 'It failed, and left no word why. Run it again.';
}

/** What a list and a button say of one whose findings are all in order. */
export function isAllClear({ totals }: Pick<DryFit, 'totals'>): boolean {
  return totals !== null && totals.hits + totals.tight + totals.loose === 0;
}
