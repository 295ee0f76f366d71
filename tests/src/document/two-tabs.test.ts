import fc from 'fast-check';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { patchHead, removeComponents, type Scene } from '#shared/scene';
import { Drawer, FakeServer, sit, state, text, wait } from './fake-server';
import { arbitraryChange, row } from './scenes';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('two tabs', () => {
  it('lose nothing, whatever they do and whatever the weather', async () => {
    vi.useRealTimers();
    const turn = fc.record({
      tab: fc.constantFrom(0, 1),
      change: fc.oneof(
        arbitraryChange,
        fc.constant((s: Scene) => removeComponents(s, ['a'])),
      ),
      weather: fc.constantFrom('fine', 'fine', 'answer lost', 'request lost' as const),
      wait: fc.constantFrom(0, 300, 1500),
    });
    await fc.assert(
      fc.asyncProperty(fc.array(turn, { maxLength: 10 }), async (turns) => {
        vi.useFakeTimers();
        const server = new FakeServer(row());
        const drawers = [new Drawer(), new Drawer()];
        const tabs = [await sit(server, drawers[0]), await sit(server, drawers[1])];
        for (const { tab, change, weather, wait: ms } of turns) {
          server.weather = weather;
          state(tabs[tab]!).apply({ label: 'Edit', edit: change });
          await wait(ms);
        }
        server.weather = 'fine';
        for (let round = 0; round < 4; round += 1) {
          for (const tab of tabs) {
            tab.retry();
            await wait(40_000);
            state(tab).settle('mine');
            await wait(5000);
            tab.heard(server.saveNumber);
            await wait(5000);
          }
        }
        for (const tab of tabs) {
          expect(state(tab).save).toEqual({ kind: 'saved', saveNumber: server.saveNumber });
          expect(text(state(tab).scene)).toBe(text(server.scene));
        }
        expect(drawers.map((d) => d.kept.size)).toEqual([0, 0]);
        vi.useRealTimers();
      }),
      { numRuns: 60 },
    );
  });

  it('rename at once: the later one is asked', async () => {
    const server = new FakeServer(row());
    const [one, two] = [await sit(server), await sit(server)];
    state(one).apply({ label: 'Rename', edit: (s) => patchHead(s, { name: 'One' }) });
    state(two).apply({ label: 'Rename', edit: (s) => patchHead(s, { name: 'Two' }) });
    await wait(3000);
    expect(state(one).save.kind).toBe('saved');
    expect(state(two).save).toMatchObject({ kind: 'conflict', records: ['name, unit and accuracy'] });
  });
});
