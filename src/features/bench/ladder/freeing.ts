// What would change a finding: a verified push-out where it hits, the straight way apart where it is tight.
import type { Finding } from '#shared/check';
import { movesOf, type Move } from '#shared/review';
import { isBodyPanel, type Scene } from '#shared/scene';
import type { Moved } from '../edits';
import { length, scale, sub, unit, type Triple } from '../viewport/vectors';

export interface Freeing {
  /** The part that would move. */
  readonly part: string;
  /** mm in the car. */
  readonly vector: Triple;
  readonly moves: readonly Move[];
  /** Whether the check has verified that it frees the pair. */
  readonly verified: boolean;
}

/** Parts of a move below this are not worth a word, mm. */
const LEAST = 0.8;

/** The push-out is for the first of a pair; a body panel stays, and the other goes the opposite way. */
function mover(scene: Scene, [first, second]: readonly [string, string]): { part: string; sign: 1 | -1 } {
  const panel = (id: string): boolean => {
    const found = scene.components.find((c) => c.id === id);
    return found !== undefined && isBodyPanel(found.category);
  };
  return panel(first) && !panel(second) ? { part: second, sign: -1 } : { part: first, sign: 1 };
}

export function freeingOf(scene: Scene, finding: Finding): Freeing | null {
  const { part, sign } = mover(scene, finding.between);
  if (finding.overlap !== null) {
    const { vector, length: size } = finding.overlap.pushOut;
    if (size === 0) return null;
    const v = scale(vector, sign);
    return { part, vector: v, moves: movesOf(v, LEAST), verified: true };
  }
  if (finding.verdict !== 'tight') return null;
  const [p, q] = finding.at.points;
  const apart = sub(p, q);
  if (length(apart) < 1e-6) return null;
  const v = scale(unit(apart), -finding.margin * sign);
  return { part, vector: v, moves: movesOf(v, LEAST), verified: false };
}

/**
 * A part that is clamped in a group takes the group along: a pedal box moves as one. Not where the other of the pair is
 * clamped in it too: the two would stay as they are to one another.
 */
export function movedBy(scene: Scene, freeing: Freeing, between: Finding['between']): Moved {
  const groupOf = (id: string): string | undefined => scene.components.find((c) => c.id === id)?.group;
  const group = groupOf(freeing.part);
  const isShared = between.every((id) => groupOf(id) === group);
  return { parts: [freeing.part], group: isShared ? null : (group ?? null) };
}
