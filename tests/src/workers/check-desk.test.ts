import { describe, expect, it } from 'vitest';
import { removeComponents, setComponentPose } from '#shared/scene';
import { createCheckDesk } from '../../../src/workers/check-desk';
import type { CheckAnswer } from '../../../src/workers/live-check';
import type { MeshAnswer } from '../../../src/workers/mesh-reader';
import { benchScene, MESH, pyramidMesh } from './scenes';

/** A desk whose clock and whose turns the test holds in its hand. */
function desk(read: (name: string) => Promise<MeshAnswer>, millisecondsATask = 50) {
  const answers: CheckAnswer[] = [];
  const turns: (() => void)[] = [];
  const asked: string[] = [];
  let time = 0;
  const take = createCheckDesk({
    answer: (answer) => answers.push(answer),
    readMesh: (teamId, name) => {
      asked.push(`${teamId} ${name}`);
      return read(name);
    },
    defer: (task) => turns.push(task),
    now: () => (time += millisecondsATask),
  });
  return {
    answers,
    asked,
    order: (version: number, scene = benchScene()) => take({ version, teamId: 'team', scene, isPreview: false }),
    turn: () => turns.shift()?.(),
    settle: async () => {
      for (let i = 0; i < 500; i += 1) {
        await Promise.resolve();
        turns.shift()?.();
      }
    },
    pass: (ms: number) => void (time += ms),
  };
}

const found = (): Promise<MeshAnswer> => Promise.resolve({ ok: true, mesh: pyramidMesh() });

describe('the desk of the check worker', () => {
  it('answers after every slice and comes to an end', async () => {
    const d = desk(found);
    d.order(1);
    await d.settle();
    expect(d.answers.length).toBeGreaterThan(5);
    expect(d.answers.at(-1)).toMatchObject({ version: 1, check: { phase: 'done' } });
    expect(d.asked).toEqual([`team ${MESH}`]);
    const counts = d.answers.map((a) => a.check.findings.length);
    expect(counts).toEqual([...counts].sort((a, b) => a - b));
  });

  it('leaves a document as soon as there is a newer one', async () => {
    const d = desk(found);
    d.order(1);
    d.turn();
    d.turn();
    d.order(2, setComponentPose(benchScene(), 'post', { at: [31, 60, 120] }));
    const before = d.answers.length;
    await d.settle();
    expect(d.answers.slice(before).every((a) => a.version === 2)).toBe(true);
    expect(d.answers.at(-1)!.check.phase).toBe('done');
  });

  it('says what is wrong with a mesh, and does not ask again for a file that is bad', async () => {
    const d = desk(() => Promise.resolve({ ok: false, sentence: 'its mesh is empty.', again: false }));
    d.order(1);
    await d.settle();
    expect(d.answers.at(-1)!.check).toMatchObject({ phase: 'failed', problem: 'rock not checked: its mesh is empty.' });
    d.pass(60_000);
    d.order(2);
    await d.settle();
    expect(d.asked).toHaveLength(1);
  });

  it('asks again for a file that could not be fetched, not at once, but when the document changes later', async () => {
    let isAway = true;
    const d = desk((): Promise<MeshAnswer> => {
      if (isAway) return Promise.resolve({ ok: false, sentence: 'The server could not be reached.', again: true });
      return found();
    }, 1);
    d.order(1);
    await d.settle();
    isAway = false;
    d.order(2);
    await d.settle();
    expect(d.asked).toHaveLength(1);
    d.pass(60_000);
    d.order(3);
    await d.settle();
    expect(d.asked).toHaveLength(2);
    expect(d.answers.at(-1)!.check).toMatchObject({ phase: 'done', problem: null });
  });

  it('has no answer to give for meshes that nobody needs any more', async () => {
    let give: (answer: MeshAnswer) => void = () => undefined;
    const d = desk(() => new Promise((resolve) => (give = resolve)));
    d.order(1);
    await d.settle();
    d.order(2, removeComponents(benchScene(), ['rock']));
    await d.settle();
    expect(d.answers.at(-1)).toMatchObject({ version: 2, check: { phase: 'done' } });
    give({ ok: false, sentence: 'too late', again: false });
    await d.settle();
    expect(d.answers.at(-1)).toMatchObject({ version: 2, check: { phase: 'done', problem: null } });
  });
});
