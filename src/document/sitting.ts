// One sitting at one scene in this browser: the store with its drafts, what the page's coming and going means for it, and
// the word from tab to tab.
import { newUuid } from '../lib/new-uuid';
import { draftDatabase } from './draft-database';
import { noDrafts, type Draft, type DraftStore } from './drafts';
import { createOpenScene, type OpenSceneControl } from './open-scene';
import { saveDoor, type ServerDocument } from './save-door';
import { endedSittings, holdSitting } from './sittings';

export interface SittingAt {
  readonly sceneId: string;
  readonly personId: string;
  readonly canEdit: boolean;
  readonly server: ServerDocument;
}

export interface Sitting extends Pick<OpenSceneControl, 'store' | 'saveNow'> {
  /** Ends it; what is unsaved goes up, or stays as a draft. */
  readonly end: () => Promise<void>;
}

/** Sittings of this page that are ending: whoever opens the same scene again waits for their last save. */
const ending = new Map<string, Promise<void>>();

export async function startSitting({ sceneId, personId, canEdit, server }: SittingAt): Promise<Sitting> {
  await ending.get(sceneId);
  const locks = 'locks' in navigator ? navigator.locks : undefined;
  const drafts = 'indexedDB' in window ? draftDatabase(window.indexedDB, personId, sceneId) : noDrafts();
  const draftId = newUuid();
  const release = holdSitting(locks, draftId);
  const left = canEdit ? await leftDrafts(drafts, locks) : [];
  const channel = new BroadcastChannel(`gapwright-scene ${sceneId}`);
  const control = createOpenScene({
    sceneId,
    server,
    canEdit,
    door: saveDoor(sceneId),
    drafts,
    draftId,
    newId: newUuid,
    left,
    onSaved: (saveNumber) => channel.postMessage(saveNumber),
  });
  channel.onmessage = ({ data }: MessageEvent<unknown>) => {
    if (typeof data === 'number') control.heard(data);
  };
  const forget = watchPage(control);
  const end = async (): Promise<void> => {
    forget();
    const closed = control.close();
    const done = closed.finally(() => {
      channel.close();
      release();
      if (ending.get(sceneId) === done) ending.delete(sceneId);
    });
    ending.set(sceneId, done);
    await done;
  };
  return { store: control.store, saveNow: control.saveNow, end };
}

async function leftDrafts(drafts: DraftStore, locks: LockManager | undefined): Promise<readonly Draft[]> {
  try {
    const all = await drafts.all();
    const ended = await endedSittings(
      locks,
      all.map((draft) => draft.id),
    );
    return all.filter((draft) => ended.has(draft.id));
  } catch {
    // no database here: there is nothing to take up
    return [];
  }
}

function watchPage(control: OpenSceneControl): () => void {
  const ends = new AbortController();
  const { signal } = ends;
  const leave = (): void => void control.flush(true);
  const comeBack = (): void => {
    control.retry();
    void control.refresh();
  };
  document.addEventListener(
    'visibilitychange',
    () => {
      if (document.visibilityState === 'hidden') leave();
      else comeBack();
    },
    { signal },
  );
  window.addEventListener('pagehide', leave, { signal });
  window.addEventListener('pageshow', comeBack, { signal });
  window.addEventListener('online', comeBack, { signal });
  window.addEventListener(
    'beforeunload',
    (event) => {
      if (control.isAtRisk()) event.preventDefault();
    },
    { signal },
  );
  return () => ends.abort();
}
