import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadLabels } from '../../../../src/features/bench/ladder/spread';

const SEED = 20261201;

describe('labels beside the rule', () => {
  it('stay where they belong as long as they do not touch', () => {
    expect(
      spreadLabels(
        [
          { at: 50, height: 20 },
          { at: 100, height: 20 },
        ],
        400,
      ),
    ).toEqual([50, 100]);
  });

  it('share the shift when two belong to one place', () => {
    const same = { at: 200, height: 30 };
    expect(spreadLabels([same, same], 400)).toEqual([185, 215]);
  });

  it('are pushed back inside at both ends', () => {
    expect(
      spreadLabels(
        [
          { at: -40, height: 20 },
          { at: 500, height: 30 },
        ],
        400,
      ),
    ).toEqual([10, 385]);
  });

  it(`never overlap, keep their order and stay inside as long as there is room (seed ${SEED})`, () => {
    const label = fc.record({
      at: fc.double({ min: -50, max: 650, noNaN: true }),
      height: fc.constantFrom(18, 26, 37),
    });
    fc.assert(
      fc.property(fc.array(label, { maxLength: 14 }), (labels) => {
        const sorted = [...labels].sort((a, b) => a.at - b.at);
        const middles = spreadLabels(sorted, 600);
        middles.forEach((m, i) => {
          const { height } = sorted[i]!;
          expect(m - height / 2).toBeGreaterThanOrEqual(-1e-6);
          expect(m + height / 2).toBeLessThanOrEqual(600 + 1e-6);
          if (i > 0) {
            expect(m - middles[i - 1]!).toBeGreaterThanOrEqual((height + sorted[i - 1]!.height) / 2 - 1e-6);
          }
        });
      }),
      { seed: SEED, numRuns: 300 },
    );
  });
});
