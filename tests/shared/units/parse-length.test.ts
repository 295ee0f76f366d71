import { describe, expect, it } from 'vitest';
import { parseLength, type LengthOptions } from '#shared/units';

const inch: LengthOptions = { unit: 'in' };
const mm: LengthOptions = { unit: 'mm' };

function read(text: string, options: LengthOptions): number {
  const result = parseLength(text, options);
  if (!result.ok) throw new Error(result.reason);
  return result.mm;
}

function reason(text: string, options: LengthOptions): string {
  const result = parseLength(text, options);
  expect(result.ok).toBe(false);
  return result.ok ? '' : result.reason;
}

describe('what a person may type for a length', () => {
  // 1 in is 25.4 mm exactly (international yard and pound agreement of 1959)
  it.each([
    ['5 3/8', inch, 136.525],
    ['5-3/8"', mm, 136.525],
    ['5 - 3/8 in', mm, 136.525],
    ['5.375in', mm, 136.525],
    ['5.375 in', mm, 136.525],
    ['5.375 inches', mm, 136.525],
    ['5,375 in.', mm, null],
    ['136.5 mm', inch, 136.5],
    ['136,5 mm', inch, 136.5],
    ['136.5', mm, 136.5],
    ['136,5', mm, 136.5],
    ['.5', inch, 12.7],
    [',5', inch, 12.7],
    ['5.', mm, 5],
    ['0,125', inch, 3.175],
    ['0.125', inch, 3.175],
    ['3/8', inch, 9.525],
    ['13 1/2 mm', inch, 13.5],
    ['13.65cm', inch, 136.5],
    ['0.1365 m', inch, 136.5],
    ['  12\t', mm, 12],
    ['12 MM', inch, 12],
    ['1.250', inch, 31.75],
    ['7/4', inch, 44.45],
  ] as const)('%s', (text, options, expected) => {
    if (expected === null) expect(parseLength(text, options).ok).toBe(false);
    else expect(read(text, options)).toBeCloseTo(expected, 10);
  });

  it.each([
    ['½', 12.7],
    ['⅜', 9.525],
    ['5⅜', 136.525],
    ['5 ⅜″', 136.525],
    ['5⅜”', 136.525],
    ["5⅜''", 136.525],
    ['5⅜′′', 136.525],
    ['5⅜’’', 136.525],
    ['5 3⁄8', 136.525],
    ['5 3∕8', 136.525],
    ['5\u00a03/8', 136.525],
    ['5\u202f3/8\u2009in', 136.525],
    ['−5⅜', -136.525],
    ['–3/4', -19.05],
  ])('%s, as a phone or a pasted text spells it', (text, expected) => {
    expect(read(text, inch)).toBeCloseTo(expected, 10);
  });
});

describe('signs', () => {
  const size: LengthOptions = { unit: 'in', current: 25.4 };
  const position: LengthOptions = { unit: 'in', current: 25.4, signed: 'absolute' };

  it('adds and takes away where a field is never negative', () => {
    expect(parseLength('+1/8', size)).toEqual({ ok: true, mm: 28.575, relative: true });
    expect(parseLength('- 1/8', size)).toEqual({ ok: true, mm: 25.4 - 3.175, relative: true });
    expect(parseLength('1/8', size)).toEqual({ ok: true, mm: 3.175, relative: false });
  });

  it('reads a minus as the value itself where values may be negative, and a plus as a change', () => {
    expect(parseLength('-1/8', position)).toEqual({ ok: true, mm: -3.175, relative: false });
    expect(parseLength('+1/8', position)).toEqual({ ok: true, mm: 28.575, relative: true });
  });

  it('takes = as absolute in both', () => {
    for (const options of [size, position]) {
      expect(parseLength('=-3/4', options)).toMatchObject({ ok: true, mm: -0.75 * 25.4, relative: false });
      expect(parseLength('= +3/4', options)).toMatchObject({ ok: true, mm: 0.75 * 25.4, relative: false });
    }
  });

  it('has nothing to add to without a current value', () => {
    expect(parseLength('+1/8', inch)).toEqual({ ok: true, mm: 3.175, relative: false });
    expect(parseLength('-1/8', inch)).toEqual({ ok: true, mm: -3.175, relative: false });
  });

  it('never gives a negative zero', () => {
    expect(Object.is(read('-0', mm), 0)).toBe(true);
    expect(Object.is(read('=-0/8', size), 0)).toBe(true);
  });
});

describe('what is refused, and the sentence that says why', () => {
  it('says what 1,250 could mean', () => {
    expect(reason('1,250', mm)).toBe('1,250 could mean 1250 or 1.25; write 1250 or 1.25.');
    expect(reason('12,500 mm', mm)).toBe('12,500 could mean 12500 or 12.5; write 12500 or 12.5.');
    expect(reason('+1,250', { unit: 'mm', current: 1 })).toContain('1250 or 1.25');
    expect(reason('1,000', mm)).toBe('1,000 could mean 1000 or 1; write 1000 or 1.');
  });

  it.each([
    ['', 'Type a length, like 5 3/8, 5.375in or 136.5mm.'],
    ['   ', 'Type a length, like 5 3/8, 5.375in or 136.5mm.'],
    ['+', 'There is no number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['mm', 'There is no number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['1/0', '1/0 divides by zero. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['3/', '3/ is half a fraction: write it like 3/8.'],
    ['/8', '/8 is half a fraction: write it like 3/8.'],
    ['abc', '“abc” is not a length. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['5 furlongs', '“furlongs” is not a unit of length. Use mm or in.'],
    ['5\' 3"', 'Feet are not used here. Type inches or millimetres.'],
    ['5 ft', 'Feet are not used here. Type inches or millimetres.'],
    ['5′', 'Feet are not used here. Type inches or millimetres.'],
    ['1.250.000', '1.250.000 has more than one point or comma: write it with one decimal point and no grouping.'],
    ['1,250.5', '1,250.5 has more than one point or comma: write it with one decimal point and no grouping.'],
    ['5 3', '“5 3” is not a number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['5.5 3/8', '“5.5 3/8” is not a number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['3/8/2', '“3/8/2” is not a number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['--5', '“-5” is not a number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['1e3', '“1e3” is not a number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['5³⁄₈', '“5³/₈” is not a number. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['200 m', 'That is more than 100 m. Check the unit.'],
    ['9'.repeat(50), 'That is more than 100 m. Check the unit.'],
    ['1'.repeat(61), 'That is too long for a length. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['constructor', '“constructor” is not a length. Type it like 5 3/8, 5.375in or 136.5mm.'],
    ['5 constructor', '“constructor” is not a unit of length. Use mm or in.'],
  ])('%j', (text, expected) => {
    expect(reason(text, mm)).toBe(expected);
  });

  it('stays quick on a pasted book', () => {
    const start = performance.now();
    reason('a'.repeat(1_000_000), mm);
    expect(performance.now() - start).toBeLessThan(100);
  });
});
