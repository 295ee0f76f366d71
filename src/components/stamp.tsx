import type { ReactNode } from 'react';
import { classes } from './classes';

const COLOURS = {
  hits: 'text-hits',
  tight: 'text-tight',
  clears: 'text-clears',
  seated: 'text-seated',
  loose: 'text-loose',
  ink: 'text-text',
  accent: 'text-accent',
} as const;

export interface StampProps {
  readonly colour?: keyof typeof COLOURS;
  readonly children: ReactNode;
  readonly className?: string;
}

/** Something put on paper with a rubber stamp: a verdict, a state. */
export const Stamp = ({ colour = 'ink', children, className }: StampProps) => (
  <span className={classes('stamp', COLOURS[colour], className)}>{children}</span>
);
