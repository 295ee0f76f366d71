// What a person types into a length field.
//
// Signs. A field whose values are never negative (a size, a gap) reads `+1/8` and `-1/8` as changes of what stands in it.
// A field whose values may be negative (a position off a datum) reads `-1/8` as that position and only `+1/8` as a change:
// going back is typed as the new value. `=` in front makes any value absolute, in every field: `=-3/4`, `=+1/8`.
import { MM_PER_INCH, millimetres, type Millimetres } from './brands';
import { isTooLong, parsePlainNumber, plainText } from './parse-number';

export interface LengthOptions {
  /** The unit of a number that names none. */
  readonly unit: 'mm' | 'in';
  /** What stands in the field now, mm; without it nothing is relative. */
  readonly current?: number;
  /** What a leading minus means; see above. Left out: `relative` where there is a current value, else `absolute`. */
  readonly signed?: 'relative' | 'absolute';
}

export type LengthResult =
  /** `relative`: the text changed the current value; `mm` is the sum. */
  | { readonly ok: true; readonly mm: Millimetres; readonly relative: boolean }
  /** A sentence: what is wrong and what to type. */
  | { readonly ok: false; readonly reason: string };

const MM_PER_UNIT: ReadonlyMap<string, number> = new Map([
  ['mm', 1],
  ['millimetre', 1],
  ['millimetres', 1],
  ['millimeter', 1],
  ['millimeters', 1],
  ['cm', 10],
  ['m', 1000],
  ['"', MM_PER_INCH],
  ['in', MM_PER_INCH],
  ['in.', MM_PER_INCH],
  ['inch', MM_PER_INCH],
  ['inches', MM_PER_INCH],
]);

/** Longest length a field takes, mm: the document's own limit. */
const LONGEST = 100_000;

const refuse = (reason: string): LengthResult => ({ ok: false, reason });

/** An example of each accepted form, for hints and messages. */
export const LENGTH_EXAMPLE = '5 3/8, 5.375in or 136.5mm';

/** Reads a length. Takes `5 3/8`, `5-3/8"`, `5.375in`, `136.5 mm`, `136,5 mm`, `+1/8`; refuses `1,250`, saying why. */
export function parseLength(input: string, options: LengthOptions): LengthResult {
  if (isTooLong(input)) return refuse(`That is too long for a length. Type it like ${LENGTH_EXAMPLE}.`);
  const text = plainText(input);
  if (text === '') return refuse(`Type a length, like ${LENGTH_EXAMPLE}.`);
  if (/'|(^|[^a-z])(ft|feet|foot)([^a-z]|$)/.test(text)) {
    return refuse('Feet are not used here. Type inches or millimetres.');
  }
  const match = /^(=?) ?([+-]?) ?(.*?) ?("|[a-z]+\.?|)$/.exec(text);
  if (match === null) return refuse(`“${input.trim()}” is not a length. Type it like ${LENGTH_EXAMPLE}.`);
  const [, equals, sign, digits, unitText] = match as unknown as [string, string, string, string, string];
  const perUnit = unitText === '' ? (options.unit === 'in' ? MM_PER_INCH : 1) : MM_PER_UNIT.get(unitText);
  if (perUnit === undefined) {
    return digits === ''
      ? refuse(`“${input.trim()}” is not a length. Type it like ${LENGTH_EXAMPLE}.`)
      : refuse(`“${unitText}” is not a unit of length. Use mm or in.`);
  }
  const number = parsePlainNumber(digits);
  if (!number.ok) {
    const advice = number.saysHow ? '' : ` Type it like ${LENGTH_EXAMPLE}.`;
    return refuse(`${sentence(number.reason)}.${advice}`);
  }
  const size = number.value * perUnit;
  const mode = options.signed ?? (options.current === undefined ? 'absolute' : 'relative');
  const relative =
    equals === '' && options.current !== undefined && (sign === '+' || (sign === '-' && mode === 'relative'));
  const signed = sign === '-' ? -size : size;
  const mm = relative ? options.current + signed : signed;
  if (!Number.isFinite(mm) || Math.abs(mm) > LONGEST) return refuse('That is more than 100 m. Check the unit.');
  // + 0 makes -0 a plain 0
  return { ok: true, mm: millimetres(mm + 0), relative };
}

function sentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
