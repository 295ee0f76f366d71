// What stands under a picture, in words: whose car, which scene and revision, from where it is seen, the worst findings, the
// caution.
import { findingKey, type Finding } from '#shared/check';
import { CAUTION_SHORT } from '#shared/review';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { pairName, readingOf, whereWords } from '../../lib/finding-words';
import { lengthRuns, plain, type TextRun } from '../../lib/text-runs';
import type { Verdict } from '#shared/check';

export interface CaptionFacts {
  readonly projectName: string;
  readonly scene: Scene;
  readonly number: number;
  /** Null where a hand has moved the camera away from every standpoint. */
  readonly standpoint: string | null;
  readonly findings: readonly Finding[];
  /** Whether the findings are those of a dry fit or only the bench's own preview. */
  readonly isDryFit: boolean;
  readonly display: LengthDisplay;
}

export interface CaptionFinding {
  readonly key: string;
  readonly verdict: Verdict;
  /** The verdict's word, the reading beside it. */
  readonly reading: readonly TextRun[];
  readonly pair: string;
  readonly where: string;
}

export interface Caption {
  readonly title: string;
  /** "revision 7, seen from the engine bay". */
  readonly seen: string;
  readonly findings: readonly CaptionFinding[];
  /** What is not listed one by one, or that nothing was found. */
  readonly rest: string;
  readonly caution: string;
}

/** So many findings are listed. */
const MOST = 4;

const isTrouble = ({ verdict }: Finding): boolean => verdict === 'hits' || verdict === 'tight' || verdict === 'loose';

/** The worst of each pair. */
export function worstOfPairs(findings: readonly Finding[]): readonly Finding[] {
  const pairs = new Set<string>();
  return findings.filter((finding) => {
    const pair = finding.between.join('|');
    if (!isTrouble(finding) || pairs.has(pair)) return false;
    pairs.add(pair);
    return true;
  });
}

function readingRuns(finding: Finding, display: LengthDisplay): TextRun[] {
  const { word, parts } = readingOf(finding, display);
  return [
    ...plain(finding.verdict),
    ...(word === '' ? [] : plain(`\u00a0\u00a0${word}`)),
    ...(parts === null ? [] : [...plain(word === '' ? '\u00a0\u00a0' : '\u00a0'), ...lengthRuns(parts)]),
  ];
}

function restWords(bad: number, isDryFit: boolean, checked: number): string {
  const source = isDryFit ? '' : 'Live check of the bench, not yet a dry fit. ';
  if (bad > MOST) return `${source}And ${bad - MOST} more.`;
  if (bad > 0) return source.trim();
  return checked === 0 ? `${source}Nothing was compared yet.` : `${source}Every pair that was checked clears.`;
}

export function captionOf(facts: CaptionFacts): Caption {
  const { projectName, scene, number, standpoint, findings, isDryFit, display } = facts;
  const bad = worstOfPairs(findings);
  return {
    title: `${projectName} / ${scene.name}`,
    seen: `revision ${number}${standpoint === null ? '' : ` \u00b7 ${standpoint}`}`,
    findings: bad.slice(0, MOST).map((finding) => ({
      key: findingKey(finding),
      verdict: finding.verdict,
      reading: readingRuns(finding, display),
      pair: pairName(scene, finding),
      where: whereWords(scene, finding),
    })),
    rest: restWords(bad.length, isDryFit, findings.length),
    caution: CAUTION_SHORT,
  };
}
