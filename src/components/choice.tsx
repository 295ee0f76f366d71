// Boxes to tick: one alone, or one of several.
import { useId, type ComponentPropsWithRef, type ReactNode } from 'react';
import { classes } from './classes';

export interface CheckBoxProps extends Omit<ComponentPropsWithRef<'input'>, 'type'> {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
}

export function CheckBox({ label, hint, className, ...rest }: CheckBoxProps) {
  const id = useId();
  return (
    <div className={classes('tick-line flex items-center gap-2.5', className)}>
      <input
        id={id}
        type="checkbox"
        aria-describedby={hint ? `${id}-hint` : undefined}
        className="tick-box"
        {...rest}
      />
      <div>
        <label htmlFor={id}>{label}</label>
        {hint && (
          <div id={`${id}-hint`} className="text-sm text-soft">
            {hint}
          </div>
        )}
      </div>
    </div>
  );
}

export interface ChoiceOption<T extends string> {
  readonly value: T;
  readonly label: ReactNode;
  readonly hint?: ReactNode;
}

export interface ChoiceProps<T extends string> {
  readonly legend: string;
  readonly name: string;
  readonly value: T;
  readonly options: readonly ChoiceOption<T>[];
  readonly onChange: (value: T) => void;
  /** Side by side where there is room. */
  readonly inline?: boolean;
  readonly disabled?: boolean;
}

/** One of several, all of them in sight. */
export function Choice<T extends string>({
  legend,
  name,
  value,
  options,
  onChange,
  inline = false,
  disabled = false,
}: ChoiceProps<T>) {
  const id = useId();
  return (
    <fieldset disabled={disabled}>
      <legend className="mb-1 text-sm font-semibold">{legend}</legend>
      <div className={inline ? 'flex flex-wrap gap-x-6 gap-y-1' : 'grid gap-1'}>
        {options.map((option) => (
          <div key={option.value} className="tick-line flex items-center gap-2.5">
            <input
              id={`${id}-${option.value}`}
              type="radio"
              name={`${id}-${name}`}
              className="tick-box"
              checked={option.value === value}
              aria-describedby={option.hint ? `${id}-${option.value}-hint` : undefined}
              onChange={() => onChange(option.value)}
            />
            <div>
              <label htmlFor={`${id}-${option.value}`}>{option.label}</label>
              {option.hint && (
                <div id={`${id}-${option.value}-hint`} className="text-sm text-soft">
                  {option.hint}
                </div>
              )}
            </div>
          </div>
        ))}
      </div>
    </fieldset>
  );
}
