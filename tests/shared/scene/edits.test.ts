import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addComponent,
  addMotion,
  addSolid,
  clampTogether,
  dropEmptyGroups,
  duplicateComponents,
  freshId,
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
  type Component,
  type Motion,
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
