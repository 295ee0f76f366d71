import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { atan2Degrees, atan2Radians, radiansOf, sinCosDegrees } from '#shared/units';

describe('sine and cosine in degrees', () => {
  it('gives exact values at quarter turns, however many', () => {
    const exact = [
      [0, 1],
      [1, 0],
      [0, -1],
      [-1, 0],
    ] as const;
    for (let k = -40; k <= 40; k += 1) {
      const [s, c] = sinCosDegrees(90 * k);
      const [es, ec] = exact[((k % 4) + 4) % 4]!;
      expect(s + 0).toBe(es);
      expect(c + 0).toBe(ec);
    }
  });

  // exact values of trigonometry: sin 30 = 1/2, cos 45 = sqrt(2)/2, cos 36 = (1 + sqrt(5))/4
  it.each([
    [30, 0.5, Math.sqrt(3) / 2],
    [45, Math.SQRT1_2, Math.SQRT1_2],
    [36, Math.sqrt(10 - 2 * Math.sqrt(5)) / 4, (1 + Math.sqrt(5)) / 4],
    [150, 0.5, -Math.sqrt(3) / 2],
    [-60, -Math.sqrt(3) / 2, 0.5],
  ])('%s degrees', (degrees, s, c) => {
    const [sin, cos] = sinCosDegrees(degrees);
    expect(Math.abs(sin - s)).toBeLessThanOrEqual(2.3e-16);
    expect(Math.abs(cos - c)).toBeLessThanOrEqual(2.3e-16);
  });

  it('agrees with the engine within what the engine promises, over ten turns each way', () => {
    fc.assert(
      fc.property(fc.double({ min: -3600, max: 3600, noNaN: true }), (degrees) => {
        const [s, c] = sinCosDegrees(degrees);
        // the engine's reduction works on rounded radians: ten turns of 2 pi lose up to 63 * 2^-53
        expect(Math.abs(s - Math.sin((degrees * Math.PI) / 180))).toBeLessThan(2e-14);
        expect(Math.abs(c - Math.cos((degrees * Math.PI) / 180))).toBeLessThan(2e-14);
        expect(Math.abs(s * s + c * c - 1)).toBeLessThan(5e-16);
      }),
    );
  });
});

describe('arc tangent', () => {
  it('agrees with the engine in all quadrants', () => {
    const number = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(number, number, (y, x) => {
        // only the sign of zero is told apart by the engine: (−0, −1) is −pi there, pi here
        fc.pre(y !== 0);
        expect(Math.abs(atan2Radians(y, x) - Math.atan2(y, x))).toBeLessThan(1e-15);
      }),
    );
  });

  it('keeps to the axes exactly', () => {
    expect(atan2Degrees(0, 1)).toBe(0);
    expect(atan2Degrees(1, 0)).toBe(90);
    expect(atan2Degrees(-1, 0)).toBe(-90);
    expect(atan2Degrees(0, -1)).toBe(180);
    expect(atan2Degrees(0, 0)).toBe(0);
    expect(atan2Degrees(1e308, 1e-308)).toBe(90);
    expect(atan2Radians(1, 1)).toBe(Math.PI / 4);
  });

  it('turns the angle back', () => {
    fc.assert(
      fc.property(fc.double({ min: -179.9, max: 180, noNaN: true }), (degrees) => {
        const [s, c] = sinCosDegrees(degrees);
        expect(Math.abs(atan2Degrees(s, c) - degrees)).toBeLessThan(1e-12);
      }),
    );
    expect(radiansOf(180)).toBe(Math.PI);
  });
});
