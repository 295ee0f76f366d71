import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addComponent,
  addLaser,
  addMotion,
  addSolid,
  clampTogether,
  dropEmptyGroups,
  duplicateComponents,
  edits,
  freshId,
  isBetween,
  jointsOf,
  loadScene,
  moveLaser,
  moveToGroup,
  partAgain,
  patchComponent,
  patchMotion,
  removeComponents,
  removeLaser,
  removeMotion,
  removeRule,
  removeSolid,
  renameComponent,
  renameGroup,
  renameLaser,
  renameSolid,
  reorderComponents,
  setCategory,
  setComponentPose,
  setGroupPose,
  setJoint,
  setNote,
  setPairGap,
  setRecipeResult,
  setShape,
  setSolidPose,
  setSource,
  setTolerance,
  worldPose,
  type Component,
  type Motion,
  type NamedEdit,
  type Scene,
} from '#shared/scene';
import { arbitraryPose, arbitraryScene, arbitraryShape } from './arbitrary-scene';
import { sampleDocument } from './sample';

function sample(): Scene {
  const result = loadScene(sampleDocument());
  if (!result.ok) throw new Error(result.refusals[0].reason);
  return result.scene;
}

const part = (scene: Scene, id: string): Component => scene.components.find((c) => c.id === id)!;

function expectSamePlaces(before: Scene, after: Scene): void {
  for (const c of before.components) {
    const [a, b] = [worldPose(before, c), worldPose(after, part(after, c.id))];
    for (let i = 0; i < 12; i += 1) expect(Math.abs(a[i]! - b[i]!)).toBeLessThan(1e-6);
  }
}

const stroke: Motion = {
  id: 'extra',
  name: 'Extra',
  use: 'service',
  steps: [{ kind: 'slide', along: [1, 0, 0], from: 0, to: 5 }],
};

describe('fresh ids', () => {
  it.each([
    ['Brake pedal', 'brake-pedal'],
    ['Säule – Größe 2', 'saule-gro-e-2'],
    ['½', '1-2'],
    ['🔧', 'part'],
    ['', 'part'],
    ['--x--', 'x'],
    ['a'.repeat(80), 'a'.repeat(56)],
    [`${'a'.repeat(55)} b`, 'a'.repeat(55)],
  ])('%j', (name, id) => {
    expect(freshId([], name)).toBe(id);
  });

  it('is a valid id that the list does not have', () => {
    const names = fc.oneof(fc.string(), fc.string({ unit: 'grapheme', maxLength: 200 }));
    fc.assert(
      fc.property(names, fc.nat(5), (name, taken) => {
        const list: { id: string }[] = [];
        for (let i = 0; i <= taken; i += 1) list.push({ id: freshId(list, name) });
        expect(new Set(list.map((x) => x.id)).size).toBe(taken + 1);
        for (const { id } of list) expect(id).toMatch(/^[a-z0-9-]{1,64}$/);
      }),
    );
  });
});

