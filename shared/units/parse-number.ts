// Numbers as people type them in a shop: decimals with point or comma, whole and fraction, real fraction characters.

export type NumberResult =
  { readonly ok: true; readonly value: number } | { readonly ok: false; readonly reason: string };

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

/** One spelling for each character: plain minus, slash, inch mark and blanks; real fractions written out. */
export function plainText(text: string): string {
  return text
    .replace(/[½¼¾⅛⅜⅝⅞⅓⅔⅕⅙]/g, (c) => ` ${FRACTION_CHARACTERS[c]!}`)
    .replace(/[⁄∕]/g, '/')
    .replace(/[−–—]/g, '-')
    .replace(/[″”“„]|''|’’|′′/g, '"')
    .replace(/[\s\u00a0\u202f\u2009]+/g, ' ')
    .trim()
    .toLowerCase();
}

const refuse = (reason: string): NumberResult => ({ ok: false, reason });

function decimal(text: string): NumberResult {
  if (!text.includes(',')) return { ok: true, value: Number(text) };
  const [whole, part] = text.split(',') as [string, string];
  // 1,250 is one and a quarter to one reader and twelve hundred and fifty to the next; a leading zero settles it
  if (part.length === 3 && whole !== '0' && whole !== '') {
    return refuse(`${text} could mean ${whole}${part} or ${whole}.${part}: write ${whole}${part} or ${whole}.${part}`);
  }
  return { ok: true, value: Number(`${whole}.${part}`) };
}

/**
 * A number without sign or unit, already in plain spelling: `5.375`, `136,5`, `3/8`, `5 3/8`, `5-3/8`.
 * @returns the value or what is wrong with it, as a sentence part
 */
export function parsePlainNumber(text: string): NumberResult {
  if (/^(\d+[.,]?\d*|[.,]\d+)$/.test(text)) return decimal(text);
  const fraction = /^(?:(\d+)(?: ?- ?| ))?(\d+) ?\/ ?(\d+)$/.exec(text);
  if (fraction !== null) {
    const [, whole = '0', top, bottom] = fraction as unknown as [string, string | undefined, string, string];
    if (Number(bottom) === 0) return refuse(`${text} divides by zero`);
    return { ok: true, value: Number(whole) + Number(top) / Number(bottom) };
  }
  if (/^\d{1,3}([.,]\d{3})+([.,]\d+)?$/.test(text) || (text.match(/[.,]/g)?.length ?? 0) > 1) {
    return refuse(`${text} has more than one point or comma: write it with one decimal point and no grouping`);
  }
  if (/\/\s*$/.test(text) || /^\s*\//.test(text)) return refuse(`${text} is half a fraction: write it like 3/8`);
  return refuse(`“${text}” is not a number`);
}
