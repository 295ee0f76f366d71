// Lengths as people read them. A gap is rounded down and a need is rounded up, so that no figure ever looks clearer than
// what it stands for.
// A field that is typed into is printed without a locale: 5.375 in a language with a decimal comma would be `5,375`, which
// parseLength refuses as it may mean five thousand. All other forms are read back to the printed step.
import { MM_PER_INCH, type LengthDisplay } from './brands';

export interface LengthParts {
  readonly sign: '' | '-';
  /** Whole units, or the whole decimal number as text. Empty where only a fraction is left. */
  readonly whole: string;
  /** 0 if there is no fraction. */
  readonly numerator: number;
  readonly denominator: number;
  readonly unit: 'mm' | 'in';
  /** All of it as plain text without unit: `5 3/8`, `136.5`. */
  readonly text: string;
}

export type Rounding = 'nearest' | 'down' | 'up';

export interface PrintOptions {
  /** Finest fraction of an inch: 16 by default (32 for gaps and needs), 64 at most. */
  readonly denominator?: 8 | 16 | 32 | 64;
  /** Decimals for `mm` (1) and `in-decimal` (3). */
  readonly decimals?: number;
  readonly rounding?: Rounding;
  /** The person's language, for the decimal sign; a point if left out. */
  readonly locale?: string;
}

/** Slack for what is a whole step but for the last bits of a division. */
const WHOLE = 1e-9;

function toSteps(x: number, rounding: Rounding): number {
  const near = Math.round(x);
  if (rounding === 'nearest' || Math.abs(x - near) < WHOLE) return near;
  return rounding === 'down' ? Math.floor(x) : Math.ceil(x);
}

/** Rounds by size, not by value: `down` is towards zero for both signs. */
function signedSteps(x: number, rounding: Rounding): number {
  return x < 0 ? -toSteps(-x, rounding) : toSteps(x, rounding);
}

function decimalParts(value: number, decimals: number, options: PrintOptions, unit: 'mm' | 'in'): LengthParts {
  const scale = 10 ** decimals;
  const steps = signedSteps(value * scale, options.rounding ?? 'nearest');
  const size = Math.abs(steps) / scale;
  const whole =
    options.locale === undefined
      ? trimZeros(size.toFixed(decimals))
      : new Intl.NumberFormat(options.locale, { maximumFractionDigits: decimals, useGrouping: false }).format(size);
  const sign = steps < 0 ? '-' : '';
  return { sign, whole, numerator: 0, denominator: 1, unit, text: `${sign}${whole}` };
}

function trimZeros(text: string): string {
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

function fractionParts(inches: number, options: PrintOptions): LengthParts {
  let denominator: number = options.denominator ?? 16;
  const steps = signedSteps(inches * denominator, options.rounding ?? 'nearest');
  const sign = steps < 0 ? '-' : '';
  const size = Math.abs(steps);
  const units = Math.floor(size / denominator);
  let numerator = size % denominator;
  while (numerator > 0 && numerator % 2 === 0) {
    numerator /= 2;
    denominator /= 2;
  }
  if (numerator === 0)
    return { sign, whole: `${units}`, numerator, denominator: 1, unit: 'in', text: `${sign}${units}` };
  const whole = units === 0 ? '' : `${units}`;
  return {
    sign,
    whole,
    numerator,
    denominator,
    unit: 'in',
    text: `${sign}${whole === '' ? '' : `${whole} `}${numerator}/${denominator}`,
  };
}

/** A length in its parts, so that a screen can set a real fraction. `mm` is in millimetres. */
export function lengthParts(mm: number, display: LengthDisplay, options: PrintOptions = {}): LengthParts {
  if (display === 'mm') return decimalParts(mm, options.decimals ?? 1, options, 'mm');
  if (display === 'in-decimal') return decimalParts(mm / MM_PER_INCH, options.decimals ?? 3, options, 'in');
  return fractionParts(mm / MM_PER_INCH, options);
}

/** A length as plain text with its unit: `5 3/8"`, `5.375"`, `136.5 mm`. */
export function formatLength(mm: number, display: LengthDisplay, options: PrintOptions = {}): string {
  const parts = lengthParts(mm, display, options);
  return parts.unit === 'mm' ? `${parts.text} mm` : `${parts.text}"`;
}

/**
 * A gap or margin that is there, rounded so that it never looks clearer than it is: a positive one down, a negative one
 * (what is lacking) up in size.
 */
export function gapParts(mm: number, display: LengthDisplay, options: PrintOptions = {}): LengthParts {
  return lengthParts(mm, display, { denominator: 32, ...options, rounding: mm < 0 ? 'up' : 'down' });
}

/** As gapParts, as text with unit. */
export function formatGap(mm: number, display: LengthDisplay, options: PrintOptions = {}): string {
  return formatLength(mm, display, { denominator: 32, ...options, rounding: mm < 0 ? 'up' : 'down' });
}

/** A length that is needed (a required gap, a move that frees): rounded up in size. */
export function formatNeed(mm: number, display: LengthDisplay, options: PrintOptions = {}): string {
  return formatLength(mm, display, { denominator: 32, ...options, rounding: 'up' });
}

/** An angle as text: `12.5°`. */
export function formatAngle(
  degrees: number,
  options: { readonly decimals?: number; readonly locale?: string } = {},
): string {
  return `${decimalParts(degrees, options.decimals ?? 1, { locale: options.locale }, 'mm').text}°`;
}

/** A share 0 to 1 as whole per cent: `62 %`; with a locale as that language writes it. */
export function formatPercent(share: number, options: { readonly locale?: string } = {}): string {
  if (options.locale === undefined) return `${Math.round(share * 100)} %`;
  return new Intl.NumberFormat(options.locale, { style: 'percent', maximumFractionDigits: 0 }).format(share);
}