describe('components', () => {
  it('adds at the end or after another, never an id twice', () => {
    const scene = sample();
    const added = { ...part(scene, 'firewall'), id: 'new' };
    const ids = (s: Scene): string[] => s.components.map((c) => c.id);
    expect(ids(addComponent(scene, added))).toEqual(['brake-pedal', 'pedal-bracket', 'firewall', 'new']);
    expect(ids(addComponent(scene, added, 'brake-pedal'))).toEqual(['brake-pedal', 'new', 'pedal-bracket', 'firewall']);
    expect(addComponent(scene, part(scene, 'firewall'))).toBe(scene);
  });

  it('takes the rules of a part out with it', () => {
    const after = removeComponents(sample(), ['firewall', 'nobody']);
    expect(after.components.map((c) => c.id)).toEqual(['brake-pedal', 'pedal-bracket']);
    expect(after.rules.pairs.some((r) => r.joint !== undefined)).toBe(false);
    expect(after.rules.pairs).toHaveLength(2);
  });

  it('copies parts beside themselves, with the joints among them', () => {
    const scene = setJoint(sample(), 'brake-pedal', 'pedal-bracket', 2);
    const { scene: after, ids } = duplicateComponents(scene, ['brake-pedal', 'pedal-bracket', 'nobody'], [0, 60, 0]);
    expect(ids).toEqual(['brake-pedal-2', 'pedal-bracket-2']);
    expect(after.components.map((c) => c.id)).toEqual([
      'brake-pedal',
      'brake-pedal-2',
      'pedal-bracket',
      'pedal-bracket-2',
      'firewall',
    ]);
    expect(part(after, 'brake-pedal-2')).toMatchObject({ name: 'Brake pedal copy', group: 'pedal-box' });
    expect(part(after, 'brake-pedal-2').pose.at).toEqual([0, 60, 0]);
    expect(jointsOf(after, 'brake-pedal-2')).toEqual([{ other: 'pedal-bracket-2', allow: 2 }]);
    // the firewall was not copied, so the copy is bolted to nothing
    expect(jointsOf(after, 'pedal-bracket-2')).toEqual([{ other: 'brake-pedal-2', allow: 2 }]);
    expect(loadScene(after).ok).toBe(true);
  });

  it('copies a part whose name leaves no room', () => {
    const named = renameComponent(sample(), 'firewall', '🔧'.repeat(118));
    const { scene: after, ids } = duplicateComponents(named, ['firewall'], [0, 0, 0]);
    expect([...part(after, ids[0]!).name]).toHaveLength(120);
    expect(loadScene(after).ok).toBe(true);
  });

  it('keeps the usual tolerance usual and a chosen one chosen', () => {
    const scene = sample();
    expect(part(scene, 'brake-pedal')).toMatchObject({ source: 'measured', tolerance: 2 });
    expect(part(setSource(scene, 'brake-pedal', 'guess'), 'brake-pedal')).toMatchObject({ tolerance: 12 });
    expect(part(setCategory(scene, 'brake-pedal', 'hood'), 'brake-pedal')).toMatchObject({ tolerance: 3 });
    const chosen = setTolerance(scene, 'brake-pedal', 5);
    expect(part(setSource(chosen, 'brake-pedal', 'guess'), 'brake-pedal')).toMatchObject({ tolerance: 5 });
    expect(part(setSource(scene, 'firewall', 'sheet'), 'firewall')).toMatchObject({ tolerance: 3 });
    expect(part(setSource(scene, 'brake-pedal', undefined), 'brake-pedal')).toMatchObject({ tolerance: 2 });
  });

  it('takes an empty note for none', () => {
    const noted = setNote(sample(), 'firewall', 'Cut last.');
    expect(part(noted, 'firewall').note).toBe('Cut last.');
    expect(part(setNote(noted, 'firewall', ''), 'firewall').note).toBeUndefined();
  });

  it('reorders, keeping those that are not named behind the one before them', () => {
    const { components } = sample();
    const four = { ...sample(), components: [...components, { ...components[0]!, id: 'last' }] };
    const order = (ids: string[]): string[] => reorderComponents(four, ids).components.map((c) => c.id);
    expect(order(['last', 'firewall', 'pedal-bracket', 'brake-pedal'])).toEqual([
      'last',
      'firewall',
      'pedal-bracket',
      'brake-pedal',
    ]);
    expect(order(['firewall', 'brake-pedal'])).toEqual(['firewall', 'last', 'brake-pedal', 'pedal-bracket']);
    expect(order(['firewall', 'nobody', 'firewall'])).toEqual(['brake-pedal', 'pedal-bracket', 'firewall', 'last']);
    expect(reorderComponents(four, [])).toBe(four);
  });

  it('puts in what a recipe built', () => {
    const built = {
      recipe: { kind: 'x', params: { a: 1 } },
      solids: part(sample(), 'firewall').solids,
      motions: [],
      holes: [],
    };
    const after = setRecipeResult(sample(), 'brake-pedal', built);
    expect(part(after, 'brake-pedal')).toMatchObject(built);
    expect(part(after, 'brake-pedal')).toMatchObject({ name: 'Brake pedal', tolerance: 2 });
  });
});

