// What the page and the check worker say to one another.
import type { Finding, MeshEntry } from '#shared/check';
import type { Scene } from '#shared/scene';

/** The live check of what is on the screen: a preview of the dry fit, never the record. */
export interface LiveCheck {
  readonly phase: 'reading-meshes' | 'checking' | 'done' | 'failed';
  readonly done: number;
  readonly total: number;
  /**
   * In the report's order. While a check runs, the findings of pairs that are not touched stay; those of pairs that a hand is
   * just moving stay as they were last worked out, a moment ago, until it lets go.
   */
  readonly findings: readonly Finding[];
  readonly unchecked: readonly (readonly [string, string])[];
  readonly meshes: readonly MeshEntry[];
  /** A sentence for the person when the phase is `failed`. */
  readonly problem: string | null;
}

export const NOTHING_CHECKED: LiveCheck = {
  phase: 'checking',
  done: 0,
  total: 0,
  findings: [],
  unchecked: [],
  meshes: [],
  problem: null,
};

export interface CheckOrder {
  readonly version: number;
  readonly teamId: string;
  readonly scene: Scene;
  /** A hand is moving something: others of its kind will follow at once. */
  readonly isPreview: boolean;
}

export interface CheckAnswer {
  readonly version: number;
  readonly check: LiveCheck;
}
