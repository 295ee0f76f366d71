import { describe, expect, it } from 'vitest';
import {
  labelledOf,
  ladderOf,
  pairRungs,
  spanOf,
  ticksOf,
  type Rung,
} from '../../../../src/features/bench/ladder/rungs';
import { finding } from './support';

const hit = (a: string, b: string, depth: number) =>
  finding(a, b, 'hits', {
    margin: -12,
    overlap: { volume: null, pushOut: { vector: [0, depth, 0], length: depth } },
  });
const clear = (a: string, b: string, margin: number) => finding(a, b, 'clears', { gap: margin + 10, margin });
const always = (): boolean => true;

describe('the rungs of the gap ladder', () => {
  it('show the worst finding of each pair, by its verdict before its margin', () => {
    const rungs = pairRungs([
      finding('arm', 'joint', 'tight', { gap: 2, margin: -20 }),
      hit('arm', 'joint', 3),
      clear('arm', 'joint', 5),
      clear('hood', 'cap', 8),
    ]);
    expect(rungs).toHaveLength(2);
    expect(rungs[0]).toMatchObject({ height: -3, others: 2, finding: { verdict: 'hits' } });
    expect(rungs[1]).toMatchObject({ height: 8, others: 0 });
  });

  it('stand at their margin, hits at minus their push-out', () => {
    const rungs = pairRungs([clear('a', 'b', 4), hit('c', 'd', 8), finding('e', 'f', 'tight', { margin: -2 })]);
    expect(rungs.map((r) => r.height)).toEqual([-8, -2, 4]);
  });

  it('never put a hit above the zero line, though its overlap is not known', () => {
    const [rung] = pairRungs([finding('a', 'b', 'hits', { margin: 0 })]);
    expect(rung!.height).toBeLessThanOrEqual(0);
  });
});

describe('the rule', () => {
  it('is as high as its labels find room, and reaches down to the deepest hit', () => {
    const rungs = pairRungs([clear('a', 'b', 30), clear('c', 'd', 3), hit('e', 'f', 11)]);
    expect(spanOf(rungs, 'mm', always)).toEqual({ top: 40, bottom: -15 });
    expect(spanOf(rungs, 'mm', (shown) => shown.length <= 2)).toEqual({ top: 25, bottom: -15 });
    expect(spanOf(rungs, 'mm', () => false).top).toBe(5);
  });

  it('speaks in inches where the person does', () => {
    const span = spanOf(pairRungs([clear('a', 'b', 3), hit('e', 'f', 5)]), 'in', always);
    expect(span.top).toBeCloseTo(38.1);
    // a quarter of an inch would do for 5 mm, but a foot that shallow would be lost under such a rule
    expect(span.bottom).toBeCloseTo(-12.7);
  });

  it('keeps what is wrong on it however high, gathers what is above, and leaves joints out', () => {
    const rungs = pairRungs([
      clear('a', 'b', 60),
      finding('c', 'd', 'tight', { margin: -1 }),
      finding('e', 'f', 'seated', { gap: 0, required: 0 }),
      finding('g', 'h', 'loose', { gap: 3, required: 0 }),
      hit('i', 'j', 70),
    ]);
    const ladder = ladderOf(rungs, { top: 40, bottom: -40 });
    expect(ladder.rungs.map((r) => r.finding.between.join())).toEqual(['i,j', 'c,d']);
    expect(ladder.above).toHaveLength(1);
    expect(ladder.seated).toHaveLength(1);
    expect(ladder.loose).toHaveLength(1);
  });

  it('gives its labels to hits first, then to the tightest, in the order in which they stand', () => {
    const rungs = pairRungs([
      hit('a', 'b', 1),
      finding('c', 'd', 'tight', { margin: -9 }),
      finding('e', 'f', 'tight', { margin: -4 }),
      clear('g', 'h', 1),
    ]);
    const names = (from: readonly Rung[]) => from.map((r) => r.finding.between.join(''));
    expect(names(labelledOf(rungs, () => 20, 45))).toEqual(['cd', 'ab']);
    expect(names(labelledOf(rungs, () => 20, 1000))).toEqual(['cd', 'ef', 'ab', 'gh']);
    expect(labelledOf(rungs, () => 20, 10)).toEqual([]);
  });
});

describe('the ticks', () => {
  it('are as fine as they can be told apart', () => {
    const span = { top: 10, bottom: -10 };
    const coarse = ticksOf(span, 'mm', 6);
    expect(coarse).toHaveLength(21);
    expect(coarse.find((t) => t.at === 0)?.rank).toBe(3);
    expect(coarse.find((t) => t.at === 5)?.rank).toBe(2);
    expect(ticksOf(span, 'mm', 12)).toHaveLength(41);
  });

  it('fall on sixteenths of an inch', () => {
    const ticks = ticksOf({ top: 25.4, bottom: 0 }, 'in', 4);
    expect(ticks).toHaveLength(17);
    expect(ticks.filter((t) => t.rank === 3).map((t) => t.at)).toEqual([0, 12.7, 25.4]);
  });
});
