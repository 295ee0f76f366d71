import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addComponent,
  applyDifference,
  canonicalSceneText,
  differenceSchema,
  diffScenes,
  edits,
  invertDifference,
  isEmptyDifference,
  loadScene,
  pairKey,
  patchComponent,
  patchHead,
  patchRules,
  removeComponents,
  renameComponent,
  setComponentPose,
  setGroupPose,
  setPairGap,
  touchedComponents,
  type Difference,
  type Scene,
} from '#shared/scene';
import { arbitraryNewComponent, arbitraryPose, arbitraryScene } from './arbitrary-scene';
import { sampleDocument } from './sample';

function sample(): Scene {
  const result = loadScene(sampleDocument());
  if (!result.ok) throw new Error(result.refusals[0].reason);
  return result.scene;
}

function applied(scene: Scene, d: Difference): Scene {
  const result = applyDifference(scene, d);
  if (!result.ok) throw new Error(`conflicts: ${result.conflicts.join(', ')}`);
  return result.scene;
}

/** One named edit at random, of whatever the scene holds. */
function arbitraryChange(scene: Scene): fc.Arbitrary<Scene> {
  const changes: fc.Arbitrary<(s: Scene) => Scene>[] = [
    fc.constantFrom('A', 'B').map((name) => (s) => patchHead(s, { name })),
    fc.constantFrom(1, 2, 3).map((gap) => (s) => patchRules(s, { gap })),
    arbitraryNewComponent.map((c) => (s) => addComponent(s, c)),
    fc.constantFrom(1, 2).map((gap) => (s) => setPairGap(s, { category: 'hood' }, { category: 'seat' }, gap)),
  ];
  if (scene.components.length > 0) {
    const id = fc.constantFrom(...scene.components.map((c) => c.id));
    changes.push(
      fc.tuple(id, arbitraryPose).map(
        ([c, pose]) =>
          (s) =>
            setComponentPose(s, c, pose),
      ),
      id.map((c) => (s) => renameComponent(s, c, 'Renamed')),
      id.map((c) => (s) => removeComponents(s, [c])),
      fc.tuple(id, fc.constantFrom(4, 5)).map(
        ([c, gap]) =>
          (s) =>
            setPairGap(s, { component: c }, { category: 'engine' }, gap),
      ),
    );
  }
  if (scene.groups.length > 0) {
    const id = fc.constantFrom(...scene.groups.map((g) => g.id));
    changes.push(
      fc.tuple(id, arbitraryPose).map(
        ([g, pose]) =>
          (s) =>
            setGroupPose(s, g, pose),
      ),
      id.map((g) => (s) => edits.partAgain(s, g).edit(s)),
    );
  }
  return fc.oneof(...changes).map((change) => change(scene));
}

function recordsOf(d: Difference): Set<string> {
  const records = new Set<string>();
  for (const [part, value] of Object.entries(d)) {
    if (part === 'head' || part === 'ruleHead') records.add(part);
    else for (const key of Object.keys(value as object)) records.add(`${part} ${key}`);
  }
  return records;
}

describe('differences of any two scenes', () => {
  it('turns the first into the second', () => {
    fc.assert(
      fc.property(arbitraryScene, arbitraryScene, (a, b) => {
        expect(applied(a, diffScenes(a, b))).toEqual(b);
      }),
    );
  });

  it('turns back by its inverse', () => {
    fc.assert(
      fc.property(arbitraryScene, arbitraryScene, (a, b) => {
        const d = diffScenes(a, b);
        expect(applied(b, invertDifference(d))).toEqual(a);
        expect(invertDifference(invertDifference(d))).toEqual(d);
        expect(invertDifference(d)).toEqual(diffScenes(b, a));
      }),
    );
  });

  it('is empty for equal scenes only', () => {
    fc.assert(
      fc.property(arbitraryScene, arbitraryScene, (a, b) => {
        expect(isEmptyDifference(diffScenes(a, structuredClone(a)))).toBe(true);
        const isSame = canonicalSceneText(a) === canonicalSceneText(b);
        expect(isEmptyDifference(diffScenes(a, b))).toBe(isSame);
      }),
    );
  });

  it('survives the wire', () => {
    fc.assert(
      fc.property(arbitraryScene, arbitraryScene, (a, b) => {
        const d = diffScenes(a, b);
        const received = differenceSchema.parse(JSON.parse(JSON.stringify(d)));
        expect(received).toEqual(d);
        expect(canonicalSceneText(applied(a, received))).toBe(canonicalSceneText(b));
      }),
    );
  });

  it('does no harm when applied again', () => {
    fc.assert(
      fc.property(arbitraryScene, arbitraryScene, (a, b) => {
        const d = diffScenes(a, b);
        expect(applied(applied(a, d), d)).toEqual(b);
      }),
    );
  });

  it('leaves its arguments as they were', () => {
    fc.assert(
      fc.property(arbitraryScene, arbitraryScene, (a, b) => {
        const [before, after] = [structuredClone(a), structuredClone(b)];
        const d = diffScenes(a, b);
        const copy = structuredClone(d);
        applyDifference(a, d);
        expect([a, b, d]).toEqual([before, after, copy]);
      }),
    );
  });
});

