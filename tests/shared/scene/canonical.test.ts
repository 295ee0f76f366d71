import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  canonicalSceneText,
  loadScene,
  loadSceneText,
  patchComponent,
  sceneForExport,
  type Scene,
} from '#shared/scene';
import { arbitraryScene } from './arbitrary-scene';
import { sampleDocument } from './sample';

/** The same value with the keys of its objects the other way round. */
function turned(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(turned);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([k, v]) => [k, turned(v)]),
  );
}

function sample(): Scene {
  const result = loadScene(sampleDocument());
  if (!result.ok) throw new Error(result.refusals[0].reason);
  return result.scene;
}

describe('canonical text', () => {
  it('is one text for one scene, whatever the order of keys', () => {
    fc.assert(
      fc.property(arbitraryScene, (scene) => {
        const text = canonicalSceneText(scene);
        expect(canonicalSceneText(turned(scene) as Scene)).toBe(text);
        const again = loadSceneText(text);
        expect(again).toEqual({ ok: true, scene });
        expect(again.ok && canonicalSceneText(again.scene)).toBe(text);
      }),
    );
  });

  it('writes defaults out, leaves out what is not there, and knows one zero', () => {
    const scene = sample();
    const text = canonicalSceneText(scene);
    expect(text.startsWith('{"accuracy":0.05,"components":[{"category":"pedal","group":"pedal-box",')).toBe(true);
    expect(text).toContain('"tolerance":0');
    expect(canonicalSceneText(patchComponent(scene, 'firewall', { note: undefined }))).toBe(text);
    const zero = patchComponent(scene, 'firewall', { tolerance: -0 });
    expect(canonicalSceneText(zero)).toBe(canonicalSceneText(patchComponent(scene, 'firewall', { tolerance: 0 })));
  });
});

describe('a file to take away', () => {
  it('names meshes by their paths beside it, and is read back to the same scene', () => {
    const scene = sample();
    const stored = 'ab'.repeat(32);
    const arm = scene.components[0]!.solids[0]!;
    const inStore = patchComponent(scene, 'brake-pedal', {
      solids: [arm, { ...scene.components[0]!.solids[1]!, shape: { kind: 'mesh', mesh: stored, scale: 25.4 } }],
    });
    const text = sceneForExport(inStore, new Map([[stored, 'pad.stl']]));
    expect(loadSceneText(text)).toEqual({ ok: true, scene });
    expect(loadSceneText(sceneForExport(inStore))).toEqual({ ok: true, scene: inStore });
    expect(text.split('\n')[1]).toBe('  "format": "gapwright-scene",');
    expect(text.endsWith('}\n')).toBe(true);
  });
});
