import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Drawer, FakeServer, put, sit, state, text, wait } from './fake-server';
import { move, row, xOf } from './scenes';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('an open scene', () => {
  it('saves an edit after a moment of quiet, with the difference alone, and drops its draft', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const control = await sit(server, drawer);
    put(control, 'a', 1);
    expect(state(control).save.kind).toBe('unsaved');
    await wait(700);
    expect(server.requests).toHaveLength(0);
    expect(drawer.kept.size).toBe(1);
    await wait(110);
    expect(state(control).save.kind).toBe('saving');
    await wait(100);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 2 });
    expect(Object.keys(server.requests[0]!.difference)).toEqual(['components']);
    expect(xOf(server.scene, 'a')).toBe(1);
    expect(drawer.kept.size).toBe(0);
  });

  it('waits while edits follow one another, but not for ever', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    for (let x = 1; x <= 12; x += 1) {
      put(control, 'a', x);
      await wait(500);
    }
    expect(server.requests).toHaveLength(1);
    await wait(2000);
    expect(xOf(server.scene, 'a')).toBe(12);
    expect(server.requests.length).toBeLessThanOrEqual(3);
  });

  it('sends what was done while a save was under way in a save of its own', async () => {
    const server = new FakeServer(row());
    server.delay = 1000;
    const control = await sit(server);
    put(control, 'a', 1);
    await wait(900);
    put(control, 'b', 21);
    await wait(5000);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 3 });
    expect(server.requests.map((r) => r.base)).toEqual([1, 2]);
    expect(text(server.scene)).toBe(text(state(control).scene));
  });

  it('sends nothing for an edit and its undo', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const control = await sit(server, drawer);
    put(control, 'a', 1);
    state(control).undo();
    await wait(2000);
    expect(server.requests).toHaveLength(0);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 1 });
    expect(drawer.kept.size).toBe(0);
  });

  it('keeps gestures out of history and autosave until their one edit', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    for (let x = 1; x < 30; x += 1) {
      state(control).setPreview(move('a', x));
      await wait(100);
    }
    expect(xOf(state(control).preview!, 'a')).toBe(29);
    expect(xOf(state(control).scene, 'a')).toBe(0);
    expect([server.requests.length, state(control).undoLabel]).toEqual([0, null]);
    put(control, 'a', 30);
    expect(state(control).preview).toBeNull();
    state(control).setPreview(null);
    await wait(1000);
    expect(server.requests).toHaveLength(1);
    state(control).undo();
    expect(xOf(state(control).scene, 'a')).toBe(0);
    expect(state(control).redoLabel).toBe('Move a');
  });

  it('asks for a lost answer again under the same save id, and so makes one save of it', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    server.weather = 'answer lost';
    put(control, 'a', 1);
    await wait(900);
    expect(state(control).save).toMatchObject({ kind: 'offline', saveNumber: 1 });
    expect(server.saveNumber).toBe(2);
    put(control, 'b', 21);
    server.weather = 'fine';
    await wait(3000);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 3 });
    const [first, second] = server.requests;
    expect(second).toMatchObject({ saveId: first!.saveId, base: 1, difference: first!.difference });
    expect(text(server.scene)).toBe(text(state(control).scene));
  });

  it('says why it is offline, tries more and more seldom, and goes on at once when the way is open', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    server.weather = 'request lost';
    put(control, 'a', 1);
    await wait(60_000);
    expect(state(control).save).toEqual({
      kind: 'offline',
      saveNumber: 1,
      reason: 'The server could not be reached.',
    });
    expect(server.requests.length).toBeGreaterThan(5);
    expect(server.requests.length).toBeLessThan(10);
    expect(new Set(server.requests.map((r) => r.saveId)).size).toBe(1);
    server.weather = 'fine';
    control.retry();
    await wait(100);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 2 });
  });

  it('keeps a refused change, and another edit may cure it', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const control = await sit(server, drawer);
    server.weather = 'refuses';
    put(control, 'a', 1);
    await wait(900);
    expect(state(control).save).toMatchObject({ kind: 'offline', reason: 'No.' });
    expect(drawer.kept.size).toBe(1);
    server.weather = 'fine';
    put(control, 'a', 2);
    await wait(2000);
    expect(xOf(server.scene, 'a')).toBe(2);
    expect(new Set(server.requests.map((r) => r.saveId)).size).toBe(server.requests.length);
  });

  it('puts mine on top of what somebody else saved meanwhile', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    server.saveElsewhere(move('b', 99));
    put(control, 'a', 1);
    await wait(3000);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 3 });
    expect([xOf(server.scene, 'a'), xOf(server.scene, 'b')]).toEqual([1, 99]);
    expect(text(state(control).scene)).toBe(text(server.scene));
    state(control).undo();
    await wait(3000);
    expect([xOf(server.scene, 'a'), xOf(server.scene, 'b')]).toEqual([0, 99]);
  });

  it.each([
    ['mine', 1],
    ['theirs', 2],
  ] as const)(
    'asks where both changed the same, and takes %s, with the other one within reach of undo',
    async (choice, x) => {
      const server = new FakeServer(row());
      const drawer = new Drawer();
      const control = await sit(server, drawer);
      server.saveElsewhere(move('a', 2));
      put(control, 'a', 1);
      put(control, 'c', 41);
      await wait(3000);
      const { save } = state(control);
      expect(save).toMatchObject({ kind: 'conflict', records: ['components: a'] });
      if (save.kind !== 'conflict') return;
      expect([xOf(save.mine, 'a'), xOf(save.theirs, 'a')]).toEqual([1, 2]);
      expect(drawer.kept.size).toBe(1);
      // still at work meanwhile
      put(control, 'b', 22);
      await wait(10_000);
      expect(server.requests).toHaveLength(1);
      state(control).settle(choice);
      await wait(3000);
      expect(state(control).save.kind).toBe('saved');
      expect(['a', 'b', 'c'].map((id) => xOf(server.scene, id))).toEqual([x, 22, 41]);
      expect(drawer.kept.size).toBe(0);
      state(control).undo();
      await wait(3000);
      expect(xOf(server.scene, 'a')).toBe(3 - x);
    },
  );

  it('ends a conflict by itself when an edit takes back what was disputed', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    server.saveElsewhere(move('a', 2));
    put(control, 'a', 1);
    await wait(3000);
    state(control).undo();
    await wait(3000);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 2 });
    expect(xOf(state(control).scene, 'a')).toBe(2);
  });

  it('takes in what another tab saved, without an edit of its own', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    server.saveElsewhere(move('a', 2));
    control.heard(2);
    await wait(100);
    expect(xOf(state(control).scene, 'a')).toBe(2);
    expect(state(control).save).toEqual({ kind: 'saved', saveNumber: 2 });
  });

  it('follows another tab during a gesture', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    state(control).setPreview(move('a', 5));
    server.saveElsewhere(move('b', 33));
    control.heard(2);
    await wait(100);
    expect([xOf(state(control).preview!, 'a'), xOf(state(control).preview!, 'b')]).toEqual([5, 33]);
  });

  it('changes nothing for those who may only look, but follows what is saved', async () => {
    const server = new FakeServer(row());
    const drawer = new Drawer();
    const control = await sit(server, drawer, false);
    put(control, 'a', 1);
    state(control).setPreview(move('a', 9));
    expect(xOf(state(control).scene, 'a')).toBe(0);
    expect(state(control).preview).toBeNull();
    server.saveElsewhere(move('a', 2));
    control.heard(2);
    await wait(3000);
    expect(xOf(state(control).scene, 'a')).toBe(2);
    expect(state(control).save).toEqual({ kind: 'read-only', saveNumber: 2 });
    expect([server.requests.length, drawer.kept.size]).toEqual([0, 0]);
  });

  it('gives the number of the save that holds what is shown', async () => {
    const server = new FakeServer(row());
    const control = await sit(server);
    put(control, 'a', 1);
    const number = control.saveNow();
    await wait(100);
    expect(await number).toBe(2);
    server.weather = 'request lost';
    put(control, 'a', 2);
    const none = control.saveNow();
    await wait(200);
    expect(await none).toBeNull();
  });
});
