// The report's contract, clause by clause: which rule decides, which findings there are, verdicts at their thresholds,
// joints, sheets, order, and that nothing but the scene decides what is written.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { block, findingOf, mesh, motion, part, reportOf, rod, sceneOf, slide, swing } from '../../fixtures/scenes';
import { blockSoup, boxSoup, invertedSoup, movedSoup, torusSoup } from '../../fixtures/soups';

type Json = Readonly<Record<string, unknown>>;
const cube = (x: number, id = 'block'): Json => block([10, 10, 10], { at: [x, 0, 0] }, id);
const group = (id: string): Json => ({ id, name: id });

describe('which rule decides', () => {
  const a = part('a', [cube(0)], { category: 'pedal', group: 'left' });
  const b = part('b', [cube(100)], { category: 'column', group: 'right' });
  const sides = {
    component: [{ component: 'a' }, { component: 'b' }],
    group: [{ group: 'left' }, { group: 'right' }],
    category: [{ category: 'pedal' }, { category: 'column' }],
  } as const;
  type Kind = keyof typeof sides;
  const rule = (x: Kind, y: Kind, gap: number, mirrored = false): Json => {
    const between = [sides[x][0], sides[y][1]];
    return { between: mirrored ? between.reverse() : between, gap };
  };
  const kinds = [
    ['component', 'component'],
    ['component', 'group'],
    ['component', 'category'],
    ['group', 'group'],
    ['group', 'category'],
    ['category', 'category'],
  ] as const;
  const decided = (pairs: readonly Json[], more: Json = {}): unknown[] => {
    const f = findingOf(
      reportOf(sceneOf([a, b], { groups: [group('left'), group('right')], rules: { pairs, ...more } })),
      'a',
      'b',
    );
    return [f.rule, f.required];
  };

  test('each kind wins over all that are less specific, in any order and whichever way round (seed 801)', () => {
    for (const [i, [x, y]] of kinds.entries()) {
      // the less specific ones ask for more, so that a mere maximum would be caught
      const rules = kinds.slice(i).flatMap(([p, q], k) => [rule(p, q, 1 + k), rule(q, p, 0.5 + k / 2)]);
      fc.assert(
        fc.property(
          fc.shuffledSubarray(rules, { minLength: rules.length }),
          fc.array(fc.boolean(), { minLength: rules.length, maxLength: rules.length }),
          (shuffled, turns) => {
            const pairs = shuffled.map((r, k) =>
              turns[k] ? { ...r, between: [...(r['between'] as Json[])].reverse() } : r,
            );
            expect(decided(pairs)).toEqual([`${x}-${y}`, 1]);
          },
        ),
        { seed: 801, numRuns: 15 },
      );
    }
  });

  test('among equally specific ones the larger gap wins', () => {
    expect(decided([rule('group', 'group', 3), rule('group', 'group', 8, true), rule('group', 'group', 5)])).toEqual([
      'group-group',
      8,
    ]);
  });

  test('a joint wins over a gap between the same two, and the larger allowance wins', () => {
    const joint = (allow: number): Json => ({ between: sides.component, joint: { allow } });
    expect(decided([rule('component', 'component', 50), joint(1), joint(3)])).toEqual(['joint', 0]);
    const overlapping = (allow: number): string => {
      const scene = sceneOf([part('a', [cube(0)]), part('b', [cube(8)])], {
        rules: {
          pairs: [
            { between: sides.component, joint: { allow: 1 } },
            { between: [...sides.component].reverse(), joint: { allow } },
          ],
        },
      });
      return findingOf(reportOf(scene), 'a', 'b').verdict;
    };
    expect([overlapping(2), overlapping(0.5)]).toEqual(['seated', 'hits']);
  });

  test('without a rule: gap at rest, movingGap where either side moves; a rule decides both', () => {
    const moving = part('a', [cube(0)], { category: 'pedal', motions: [motion([swing(1)])] });
    const of = (pairs: readonly Json[]): unknown[] =>
      reportOf(sceneOf([moving, part('b', [cube(100)])], { rules: { gap: 3, movingGap: 7, pairs } }))
        .findings.map((f) => [f.motions.length, f.rule, f.required])
        .sort();
    expect(of([])).toEqual([
      [0, 'gap', 3],
      [1, 'movingGap', 7],
    ]);
    expect(of([{ between: [{ category: 'pedal' }, { component: 'b' }], gap: 2 }])).toEqual([
      [0, 'component-category', 2],
      [1, 'component-category', 2],
    ]);
  });

  test('a rule of one category with itself fits two parts of it, and no part outside', () => {
    const scene = sceneOf(
      [
        part('a', [cube(0)], { category: 'pedal' }),
        part('b', [cube(50)], { category: 'pedal' }),
        part('c', [cube(99)]),
      ],
      {
        rules: { pairs: [{ between: [{ category: 'pedal' }, { category: 'pedal' }], gap: 44 }] },
      },
    );
    const rules = reportOf(scene)
      .findings.map((f) => [f.between.join(), f.rule])
      .sort();
    expect(rules).toEqual([
      ['a,b', 'category-category'],
      ['a,c', 'gap'],
      ['b,c', 'gap'],
    ]);
  });
});

