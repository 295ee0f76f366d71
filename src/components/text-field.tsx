import type { ComponentPropsWithRef, ReactNode } from 'react';
import { classes } from './classes';
import { Field, type FieldWords } from './field';

type Own = FieldWords & { readonly className?: string };

const split = <T extends Own>({ label, hint, error, optional, labelHidden, className, ...control }: T) => ({
  words: { label, hint, error, optional, labelHidden, className },
  control,
});

export type TextFieldProps = Own & Omit<ComponentPropsWithRef<'input'>, 'className'>;

export function TextField(props: TextFieldProps) {
  const { words, control } = split(props);
  return (
    <Field {...words}>
      {(ids) => <input type="text" autoComplete="off" {...control} {...ids} className="input" />}
    </Field>
  );
}

export type TextAreaProps = Own & Omit<ComponentPropsWithRef<'textarea'>, 'className'>;

export function TextArea(props: TextAreaProps) {
  const { words, control } = split(props);
  return (
    <Field {...words}>
      {(ids) => <textarea rows={4} {...control} {...ids} className={classes('input', 'min-h-24')} />}
    </Field>
  );
}

export type SelectProps = Own & Omit<ComponentPropsWithRef<'select'>, 'className'> & { readonly children: ReactNode };

/** The browser's own list: it works with every input device and reader. */
export function Select(props: SelectProps) {
  const { words, control } = split(props);
  return <Field {...words}>{(ids) => <select {...control} {...ids} className="input select" />}</Field>;
}
