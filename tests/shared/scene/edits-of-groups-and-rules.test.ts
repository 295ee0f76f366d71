import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addLaser,
  clampTogether,
  dropEmptyGroups,
  isBetween,
  jointsOf,
  loadScene,
  moveLaser,
  moveToGroup,
  partAgain,
  removeLaser,
  removeRule,
  renameLaser,
  setJoint,
  setPairGap,
  worldPose,
  type Component,
  type Scene,
} from '#shared/scene';
import { arbitraryPose, arbitraryScene } from './arbitrary-scene';
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