describe('which findings there are', () => {
  const stroke = (id: string, solids: readonly string[], use = 'operating'): Json =>
    motion([swing(1)], { id, solids, use });
  const two = (id: string, x: number, motions: readonly Json[]): Json =>
    part(id, [cube(x, 'one'), cube(x + 20, 'two'), cube(x + 40, 'three')], { motions });

  test('motions of both, what stays of either, and service motions', () => {
    const a = two('a', 0, [stroke('m', ['one']), stroke('n', ['two']), stroke('out', ['one', 'three'], 'service')]);
    const b = two('b', 500, [stroke('k', ['one', 'two', 'three'])]);
    const names = reportOf(sceneOf([b, a])).findings.map((f) =>
      f.motions.map((m) => `${m.component}.${m.motion}`).join('+'),
    );
    // b has nothing that no operating motion moves, so m and n against what stays of b are left out
    expect(names.sort()).toEqual(['', 'a.m+b.k', 'a.n+b.k', 'a.out', 'b.k']);
  });

  test('operating motions of one part are not checked against one another, nor a part against itself', () => {
    const a = two('a', 0, [stroke('m', ['one']), stroke('n', ['two'])]);
    expect(reportOf(sceneOf([a])).findings).toEqual([]);
  });

  test('a jointed pair is checked at rest alone, and is listed as unchecked in motion', () => {
    const a = two('pedal', 0, [stroke('m', ['one']), stroke('out', ['one'], 'service')]);
    const b = two('bracket', 500, [stroke('k', ['one'])]);
    const c = part('wall', [cube(900)]);
    const rules = { pairs: [{ between: [{ component: 'pedal' }, { component: 'bracket' }], joint: {} }] };
    const report = reportOf(sceneOf([a, b, c], { rules }));
    expect(report.unchecked).toEqual([['bracket', 'pedal']]);
    expect(report.findings.filter((f) => f.between.join() === 'bracket,pedal').map((f) => f.motions)).toEqual([[]]);
  });

  test('between is sorted by id, and the totals count the findings', () => {
    const report = reportOf(sceneOf([part('b', [cube(0)]), part('a', [cube(5)]), part('a-1', [cube(50)])]));
    for (const f of report.findings) expect(f.between[0] < f.between[1]).toBe(true);
    expect(report.totals).toEqual({ hits: 1, tight: 0, loose: 0, seated: 0, clears: 2 });
  });
});