describe('solids and motions', () => {
  const pedal = (s: Scene): Component => part(s, 'brake-pedal');

  it('drops the recipe of a part that is changed by hand', () => {
    const scene = sample();
    expect(pedal(scene).recipe).toBeDefined();
    for (const after of [
      addSolid(scene, 'brake-pedal', { id: 'rib', shape: { kind: 'box', size: [1, 1, 1] } }),
      removeSolid(scene, 'brake-pedal', 'pad'),
      setShape(scene, 'brake-pedal', 'arm', { kind: 'box', size: [9, 9, 9] }),
      setSolidPose(scene, 'brake-pedal', 'arm', { at: [1, 1, 1] }),
      addMotion(scene, 'brake-pedal', stroke),
      removeMotion(scene, 'brake-pedal', 'stroke'),
      patchMotion(scene, 'brake-pedal', 'stroke', { name: 'Stroke' }),
    ]) {
      expect(pedal(after).recipe).toBeUndefined();
      expect('recipe' in pedal(after)).toBe(false);
    }
    expect(pedal(setComponentPose(scene, 'brake-pedal', {})).recipe).toBeDefined();
  });

  it('takes a solid out of the motions that name it, and those that are left empty', () => {
    let scene = patchMotion(sample(), 'brake-pedal', 'stroke', { solids: ['pad'] });
    scene = addMotion(scene, 'brake-pedal', { ...stroke, solids: ['arm', 'pad'] });
    const after = removeSolid(scene, 'brake-pedal', 'pad');
    expect(pedal(after).motions).toEqual([{ ...stroke, solids: ['arm'] }]);
    expect(removeSolid(after, 'brake-pedal', 'arm')).toBe(after);
  });

  it('names a solid, and takes an empty name for none', () => {
    const named = renameSolid(sample(), 'brake-pedal', 'arm', 'Arm');
    expect(pedal(named).solids[0]!.name).toBe('Arm');
    expect(pedal(renameSolid(named, 'brake-pedal', 'arm', '')).solids[0]!.name).toBeUndefined();
  });
});

describe('groups', () => {
  it('clamps together and parts again without moving anything', () => {
    fc.assert(
      fc.property(arbitraryScene, fc.array(fc.nat(5)), arbitraryPose, (scene, places, pose) => {
        const ids = scene.components.filter((_, i) => places.includes(i)).map((c) => c.id);
        const { scene: clamped, group } = clampTogether(scene, ids, 'New box', pose.at ?? [0, 0, 0]);
        expectSamePlaces(scene, clamped);
        for (const id of ids) expect(part(clamped, id).group).toBe(group);
        if (ids.length === 0) expect(clamped).toBe(scene);
        const parted = partAgain(clamped, group);
        expectSamePlaces(scene, parted);
        for (const id of ids) expect(part(parted, id).group).toBeUndefined();
        expect(parted.groups.some((g) => g.id === group)).toBe(false);
        expect(loadScene(clamped).ok && loadScene(parted).ok).toBe(true);
      }),
    );
  });

  it('moves a part from group to group without moving it', () => {
    fc.assert(
      fc.property(arbitraryScene, fc.nat(), fc.nat(), (scene, c, g) => {
        fc.pre(scene.components.length > 0);
        const { id } = scene.components[c % scene.components.length]!;
        const group = [undefined, ...scene.groups.map((x) => x.id)][g % (scene.groups.length + 1)];
        const after = moveToGroup(scene, id, group);
        expectSamePlaces(scene, after);
        expect(part(after, id).group).toBe(group);
        expect(loadScene(after).ok).toBe(true);
      }),
    );
  });

  it('leaves a part alone that is in the group already', () => {
    const scene = sample();
    expect(moveToGroup(scene, 'brake-pedal', 'pedal-box')).toBe(scene);
  });

  it('takes the rules of a group out with it', () => {
    const after = partAgain(sample(), 'pedal-box');
    expect(after.groups).toEqual([]);
    expect(after.rules.pairs).toHaveLength(2);
    const emptied = moveToGroup(moveToGroup(sample(), 'brake-pedal', undefined), 'pedal-bracket', undefined);
    expect(dropEmptyGroups(emptied)).toEqual({ ...emptied, groups: [], rules: after.rules });
  });
});

