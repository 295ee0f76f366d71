// What a person types into an angle field: degrees, with point or comma.
import { degrees, type Degrees } from './brands';
import { isTooLong, parsePlainNumber, plainText } from './parse-number';

export type AngleResult =
  /** `relative`: the text changed the current value; `degrees` is the sum. */
  | { readonly ok: true; readonly degrees: Degrees; readonly relative: boolean }
  /** A sentence: what is wrong and what to type. */
  | { readonly ok: false; readonly reason: string };

/** Largest angle a field takes, degrees: the document's own limit. */
const LARGEST = 3600;

const refuse = (reason: string): AngleResult => ({ ok: false, reason });

/**
 * Reads an angle in degrees: `12.5`, `12,5°`, `-9 deg`; with a current value `+1` adds to it. Angles are negative as often
 * as not, so a minus is always the value itself; `=+1` is absolute.
 */
export function parseAngle(input: string, options: { readonly current?: number } = {}): AngleResult {
  if (isTooLong(input)) return refuse('That is too long for an angle. Type degrees, like 12.5.');
  const text = plainText(input);
  if (text === '') return refuse('Type an angle in degrees, like 12.5.');
  const match = /^(=?) ?([+-]?) ?(.*?) ?(°|deg|degrees?|)$/.exec(text);
  if (match === null) return refuse(`“${input.trim()}” is not an angle. Type degrees, like 12.5.`);
  const [, equals, sign, digits] = match as unknown as [string, string, string, string];
  const number = parsePlainNumber(digits);
  if (!number.ok) {
    const advice = number.saysHow ? '' : ' Type degrees, like 12.5.';
    return refuse(`“${input.trim()}” is not an angle: ${number.reason}.${advice}`);
  }
  const relative = equals === '' && sign === '+' && options.current !== undefined;
  const value = (relative ? options.current : 0) + (sign === '-' ? -number.value : number.value);
  if (!(Math.abs(value) <= LARGEST)) return refuse(`That is more than ${LARGEST} degrees. Type degrees, like 12.5.`);
  return { ok: true, degrees: degrees(value + 0), relative };
}
