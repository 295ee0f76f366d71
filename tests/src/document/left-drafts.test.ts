import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Drawer, FakeServer, put, sit, state, text, wait } from './fake-server';
import { move, row, xOf } from './scenes';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('drafts', () => {
  /** The tab is gone from one moment to the next: nothing of it runs any more. */
  const vanish = (): void => void vi.clearAllTimers();

  it('bring back what was not sent yet', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    put(await sit(server, drawer), 'a', 1);
    await wait(10);
    vanish();
    const again = await sit(server, drawer);
    expect(xOf(state(again).scene, 'a')).toBe(1);
    await wait(3000);
    expect(state(again).save).toEqual({ kind: 'saved', saveNumber: 2 });
    expect([xOf(server.scene, 'a'), drawer.kept.size]).toEqual([1, 0]);
  });

  it.each(['answer lost', 'request lost'] as const)(
    'lose and double nothing when the server is killed, %s, and the tab is closed',
    async (weather) => {
      const server = new FakeServer(row());
      const drawer = new Drawer();
      const control = await sit(server, drawer);
      server.weather = weather;
      put(control, 'a', 1);
      await wait(900);
      put(control, 'b', 21);
      await wait(10);
      vanish();
      const wanted = text(state(control).scene);
      server.weather = 'fine';
      const again = await sit(server, drawer);
      expect(text(state(again).scene)).toBe(wanted);
      await wait(3000);
      expect(state(again).save.kind).toBe('saved');
      expect(text(server.scene)).toBe(wanted);
      expect(text(state(again).scene)).toBe(wanted);
      expect(drawer.kept.size).toBe(0);
    },
  );

  it.each([false, true])(
    'give way to a last save that held more, sent as the page went away (somebody saved since: %s)',
    async (isOlder) => {
      const server = new FakeServer(row());
      const drawer = new Drawer();
      const control = await sit(server, drawer);
      put(control, 'a', 1);
      await wait(10);
      drawer.put = () => new Promise(() => undefined);
      put(control, 'a', 2);
      void control.flush(true);
      await wait(30);
      expect(server.saveNumber).toBe(2);
      vanish();
      if (isOlder) server.saveElsewhere(move('b', 30));
      const next = new Drawer();
      for (const [id, draft] of drawer.kept) next.kept.set(id, draft);
      const again = await sit(server, next);
      await wait(3000);
      expect(state(again).save).toEqual({ kind: 'saved', saveNumber: server.saveNumber });
      expect([xOf(state(again).scene, 'a'), xOf(state(again).scene, 'b')]).toEqual([2, isOlder ? 30 : 20]);
      expect([text(server.scene), next.kept.size]).toEqual([text(state(again).scene), 0]);
    },
  );

  it('know their own save even when somebody else saved the same part after it', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const control = await sit(server, drawer);
    server.weather = 'answer lost';
    put(control, 'a', 1);
    await wait(900);
    vanish();
    server.weather = 'fine';
    server.saveElsewhere(move('a', 2));
    const again = await sit(server, drawer);
    await wait(3000);
    expect(state(again).save).toEqual({ kind: 'saved', saveNumber: 3 });
    expect([xOf(server.scene, 'a'), xOf(state(again).scene, 'a')]).toEqual([2, 2]);
  });

  it('are replayed on a newer document, or offered as a conflict', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    put(await sit(server, drawer), 'a', 1);
    await wait(10);
    vanish();
    server.saveElsewhere(move('b', 30));
    const again = await sit(server, drawer);
    await wait(10);
    put(again, 'c', 41);
    await wait(10);
    vanish();
    expect(['a', 'b', 'c'].map((id) => xOf(state(again).scene, id))).toEqual([1, 30, 41]);
    server.saveElsewhere(move('a', 5));
    const third = await sit(server, drawer);
    await wait(3000);
    expect(state(third).save).toMatchObject({ kind: 'conflict', records: ['components: a'] });
    state(third).settle('mine');
    await wait(3000);
    expect(['a', 'b', 'c'].map((id) => xOf(server.scene, id))).toEqual([1, 30, 41]);
  });

  it('of two tabs come together in a third', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const [one, two] = [await sit(server, drawer), await sit(server, drawer)];
    put(one, 'a', 1);
    put(two, 'b', 21);
    await wait(10);
    vanish();
    await sit(server, drawer);
    await wait(3000);
    expect(['a', 'b'].map((id) => xOf(server.scene, id))).toEqual([1, 21]);
    expect(drawer.kept.size).toBe(0);
  });

  it('that do not go together wait for their turn', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const [one, two] = [await sit(server, drawer), await sit(server, drawer)];
    put(one, 'a', 1);
    put(two, 'a', 7);
    await wait(10);
    vanish();
    await sit(server, drawer);
    await wait(3000);
    expect([xOf(server.scene, 'a'), drawer.kept.size]).toEqual([1, 1]);
    const next = await sit(server, drawer);
    await wait(3000);
    expect(state(next).save.kind).toBe('conflict');
  });

  it('are kept, with the save they belong to, before it is sent', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const quick = drawer.put;
    drawer.put = async (draft) => {
      await new Promise((resolve) => setTimeout(resolve, 300));
      await quick(draft);
    };
    put(await sit(server, drawer), 'a', 1);
    while (server.requests.length === 0) await wait(10);
    const [draft] = await drawer.all();
    expect(draft?.pending.saveId).toBe(server.requests[0]!.saveId);
  });

  it('that cannot be kept do not hinder saving', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    drawer.put = () => Promise.reject(new Error('The disk is full.'));
    const control = await sit(server, drawer);
    put(control, 'a', 1);
    await wait(10);
    expect(control.isAtRisk()).toBe(true);
    await wait(1000);
    expect(state(control).save.kind).toBe('saved');
    expect(control.isAtRisk()).toBe(false);
  });

  it('stay when the page is left while the server is away, and go up when it is not', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const control = await sit(server, drawer);
    server.weather = 'request lost';
    put(control, 'a', 1);
    const closed = control.close();
    await wait(100_000);
    await closed;
    expect([server.requests.length, drawer.kept.size]).toEqual([1, 1]);
    server.weather = 'fine';
    const again = await sit(server, drawer);
    put(again, 'b', 21);
    const done = again.close();
    await wait(1000);
    await done;
    expect(['a', 'b'].map((id) => xOf(server.scene, id))).toEqual([1, 21]);
    expect(drawer.kept.size).toBe(0);
  });
});