describe('replay on a newer document', () => {
  it('commutes where two differences share no record', () => {
    let compared = 0;
    fc.assert(
      fc.property(
        arbitraryScene.chain((s) => fc.tuple(fc.constant(s), arbitraryChange(s), arbitraryChange(s))),
        ([base, mine, theirs]) => {
          const [d, e] = [diffScenes(base, mine), diffScenes(base, theirs)];
          const shared = [...recordsOf(d)].filter((record) => recordsOf(e).has(record));
          fc.pre(shared.length === 0);
          compared += 1;
          const [onTheirs, onMine] = [applyDifference(theirs, d), applyDifference(mine, e)];
          // only where one takes out what the other begins to use is there anything to decide, and then both ways round
          expect(onTheirs.ok).toBe(onMine.ok);
          if (onTheirs.ok && onMine.ok) {
            expect(onTheirs.scene).toEqual(onMine.scene);
            expect(loadScene(onTheirs.scene).ok).toBe(true);
          }
        },
      ),
      { numRuns: 400 },
    );
    expect(compared).toBeGreaterThan(100);
  });

  it('keeps both of two edits of different parts', () => {
    const base = sample();
    const mine = setComponentPose(base, 'brake-pedal', { at: [1, 2, 3] });
    const theirs = renameComponent(base, 'firewall', 'Bulkhead');
    const both = applied(theirs, diffScenes(base, mine));
    expect(both.components[0]!.pose).toEqual({ at: [1, 2, 3] });
    expect(both.components[2]!.name).toBe('Bulkhead');
  });

  it('names the records that both changed', () => {
    const base = sample();
    const mine = patchRules(setComponentPose(base, 'brake-pedal', { at: [1, 2, 3] }), { gap: 7 });
    const theirs = patchRules(renameComponent(base, 'brake-pedal', 'Brake'), { gap: 8 });
    expect(applyDifference(theirs, diffScenes(base, mine))).toEqual({
      ok: false,
      conflicts: ['general gaps', 'components: brake-pedal'],
    });
  });

  it('takes the same change by both as one', () => {
    const base = sample();
    const moved = setComponentPose(base, 'brake-pedal', { at: [1, 2, 3] });
    expect(applied(moved, diffScenes(base, structuredClone(moved)))).toEqual(moved);
  });

  it('merges the head field by field', () => {
    const base = sample();
    const d = diffScenes(base, patchHead(base, { name: 'Mine' }));
    expect(applied(patchHead(base, { accuracy: 0.5 }), d)).toMatchObject({ name: 'Mine', accuracy: 0.5 });
    expect(applyDifference(patchHead(base, { name: 'Theirs' }), d)).toEqual({
      ok: false,
      conflicts: ['name, unit and accuracy'],
    });
  });

  it('keeps the parts that two people add at once', () => {
    const base = sample();
    const [first] = base.components;
    const mine = addComponent(base, { ...first!, id: 'mine' });
    const theirs = addComponent(base, { ...first!, id: 'theirs' });
    const both = applied(theirs, diffScenes(base, mine));
    expect(both.components.map((c) => c.id).sort()).toEqual([
      'brake-pedal',
      'firewall',
      'mine',
      'pedal-bracket',
      'theirs',
    ]);
  });

  it('is in conflict where a part went that a new rule names, whoever was first', () => {
    const base = sample();
    const removed = removeComponents(base, ['firewall']);
    const ruled = setPairGap(base, { component: 'firewall' }, { component: 'brake-pedal' }, 5);
    const conflicts = ['pairs: component brake-pedal | component firewall | gap'];
    expect(applyDifference(removed, diffScenes(base, ruled))).toEqual({ ok: false, conflicts });
    expect(applyDifference(ruled, diffScenes(base, removed))).toEqual({ ok: false, conflicts });
  });

  it('is in conflict where a group went that a part was put in', () => {
    const base = sample();
    const parted = edits.partAgain(base, 'pedal-box').edit(base);
    const clamped = edits.moveToGroup(base, 'firewall', 'pedal-box').edit(base);
    expect(applyDifference(parted, diffScenes(base, clamped))).toEqual({
      ok: false,
      conflicts: ['components: firewall'],
    });
  });
});

