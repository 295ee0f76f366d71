// What every board of the shelf is given.
import type { RollCallKey } from '#shared/review';
import type { Component } from '#shared/scene';
import type { Triple } from '../viewport/vectors';

export interface BoardProps {
  /** What the roll-call misses, if the shelf was opened from there. */
  readonly wanted: RollCallKey | null;
  /** Where a new part goes. */
  readonly at: () => Triple;
  readonly onPlace: (component: Component) => void;
}
