// Numbers as people type them in a shop: decimals with point or comma, whole and fraction, real fraction characters.

export type NumberResult =
  | { readonly ok: true; readonly value: number }
  /** `saysHow`: the reason already says what to type instead. */
  | { readonly ok: false; readonly reason: string; readonly saysHow: boolean };

/** More characters than any length or angle needs; what is longer was pasted by mistake. */
const LONGEST_TEXT = 60;

const FRACTION_CHARACTERS: Readonly<Record<string, string>> = {
  '½': '1/2',
  '¼': '1/4',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
  '⅓': '1/3',
  '⅔': '2/3',
  '⅕': '1/5',
  '⅙': '1/6',
};

/** True for a text that is too long to be a number. */
export function isTooLong(text: string): boolean {
  return text.length > LONGEST_TEXT;
}

/** One spelling for each character: plain minus, slash, inch and foot mark, degree sign and blanks; fractions written out. */
export function plainText(text: string): string {
  return text
    .replace(/[½¼¾⅛⅜⅝⅞⅓⅔⅕⅙]/g, (c) => ` ${FRACTION_CHARACTERS[c]!}`)
    .replace(/[⁄∕]/g, '/')
    .replace(/[−–—‒‑‐]/g, '-')
    .replace(/[′‘’ʹ]/g, "'")
    .replace(/[″”“„‟ʺ]|''/g, '"')
    .replace(/º/g, '°')
    .replace(/\s+/g, ' ')
    .trim()
    .toLowerCase();
}

const refuse = (reason: string, saysHow = false): NumberResult => ({ ok: false, reason, saysHow });

function decimal(text: string): NumberResult {
  if (!text.includes(',')) return { ok: true, value: Number(text) };
  const [whole, part] = text.split(',') as [string, string];
  // 1,250 is one and a quarter to one reader and twelve hundred and fifty to the next; a leading zero settles it
  if (part.length === 3 && /[1-9]/.test(whole)) {
    const large = `${whole}${part}`;
    const small = `${whole}.${part}`.replace(/\.?0+$/, '');
    return refuse(`${text} could mean ${large} or ${small}; write ${large} or ${small}`, true);
  }
  return { ok: true, value: Number(`${whole}.${part}`) };
}

/**
 * A number without sign or unit, already in plain spelling: `5.375`, `136,5`, `3/8`, `5 3/8`, `5-3/8`.
 * @returns the value or what is wrong with it, as a sentence part
 */
export function parsePlainNumber(text: string): NumberResult {
  if (text === '') return refuse('there is no number');
  if (/^(\d+[.,]?\d*|[.,]\d+)$/.test(text)) return decimal(text);
  const fraction = /^(?:(\d+)(?: ?- ?| ))?(\d+) ?\/ ?(\d+)$/.exec(text);
  if (fraction !== null) {
    const [, whole = '0', top, bottom] = fraction as unknown as [string, string | undefined, string, string];
    if (Number(bottom) === 0) return refuse(`${text} divides by zero`);
    return { ok: true, value: Number(whole) + Number(top) / Number(bottom) };
  }
  if (/^[\d.,]+$/.test(text) && (text.match(/[.,]/g)?.length ?? 0) > 1) {
    return refuse(`${text} has more than one point or comma: write it with one decimal point and no grouping`, true);
  }
  if (/^[\d\s-]+\/$/.test(text) || /^\/[\d\s]+$/.test(text))
    return refuse(`${text} is half a fraction: write it like 3/8`, true);
  return refuse(`“${text}” is not a number`);
}
