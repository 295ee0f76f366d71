// What a person types into a length field.
import { MM_PER_INCH, millimetres, type Millimetres } from './brands';
import { parsePlainNumber, plainText } from './parse-number';

export interface LengthOptions {
  /** The unit of a number that names none. */
  readonly unit: 'mm' | 'in';
  /** What stands in the field now, mm; `+1/8` adds to it. */
  readonly current?: number;
  /**
   * What a leading sign means. `relative` (the default where there is a current value): +1/8 and -1/8 change it.
   * `absolute`: -1/8 is a position on the other side of the datum, +1/8 still adds. `=-3/4` is absolute everywhere.
   */
  readonly signed?: 'relative' | 'absolute';
}

export type LengthResult =
  | { readonly ok: true; readonly mm: Millimetres; readonly relative: boolean }
  | { readonly ok: false; readonly reason: string };

const MM_PER_UNIT: Readonly<Record<string, number>> = {
  mm: 1,
  millimetre: 1,
  millimetres: 1,
  millimeter: 1,
  millimeters: 1,
  cm: 10,
  m: 1000,
  '"': MM_PER_INCH,
  in: MM_PER_INCH,
  'in.': MM_PER_INCH,
  inch: MM_PER_INCH,
  inches: MM_PER_INCH,
};

/** Longest length a field takes, mm: the document's own limit. */
const LONGEST = 100_000;

const refuse = (reason: string): LengthResult => ({ ok: false, reason });

/** An example of each accepted form, for hints and messages. */
export const LENGTH_EXAMPLE = '5 3/8, 5.375in or 136.5mm';

/** Reads a length. Takes `5 3/8`, `5-3/8"`, `5.375in`, `136.5 mm`, `136,5 mm`, `+1/8`; refuses `1,250`, saying why. */
export function parseLength(input: string, options: LengthOptions): LengthResult {
  const text = plainText(input);
  if (text === '') return refuse(`Type a length, like ${LENGTH_EXAMPLE}.`);
  const match = /^(=?) ?([+-]?) ?(.*?) ?("|[a-z]+\.?|'|)$/.exec(text);
  if (match === null) return refuse(`“${input.trim()}” is not a length. Type it like ${LENGTH_EXAMPLE}.`);
  const [, equals, sign, digits, unitText] = match as unknown as [string, string, string, string, string];
  if (unitText === "'" || unitText === 'ft' || unitText === 'feet' || unitText === 'foot') {
    return refuse('Feet are not used here. Type inches or millimetres.');
  }
  const perUnit = unitText === '' ? (options.unit === 'in' ? MM_PER_INCH : 1) : MM_PER_UNIT[unitText];
  if (perUnit === undefined) return refuse(`“${unitText}” is not a unit of length. Use mm or in.`);
  const number = parsePlainNumber(digits);
  if (!number.ok) return refuse(`${sentence(number.reason)}. Type it like ${LENGTH_EXAMPLE}.`);
  const size = number.value * perUnit;
  const mode = options.signed ?? (options.current === undefined ? 'absolute' : 'relative');
  const relative =
    equals === '' && options.current !== undefined && (sign === '+' || (sign === '-' && mode === 'relative'));
  const signed = sign === '-' ? -size : size;
  const mm = relative ? options.current + signed : signed;
  if (!Number.isFinite(mm) || Math.abs(mm) > LONGEST) return refuse('That is more than 100 m. Check the unit.');
  return { ok: true, mm: millimetres(mm + 0), relative };
}

function sentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
