import { describe, expect, it } from 'vitest';
import {
  CATEGORIES,
  DEFAULT_GAPS,
  DEFAULT_GENERAL,
  defaultFor,
  defaultTolerance,
  isBodyPanel,
  loadScene,
  newScene,
  pairKey,
  ruleOrigin,
  SOURCES,
  type Category,
} from '#shared/scene';

describe('tolerances of new parts', () => {
  it('follows the source, with at least 3 mm for a body panel', () => {
    expect(SOURCES.map((source) => defaultTolerance(source, 'pedal'))).toEqual([2, 1, 12]);
    expect(SOURCES.map((source) => defaultTolerance(source, 'inner-fender'))).toEqual([3, 3, 12]);
    expect(CATEGORIES.filter(isBodyPanel)).toEqual([
      'firewall',
      'cowl',
      'toe-board',
      'floor',
      'tunnel',
      'inner-fender',
      'fender-liner',
      'hood',
      'dash',
    ]);
  });
});

describe('the table of gaps', () => {
  const gapOf = (a: Category, b: Category): number | undefined =>
    defaultFor({ between: [{ category: a }, { category: b }] })?.gap;

  // the trade's usual set, common practice, no source: moving 13, fixed 10, engine 15, hot line 76, belt 25, wiper 8, hood 19
  it('holds the usual figures of the trade', () => {
    expect(DEFAULT_GENERAL.movingGap.value).toBe(13);
    expect(DEFAULT_GENERAL.gap.value).toBe(10);
    expect(gapOf('firewall', 'engine')).toBe(15);
    expect(gapOf('line', 'exhaust')).toBe(76);
    expect(gapOf('wiring', 'belt')).toBe(25);
    expect(gapOf('wiper', 'cowl')).toBe(8);
    expect(gapOf('hood', 'engine')).toBe(19);
    expect(gapOf('pedal', 'pedal')).toBe(25);
    expect(gapOf('seat', 'heater')).toBeUndefined();
  });

  it('has one row a pair, each saying where it comes from and why', () => {
    const keys = DEFAULT_GAPS.map((row) =>
      pairKey({ between: [{ category: row.between[0] }, { category: row.between[1] }], gap: row.gap }),
    );
    expect(new Set(keys).size).toBe(keys.length);
    for (const row of DEFAULT_GAPS) expect(row.origin).toMatch(/^common practice, no source: .{10,}/);
  });

  it('knows a rule as its own whichever way round, until its figure is changed', () => {
    const [a, b] = [{ category: 'engine' }, { category: 'hood' }] as const;
    expect(ruleOrigin({ between: [a, b], gap: 19 })).toMatch(/^common practice/);
    expect(ruleOrigin({ between: [b, a], gap: 19 })).toMatch(/^common practice/);
    expect(ruleOrigin({ between: [a, b], gap: 18 })).toBeNull();
    expect(ruleOrigin({ between: [a, { category: 'seat' }], gap: 19 })).toBeNull();
    expect(ruleOrigin({ between: [{ group: 'hood' }, a], gap: 19 })).toBeNull();
    expect(defaultFor({ between: [a, b], gap: 18 })?.gap).toBe(19);
  });
});

describe('a new scene', () => {
  it('loads, is empty but for two lasers, and carries the table', () => {
    const scene = newScene('Layout 1', 'in');
    expect(loadScene(structuredClone(scene))).toEqual({ ok: true, scene });
    expect(scene.components).toEqual([]);
    expect(scene.lasers.map((l) => l.id)).toEqual(['centre-line', 'floor-line']);
    expect(scene.rules).toMatchObject({ gap: 10, movingGap: 13 });
    expect(scene.rules.pairs).toHaveLength(DEFAULT_GAPS.length);
    expect(scene.rules.pairs.every((rule) => ruleOrigin(rule) !== null)).toBe(true);
  });
});
