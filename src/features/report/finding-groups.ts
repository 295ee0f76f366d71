// Findings as the report lists them: what has to be dealt with one by one, what is in order gathered.
import type { Finding, Verdict } from '#shared/check';
import type { Scene } from '#shared/scene';
import { motionName, nameOf } from '../../lib/finding-words';

export const TROUBLE: readonly Verdict[] = ['hits', 'tight', 'loose'];
export type VerdictFilter = 'trouble' | Verdict;

export const isTrouble = ({ verdict }: Pick<Finding, 'verdict'>): boolean => TROUBLE.includes(verdict);

/** What a search looks through: the names of the two parts and of the motions. */
function wordsOf(scene: Scene, finding: Finding): string {
  return [
    ...finding.between.map((id) => nameOf(scene, id)),
    ...finding.motions.map((m) => motionName(scene, m.component, m.motion)),
    finding.motions.length === 0 ? 'at rest' : '',
  ]
    .join(' ')
    .toLowerCase();
}

/** Every word of the search has to be there, in any order. */
export function matches(scene: Scene, finding: Finding, search: string): boolean {
  const words = wordsOf(scene, finding);
  return search
    .toLowerCase()
    .split(/\s+/)
    .every((word) => words.includes(word));
}

export interface FindingGroups {
  /** In full, worst first; a pair that may lie inside a broken scan comes before all others. */
  readonly full: readonly Finding[];
  /** Gathered: pairs that are in order. */
  readonly clears: readonly Finding[];
  readonly seated: readonly Finding[];
}

export function groupFindings(
  scene: Scene,
  findings: readonly Finding[],
  search: string,
  filter: VerdictFilter | null,
): FindingGroups {
  const found = findings.filter((f) => {
    const isWanted = filter === null || (filter === 'trouble' ? isTrouble(f) : f.verdict === filter);
    return isWanted && matches(scene, f, search);
  });
  const isFull = (f: Finding): boolean => isTrouble(f) || f.insideSheet === true;
  const inside = found.filter((f) => f.insideSheet === true);
  return {
    full: [...inside, ...found.filter((f) => isTrouble(f) && f.insideSheet !== true)],
    clears: found.filter((f) => f.verdict === 'clears' && !isFull(f)),
    seated: found.filter((f) => f.verdict === 'seated' && !isFull(f)),
  };
}

/** The findings of which pictures are taken: the worst, one by one. */
export function picturedFindings(findings: readonly Finding[], most: number): readonly Finding[] {
  return findings.filter(isTrouble).slice(0, most);
}
