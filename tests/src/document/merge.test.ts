import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addComponent,
  canonicalSceneText,
  clampTogether,
  loadScene,
  moveToGroup,
  partAgain,
  patchHead,
  patchRules,
  removeComponents,
  setPairGap,
  worldPose,
} from '#shared/scene';
import { merge, type Merged } from '../../../src/document/merge';
import { arbitraryChange, box, move, row, xOf } from './scenes';

type Conflict = Extract<Merged, { kind: 'conflict' }>;
const asConflict = (merged: Merged): Conflict => {
  expect(merged.kind).toBe('conflict');
  return merged as Conflict;
};

describe('a merge', () => {
  it('has both where other parts were changed', () => {
    const base = row();
    const merged = merge(base, move('a', 1)(base), patchHead(move('b', 25)(base), { name: 'Theirs' }));
    expect(merged.kind).toBe('merged');
    if (merged.kind !== 'merged') return;
    expect(xOf(merged.scene, 'a')).toBe(1);
    expect(xOf(merged.scene, 'b')).toBe(25);
    expect(merged.scene.name).toBe('Theirs');
  });

  it('has both added parts', () => {
    const base = row();
    const merged = merge(base, addComponent(base, box('mine', 80)), addComponent(base, box('theirs', 90)));
    expect(merged.kind === 'merged' && merged.scene.components.map((c) => c.id).sort()).toEqual([
      'a',
      'b',
      'c',
      'mine',
      'theirs',
    ]);
  });

  it('gives two documents to choose from where both changed one part, with all else in both', () => {
    const base = row();
    const mine = move('c', 41)(move('a', 1)(base));
    const theirs = move('b', 25)(move('a', 2)(base));
    const found = asConflict(merge(base, mine, theirs));
    expect(found.records).toEqual(['components: a']);
    expect(['a', 'b', 'c'].map((id) => xOf(found.mine, id))).toEqual([1, 25, 41]);
    expect(['a', 'b', 'c'].map((id) => xOf(found.theirs, id))).toEqual([2, 25, 41]);
  });

  it('disputes a part that one moved and the other deleted, both ways round', () => {
    const base = row();
    const moved = move('c', 41)(base);
    const deleted = removeComponents(base, ['c']);
    const keep = asConflict(merge(base, moved, deleted));
    expect(xOf(keep.mine, 'c')).toBe(41);
    expect(xOf(keep.theirs, 'c')).toBeUndefined();
    const drop = asConflict(merge(base, deleted, moved));
    expect(xOf(drop.mine, 'c')).toBeUndefined();
    expect(xOf(drop.theirs, 'c')).toBe(41);
  });

  it('disputes a rule on a part that the other deleted', () => {
    const base = row();
    const ruled = setPairGap(base, { component: 'b' }, { component: 'c' }, 9);
    const deleted = removeComponents(base, ['c']);
    const found = asConflict(merge(base, ruled, deleted));
    expect(xOf(found.mine, 'c')).toBe(40);
    expect(found.mine.rules.pairs).toContainEqual(ruled.rules.pairs.at(-1));
    expect(canonicalSceneText(found.theirs)).toBe(canonicalSceneText(deleted));
    const other = asConflict(merge(base, move('a', 1)(deleted), ruled));
    expect([xOf(other.mine, 'a'), xOf(other.theirs, 'a')]).toEqual([1, 1]);
    expect(xOf(other.mine, 'c')).toBeUndefined();
    expect(canonicalSceneText(other.theirs)).toBe(canonicalSceneText(move('a', 1)(ruled)));
  });

  it('leaves a part where it stands in the car when the group around it was taken apart', () => {
    const base = clampTogether(row(), ['a', 'b'], 'Pair', [100, 0, 0]).scene;
    const group = base.groups[0]!.id;
    const mine = partAgain(base, group);
    const theirs = moveToGroup(base, 'c', group);
    const found = asConflict(merge(base, mine, theirs));
    expect(found.mine.groups).toEqual([]);
    const c = found.mine.components.find((x) => x.id === 'c')!;
    expect(worldPose(found.mine, c)[3]).toBeCloseTo(40, 9);
    expect(found.theirs.groups.map((g) => g.id)).toEqual([group]);
  });

  it('disputes general gaps only where both changed the same', () => {
    const base = row();
    const both = merge(base, patchRules(base, { gap: 7 }), patchRules(base, { movingGap: 12 }));
    expect(both.kind === 'merged' && [both.scene.rules.gap, both.scene.rules.movingGap]).toEqual([7, 12]);
    const found = asConflict(merge(base, patchRules(base, { gap: 7 }), patchRules(base, { gap: 8, movingGap: 12 })));
    expect([found.mine.rules.gap, found.mine.rules.movingGap]).toEqual([7, 12]);
    expect([found.theirs.rules.gap, found.theirs.rules.movingGap]).toEqual([8, 12]);
  });

  it('always gives documents that load, and mine alone where they changed nothing', () => {
    const changes = fc.array(arbitraryChange, { maxLength: 6 });
    fc.assert(
      fc.property(changes, changes, changes, (before, own, other) => {
        const base = before.reduce((s, change) => change(s), row());
        const mine = own.reduce((s, change) => change(s), base);
        const theirs = other.reduce((s, change) => change(s), base);
        const merged = merge(base, mine, theirs);
        const scenes = merged.kind === 'merged' ? [merged.scene] : [merged.mine, merged.theirs];
        for (const scene of scenes) expect(loadScene(scene)).toMatchObject({ ok: true });
        if (merged.kind === 'conflict') expect(merged.records.length).toBeGreaterThan(0);
        const alone = merge(base, mine, base);
        expect(alone.kind === 'merged' && canonicalSceneText(alone.scene)).toBe(canonicalSceneText(mine));
        const read = merge(base, base, theirs);
        expect(read.kind === 'merged' && canonicalSceneText(read.scene)).toBe(canonicalSceneText(theirs));
      }),
      { numRuns: 300 },
    );
  });

  it('does not doubt what both changed alike', () => {
    const base = row();
    const same = move('a', 3)(base);
    expect(merge(base, same, move('a', 3)(base))).toEqual({ kind: 'merged', scene: same });
  });
});
