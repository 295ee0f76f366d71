import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { newScene, type Scene } from '#shared/scene';
import { CheckClient, type CheckWorker } from '../../../src/workers/check-client';
import { NOTHING_CHECKED, type CheckAnswer, type CheckOrder, type LiveCheck } from '../../../src/workers/live-check';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

/** Workers that do what the test says. */
class Puppet implements CheckWorker {
  onmessage: CheckWorker['onmessage'] = null;
  onerror: CheckWorker['onerror'] = null;
  onmessageerror: CheckWorker['onmessageerror'] = null;
  readonly orders: CheckOrder[] = [];
  isEnded = false;
  postMessage = (order: CheckOrder): void => void this.orders.push(order);
  terminate = (): void => void (this.isEnded = true);
  say(version: number, check: Partial<LiveCheck>): void {
    const data = { version, check: { ...NOTHING_CHECKED, ...check } };
    this.onmessage?.({ data } as MessageEvent<CheckAnswer>);
  }
  die(): void {
    this.onerror?.({ preventDefault: () => undefined } as ErrorEvent);
  }
  get last(): CheckOrder {
    return this.orders.at(-1)!;
  }
}

function setUp() {
  const workers: Puppet[] = [];
  const client = new CheckClient('team', () => {
    const worker = new Puppet();
    workers.push(worker);
    return worker;
  });
  return { client, workers, live: () => client.live.getState(), now: () => workers.at(-1)! };
}

let n = 0;
const scene = (): Scene => newScene(`Scene ${(n += 1)}`, 'mm');

describe('the page’s end of the check', () => {
  it('shows what the worker answers', () => {
    const { client, live, now } = setUp();
    const shown = scene();
    client.show(shown, false);
    expect(now().last).toMatchObject({ version: 1, teamId: 'team', scene: shown });
    now().say(1, { phase: 'checking', done: 3, total: 9 });
    expect(live()).toMatchObject({ phase: 'checking', done: 3 });
    now().say(1, { phase: 'done', done: 9, total: 9 });
    expect(live().phase).toBe('done');
  });

  it('orders nothing twice', () => {
    const { client, now } = setUp();
    const shown = scene();
    client.show(shown, false);
    client.show(shown, false);
    expect(now().orders).toHaveLength(1);
  });

  it('drops late answers to an old document', () => {
    const { client, live, now } = setUp();
    client.show(scene(), false);
    now().say(1, { phase: 'done', total: 1 });
    client.show(scene(), false);
    expect(live().phase).toBe('checking');
    now().say(1, { phase: 'done', total: 77 });
    expect(live()).toMatchObject({ phase: 'checking', total: 1 });
    now().say(2, { phase: 'done', total: 2 });
    expect(live().total).toBe(2);
  });

  it('lets gaps follow the hand: one document of a gesture at a time, the newest next', () => {
    const { client, live, now } = setUp();
    client.show(scene(), false);
    now().say(1, { phase: 'done' });
    const moves = Array.from({ length: 5 }, scene);
    for (const move of moves) client.show(move, true);
    expect(now().orders).toHaveLength(2);
    now().say(2, { phase: 'checking', total: 20 });
    expect(live().total).toBe(20);
    expect(now().orders).toHaveLength(3);
    expect(now().last.scene).toBe(moves[4]);
    // the rest of the one before is still welcome, for it is of the same gesture
    now().say(2, { phase: 'checking', total: 21 });
    expect(live().total).toBe(21);
    // letting go interrupts at once, and ends the welcome
    const end = scene();
    client.show(end, false);
    expect(now().last).toMatchObject({ version: 4, scene: end });
    now().say(3, { phase: 'done', total: 30 });
    expect(live().total).toBe(21);
    now().say(4, { phase: 'done', total: 40 });
    expect(live()).toMatchObject({ phase: 'done', total: 40 });
  });

  it('starts a worker again that died, with the newest document', () => {
    const { client, workers, live, now } = setUp();
    client.show(scene(), false);
    const newest = scene();
    client.show(newest, false);
    now().die();
    expect(workers.map((w) => w.isEnded)).toEqual([true, false]);
    expect(now().last).toMatchObject({ version: 3, scene: newest });
    workers[0]!.say(2, { phase: 'done', total: 5 });
    expect(live().phase).toBe('checking');
    now().say(3, { phase: 'done', total: 6 });
    expect(live().total).toBe(6);
  });

  it('starts a worker again that hangs, and lets one be that is at rest or at work', () => {
    const { client, workers, now } = setUp();
    client.show(scene(), false);
    vi.advanceTimersByTime(89_000);
    now().say(1, { phase: 'checking', done: 1, total: 2 });
    vi.advanceTimersByTime(89_000);
    expect(workers).toHaveLength(1);
    vi.advanceTimersByTime(2000);
    expect(workers).toHaveLength(2);
    now().say(2, { phase: 'done' });
    vi.advanceTimersByTime(1_000_000);
    expect(workers).toHaveLength(2);
  });

  it('waits for files as long as they take', () => {
    const { client, workers, now } = setUp();
    client.show(scene(), false);
    now().say(1, { phase: 'reading-meshes', done: 4, total: 4 });
    vi.advanceTimersByTime(1_000_000);
    expect(workers).toHaveLength(1);
  });

  it('gives up on a document that kills every worker, says so, and tries the next one', () => {
    const { client, workers, live, now } = setUp();
    client.show(scene(), false);
    for (let i = 0; i < 3; i += 1) now().die();
    expect(workers).toHaveLength(3);
    expect(live()).toMatchObject({ phase: 'failed' });
    expect(live().problem).toMatch(/dry fit/);
    client.show(scene(), false);
    expect(workers).toHaveLength(4);
    now().say(now().last.version, { phase: 'done' });
    expect(live()).toMatchObject({ phase: 'done', problem: null });
  });

  it('ends its worker with the page', () => {
    const { client, workers } = setUp();
    client.show(scene(), false);
    client.stop();
    expect(workers[0]!.isEnded).toBe(true);
    vi.advanceTimersByTime(1_000_000);
    expect(workers).toHaveLength(1);
  });
});
