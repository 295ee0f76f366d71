// What all fields have in common: a label, a hint, a fault, tied to the control for readers of all kinds.
import { useId, type ReactNode } from 'react';
import { classes } from './classes';

export interface FieldWords {
  readonly label: string;
  /** What to enter, before it is wrong. */
  readonly hint?: ReactNode;
  /** What is wrong and what to do. */
  readonly error?: string | null;
  /** Shown with the label where a field may be left empty. */
  readonly optional?: boolean;
  /** The label is read out but not shown. */
  readonly labelHidden?: boolean;
}

export interface ControlIds {
  readonly id: string;
  readonly 'aria-describedby': string | undefined;
  readonly 'aria-invalid': true | undefined;
}

export interface FieldProps extends FieldWords {
  readonly className?: string;
  readonly children: (ids: ControlIds) => ReactNode;
}

export function Field({ label, hint, error, optional = false, labelHidden = false, className, children }: FieldProps) {
  const id = useId();
  const hasError = error !== undefined && error !== null && error !== '';
  const hasHint = hint !== undefined && hint !== null;
  const described = classes(hasHint && `${id}-hint`, hasError && `${id}-fault`);
  return (
    <div className={classes('grid content-start gap-1', className)}>
      <label htmlFor={id} className={labelHidden ? 'sr-only' : 'text-sm font-semibold'}>
        {label}
        {optional && <span className="font-normal text-soft"> (may stay empty)</span>}
      </label>
      {children({
        id,
        'aria-describedby': described === '' ? undefined : described,
        'aria-invalid': hasError ? true : undefined,
      })}
      {hasHint && (
        <div id={`${id}-hint`} className="text-sm text-soft">
          {hint}
        </div>
      )}
      <FieldFault id={`${id}-fault`} text={hasError ? error : null} />
    </div>
  );
}

/** Announced when it appears. */
export function FieldFault({ id, text }: { readonly id: string; readonly text: string | null }) {
  return (
    <div id={id} role="alert" className={classes('text-sm font-semibold text-hits', text === null && 'hidden')}>
      {text}
    </div>
  );
}
