import type { ComponentPropsWithRef } from 'react';
import { classes } from './classes';
import { Hint } from './hint';

export interface IconButtonProps extends Omit<ComponentPropsWithRef<'button'>, 'aria-label'> {
  /** What it does; read out, and shown as a hint. */
  readonly label: string;
  /** Leave the hint away where the button opens something that says it at once. */
  readonly hint?: boolean;
}

export function IconButton({ label, hint = true, className, children, ...rest }: IconButtonProps) {
  const button = (
    <button type="button" aria-label={label} className={classes('icon-button', className)} {...rest}>
      {children}
    </button>
  );
  return hint ? <Hint text={label}>{button}</Hint> : button;
}
