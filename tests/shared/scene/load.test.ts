import { describe, expect, it } from 'vitest';
import { canonicalSceneText, CATEGORIES, loadScene, loadSceneText, meshPathFault, type Scene } from '#shared/scene';
import { sampleDocument, spoiled } from './sample';

function loaded(input: unknown): Scene {
  const result = loadScene(input);
  if (!result.ok) throw new Error(`${result.refusals[0].path}: ${result.refusals[0].reason}`);
  return result.scene;
}

describe('documents that are read', () => {
  it("reads the page's example", () => {
    const scene = loaded(sampleDocument());
    expect(scene.components.map((c) => c.id)).toEqual(['brake-pedal', 'pedal-bracket', 'firewall']);
    expect(scene.components[0]!.solids[1]!.shape).toEqual({ kind: 'mesh', mesh: 'pad.stl', scale: 25.4 });
    expect(scene.components[0]!.recipe).toEqual({
      kind: 'hanging-pedal',
      params: { arm: 240, hand: 'left', pad: true },
    });
  });

  it('fills in the defaults that the page names', () => {
    const scene = loaded({
      format: 'gapwright-scene',
      version: 1,
      name: 'Bare',
      groups: [{ id: 'g', name: 'G' }],
      components: [
        {
          id: 'a',
          name: 'A',
          category: 'other',
          solids: [{ id: 's', shape: { kind: 'box', size: [1, 2, 3] } }],
          motions: [
            { id: 'm', name: 'M', use: 'service', steps: [{ kind: 'slide', along: [1, 0, 0], to: 5 }] },
            {
              id: 'n',
              name: 'N',
              use: 'operating',
              steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 0, 2], to: 5 }],
            },
          ],
        },
        { id: 'b', name: 'B', category: 'other', solids: [{ id: 's', shape: { kind: 'box', size: [1, 2, 3] } }] },
      ],
      rules: { pairs: [{ between: [{ component: 'a' }, { component: 'b' }], joint: {} }] },
    });
    expect(scene).toMatchObject({ display: 'mm', lasers: [], accuracy: 0.05 });
    expect(scene.groups[0]!.pose).toEqual({});
    expect(scene.rules).toEqual({
      gap: 6,
      movingGap: 10,
      touch: 0.01,
      pairs: [{ between: [{ component: 'a' }, { component: 'b' }], joint: { allow: 1 } }],
    });
    expect(scene.components[1]).toMatchObject({ pose: {}, tolerance: 0, motions: [], holes: [] });
    expect(scene.components[0]!.motions.map((m) => m.steps[0]!.from)).toEqual([0, 0]);
    const bare = loaded({ format: 'gapwright-scene', version: 1, name: 'x', components: [] });
    expect(bare.rules).toEqual({ gap: 6, movingGap: 10, touch: 0.01, pairs: [] });
  });

  it('reads again what it wrote, to the same scene and the same text', () => {
    const scene = loaded(sampleDocument());
    const text = canonicalSceneText(scene);
    const again = loadSceneText(text);
    expect(again).toEqual({ ok: true, scene });
    expect(again.ok && canonicalSceneText(again.scene)).toBe(text);
  });

  it('passes over a byte order mark', () => {
    const text = JSON.stringify(sampleDocument());
    expect(loadSceneText(`\ufeff${text}`).ok).toBe(true);
    expect(loadSceneText(Uint8Array.of(0xef, 0xbb, 0xbf, ...new TextEncoder().encode(text))).ok).toBe(true);
  });

  it('decodes UTF-8 of every length, over the seams of its chunks too', () => {
    for (let shift = 0; shift < 4; shift += 1) {
      const note = 'x'.repeat(shift) + 'aä″😀'.repeat(490);
      const document = spoiled(sampleDocument(), 'components[1].note', note);
      const padded = ' '.repeat(3000 + shift) + JSON.stringify(document);
      const result = loadSceneText(new TextEncoder().encode(padded));
      expect(result.ok && result.scene.components[1]!.note).toBe(note);
    }
  });

  it('takes the last of two equal keys, as JSON does', () => {
    const text = JSON.stringify(sampleDocument()).replace('"accuracy":0.05', '"accuracy":0.01,"accuracy":0.02');
    const result = loadSceneText(text);
    expect(result.ok && result.scene.accuracy).toBe(0.02);
  });

  it('takes a 0 as `from` of a later step, as a document with its defaults written out has it', () => {
    const document = spoiled(sampleDocument(), 'components[1].motions[0].steps[1].from', 0);
    expect(loaded(document)).toEqual(loaded(sampleDocument()));
  });

  it('knows every category of the page, and categories against themselves', () => {
    expect(CATEGORIES).toHaveLength(28);
    for (const category of CATEGORIES) {
      let document = spoiled(sampleDocument(), 'components[2].category', category);
      document = spoiled(document, 'rules.pairs[3]', { between: [{ category }, { category }], gap: 0 });
      expect(loaded(document).components[2]!.category).toBe(category);
    }
  });

  it('takes two rules about the same two sides', () => {
    const document = spoiled(sampleDocument(), 'rules.pairs[3]', {
      between: [{ category: 'column' }, { component: 'brake-pedal' }],
      gap: 9,
    });
    expect(loaded(document).rules.pairs).toHaveLength(4);
  });

  it('lets two operating motions share a component but not a solid', () => {
    const first = { id: 'm', name: 'M', use: 'operating', solids: ['arm'] };
    const steps = [{ kind: 'slide', along: [1, 0, 0], to: 5 }];
    const document = spoiled(sampleDocument(), 'components[0].motions', [
      { ...first, steps },
      { ...first, id: 'n', solids: ['pad'], steps },
      { id: 'o', name: 'O', use: 'service', steps },
    ]);
    expect(loaded(document).components[0]!.motions).toHaveLength(3);
  });

  it.each([
    'pad.stl',
    'meshes/pad.stl',
    './pad.stl',
    'a/../pad.stl',
    '.hidden',
    '..pad.stl',
    'a b/ü.stl',
    'ab'.repeat(32),
  ])('takes the mesh path %s', (path) => {
    expect(meshPathFault(path)).toBeNull();
  });

  it('leaves what it was given as it was', () => {
    const document = sampleDocument();
    loaded(document);
    expect(document).toEqual(sampleDocument());
  });

  it('keeps parameters whose names objects have already', () => {
    const params = { constructor: 1, toString: 'x', valueOf: true };
    expect(
      loaded(spoiled(sampleDocument(), 'components[0].recipe.params', params)).components[0]!.recipe!.params,
    ).toEqual(params);
  });
});
