// A server for the tests of the open document: it keeps the promises of the real one about saves, and its answers can be
// lost on either way.
import { vi } from 'vitest';
import { applyDifference, canonicalSceneText, type Scene } from '#shared/scene';
import type { Draft, DraftStore } from '../../../src/document/drafts';
import { readDraft } from '../../../src/document/drafts';
import { createOpenScene, type OpenSceneControl } from '../../../src/document/open-scene';
import type { SaveAnswer, SaveDoor, SaveRequest } from '../../../src/document/save-door';
import { move } from './scenes';

type Weather = 'fine' | 'request lost' | 'answer lost' | 'refuses';

export class FakeServer {
  saveNumber = 1;
  weather: Weather = 'fine';
  /** ms until an answer is there. */
  delay = 20;
  readonly requests: SaveRequest[] = [];
  private readonly saves = new Map<string, number>();

  constructor(public scene: Scene) {}

  /** Somebody else saves. */
  saveElsewhere(change: (scene: Scene) => Scene): void {
    this.scene = change(this.scene);
    this.saveNumber += 1;
  }

  private carryOut({ saveId, base, difference }: SaveRequest): SaveAnswer {
    const before = this.saves.get(saveId);
    if (before !== undefined) return { kind: 'saved', saveNumber: before };
    if (base !== this.saveNumber) return { kind: 'newer', saveNumber: this.saveNumber, scene: this.scene };
    const applied = applyDifference(this.scene, difference);
    if (!applied.ok) return { kind: 'refused', reason: applied.conflicts.join() };
    this.scene = applied.scene;
    this.saveNumber += 1;
    this.saves.set(saveId, this.saveNumber);
    return { kind: 'saved', saveNumber: this.saveNumber };
  }

  readonly door: SaveDoor = {
    send: async (request) => {
      this.requests.push(request);
      const { weather } = this;
      await new Promise((resolve) => setTimeout(resolve, this.delay));
      if (weather === 'refuses') return { kind: 'refused', reason: 'No.' };
      if (weather === 'request lost') return { kind: 'lost', reason: 'The server could not be reached.' };
      const answer = this.carryOut(structuredClone(request));
      return weather === 'answer lost' ? { kind: 'lost', reason: 'The server could not be reached.' } : answer;
    },
    read: async () => {
      await new Promise((resolve) => setTimeout(resolve, this.delay));
      if (this.weather !== 'fine') throw new Error('The server could not be reached.');
      return { saveNumber: this.saveNumber, scene: this.scene };
    },
    say: (error) => (error instanceof Error ? error.message : ''),
  };
}

/** Drafts that outlive their sittings, as a browser's database does; copies, never the objects themselves. */
export class Drawer implements DraftStore {
  readonly kept = new Map<string, unknown>();
  put = (draft: Draft): Promise<void> => {
    this.kept.set(draft.id, JSON.parse(JSON.stringify(draft)));
    return Promise.resolve();
  };
  remove = (id: string): Promise<void> => {
    this.kept.delete(id);
    return Promise.resolve();
  };
  all = (): Promise<Draft[]> => Promise.resolve([...this.kept.values()].flatMap((value) => readDraft(value) ?? []));
}

let sittings = 0;
let saves = 0;

/** Opens the scene as a page does; what lies in the drawer is taken up. */
export async function sit(server: FakeServer, drawer = new Drawer(), canEdit = true): Promise<OpenSceneControl> {
  sittings += 1;
  return createOpenScene({
    sceneId: 'scene',
    server: { saveNumber: server.saveNumber, scene: server.scene },
    canEdit,
    door: server.door,
    drafts: drawer,
    draftId: `sitting-${sittings}`,
    newId: () => {
      saves += 1;
      return `save-${saves}`;
    },
    left: await drawer.all(),
  });
}

export const text = canonicalSceneText;

export const wait = (ms: number) => vi.advanceTimersByTimeAsync(ms);
export const state = ({ store }: OpenSceneControl) => store.getState();
export const put = (control: OpenSceneControl, id: string, x: number): void =>
  state(control).apply({ label: `Move ${id}`, edit: move(id, x) });
