// Drafts in the browser's own database.
import { readDraft, type Draft, type DraftStore } from './drafts';

const DATABASE = 'gapwright';
const DRAFTS = 'drafts';

function opened(factory: IDBFactory): Promise<IDBDatabase> {
  return new Promise((resolve, reject) => {
    const request = factory.open(DATABASE, 1);
    request.onupgradeneeded = () => {
      request.result.createObjectStore(DRAFTS);
    };
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error ?? new Error('The database did not open.'));
    request.onblocked = () => reject(new Error('The database is held by another page.'));
  });
}

async function run<T>(
  database: Promise<IDBDatabase>,
  mode: IDBTransactionMode,
  ask: (drafts: IDBObjectStore) => IDBRequest<T>,
): Promise<T> {
  const transaction = (await database).transaction(DRAFTS, mode);
  const request = ask(transaction.objectStore(DRAFTS));
  return new Promise((resolve, reject) => {
    transaction.oncomplete = () => resolve(request.result);
    const fail = (): void => reject(transaction.error ?? new Error('The draft was not kept.'));
    transaction.onerror = fail;
    transaction.onabort = fail;
  });
}

/** The drafts of one person and one scene. */
export function draftDatabase(factory: IDBFactory, personId: string, sceneId: string): DraftStore {
  const database = opened(factory);
  // whoever asks first hears of the failure; nobody may ask at all
  database.catch(() => undefined);
  const key = (id: string): string[] => [personId, sceneId, id];
  return {
    put: async (draft: Draft) => {
      await run(database, 'readwrite', (drafts) => drafts.put(draft, key(draft.id)));
    },
    remove: async (id) => {
      await run(database, 'readwrite', (drafts) => drafts.delete(key(id)));
    },
    all: async () => {
      // an array sorts behind every text, so this spans all ids
      const range = IDBKeyRange.bound([personId, sceneId], [personId, sceneId, []]);
      const values = await run<unknown[]>(
        database,
        'readonly',
        (drafts) => drafts.getAll(range) as IDBRequest<unknown[]>,
      );
      return values.flatMap((value) => readDraft(value) ?? []);
    },
  };
}
