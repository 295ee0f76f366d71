import { describe, expect, it } from 'vitest';
import { canonicalSceneText, loadScene, type Scene } from '#shared/scene';
import { changedSince } from '../../../../src/features/report/changed-since';
import { smallScene } from '../bench/support';

const stored = (scene: Scene): unknown => JSON.parse(canonicalSceneText(scene));
const checked = (): Scene => {
  const loaded = loadScene(stored(smallScene()));
  if (!loaded.ok) throw new Error('the small scene is refused');
  return loaded.scene;
};

describe('whether a report still holds', () => {
  it('says nothing as long as nothing that was checked differs', () => {
    const scene = checked();
    expect(changedSince(scene, stored(scene))).toBeNull();
    expect(changedSince(scene, stored({ ...scene, name: 'Layout 2', display: 'mm' }))).toBeNull();
  });

  it('names the part that was moved', () => {
    const scene = checked();
    const components = scene.components.map((c) =>
      c.id === 'wiper' ? { ...c, pose: { at: [-210, 0, 700] as const } } : c,
    );
    expect(changedSince(scene, stored({ ...scene, components }))).toEqual({ parts: ['Wiper'] });
  });

  it('names a part that is gone by its old name', () => {
    const scene = checked();
    const components = scene.components.filter((c) => c.id !== 'wiper');
    expect(changedSince(scene, stored({ ...scene, components }))?.parts).toContain('Wiper');
  });

  it('takes a changed general gap for a change of every part', () => {
    const scene = checked();
    const rules = { ...scene.rules, gap: scene.rules.gap + 1 };
    expect(changedSince(scene, stored({ ...scene, rules }))?.parts).toHaveLength(scene.components.length);
  });

  it('says so too where the scene of now cannot be read', () => {
    expect(changedSince(checked(), { format: 'something else' })).toEqual({ parts: [] });
  });
});
