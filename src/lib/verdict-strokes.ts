// The marks of verdicts as paths in a square of 16 by 16 px around the origin: the same signs as on paper.
import type { Verdict } from '#shared/check';

export interface VerdictStroke {
  readonly d: string;
  readonly width: number;
  readonly round?: boolean;
  readonly opacity?: number;
}

export const VERDICT_STROKES: Readonly<Record<Verdict, readonly VerdictStroke[]>> = {
  hits: [
    { d: 'M-7-7H7V7H-7Z M-7-2-2-7M-7 3 3-7M-7 7 7-7M-3 7 7-3M2 7 7 2', width: 0.9, opacity: 0.75 },
    { d: 'M-4.8-4.8 4.8 4.8M4.8-4.8-4.8 4.8', width: 2.8 },
  ],
  tight: [{ d: 'M-5.4 6-1-6M.6 6 5-6', width: 2.4, round: true }],
  clears: [{ d: 'M-6 .6-2 5 6-5', width: 1.6 }],
  seated: [{ d: 'M0-6.8 5.9-3.4v6.8L0 6.8-5.9 3.4v-6.8z M3 0A3 3 0 1 1 2.99-.2', width: 1.4 }],
  loose: [
    { d: 'M1.4-5.8A6 6 0 1 1-1.8-5.7', width: 2 },
    { d: 'M1-7.4 1.5-4.2M-1.3-7.1-1.9-4.1', width: 1.2 },
  ],
};
