// The one sentence that a report opens with: verdict, the deciding number, the pose, the pair, and what would change it.
// Lengths stay lengths until a screen or a caption sets them in the reader's unit.
import type { Finding, Report } from '#shared/check';
import { isBodyPanel, type Component, type Scene } from '#shared/scene';
import { formatGap, formatNeed, formatPercent, type LengthDisplay } from '#shared/units';
import { movesOf } from './directions';

export type SentencePart =
  | string
  /** A gap that is there: rounded down when printed, so that it never looks clearer than it is. */
  | { readonly gap: number }
  /** A length that is needed: rounded up when printed. */
  | { readonly need: number }
  | { readonly percent: number };

export interface Sentence {
  readonly verdict: Finding['verdict'] | null;
  readonly parts: readonly SentencePart[];
  /** The finding that it speaks of. */
  readonly finding: Finding | null;
}

/** Moves below this are not worth a word, mm. */
const LEAST_MOVE = 0.8;

function nameOf(scene: Scene, id: string): string {
  return scene.components.find((c) => c.id === id)?.name ?? id;
}

function motionName(scene: Scene, component: string, motion: string): string {
  const found: Component | undefined = scene.components.find((c) => c.id === component);
  return found?.motions.find((m) => m.id === motion)?.name ?? motion;
}

/** Where on the stroke a finding is, as sentence parts: " at rest", " at 62 % of Brake stroke". */
export function poseParts(scene: Scene, finding: Finding): SentencePart[] {
  if (finding.motions.length === 0) return [' at rest'];
  return finding.motions.flatMap((m, i): SentencePart[] => [
    i === 0 ? ' at ' : ' and ',
    { percent: finding.at.positions[i] ?? 0 },
    ` of “${motionName(scene, m.component, m.motion)}”`,
  ]);
}

/** How much a finding lies inside, mm: the length of its push-out. */
export function depthOf(finding: Finding): number {
  return finding.overlap?.pushOut.length ?? 0;
}

/** The push-out is the first one's; a body panel stays where it is, and the other goes the opposite way. */
function moverOf(scene: Scene, { between }: Finding): { readonly id: string; readonly sign: 1 | -1 } {
  const [first, second] = between;
  const isPanel = (id: string): boolean => scene.components.some((c) => c.id === id && isBodyPanel(c.category));
  return isPanel(first) && !isPanel(second) ? { id: second, sign: -1 } : { id: first, sign: 1 };
}

/** "moving Front cylinder 5/8 rearward and 1/4 up frees this pair" as parts; `begins`: at the beginning of a sentence. */
export function freeingParts(scene: Scene, finding: Finding, begins = false): SentencePart[] {
  const { overlap } = finding;
  if (overlap === null) return [];
  const { id, sign } = moverOf(scene, finding);
  const [x, y, z] = overlap.pushOut.vector;
  const moves = movesOf([x * sign, y * sign, z * sign], LEAST_MOVE);
  const parts: SentencePart[] = [`${begins ? 'Moving' : 'moving'} ${nameOf(scene, id)} `];
  for (const [i, move] of moves.entries()) {
    if (i > 0) parts.push(i === moves.length - 1 ? ' and ' : ', ');
    parts.push({ need: move.distance }, ` ${move.direction}`);
  }
  return [...parts, ' frees this pair'];
}

/** The finding that decides: of the worst verdict the deepest hit, else the least margin. */
export function decidingFinding(report: Report): Finding | null {
  const first = report.findings[0];
  if (first === undefined) return null;
  if (first.verdict !== 'hits') {
    // seated joints say nothing about room: the least margin among clear pairs is the number worth knowing
    return report.findings.find((f) => f.verdict !== 'seated') ?? first;
  }
  const hits = report.findings.filter((f) => f.verdict === 'hits');
  return hits.reduce((deepest, f) => (depthOf(f) > depthOf(deepest) ? f : deepest));
}

/** The opening sentence of a report. */
export function reportSentence(scene: Scene, report: Report): Sentence {
  const finding = decidingFinding(report);
  if (finding === null) {
    return { verdict: null, parts: ['There is no pair of parts to compare yet.'], finding: null };
  }
  const [a, b] = finding.between.map((id) => nameOf(scene, id)) as [string, string];
  const pose = poseParts(scene, finding);
  const tolerance = Math.max(0, finding.gapAtLeast - finding.required - finding.margin);
  const after: SentencePart[] = tolerance > 0 ? [' after ', { need: tolerance }, ' of tolerance'] : [];
  switch (finding.verdict) {
    case 'hits': {
      const depth = depthOf(finding);
      const how: SentencePart[] = depth > 0 ? [', ', { need: depth }, ' deep,'] : [];
      return {
        verdict: 'hits',
        parts: [`${a} hits ${b}`, ...how, ...pose, '; ', ...freeingParts(scene, finding), '.'],
        finding,
      };
    }
    case 'tight':
      return {
        verdict: 'tight',
        parts: [
          `${a} passes ${b} with `,
          { gap: finding.gapAtLeast },
          ...pose,
          ', needs ',
          { need: finding.required },
          ...after,
          '; ',
          { need: -finding.margin },
          ' more room would clear it.',
        ],
        finding,
      };
    case 'loose':
      return {
        verdict: 'loose',
        parts: [
          `${a} and ${b} are jointed but stand `,
          { gap: finding.gapAtLeast },
          ' apart; closing that gap, or taking the joint out of the rules, would settle it.',
        ],
        finding,
      };
    case 'seated':
      return { verdict: 'seated', parts: ['All pairs are seated joints; nothing else is compared yet.'], finding };
    case 'clears':
      return {
        verdict: 'clears',
        parts: [
          `Every pair clears. The closest call is ${a} against ${b}: `,
          { gap: finding.gapAtLeast },
          ...pose,
          ', ',
          { gap: finding.margin },
          ' more than it needs',
          ...after,
          '; moving either nearer by that much makes it tight.',
        ],
        finding,
      };
  }
}

/** A sentence as plain text in the reader's unit, for captions and link previews. */
export function sentenceText(parts: readonly SentencePart[], display: LengthDisplay): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('gap' in part) return formatGap(part.gap, display);
      return 'need' in part ? formatNeed(part.need, display) : formatPercent(part.percent);
    })
    .join('');
}
