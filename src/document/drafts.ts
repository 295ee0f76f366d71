// What is not saved yet, kept on this machine: it outlives the tab, the browser and the server. One draft for each person,
// scene and open tab, so that two tabs never write over one another.
import { z } from 'zod';
import { loadScene, type Scene } from '#shared/scene';

/** A save that was sent and whose answer is not known, or that is to come and may be sent as the page goes away. */
export interface PendingSave {
  readonly saveId: string;
  readonly base: number;
  /** The document that the save makes. */
  readonly scene: Scene;
}

export interface Draft {
  /** Of the sitting that wrote it. */
  readonly id: string;
  readonly base: number;
  /** The document of save number `base`. */
  readonly baseScene: Scene;
  readonly pending: PendingSave;
  readonly scene: Scene;
}

export interface DraftStore {
  readonly put: (draft: Draft) => Promise<void>;
  readonly remove: (id: string) => Promise<void>;
  /** All drafts of this person and scene, those of other tabs included. */
  readonly all: () => Promise<readonly Draft[]>;
}

const stored = z.object({
  id: z.string(),
  base: z.number().int(),
  baseScene: z.unknown(),
  pending: z.object({ saveId: z.string(), base: z.number().int(), scene: z.unknown() }),
  scene: z.unknown(),
});

/** A draft as it was stored, perhaps by an older version of this program; null if it cannot be read any more. */
export function readDraft(value: unknown): Draft | null {
  const parsed = stored.safeParse(value);
  if (!parsed.success) return null;
  const { pending, ...draft } = parsed.data;
  const baseScene = loadScene(draft.baseScene);
  const scene = loadScene(draft.scene);
  const sent = loadScene(pending.scene);
  if (!baseScene.ok || !scene.ok || !sent.ok) return null;
  return {
    ...draft,
    baseScene: baseScene.scene,
    scene: scene.scene,
    pending: { ...pending, scene: sent.scene },
  };
}

/** Where nothing can be kept: private windows of some browsers, full disks. */
export function noDrafts(): DraftStore {
  return {
    put: () => Promise.reject(new Error('Drafts cannot be kept here.')),
    remove: () => Promise.resolve(),
    all: () => Promise.resolve([]),
  };
}
