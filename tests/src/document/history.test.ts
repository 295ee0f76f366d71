import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalSceneText, type Scene } from '#shared/scene';
import { NO_HISTORY, noted, reconciled, redone, undone, type History } from '../../../src/document/history';
import { arbitraryScene } from '../../shared/scene/arbitrary-scene';
import { arbitraryChange, move, row, xOf, type Change } from './scenes';

function play(start: Scene, changes: readonly Change[]): { scene: Scene; history: History; texts: string[] } {
  let scene = start;
  let history = NO_HISTORY;
  const texts = [canonicalSceneText(start)];
  for (const [i, change] of changes.entries()) {
    const after = change(scene);
    const next = noted(history, `Step ${i}`, scene, after);
    if (next === history) continue;
    scene = after;
    history = next;
    texts.push(canonicalSceneText(scene));
  }
  return { scene, history, texts };
}

describe('history', () => {
  it('undoes any sequence of edits step by step to the first document, and redoes it to the last', () => {
    fc.assert(
      fc.property(arbitraryScene, fc.array(arbitraryChange, { maxLength: 14 }), (start, changes) => {
        const played = play(start, changes);
        let { scene, history } = played;
        for (const text of played.texts.slice(0, -1).reverse()) {
          const step = undone(history, scene)!;
          expect(canonicalSceneText(step.scene)).toBe(text);
          ({ scene, history } = step);
        }
        expect(undone(history, scene)).toBeNull();
        for (const text of played.texts.slice(1)) {
          const step = redone(history, scene)!;
          expect(canonicalSceneText(step.scene)).toBe(text);
          ({ scene, history } = step);
        }
        expect(redone(history, scene)).toBeNull();
      }),
      { numRuns: 150 },
    );
  });

  it('keeps two equal edits after one another as two steps', () => {
    const { history } = play(row(), [move('a', 1), move('a', 2), move('a', 3)]);
    expect(history.done).toHaveLength(3);
  });

  it('makes no step of an edit that changed nothing', () => {
    expect(play(row(), [move('a', 0), (s) => ({ ...s })]).history).toBe(NO_HISTORY);
  });

  it('forgets what was undone when something else is done', () => {
    const { history, scene } = play(row(), [move('a', 1)]);
    const step = undone(history, scene)!;
    expect(noted(step.history, 'Other', step.scene, move('b', 7)(step.scene)).undone).toEqual([]);
  });

  it('still undoes after somebody else changed other parts, and leaves theirs alone', () => {
    const { history, scene } = play(row(), [move('a', 1)]);
    const theirs = move('b', 99)(scene);
    const step = undone(reconciled(history, theirs), theirs)!;
    expect(xOf(step.scene, 'a')).toBe(0);
    expect(xOf(step.scene, 'b')).toBe(99);
  });

  it('leaves out the steps over a part that somebody else changed, and keeps the others', () => {
    const { history, scene } = play(row(), [move('a', 1), move('b', 21), move('a', 2)]);
    const kept = reconciled(history, move('a', 50)(scene));
    expect(kept.done.map((deed) => deed.label)).toEqual(['Step 1']);
  });
});