describe('lasers', () => {
  it('adds, names, moves and removes', () => {
    let scene = addLaser(sample(), { id: 'floor', name: 'Floor', point: [0, 0, 0], normal: [0, 0, 1] });
    expect(addLaser(scene, scene.lasers[1]!)).toBe(scene);
    scene = renameLaser(scene, 'floor', 'Floor line');
    scene = moveLaser(scene, 'floor', [0, 0, 5]);
    expect(scene.lasers[1]).toEqual({ id: 'floor', name: 'Floor line', point: [0, 0, 5], normal: [0, 0, 1] });
    scene = moveLaser(scene, 'floor', [0, 0, 6], [0, 1, 1]);
    expect(scene.lasers[1]).toMatchObject({ point: [0, 0, 6], normal: [0, 1, 1] });
    expect(removeLaser(scene, 'floor').lasers).toEqual(sample().lasers);
  });
});

describe('rules', () => {
  const brake = { component: 'brake-pedal' } as const;
  const column = { category: 'column' } as const;

  it('changes the gap of a pair whichever way round, in its place', () => {
    const after = setPairGap(sample(), column, brake, 9);
    expect(after.rules.pairs).toHaveLength(3);
    expect(after.rules.pairs[0]).toEqual({ between: [column, brake], gap: 9 });
    expect(isBetween(after.rules.pairs[0]!, brake, column)).toBe(true);
    expect(isBetween(after.rules.pairs[0]!, brake, { category: 'hood' })).toBe(false);
  });

  it('puts one rule in the place of repeats, as the larger of them would go on deciding', () => {
    const scene = sample();
    const repeated = {
      ...scene,
      rules: { ...scene.rules, pairs: [...scene.rules.pairs, { between: [column, brake], gap: 30 } as const] },
    };
    expect(setPairGap(repeated, brake, column, 5).rules.pairs.filter((r) => isBetween(r, brake, column))).toEqual([
      { between: [brake, column], gap: 5 },
    ]);
  });

  it('lets a joint and a gap stand for one pair, each changed on its own', () => {
    let scene = setPairGap(sample(), { component: 'pedal-bracket' }, { component: 'firewall' }, 2);
    scene = setJoint(scene, 'firewall', 'pedal-bracket', 3);
    expect(scene.rules.pairs).toHaveLength(4);
    expect(jointsOf(scene, 'firewall')).toEqual([{ other: 'pedal-bracket', allow: 3 }]);
    expect(jointsOf(scene, 'pedal-bracket')).toEqual([{ other: 'firewall', allow: 3 }]);
    expect(jointsOf(setJoint(scene, 'pedal-bracket', 'firewall', null), 'firewall')).toEqual([]);
  });

  it('makes no rule about what is not there, nor of a part with itself', () => {
    const scene = sample();
    expect(setPairGap(scene, brake, brake, 1)).toBe(scene);
    expect(setPairGap(scene, brake, { component: 'nobody' }, 1)).toBe(scene);
    expect(setPairGap(scene, { group: 'nobody' }, brake, 1)).toBe(scene);
    expect(setJoint(scene, 'firewall', 'firewall', 1)).toBe(scene);
    expect(setJoint(scene, 'firewall', 'nobody', 1)).toBe(scene);
    expect(setPairGap(scene, { group: 'pedal-box' }, { group: 'pedal-box' }, 1).rules.pairs[2]!.gap).toBe(1);
  });

  it('removes a rule by its place', () => {
    expect(removeRule(sample(), 1).rules.pairs.map((r) => r.gap)).toEqual([8, 3]);
  });
});

