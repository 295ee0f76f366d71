import { formatAngle, parseAngle } from '#shared/units';
import { classes } from './classes';
import { Field, type FieldWords } from './field';
import { useDraft } from './use-draft';

export interface AngleFieldProps extends FieldWords {
  readonly value: number;
  readonly onCommit: (degrees: number) => void;
  /** What an arrow key adds, degrees; 1 if left out. */
  readonly step?: number;
  readonly least?: number;
  readonly most?: number;
  readonly look?: 'form' | 'measure';
  readonly disabled?: boolean;
  readonly className?: string;
}

export function AngleField({
  value,
  onCommit,
  step = 1,
  least,
  most,
  look = 'form',
  disabled = false,
  error: outerError,
  ...words
}: AngleFieldProps) {
  const within = (x: number): string | null => {
    if (least !== undefined && x < least) return `Must be at least ${formatAngle(least)}.`;
    if (most !== undefined && x > most) return `Must be at most ${formatAngle(most)}.`;
    return null;
  };
  const draft = useDraft<number>({
    shown: formatAngle(value, { decimals: 2 }),
    read: (text) => {
      const result = parseAngle(text, { current: value });
      if (!result.ok) return result;
      const fault = within(result.degrees);
      return fault === null ? { ok: true, value: result.degrees } : { ok: false, reason: fault };
    },
    onCommit,
    step: (times) => (within(value + times * step) === null ? value + times * step : null),
  });
  return (
    <Field {...words} error={draft.error ?? outerError}>
      {(ids) => (
        <input
          {...ids}
          type="text"
          autoComplete="off"
          spellCheck={false}
          data-drafting={draft.isEditing || undefined}
          disabled={disabled}
          className={classes('input figures', look === 'measure' && 'input-measure')}
          value={draft.text}
          onChange={(event) => draft.setText(event.target.value)}
          onFocus={(event) => event.currentTarget.select()}
          onBlur={draft.commit}
          onKeyDown={draft.onKeyDown}
        />
      )}
    </Field>
  );
}
