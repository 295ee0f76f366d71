import { useState } from 'react';
import { LENGTH_EXAMPLE, lengthParts, MM_PER_INCH, parseLength, type LengthDisplay } from '#shared/units';
import { classes } from './classes';
import { Field, type FieldWords } from './field';
import { Fraction } from './fraction';
import { useDraft } from './use-draft';

export interface LengthFieldProps extends FieldWords {
  /** mm; null where nothing is set yet. */
  readonly value: number | null;
  /** mm, when a new value is right: Enter, leaving the field, or an arrow key. */
  readonly onCommit: (mm: number) => void;
  readonly display: LengthDisplay;
  /** What an arrow key adds, mm: 1/16 inch or 1 mm if left out. */
  readonly step?: number;
  /** `absolute` for positions that may be negative; see parseLength. */
  readonly signed?: 'relative' | 'absolute';
  /** The limits of what is taken, mm. */
  readonly least?: number;
  readonly most?: number;
  /** `measure`: a bare figure over a laser line, as on the tape. */
  readonly look?: 'form' | 'measure';
  readonly disabled?: boolean;
  readonly className?: string;
}

const sayLength = (mm: number, display: LengthDisplay): string => {
  const parts = lengthParts(mm, display);
  return parts.unit === 'mm' ? `${parts.text} mm` : `${parts.text}"`;
};

export function LengthField({
  value,
  onCommit,
  display,
  step,
  signed,
  least,
  most,
  look = 'form',
  disabled = false,
  error: outerError,
  ...words
}: LengthFieldProps) {
  const [isFocused, setFocused] = useState(false);
  const stepMm = step ?? (display === 'mm' ? 1 : MM_PER_INCH / 16);
  // a sixteenth may hide what was typed to a sixty-fourth
  const parts = value === null ? null : lengthParts(value, display, { denominator: 64 });
  const within = (mm: number): string | null => {
    if (least !== undefined && mm < least) return `Must be at least ${sayLength(least, display)}.`;
    if (most !== undefined && mm > most) return `Must be at most ${sayLength(most, display)}.`;
    return null;
  };
  const draft = useDraft<number>({
    shown: parts?.text ?? '',
    read: (text) => {
      const result = parseLength(text, {
        unit: display === 'mm' ? 'mm' : 'in',
        ...(value === null ? {} : { current: value }),
        ...(signed === undefined ? {} : { signed }),
      });
      if (!result.ok) return result;
      const fault = within(result.mm);
      return fault === null ? { ok: true, value: result.mm } : { ok: false, reason: fault };
    },
    onCommit,
    step: (times) => {
      const next = (value ?? 0) + times * stepMm;
      return value === null || within(next) !== null ? null : next;
    },
  });
  // at rest a real fraction is set over the field; while typing, the plain text shows
  const isSet = parts !== null && !isFocused && !draft.isEditing;
  return (
    <Field {...words} error={draft.error ?? outerError}>
      {(ids) => (
        <span className="relative block">
          <input
            {...ids}
            type="text"
            inputMode="text"
            autoComplete="off"
            spellCheck={false}
            data-drafting={draft.isEditing || undefined}
            disabled={disabled}
            placeholder={value === null ? LENGTH_EXAMPLE : undefined}
            className={classes('input figures', look === 'measure' && 'input-measure', isSet && '!text-transparent')}
            value={draft.text}
            onChange={(event) => draft.setText(event.target.value)}
            onFocus={(event) => {
              setFocused(true);
              event.currentTarget.select();
            }}
            onBlur={() => {
              setFocused(false);
              draft.commit();
            }}
            onKeyDown={draft.onKeyDown}
          />
          {isSet && (
            <span
              aria-hidden="true"
              className={classes(
                'pointer-events-none absolute inset-0 flex items-center px-[0.65rem]',
                look === 'measure' && 'justify-end text-[1.15rem] font-semibold',
                disabled && 'text-soft',
              )}
            >
              <Fraction parts={parts} />
            </span>
          )}
        </span>
      )}
    </Field>
  );
}