describe('edits of what is not there', () => {
  it('gives the same scene back', () => {
    const scene = sample();
    const no = 'nobody';
    const shape = { kind: 'box', size: [1, 1, 1] } as const;
    for (const after of [
      removeComponents(scene, [no]),
      duplicateComponents(scene, [no], [0, 0, 0]).scene,
      renameComponent(scene, no, 'x'),
      setComponentPose(scene, no, {}),
      setCategory(scene, no, 'hood'),
      setSource(scene, no, 'guess'),
      setTolerance(scene, no, 1),
      setNote(scene, no, 'x'),
      patchComponent(scene, no, {}),
      addSolid(scene, no, { id: 'x', shape }),
      addSolid(scene, 'firewall', { id: 'sheet', shape }),
      removeSolid(scene, 'firewall', no),
      setShape(scene, 'firewall', no, shape),
      addMotion(scene, no, stroke),
      removeMotion(scene, 'brake-pedal', no),
      patchMotion(scene, 'brake-pedal', no, { name: 'x' }),
      setGroupPose(scene, no, {}),
      renameGroup(scene, no, 'x'),
      moveToGroup(scene, no, 'pedal-box'),
      moveToGroup(scene, 'firewall', no),
      clampTogether(scene, [no], 'x', [0, 0, 0]).scene,
      partAgain(scene, no),
      dropEmptyGroups(scene),
      reorderComponents(scene, [no]),
      removeLaser(scene, no),
      renameLaser(scene, no, 'x'),
      moveLaser(scene, no, [0, 0, 0]),
      setJoint(scene, no, 'firewall', null),
      removeRule(scene, 9),
    ]) {
      expect(after).toBe(scene);
    }
  });
});

