// Which findings show a witness mark: what matters, or what is asked for, and not more than can be read.
import { findingKey, type Finding } from '#shared/check';
import type { WitnessInput } from './witness';

const MOST = 14;
/** So many carry a label; the others their mark alone. */
const MOST_LABELS = 7;
/** For the selected part its nearest neighbours are shown too, clear as they may be. */
const NEIGHBOURS = 4;

export interface WitnessChoice {
  readonly findings: readonly Finding[];
  readonly open: string | null;
  readonly hovered: string | null;
  readonly selected: ReadonlySet<string>;
  readonly isOff: (component: string) => boolean;
}

/** One for each pair, the worst; the open and the hovered one in any case. */
export function chooseWitnesses({ findings, open, hovered, selected, isOff }: WitnessChoice): WitnessInput[] {
  const chosen = new Map<string, Finding>();
  const pairs = new Set<string>();
  const put = (f: Finding): void => {
    chosen.set(findingKey(f), f);
    pairs.add(f.between.join('|'));
  };
  const asked = findings.filter((f) => findingKey(f) === open || findingKey(f) === hovered);
  // an open finding is looked at alone: other marks would only be in the way
  if (open !== null && asked.length > 0) return asked.map((f) => ({ finding: f, isOpen: findingKey(f) === open }));
  asked.forEach(put);
  const bad = findings.filter(
    (f) =>
      f.verdict === 'hits' ||
      f.verdict === 'tight' ||
      // joints are many and say little about room: only those of what is selected
      (f.verdict === 'loose' && f.between.some((id) => selected.has(id))),
  );
  // what is selected comes first
  const isAsked = (f: Finding): boolean => f.between.some((id) => selected.has(id));
  bad.sort((a, b) => Number(isAsked(b)) - Number(isAsked(a)));
  const near = findings
    .filter((f) => f.verdict === 'clears' && f.between.some((id) => selected.has(id)))
    .sort((a, b) => a.margin - b.margin)
    .slice(0, NEIGHBOURS);
  for (const f of [...bad, ...near]) {
    if (chosen.size >= MOST) break;
    if (pairs.has(f.between.join('|')) || f.between.some(isOff)) continue;
    put(f);
  }
  return [...chosen.values()].map((finding, i) => ({
    finding,
    isOpen: findingKey(finding) === hovered,
    isQuiet: i >= MOST_LABELS || (selected.size > 0 && !isAsked(finding) && findingKey(finding) !== hovered),
  }));
}
