// Lengths as they are set in print: real fractions, the unit beside them.
import { gapParts, lengthParts, type LengthDisplay, type LengthParts, type PrintOptions } from '#shared/units';

export interface FractionProps {
  readonly parts: LengthParts;
  /** Whether the unit is shown; it is always read out. */
  readonly unit?: boolean;
  readonly className?: string;
}

/** A length in its parts. */
export function Fraction({ parts, unit = true, className }: FractionProps) {
  const spoken = `${parts.text} ${parts.unit === 'mm' ? 'millimetres' : 'inches'}`;
  const minus = parts.sign === '-' ? '\u2212' : '';
  return (
    <span className={className}>
      <span className="sr-only">{spoken}</span>
      <span aria-hidden="true" className="figures whitespace-nowrap">
        {minus}
        {parts.whole}
        {parts.numerator !== 0 && (
          <span className="fraction">
            <span>{parts.numerator}</span>
            <span className="slash">{'\u2044'}</span>
            <span>{parts.denominator}</span>
          </span>
        )}
        {unit && (parts.unit === 'mm' ? <span className="text-[0.75em] font-normal"> mm</span> : '"')}
      </span>
    </span>
  );
}

export interface LengthProps {
  readonly mm: number;
  readonly display: LengthDisplay;
  readonly options?: PrintOptions;
  readonly unit?: boolean;
  readonly className?: string;
}

/** A length, rounded to the nearest. */
export function Length({ mm, display, options, ...rest }: LengthProps) {
  return <Fraction parts={lengthParts(mm, display, options)} {...rest} />;
}

/** A gap or margin, rounded so that it never looks clearer than it is. */
export function Gap({ mm, display, options, ...rest }: LengthProps) {
  return <Fraction parts={gapParts(mm, display, options)} {...rest} />;
}