describe('named edits', () => {
  const scene = sample();
  const box = { kind: 'box', size: [1, 1, 1] } as const;

  it.each<[NamedEdit, string]>([
    [edits.addComponent(scene, { ...part(scene, 'firewall'), id: 'n', name: 'Cowl' }), 'Add Cowl'],
    [edits.moveComponent(scene, 'brake-pedal', { at: [1, 2, 3] }), 'Move Brake pedal'],
    [edits.removeComponents(scene, ['brake-pedal']), 'Remove Brake pedal'],
    [edits.removeComponents(scene, ['brake-pedal', 'firewall']), 'Remove 2 parts'],
    [edits.duplicateComponents(scene, ['firewall'], [0, 0, 1]), 'Copy Firewall'],
    [edits.renameComponent(scene, 'firewall', 'Bulkhead'), 'Rename Firewall'],
    [edits.setCategory(scene, 'firewall', 'cowl'), 'Change what Firewall is'],
    [edits.setSource(scene, 'firewall', 'guess'), 'Change the source of Firewall'],
    [edits.setTolerance(scene, 'firewall', 4), 'Change the tolerance of Firewall'],
    [edits.setNote(scene, 'firewall', 'x'), 'Change the note on Firewall'],
    [
      edits.setRecipeResult(scene, 'firewall', {
        recipe: { kind: 'x', params: {} },
        solids: [{ id: 'x', shape: box }],
        motions: [],
        holes: [],
      }),
      'Rebuild Firewall',
    ],
    [edits.reorderComponents(scene, ['firewall', 'brake-pedal']), 'Change the fitting order'],
    [edits.addSolid(scene, 'firewall', { id: 'rib', shape: box }), 'Add a solid to Firewall'],
    [edits.removeSolid(scene, 'brake-pedal', 'pad'), 'Remove pad of Brake pedal'],
    [edits.setShape(scene, 'firewall', 'sheet', box), 'Resize Firewall'],
    [edits.moveSolid(scene, 'brake-pedal', 'arm', { at: [1, 1, 1] }), 'Move arm of Brake pedal'],
    [edits.renameSolid(scene, 'brake-pedal', 'arm', 'Arm'), 'Rename arm of Brake pedal'],
    [edits.addMotion(scene, 'firewall', stroke), 'Add Extra to Firewall'],
    [edits.changeMotion(scene, 'brake-pedal', 'stroke', { name: 'x' }), 'Change Brake stroke of Brake pedal'],
    [edits.removeMotion(scene, 'brake-pedal', 'stroke'), 'Remove Brake stroke of Brake pedal'],
    [edits.clampTogether(scene, ['firewall', 'brake-pedal'], 'Box', [0, 0, 0]), 'Clamp 2 parts together as Box'],
    [edits.partAgain(scene, 'pedal-box'), 'Part Pedal box'],
    [edits.moveToGroup(scene, 'firewall', 'pedal-box'), 'Clamp Firewall to Pedal box'],
    [edits.moveToGroup(scene, 'brake-pedal', undefined), 'Take Brake pedal out of its group'],
    [edits.moveGroup(scene, 'pedal-box', {}), 'Move Pedal box'],
    [edits.renameGroup(scene, 'pedal-box', 'x'), 'Rename Pedal box'],
    [edits.addLaser(scene, { id: 'x', name: 'Floor line', point: [0, 0, 0], normal: [0, 0, 1] }), 'Add Floor line'],
    [edits.removeLaser(scene, 'column-line'), 'Remove Column line'],
    [edits.renameLaser(scene, 'column-line', 'x'), 'Rename Column line'],
    [edits.moveLaser(scene, 'column-line', [1, 1, 1]), 'Move Column line'],
    [
      edits.setPairGap(scene, { group: 'pedal-box' }, { category: 'inner-fender' }, 4),
      'Set the gap of Pedal box and inner fender',
    ],
    [edits.setJoint(scene, 'brake-pedal', 'firewall', 1), 'Join Brake pedal and Firewall'],
    [edits.setJoint(scene, 'pedal-bracket', 'firewall', null), 'Part Pedal bracket and Firewall'],
    [edits.removeRule(scene, 0), 'Remove the gap rule of Brake pedal and column'],
    [edits.removeRule(scene, 1), 'Remove the joint of Pedal bracket and Firewall'],
    [edits.setGeneralGaps(scene, { gap: 7, touch: 0.02 }), 'Change the general gaps'],
    [edits.setName(scene, 'Layout 4'), 'Rename the scene to Layout 4'],
    [edits.setDisplay(scene, 'mm'), 'Change the unit'],
    [edits.setAccuracy(scene, 0.1), 'Change the accuracy'],
  ])('%#: %s', ({ label, edit }, expected) => {
    expect(label).toBe(expected);
    const after = edit(scene);
    expect(after).not.toEqual(scene);
    expect(loadScene(after).ok).toBe(true);
    expect(scene).toEqual(sample());
  });

  it('changes nothing where the document would not load any more', () => {
    for (const { edit } of [
      edits.setTolerance(scene, 'firewall', -1),
      edits.setName(scene, ''),
      edits.setAccuracy(scene, 0),
      edits.setShape(scene, 'firewall', 'sheet', { kind: 'box', size: [0, 1, 1] }),
      edits.moveComponent(scene, 'firewall', { at: [0, 0, 1e9] }),
      edits.moveGroup(scene, 'pedal-box', { at: [0, 0, 99_999] }),
      edits.addMotion(scene, 'brake-pedal', { ...stroke, use: 'operating' }),
      edits.addMotion(scene, 'firewall', { ...stroke, steps: [] }),
      edits.moveLaser(scene, 'column-line', [0, 0, 0], [0, 0, 0]),
      edits.setPairGap(scene, { category: 'hood' }, { category: 'engine' }, -1),
      edits.setGeneralGaps(scene, { touch: 0 }),
      edits.addComponent(scene, { ...part(scene, 'firewall'), id: 'x', group: 'nobody' }),
      edits.moveComponent(scene, 'nobody', {}),
    ]) {
      expect(edit(scene)).toBe(scene);
    }
  });

  it('acts on the scene as it is when it runs', () => {
    const move = edits.moveComponent(scene, 'firewall', { at: [1, 0, 0] });
    const later = renameComponent(scene, 'brake-pedal', 'Brake');
    expect(part(move.edit(later), 'firewall').pose).toEqual({ at: [1, 0, 0] });
    expect(part(move.edit(later), 'brake-pedal').name).toBe('Brake');
    expect(move.edit(removeComponents(scene, ['firewall'])).components).toHaveLength(2);
  });
});