describe('verdicts', () => {
  const verdictAt = (gap: number, more: Json = {}, tolerance = 0): string =>
    findingOf(reportOf(sceneOf([part('a', [cube(0)], { tolerance }), part('b', [cube(10 + gap)])], more)), 'a', 'b')
      .verdict;
  const touch = 0.01;

  test.each([
    [-3, 'hits'],
    [0, 'hits'],
    [touch / 2, 'hits'],
    [touch - 1e-5, 'hits'],
    [touch + 1e-5, 'tight'],
    [5.99, 'tight'],
    [6 - touch / 10 - 1e-5, 'tight'],
    [6 - touch / 10 + 1e-5, 'clears'],
    [6, 'clears'],
    [6.01, 'clears'],
  ])('a gap of %d where 6 is required: %s', (gap, verdict) => {
    expect(verdictAt(gap)).toBe(verdict);
  });

  test('tolerances of both count, and touch is the rule-book’s', () => {
    expect([verdictAt(7.9, {}, 2), verdictAt(8, {}, 2)]).toEqual(['tight', 'clears']);
    expect([verdictAt(0.4, { rules: { touch: 0.5 } }), verdictAt(0.6, { rules: { touch: 0.5 } })]).toEqual([
      'hits',
      'tight',
    ]);
  });

  test('margin is the proven gap less tolerances and what is required', () => {
    const scene = sceneOf([part('a', [cube(0)], { tolerance: 1.5 }), part('b', [cube(30)], { tolerance: 0.25 })]);
    const f = findingOf(reportOf(scene), 'a', 'b');
    expect(f.margin).toBe(f.gapAtLeast - 1.75 - 6);
  });

  test('exact contact is a hit, whatever the frame it is in (seed 802)', () => {
    const turn = fc.double({ min: -180, max: 180, noNaN: true });
    const place = fc.double({ min: -2000, max: 2000, noNaN: true });
    fc.assert(
      fc.property(
        fc.tuple(place, place, place),
        fc.tuple(turn, turn, turn),
        fc.constantFrom('box', 'rod', 'mesh'),
        (at, turned, kind) => {
          const pose = { at, turn: turned };
          const other =
            kind === 'box'
              ? cube(10)
              : kind === 'rod'
                ? rod(10, 10, { at: [10, 0, 0] })
                : mesh('cube', { at: [10, 0, 0] });
          const f = findingOf(
            reportOf(sceneOf([part('a', [cube(0)], { pose }), part('b', [other], { pose })]), {
              cube: boxSoup(10, 10, 10),
            }),
            'a',
            'b',
          );
          expect(f.verdict).toBe('hits');
          expect(f.gap).toBeLessThan(1e-5);
        },
      ),
      { seed: 802, numRuns: 150 },
    );
  });

  test('a part wholly inside another hits: every kind in every kind, and meshes inside out', () => {
    const soups = {
      outer: boxSoup(100, 100, 100),
      inner: boxSoup(5, 5, 5),
      inside: invertedSoup(boxSoup(100, 100, 100)),
    };
    for (const outer of [block([100, 100, 100]), rod(150, 100), mesh('outer'), mesh('inside')]) {
      for (const inner of [block([5, 5, 5]), rod(5, 5), mesh('inner')]) {
        const f = findingOf(reportOf(sceneOf([part('a', [outer]), part('b', [inner])]), soups), 'a', 'b');
        expect([f.verdict, f.gap, f.gapAtLeast]).toEqual(['hits', 0, 0]);
        expect(f.at.points[0]).toEqual(f.at.points[1]);
        expect(f.overlap!.pushOut.length).toBeGreaterThan(50);
      }
    }
  });

  test('a part in the hollow of a closed shape is clear of it', () => {
    const hollow = [...boxSoup(100, 100, 100), ...invertedSoup(boxSoup(80, 80, 80))];
    const f = findingOf(reportOf(sceneOf([part('a', [mesh('hollow')]), part('b', [cube(0)])]), { hollow }), 'a', 'b');
    expect([f.verdict, f.gap]).toEqual(['clears', 35]);
  });

  test('an open surface has no inside, but a part that seems to lie in it is told', () => {
    const scan = boxSoup(100, 100, 100).slice(9);
    const inside = (at: number): unknown => {
      const f = findingOf(reportOf(sceneOf([part('a', [mesh('scan')]), part('b', [cube(at)])]), { scan }), 'a', 'b');
      return [f.verdict, f.insideSheet ?? false];
    };
    expect(inside(0)).toEqual(['clears', true]);
    expect(inside(80)).toEqual(['clears', false]);
  });

  test('a ring around an open scan is not inside it, although the middle of its box is; a ring within is', () => {
    const scan = boxSoup(40, 40, 40).slice(9);
    const inside = (ring: number[]): unknown =>
      findingOf(reportOf(sceneOf([part('a', [mesh('scan')]), part('b', [mesh('ring')])]), { scan, ring }), 'a', 'b')
        .insideSheet ?? false;
    expect(inside(torusSoup(60, 5, 16, 8))).toBe(false);
    expect(inside(torusSoup(10, 3, 16, 8))).toBe(true);
  });
});

