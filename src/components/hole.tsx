import type { CSSProperties } from 'react';
import { classes } from './classes';

export interface HoleProps {
  /** What is seen through it: the ground under the tag. */
  readonly through?: string;
  /** Reinforced with a ring. */
  readonly ring?: boolean;
  readonly className?: string;
}

/** A punched hole. */
export const Hole = ({ through, ring = false, className }: HoleProps) => (
  <span
    aria-hidden="true"
    className={classes('hole', ring && 'hole-ring', className)}
    style={through === undefined ? undefined : ({ '--hole': through } as CSSProperties)}
  />
);
