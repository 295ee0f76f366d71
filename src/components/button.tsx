import type { ComponentPropsWithRef } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { classes } from './classes';

/** `main`: the one thing to do here. `plain`: other things. `danger`: takes something away. `text`: a side path. */
export type ButtonKind = 'main' | 'plain' | 'danger' | 'text';
export type ButtonSize = 'usual' | 'small';

const look = (kind: ButtonKind, size: ButtonSize, more?: string): string =>
  kind === 'text'
    ? classes('button-text', size === 'small' && 'text-sm', more)
    : classes(
        'button cut',
        kind === 'main' && 'button-main',
        kind === 'danger' && 'button-danger',
        size === 'small' && 'button-small',
        more,
      );

export interface ButtonProps extends ComponentPropsWithRef<'button'> {
  readonly kind?: ButtonKind;
  readonly size?: ButtonSize;
  /** Under way: the button says so and takes no second press, but keeps the focus. */
  readonly busy?: boolean;
}

export function Button({
  kind = 'plain',
  size = 'usual',
  busy = false,
  className,
  onClick,
  children,
  ...rest
}: ButtonProps) {
  return (
    <button
      type="button"
      aria-disabled={busy || undefined}
      aria-busy={busy || undefined}
      className={look(kind, size, className)}
      onClick={(event) => {
        if (busy) event.preventDefault();
        else onClick?.(event);
      }}
      {...rest}
    >
      {children}
      {busy && <span aria-hidden="true">…</span>}
    </button>
  );
}

export interface ButtonLinkProps extends LinkProps {
  readonly kind?: ButtonKind;
  readonly size?: ButtonSize;
}

export function ButtonLink({ kind = 'plain', size = 'usual', className, ...rest }: ButtonLinkProps) {
  return <Link className={look(kind, size, className)} {...rest} />;
}