describe('joints at rest', () => {
  const seated = (gap: number, allow = 1): ReturnType<typeof findingOf> =>
    findingOf(
      reportOf(
        sceneOf([part('a', [cube(0)]), part('b', [cube(10 + gap)])], {
          rules: { pairs: [{ between: [{ component: 'a' }, { component: 'b' }], joint: { allow } }] },
        }),
      ),
      'a',
      'b',
    );
  test.each([
    [0, 'seated'],
    [0.49, 'seated'],
    [0.51, 'loose'],
    [40, 'loose'],
    [-0.9, 'seated'],
    [-1, 'seated'],
    [-1.1, 'hits'],
  ])('a gap of %d: %s', (gap, verdict) => {
    const f = seated(gap);
    expect([f.verdict, f.rule, f.required]).toEqual([verdict, 'joint', 0]);
    expect(f.overlap === null).toBe(gap > 0);
  });
  test('no overlap is allowed where allow is 0', () => {
    expect([seated(0, 0).verdict, seated(-0.1, 0).verdict]).toEqual(['seated', 'hits']);
  });
});

test('a push-out was verified: moved by it, the first is free of the second by at least touch (seed 803)', () => {
  const turn = fc.double({ min: -180, max: 180, noNaN: true });
  const place = fc.double({ min: -20, max: 20, noNaN: true });
  const soups = { ring: torusSoup(20, 6, 16, 8) };
  const solid = fc.constantFrom(block([30, 20, 10]), rod(16, 40), mesh('ring'));
  fc.assert(
    fc.property(solid, solid, fc.tuple(place, place, place), fc.tuple(turn, turn, turn), (x, y, at, turned) => {
      const scene = (by: readonly number[]): Json =>
        sceneOf([part('a', [x], { pose: { at: by } }), part('b', [y], { pose: { at, turn: turned } })]);
      const f = findingOf(reportOf(scene([0, 0, 0]), soups), 'a', 'b');
      if (f.overlap === null) return;
      const { vector, length } = f.overlap.pushOut;
      expect(Math.hypot(...vector)).toBeCloseTo(length, 9);
      expect(findingOf(reportOf(scene(vector), soups), 'a', 'b').gap).toBeGreaterThan(0.01 - 1e-6);
    }),
    { seed: 803, numRuns: 30 },
  );
});

describe('order and repetition', () => {
  const soups = {
    ring: torusSoup(60, 15, 24, 12),
    plate: blockSoup([0, 0, 0], [200, 4, 100]),
    sheet: movedSoup(boxSoup(90, 90, 90).slice(18), [0, 0, 0]),
  };
  const parts = [
    part('pedal', [block([20, 12, 240], { at: [0, 0, -120] }, 'arm'), mesh('ring', { at: [0, 0, -260] })], {
      category: 'pedal',
      motions: [motion([swing(21)])],
    }),
    part('clutch', [block([20, 12, 240], { at: [0, -40, -120] }, 'arm')], {
      motions: [motion([swing(25)]), motion([slide([1, 0, 0], 50)], { id: 'out', use: 'service' })],
    }),
    part('plate', [mesh('plate', { at: [-200, -80, -300] })], { tolerance: 3 }),
    part('scan', [mesh('sheet', { at: [80, 60, -200] })]),
    part('column', [rod(38, 400, { at: [-80, 90, -100], turn: [0, 70, 0] })]),
  ];

  test('worst verdict first, then the least margin, then ids', () => {
    const order = ['hits', 'tight', 'loose', 'seated', 'clears'];
    const { findings } = reportOf(sceneOf(parts), soups);
    expect(new Set(findings.map((f) => f.verdict)).size).toBeGreaterThan(1);
    for (const [i, f] of findings.slice(1).entries()) {
      const before = findings[i]!;
      const [p, q] = [order.indexOf(before.verdict), order.indexOf(f.verdict)];
      expect(
        p < q ||
          (p === q &&
            (before.margin < f.margin || (before.margin === f.margin && before.between.join() <= f.between.join()))),
      ).toBe(true);
    }
  });

  test('the same findings to the byte on every run and for any order of the parts (seed 804)', () => {
    const first = JSON.stringify(reportOf(sceneOf(parts), soups).findings);
    expect(JSON.stringify(reportOf(sceneOf(parts), soups).findings)).toBe(first);
    fc.assert(
      fc.property(fc.shuffledSubarray(parts, { minLength: parts.length }), (shuffled) => {
        expect(JSON.stringify(reportOf(sceneOf(shuffled), soups).findings)).toBe(first);
      }),
      { seed: 804, numRuns: 4 },
    );
  });
});
