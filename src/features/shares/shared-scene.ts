// What a share link answers with, put back into the form that screens read.
import type { z } from 'zod';
import type { sharedRevision } from '#shared/api';
import type { Finding } from '#shared/check';
import type { SentencePart } from '#shared/review';
import { loadScene, type Scene } from '#shared/scene';

export type SharedRevision = z.infer<typeof sharedRevision>;

/** The scene for drawing: what the team keeps to itself stands at its defaults. Null if this page cannot read it. */
export function sharedScene({ document }: Pick<SharedRevision, 'document'>): Scene | null {
  if (typeof document !== 'object' || document === null) return null;
  const loaded = loadScene({ ...document, format: 'gapwright-scene', version: 1 });
  return loaded.ok ? loaded.scene : null;
}

export const sharedFindings = ({ findings }: Pick<SharedRevision, 'findings'>): readonly Finding[] =>
  findings as readonly Finding[];

export const sharedSentence = ({ sentence }: Pick<SharedRevision, 'sentence'>): readonly SentencePart[] =>
  Array.isArray(sentence) ? (sentence as readonly SentencePart[]) : [];
