// The camera as it was for the last picture, for whatever is drawn over it: projects points of the car to CSS px.
import type { Triple } from './vectors';

export interface Frame {
  readonly width: number;
  readonly height: number;
  /** Projection times view, column by column. */
  readonly matrix: readonly number[];
  readonly isSquare: boolean;
  /** mm a CSS px in a square-on look; null in perspective. */
  readonly millimetresPerPixel: number | null;
  readonly eye: Triple;
}

export interface Projected {
  readonly x: number;
  readonly y: number;
  /** CSS px a mm at this depth. */
  readonly perMm: number;
}

/** Null for a point behind the eye. */
export function project(frame: Frame, [x, y, z]: Triple): Projected | null {
  const m = frame.matrix;
  const w = m[3]! * x + m[7]! * y + m[11]! * z + m[15]!;
  if (w <= 1e-6) return null;
  const across = (m[0]! * x + m[4]! * y + m[8]! * z + m[12]!) / w;
  const up = (m[1]! * x + m[5]! * y + m[9]! * z + m[13]!) / w;
  // the second row's length is what 1 mm along the picture's up is worth
  const perMm = (Math.hypot(m[1]!, m[5]!, m[9]!) / w) * (frame.height / 2);
  return { x: (0.5 + across / 2) * frame.width, y: (0.5 - up / 2) * frame.height, perMm };
}

export interface FrameStore {
  readonly get: () => Frame | null;
  readonly set: (frame: Frame) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

export function createFrameStore(): FrameStore {
  let frame: Frame | null = null;
  const listeners = new Set<() => void>();
  return {
    get: () => frame,
    set: (next) => {
      frame = next;
      for (const listener of listeners) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
