import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatAngle,
  formatGap,
  formatLength,
  formatNeed,
  formatPercent,
  gapParts,
  lengthParts,
  parseAngle,
  parseLength,
  type LengthDisplay,
} from '#shared/units';

const lengths = fc.double({ min: -99_000, max: 99_000, noNaN: true });
const displays = fc.constantFrom<LengthDisplay>('mm', 'in', 'in-decimal');
const denominators = fc.constantFrom<8 | 16 | 32 | 64>(8, 16, 32, 64);

/** The printed step, mm. */
function stepOf(display: LengthDisplay, denominator: number): number {
  if (display === 'mm') return 0.1;
  return display === 'in' ? 25.4 / denominator : 0.0254;
}

function readBack(text: string): number {
  const result = parseLength(text, { unit: 'mm', signed: 'absolute' });
  if (!result.ok) throw new Error(result.reason);
  return result.mm;
}

describe('lengths in print', () => {
  it.each([
    [136.525, 'in', '5 3/8"'],
    [136.525, 'in-decimal', '5.375"'],
    [136.525, 'mm', '136.5 mm'],
    [9.525, 'in', '3/8"'],
    [25.4, 'in', '1"'],
    [0, 'in', '0"'],
    [-9.525, 'in', '-3/8"'],
    [-136.525, 'in', '-5 3/8"'],
    [-0.01, 'mm', '0 mm'],
    [-0.1, 'in', '0"'],
    [25.3, 'in', '1"'],
    [100, 'mm', '100 mm'],
    [1250, 'mm', '1250 mm'],
    [0.8, 'in', '1/16"'],
  ] as const)('%s mm as %s', (mm, display, expected) => {
    expect(formatLength(mm, display)).toBe(expected);
  });

  it('goes as fine as a sixty-fourth when asked', () => {
    const mm = (25.4 * 23) / 64;
    expect(formatLength(mm, 'in', { denominator: 64 })).toBe('23/64"');
    expect(formatLength(mm, 'in', { denominator: 32 })).toBe('3/8"');
    expect(formatLength(mm, 'in')).toBe('3/8"');
  });

  it('gives its parts for a real fraction', () => {
    expect(lengthParts(-136.525, 'in')).toEqual({
      sign: '-',
      whole: '5',
      numerator: 3,
      denominator: 8,
      unit: 'in',
      text: '-5 3/8',
    });
    expect(lengthParts(9.525, 'in')).toMatchObject({ sign: '', whole: '', numerator: 3, denominator: 8 });
    expect(lengthParts(50.8, 'in')).toMatchObject({ whole: '2', numerator: 0, text: '2' });
    expect(lengthParts(50.86, 'mm')).toMatchObject({ whole: '50.9', numerator: 0, unit: 'mm', text: '50.9' });
  });

  it('follows the language for the decimal sign, without grouping', () => {
    expect(formatLength(1136.5, 'mm', { locale: 'de' })).toBe('1136,5 mm');
    expect(formatAngle(12.5, { locale: 'de' })).toBe('12,5°');
    expect(formatPercent(0.62, { locale: 'de' })).toBe('62\u00a0%');
    expect(formatPercent(0.62, { locale: 'en' })).toBe('62%');
    expect(formatPercent(0.624)).toBe('62 %');
  });

  it('is read back to half the printed step', () => {
    fc.assert(
      fc.property(lengths, displays, denominators, (mm, display, denominator) => {
        const printed = readBack(formatLength(mm, display, { denominator }));
        expect(Math.abs(printed - mm)).toBeLessThanOrEqual(stepOf(display, denominator) / 2 + 1e-7);
      }),
    );
  });

  it('prints what was read back the same again', () => {
    fc.assert(
      fc.property(lengths, displays, denominators, (mm, display, denominator) => {
        const text = formatLength(mm, display, { denominator });
        expect(formatLength(readBack(text), display, { denominator })).toBe(text);
      }),
    );
  });

  it('reads every fraction down to 1/64 back exactly', () => {
    fc.assert(
      fc.property(fc.integer({ min: -6400, max: 6400 }), (sixtyFourths) => {
        const mm = (sixtyFourths / 64) * 25.4;
        expect(readBack(formatLength(mm, 'in', { denominator: 64 }))).toBeCloseTo(mm, 9);
      }),
    );
  });

  it('reads a decimal comma back too', () => {
    fc.assert(
      fc.property(lengths, (mm) => {
        const text = formatLength(mm, 'mm', { locale: 'de' });
        expect(Math.abs(readBack(text) - mm)).toBeLessThanOrEqual(0.05 + 1e-7);
      }),
    );
  });

  it('reads angles back', () => {
    fc.assert(
      fc.property(fc.double({ min: -3600, max: 3600, noNaN: true }), (degrees) => {
        const result = parseAngle(formatAngle(degrees, { decimals: 2 }));
        expect(result.ok && Math.abs(result.degrees - degrees) <= 0.005 + 1e-9).toBe(true);
      }),
    );
  });
});

describe('gaps and needs', () => {
  it('never makes a gap look clearer than it is', () => {
    fc.assert(
      fc.property(lengths, displays, denominators, (mm, display, denominator) => {
        const printed = readBack(formatGap(mm, display, { denominator }));
        expect(printed).toBeLessThanOrEqual(mm + 1e-7);
        expect(mm - printed).toBeLessThan(stepOf(display, denominator) + 1e-7);
      }),
    );
  });

  it('never makes a need look smaller than it is', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 99_000, noNaN: true }),
        displays,
        denominators,
        (mm, display, denominator) => {
          expect(readBack(formatNeed(mm, display, { denominator }))).toBeGreaterThanOrEqual(mm - 1e-7);
        },
      ),
    );
  });

  it.each([
    [9.52, 'in', '11/32"'],
    [9.525, 'in', '3/8"'],
    [9.59, 'mm', '9.5 mm'],
    [0.7, 'in', '0"'],
    [-0.52, 'mm', '-0.6 mm'],
    [-0.1, 'in', '-1/32"'],
  ] as const)('a gap of %s mm as %s', (mm, display, expected) => {
    expect(formatGap(mm, display)).toBe(expected);
    expect(`${gapParts(mm, display).text}${display === 'mm' ? ' mm' : '"'}`).toBe(expected);
  });

  it('is not thrown off by the last bits of a division', () => {
    for (let n = 1; n < 2000; n += 1) {
      const text = formatLength((n * 25.4) / 32, 'in', { denominator: 32 });
      expect(formatGap((n * 25.4) / 32, 'in')).toBe(text);
      expect(formatNeed((n * 25.4) / 32, 'in')).toBe(text);
    }
  });
});
