// The way of a document to the server and back.
import type { z } from 'zod';
import { openDocument, readDocument, saveDocument } from '#shared/api';
import type { Difference, Scene } from '#shared/scene';
import { loadScene } from '#shared/scene';
import { addressOf, callApi, parseAnswer, reach } from '../lib/api';
import { ApiProblem, isProblem, sayProblem } from '../lib/api-problem';

export interface SaveRequest {
  readonly saveId: string;
  readonly base: number;
  readonly difference: Difference;
  /** The page is going away: the request must outlive it. */
  readonly isLast: boolean;
}

export interface ServerDocument {
  readonly saveNumber: number;
  readonly scene: Scene;
}

export type SaveAnswer =
  | { readonly kind: 'saved'; readonly saveNumber: number }
  | ({ readonly kind: 'newer' } & ServerDocument)
  /** Whether it was carried out is not known; the same save may be sent again. */
  | { readonly kind: 'lost'; readonly reason: string }
  /** The server said no; the same save will never go through. */
  | { readonly kind: 'refused'; readonly reason: string };

export interface SaveDoor {
  readonly send: (request: SaveRequest) => Promise<SaveAnswer>;
  readonly read: () => Promise<ServerDocument>;
  /** Why a read failed, for the person. */
  readonly say: (error: unknown) => string;
}

/** After this long without an answer the save counts as lost, ms. */
const PATIENCE = 30_000;

/** Browsers carry at most 64 KB of such requests; leaves room for letters of more than a byte. */
const LONGEST_LAST = 30_000;

const newer = openDocument.pick({ saveNumber: true, document: true });

/** Codes under which a server in good health will still say no. */
const FINAL: ReadonlySet<number> = new Set([400, 403, 404, 410, 413, 415, 422]);

export function answerOf(error: unknown): SaveAnswer {
  const reason = sayProblem(error);
  if (isProblem(error, 'scene/newer') && error instanceof ApiProblem) {
    const parsed = newer.safeParse(error.more.data);
    const loaded = parsed.success ? loadScene(parsed.data.document) : null;
    if (!parsed.success || loaded?.ok !== true) {
      return {
        kind: 'refused',
        reason: 'Somebody saved this scene with a newer version of the program. Load the page again.',
      };
    }
    return { kind: 'newer', saveNumber: parsed.data.saveNumber, scene: loaded.scene };
  }
  const isFinal = error instanceof ApiProblem && FINAL.has(error.status);
  return { kind: isFinal ? 'refused' : 'lost', reason };
}

export function saveDoor(sceneId: string): SaveDoor {
  const params = { sceneId };
  return {
    send: async ({ saveId, base, difference, isLast }) => {
      const sent: z.input<typeof saveDocument.body> = { saveId, base, difference };
      const body = JSON.stringify(sent);
      try {
        const answer = await reach(addressOf(saveDocument, params), {
          method: saveDocument.method,
          headers: { 'Content-Type': 'application/json' },
          body,
          // what outlives its page may be no longer; the draft is kept anyhow
          keepalive: isLast && body.length < LONGEST_LAST,
          signal: AbortSignal.timeout(PATIENCE),
        });
        return { kind: 'saved', saveNumber: parseAnswer(saveDocument, answer).saveNumber };
      } catch (error) {
        return answerOf(error);
      }
    },
    read: async () => {
      const { saveNumber, document } = await callApi(readDocument, { params });
      const loaded = loadScene(document);
      if (!loaded.ok) throw new Error('The scene cannot be read by this version of the program.');
      return { saveNumber, scene: loaded.scene };
    },
    say: sayProblem,
  };
}