describe('records', () => {
  it('counts a value that is left out and one that is undefined as the same', () => {
    const base = sample();
    expect(isEmptyDifference(diffScenes(base, patchComponent(base, 'firewall', { note: undefined })))).toBe(true);
  });

  it('keeps repeats of a pair apart', () => {
    const base = sample();
    const [rule] = base.rules.pairs;
    const turned = { ...rule!, between: [rule!.between[1], rule!.between[0]] as const, gap: 9 };
    const twice = patchRules(base, { pairs: [...base.rules.pairs, turned] });
    expect(pairKey(turned)).toBe(pairKey(rule!));
    const d = diffScenes(base, twice);
    expect(Object.keys(d.pairs!)).toEqual([`${pairKey(rule!)} #2`]);
    expect(applied(base, d)).toEqual(twice);
    expect(applied(twice, invertDifference(d))).toEqual(base);
  });

  it('says which parts to check again', () => {
    const base = sample();
    const touched = (after: Scene): string[] => [...touchedComponents(diffScenes(base, after), after)].sort();
    const all = ['brake-pedal', 'firewall', 'pedal-bracket'];
    expect(touched(base)).toEqual([]);
    expect(touched(setComponentPose(base, 'firewall', { at: [1, 0, 0] }))).toEqual(['firewall']);
    expect(touched(setGroupPose(base, 'pedal-box', {}))).toEqual(['brake-pedal', 'pedal-bracket']);
    expect(touched(patchRules(base, { movingGap: 11 }))).toEqual(all);
    expect(touched(patchHead(base, { accuracy: 0.1 }))).toEqual(all);
    expect(touched(patchHead(base, { name: 'Other', display: 'mm' }))).toEqual([]);
    expect(touched(setPairGap(base, { category: 'firewall' }, { category: 'hood' }, 3))).toEqual(['firewall']);
    expect(touched(setPairGap(base, { group: 'pedal-box' }, { category: 'hood' }, 3))).toEqual([
      'brake-pedal',
      'pedal-bracket',
    ]);
    expect(touched(removeComponents(base, ['firewall']))).toEqual(['firewall', 'pedal-bracket']);
  });
});

describe('differences from outside', () => {
  const pose = (at: number[]): unknown => ({ id: 'pedal-box', name: 'Pedal box', pose: { at } });

  it.each([
    ['unknown parts', { bodies: {} }],
    ['a change of nothing', { groups: { 'pedal-box': { before: null, after: null } } }],
    ['half a change', { groups: { 'pedal-box': { before: pose([0, 0, 0]) } } }],
    ['a record under the key of another', { groups: { other: { before: null, after: pose([0, 0, 0]) } } }],
    ['a numbered id', { groups: { 'pedal-box #2': { before: null, after: pose([0, 0, 0]) } } }],
    [
      'a rule under a key of its own making',
      { pairs: { x: { before: null, after: { between: [{ category: 'hood' }, { category: 'seat' }], gap: 1 } } } },
    ],
    ['records that are none', { groups: { 'pedal-box': { before: null, after: pose([Infinity, 0, 0]) } } }],
    ['a list for an object', { groups: [] }],
    ['a head without its fields', { head: { before: { name: 'x' }, after: { name: 'y' } } }],
    ['an order of things that are no keys', { order: { groups: { before: [], after: [5] } } }],
    ['an order of an unknown list', { order: { bodies: { before: [], after: [] } } }],
    ['too long a key', { order: { groups: { before: [], after: ['x'.repeat(401)] } } }],
  ])('refuses %s', (_what, input) => {
    expect(differenceSchema.safeParse(input).success).toBe(false);
  });

  it('refuses a key that some code would take for a prototype', () => {
    const text = `{"groups":{"__proto__":{"before":null,"after":${JSON.stringify(pose([0, 0, 0]))}}}}`;
    const result = differenceSchema.safeParse(JSON.parse(text));
    expect(result.success).toBe(false);
    expect(({} as Record<string, unknown>)['before']).toBeUndefined();
  });

  it('does not repeat what an order repeats', () => {
    const base = sample();
    const keys = base.components.map((c) => c.id);
    const d: Difference = { order: { components: { before: keys, after: [...keys, ...keys, 'nobody'] } } };
    expect(applied(base, differenceSchema.parse(d))).toEqual(base);
  });

  it('does not drown in junk', () => {
    const junk = Object.fromEntries(Array.from({ length: 300_000 }, (_, i) => [`k${i}`, 0]));
    const result = differenceSchema.safeParse({
      components: junk,
      order: { groups: { before: [], after: Array(99_999).fill(0) } },
    });
    expect(result.success).toBe(false);
    expect(result.error!.issues.length).toBeLessThanOrEqual(200);
  });
});
