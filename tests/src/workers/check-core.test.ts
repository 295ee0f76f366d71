import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkScene, findingKey, prepareScene } from '#shared/check';
import { patchHead, patchRules, removeComponents, setComponentPose, setTolerance, type Scene } from '#shared/scene';
import { CheckCore } from '../../../src/workers/check-core';
import { benchScene, MESH, pyramidMesh } from './scenes';

const move =
  (id: string, x: number, y = 0) =>
  (scene: Scene) =>
    setComponentPose(scene, id, { at: [x, y, 100] });

function whole(scene: Scene) {
  const result = prepareScene(scene, new Map([[MESH, pyramidMesh()]]));
  if (!result.ok) throw new Error(result.refusal.reason);
  return checkScene(result.prepared, '');
}

function started(): CheckCore {
  const core = new CheckCore();
  core.putMesh(MESH, pyramidMesh());
  return core;
}

/** Works until it is done; the number of slices it took. */
function finish(core: CheckCore): number {
  let slices = 1;
  while (core.run(() => true)) slices += 1;
  return slices;
}

const byteEqual = (a: unknown, b: unknown): void => expect(JSON.stringify(a)).toBe(JSON.stringify(b));

describe('the live check', () => {
  it('ends with the findings of the whole check, to the last bit', () => {
    const core = started();
    const scene = benchScene();
    core.take(scene);
    finish(core);
    const live = core.answer();
    const report = whole(scene);
    expect(live.phase).toBe('done');
    expect(report.findings.length).toBeGreaterThan(25);
    expect(new Set(report.findings.map((f) => f.verdict)).size).toBeGreaterThan(2);
    byteEqual(live.findings, report.findings);
    byteEqual(live.unchecked, report.unchecked);
    byteEqual(live.meshes, report.meshes);
  });

  it('does so after any edits, interruptions and undos', () => {
    const edit = fc.oneof(
      fc
        .tuple(fc.constantFrom('wall', 'post', 'rock', 'hanger', 'left'), fc.integer({ min: -90, max: 2000 }))
        .map(([id, x]) => move(id, x)),
      fc.integer({ min: 0, max: 5 }).map((t) => (s: Scene) => setTolerance(s, 'wall', t)),
      fc.integer({ min: 0, max: 20 }).map((gap) => (s: Scene) => patchRules(s, { gap })),
      fc.constant((s: Scene) => removeComponents(s, ['post'])),
      fc.constantFrom(0.05, 0.5).map((accuracy) => (s: Scene) => patchHead(s, { accuracy })),
      fc.constant(() => benchScene()),
    );
    const turns = fc.array(fc.tuple(edit, fc.nat(12)), { minLength: 1, maxLength: 5 });
    fc.assert(
      fc.property(turns, (edits) => {
        const core = started();
        let scene = benchScene();
        core.take(scene);
        for (const [change, slices] of edits) {
          scene = change(scene);
          core.take(scene);
          for (let i = 0; i < slices; i += 1) core.run(() => true);
        }
        finish(core);
        byteEqual(core.answer().findings, whole(scene).findings);
      }),
      { numRuns: 12 },
    );
  });

  it('works out again only what an edit touches, and nothing for one that decides nothing', () => {
    const core = started();
    const scene = benchScene();
    core.take(scene);
    const all = finish(core);
    core.take(patchHead(scene, { name: 'Another', display: 'in' }));
    expect(core.answer()).toMatchObject({ phase: 'done', done: all, total: all });
    core.take(move('rock', -70)(scene));
    const { findings, done } = core.answer();
    expect(findings.length).toBe(done);
    expect(findings.some((f) => f.between.includes('rock'))).toBe(false);
    const touched = whole(scene).findings.filter((f) => f.between.includes('rock')).length;
    expect(finish(core)).toBe(touched);
    // and nothing at all when it comes back
    core.take(scene);
    expect(core.answer().phase).toBe('done');
  });

  it('does not work everything out again because one part goes far away', () => {
    const core = started();
    const scene = benchScene();
    core.take(scene);
    finish(core);
    core.take(move('rock', 900)(scene));
    expect(core.answer().findings.length).toBeGreaterThan(15);
  });

  it('takes what was moved at rest first, then its motions, then the rest', () => {
    const core = started();
    const scene = benchScene();
    core.take(scene);
    core.run(() => true);
    core.take(move('post', 35, 60)(scene));
    const order: string[] = [];
    let known = new Set(core.answer().findings);
    while (core.run(() => true)) {
      const now = core.answer().findings;
      for (const f of now) {
        if (!known.has(f)) order.push(`${f.between.includes('post') ? 'post' : 'other'} ${f.motions.length === 0}`);
      }
      known = new Set(now);
    }
    const stages = order.filter((stage, i) => stage !== order[i - 1]);
    expect(stages).toEqual(['post true', 'post false', 'other true', 'other false']);
  });

  it('lets no gap blink while a hand moves, works out each in its turn, and shows none but its own when it lets go', () => {
    const core = started();
    const scene = benchScene();
    core.take(scene);
    finish(core);
    const all = core.answer().findings.length;
    const worked = new Set<string>();
    let before = core.answer().findings;
    for (let x = 1; x <= 40; x += 1) {
      core.take(move('post', 30 + x / 10, 60)(scene), true);
      core.run(() => true);
      core.run(() => true);
      const { findings, phase } = core.answer();
      expect([findings.length, phase]).toEqual([all, 'checking']);
      for (const f of findings) if (!before.includes(f)) worked.add(findingKey(f));
      before = findings;
    }
    const touched = before.filter((f) => f.between.includes('post')).map(findingKey);
    expect([...worked].sort()).toEqual(touched.sort());
    const end = move('post', 37, 60)(scene);
    core.take(end);
    expect(core.answer().findings.length).toBe(all - touched.length);
    finish(core);
    byteEqual(core.answer().findings, whole(end).findings);
  });

  it('gives all other gaps where a mesh is still on its way, or bad', () => {
    const core = new CheckCore();
    const scene = benchScene();
    core.take(scene);
    finish(core);
    const others = whole(removeComponents(scene, ['rock'])).findings;
    expect(core.answer()).toMatchObject({ phase: 'reading-meshes', problem: null });
    byteEqual(core.answer().findings, others);
    core.failMesh(MESH, 'the file is truncated.');
    expect(core.answer()).toMatchObject({ phase: 'failed', problem: 'rock not checked: the file is truncated.' });
    byteEqual(core.answer().findings, others);
    core.forgive([MESH]);
    expect(core.wanted()).toEqual([MESH]);
    core.putMesh(MESH, pyramidMesh());
    finish(core);
    expect(core.answer()).toMatchObject({ phase: 'done', problem: null });
    byteEqual(core.answer().findings, whole(scene).findings);
  });

  it('leaves out a part beyond the limits and says so', () => {
    const core = started();
    const scene = move('post', 200_000)(benchScene());
    core.take(scene);
    finish(core);
    const live = core.answer();
    expect(live.phase).toBe('failed');
    expect(live.problem).toMatch(/^post is not checked: .*100 m/);
    byteEqual(live.findings, whole(removeComponents(scene, ['post'])).findings);
  });
});