describe('bare edits', () => {
  // what they leave to the caller: values in bounds, and free solids for an operating motion
  it('leaves a document that loads, whatever is done to whatever', () => {
    const ids = fc.constantFrom('a', 'b', 'c', 'constructor', 'nobody');
    const side = fc.oneof(
      fc.record({ component: ids }),
      fc.record({ group: ids }),
      fc.constant({ category: 'hood' } as const),
    );
    type Step = (s: Scene) => Scene;
    const step: fc.Arbitrary<Step> = fc.oneof(
      fc.tuple(ids, arbitraryPose).map(
        ([id, pose]): Step =>
          (s) =>
            setComponentPose(s, id, pose),
      ),
      fc.tuple(ids, arbitraryPose).map(
        ([id, pose]): Step =>
          (s) =>
            setGroupPose(s, id, pose),
      ),
      fc.array(ids).map(
        (all): Step =>
          (s) =>
            removeComponents(s, all),
      ),
      fc.array(ids).map(
        (all): Step =>
          (s) =>
            duplicateComponents(s, all, [1, 2, 3]).scene,
      ),
      fc.array(ids).map(
        (all): Step =>
          (s) =>
            clampTogether(s, all, 'Clamp', [1, 2, 3]).scene,
      ),
      fc.array(ids).map(
        (all): Step =>
          (s) =>
            reorderComponents(s, all),
      ),
      fc.tuple(ids, ids).map(
        ([id, to]): Step =>
          (s) =>
            moveToGroup(s, id, to),
      ),
      ids.map(
        (id): Step =>
          (s) =>
            partAgain(s, id),
      ),
      fc.tuple(ids, ids, arbitraryShape).map(
        ([c, id, shape]): Step =>
          (s) =>
            addSolid(s, c, { id, shape }),
      ),
      fc.tuple(ids, ids).map(
        ([c, id]): Step =>
          (s) =>
            removeSolid(s, c, id),
      ),
      fc.tuple(ids, ids, arbitraryShape).map(
        ([c, id, shape]): Step =>
          (s) =>
            setShape(s, c, id, shape),
      ),
      ids.map(
        (c): Step =>
          (s) =>
            addMotion(s, c, stroke),
      ),
      fc.tuple(ids, ids).map(
        ([c, id]): Step =>
          (s) =>
            removeMotion(s, c, id),
      ),
      fc.tuple(side, side).map(
        ([a, b]): Step =>
          (s) =>
            setPairGap(s, a, b, 5),
      ),
      fc.tuple(ids, ids, fc.constantFrom(null, 2)).map(
        ([a, b, allow]): Step =>
          (s) =>
            setJoint(s, a, b, allow),
      ),
      fc.nat(3).map(
        (i): Step =>
          (s) =>
            removeRule(s, i),
      ),
    );
    fc.assert(
      fc.property(arbitraryScene, fc.array(step, { maxLength: 8 }), (start, all) => {
        const after = all.reduce((scene, one) => one(scene), start);
        expect(loadScene(structuredClone(after))).toMatchObject({ ok: true });
      }),
      { numRuns: 300 },
    );
  });
});
