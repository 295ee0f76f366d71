import { describe, expect, it } from 'vitest';
import { DraftKeeper } from '../../../src/document/draft-keeper';
import { noDrafts, readDraft, type Draft, type DraftStore } from '../../../src/document/drafts';
import { endedSittings, holdSitting } from '../../../src/document/sittings';
import { row } from './scenes';

const draft = (base: number): Draft => ({
  id: 'mine',
  base,
  baseScene: row(),
  pending: { saveId: 'save', base, scene: row() },
  scene: row(),
});

/** A store that carries out its writes when it is told to. */
function slowStore() {
  const writes: { what: number | 'removed'; finish: () => void }[] = [];
  const write = (what: number | 'removed') =>
    new Promise<void>((resolve) => {
      writes.push({ what, finish: resolve });
    });
  const store: DraftStore = {
    put: ({ base }) => write(base),
    remove: () => write('removed'),
    all: () => Promise.resolve([]),
  };
  return { store, writes };
}

const settle = async (): Promise<void> => {
  for (let i = 0; i < 20; i += 1) await Promise.resolve();
};

describe('keeping drafts', () => {
  it('writes at once, and of those that wait for a slow disk only the latest', async () => {
    const { store, writes } = slowStore();
    const keeper = new DraftKeeper(store, 'mine');
    const kept: number[] = [];
    for (let base = 1; base <= 9; base += 1) void keeper.keep(draft(base)).then(() => kept.push(base));
    expect(writes.map((w) => w.what)).toEqual([1, 2, 3, 4]);
    writes[0]!.finish();
    await settle();
    expect(writes.map((w) => w.what)).toEqual([1, 2, 3, 4, 9]);
    expect(kept).toEqual([1]);
    writes[4]!.finish();
    await settle();
    expect(kept).toEqual([1, 5, 6, 7, 8, 9]);
  });

  it('lets a draft go after it, never before', async () => {
    const { store, writes } = slowStore();
    const keeper = new DraftKeeper(store, 'mine');
    for (let base = 1; base <= 5; base += 1) void keeper.keep(draft(base));
    void keeper.drop();
    for (let i = 0; i < 5; i += 1) {
      writes[i]!.finish();
      await settle();
    }
    expect(writes.map((w) => w.what)).toEqual([1, 2, 3, 4, 'removed']);
  });

  it('says where none can be kept', async () => {
    const keeper = new DraftKeeper(noDrafts(), 'mine');
    await keeper.keep(draft(1));
    expect(keeper.hasFailed).toBe(true);
    await keeper.drop();
    expect(keeper.hasFailed).toBe(false);
  });

  it('reads a draft back, and does not trip over one that is none any more', () => {
    expect(readDraft(structuredClone(draft(3)))).toEqual(draft(3));
    expect(readDraft({ ...draft(3), scene: { format: 'something else' } })).toBeNull();
    expect(readDraft({ ...draft(3), pending: null })).toBeNull();
    expect(readDraft(null)).toBeNull();
  });
});

describe('sittings', () => {
  /** As much of the browser's locks as is used. */
  function locks() {
    const held = new Set<string>();
    return {
      held,
      manager: {
        request: async (name: string, work: () => Promise<void>) => {
          held.add(name);
          await work();
          held.delete(name);
        },
        query: () => Promise.resolve({ held: [...held].map((name) => ({ name })), pending: [] }),
      } as unknown as LockManager,
    };
  }

  it('that go on keep their drafts to themselves; those that ended leave them', async () => {
    const { manager } = locks();
    holdSitting(manager, 'one');
    const end = holdSitting(manager, 'two');
    expect([...(await endedSittings(manager, ['one', 'two', 'three']))]).toEqual(['three']);
    end();
    expect([...(await endedSittings(manager, ['one', 'two', 'three']))]).toEqual(['two', 'three']);
  });

  it('of a page that is being reloaded are waited for', async () => {
    const { manager } = locks();
    const end = holdSitting(manager, 'one');
    setTimeout(end, 150);
    expect([...(await endedSittings(manager, ['one']))]).toEqual(['one']);
  });

  it('all count as ended where there are no locks', async () => {
    holdSitting(undefined, 'one')();
    expect([...(await endedSittings(undefined, ['one']))]).toEqual(['one']);
  });
});
