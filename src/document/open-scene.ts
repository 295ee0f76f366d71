// The store of one open scene: what the screens read, and what they call.
import { createStore, type StoreApi } from 'zustand';
import type { Scene } from '#shared/scene';
import { Autosave } from './autosave';
import { DraftKeeper } from './draft-keeper';
import type { Draft, DraftStore } from './drafts';
import { NO_HISTORY, noted, reconciled, redone, undone, type History, type Step } from './history';
import { merge } from './merge';
import type { SaveDoor, ServerDocument } from './save-door';
import type { OpenScene } from './types';

export interface OpenSceneParts {
  readonly sceneId: string;
  readonly server: ServerDocument;
  readonly canEdit: boolean;
  readonly door: SaveDoor;
  readonly drafts: DraftStore;
  /** Names this sitting's draft. */
  readonly draftId: string;
  readonly newId: () => string;
  /** What an earlier sitting left unsaved, the one to be resumed first. */
  readonly left?: readonly Draft[];
  readonly onSaved?: (saveNumber: number) => void;
}

export interface OpenSceneControl {
  readonly store: StoreApi<OpenScene>;
  /** Sends what is not saved yet; the page may be going away. */
  readonly flush: (isLast?: boolean) => Promise<void>;
  /** The number of the save that holds what is shown; null if it could not be saved. */
  readonly saveNow: () => Promise<number | null>;
  readonly retry: () => void;
  readonly heard: (saveNumber: number) => void;
  readonly refresh: () => Promise<void>;
  /** True while leaving the page would lose something: it is not saved, and no draft of it could be kept either. */
  readonly isAtRisk: () => boolean;
  readonly close: () => Promise<void>;
}

type Change = (scene: Scene) => Scene;

export function createOpenScene(parts: OpenSceneParts): OpenSceneControl {
  const { sceneId, canEdit, door, drafts, draftId, newId } = parts;
  const [first, ...others] = canEdit ? (parts.left ?? []) : [];
  let history: History = NO_HISTORY;
  let gesture: Change | null = null;

  const store = createStore<OpenScene>()((set, get) => {
    const take = (step: Step | null): void => {
      if (step === null) return;
      put(step.scene, step.history);
      autosave.changed();
    };
    const whenEditable =
      <A extends readonly unknown[]>(deed: (...args: A) => void) =>
      (...args: A): void => {
        if (canEdit) deed(...args);
      };
    return {
      sceneId,
      scene: first?.scene ?? parts.server.scene,
      preview: null,
      save: { kind: canEdit ? 'saved' : 'read-only', saveNumber: parts.server.saveNumber },
      canEdit,
      undoLabel: null,
      redoLabel: null,
      apply: whenEditable(({ label, edit }) => {
        const { scene } = get();
        // the one edit at the end of a gesture takes its place
        gesture = null;
        const after = edit(scene);
        const next = noted(history, label, scene, after);
        // what differs in nothing that counts stays the very same object
        if (next !== history) take({ scene: after, history: next });
        else set({ preview: null });
      }),
      setPreview: (edit) => {
        gesture = canEdit ? edit : null;
        set({ preview: gesture === null ? null : gesture(get().scene) });
      },
      undo: whenEditable(() => take(undone(history, get().scene))),
      redo: whenEditable(() => take(redone(history, get().scene))),
      settle: whenEditable((choice) => {
        const merged = autosave.settled();
        if (merged === null) return;
        if (merged.kind === 'merged') put(merged.scene, reconciled(history, merged.scene));
        else {
          // the other one of the two stays within reach of undo
          const [kept, left] = choice === 'mine' ? [merged.mine, merged.theirs] : [merged.theirs, merged.mine];
          const label = choice === 'mine' ? 'Keep yours' : 'Take theirs';
          put(kept, noted(reconciled(history, left), label, left, kept));
        }
        autosave.rest();
      }),
    };
  });

  function put(scene: Scene, next: History): void {
    history = next;
    store.setState({
      scene,
      preview: gesture === null ? null : gesture(scene),
      undoLabel: next.done.at(-1)?.label ?? null,
      redoLabel: next.undone.at(-1)?.label ?? null,
    });
  }
  const replace = (scene: Scene): void => put(scene, reconciled(history, scene));

  const keeper = new DraftKeeper(drafts, draftId);
  const autosave = new Autosave({
    host: {
      scene: () => store.getState().scene,
      show: (save) => store.setState({ save: canEdit ? save : { kind: 'read-only', saveNumber: save.saveNumber } }),
      replace,
      onSaved: (saveNumber) => parts.onSaved?.(saveNumber),
    },
    door,
    keeper,
    draftId,
    newId,
    server: first === undefined ? parts.server : { saveNumber: first.base, scene: first.baseScene },
    pending: first?.pending ?? null,
  });

  if (first !== undefined) void resume(first, others);

  /** Takes up what an earlier sitting left. Its drafts go only when they are in this sitting's own. */
  async function resume(draft: Draft, more: readonly Draft[]): Promise<void> {
    const adopted = [draft.id];
    for (const other of more) {
      const merged = merge(other.baseScene, other.scene, store.getState().scene);
      // one that does not go together with the first waits for a sitting in which it is the first
      if (merged.kind === 'conflict') continue;
      replace(merged.scene);
      adopted.push(other.id);
    }
    await autosave.keepNow();
    await Promise.all(adopted.map((id) => drafts.remove(id).catch(() => undefined)));
    autosave.knows(parts.server.saveNumber);
    void autosave.flush();
  }

  return {
    store,
    flush: (isLast) => autosave.flush(isLast),
    saveNow: async () => {
      // what is under way may be older than what is shown
      for (let turn = 0; turn < 3; turn += 1) {
        await autosave.flush();
        const { save } = store.getState();
        if (save.kind === 'saved' || save.kind === 'read-only') return save.saveNumber;
      }
      return null;
    },
    retry: () => autosave.retry(),
    heard: (saveNumber) => autosave.heard(saveNumber),
    refresh: () => autosave.refresh(),
    isAtRisk: () => {
      const { kind } = store.getState().save;
      return keeper.hasFailed && kind !== 'saved' && kind !== 'read-only';
    },
    close: () => autosave.close(),
  };
}
