// The closest calls of a shared revision; each leads to its witness mark where the scene is drawn.
import { useState, type ReactNode } from 'react';
import { findingKey, type Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { Section } from '../../components/page-head';
import { VerdictMark } from '../../components/verdict-mark';
import { VerdictReading } from '../../components/verdict-reading';
import { countOf } from '../../lib/format';
import { pairName, whereWords } from '../../lib/finding-words';

export interface FindingListProps {
  readonly scene: Scene;
  readonly findings: readonly Finding[];
  readonly totals: Readonly<Record<string, number>>;
  readonly display: LengthDisplay;
  /** Null as long as the scene is not drawn. */
  readonly onFinding: ((finding: Finding) => void) | null;
}

/** So many stand there at once; the rest on request. */
const FIRST = 12;

export function FindingList({ scene, findings, totals, display, onFinding }: FindingListProps) {
  const [open, setOpen] = useState<string | null>(null);
  const [showsAll, setShowsAll] = useState(false);
  if (findings.length === 0) return null;
  const shown = showsAll ? findings : findings.slice(0, FIRST);
  const more = findings.length - FIRST;
  const unsent =
    (totals['hits'] ?? 0) +
    (totals['tight'] ?? 0) +
    (totals['loose'] ?? 0) -
    findings.filter((f) => f.verdict !== 'clears').length;
  return (
    <Section
      title="Closest calls"
      note={onFinding === null ? undefined : 'choose one to see it in 3D'}
      className="shared-calls"
    >
      <ul>
        {shown.map((finding) => {
          const key = findingKey(finding);
          return (
            <li key={key}>
              {onFinding === null ? (
                <div className="shared-finding">{entry(scene, finding, display)}</div>
              ) : (
                <button
                  type="button"
                  className="shared-finding"
                  aria-pressed={open === key}
                  onClick={() => {
                    setOpen(key);
                    onFinding(finding);
                  }}
                >
                  {entry(scene, finding, display)}
                </button>
              )}
            </li>
          );
        })}
      </ul>
      {more > 0 && (
        <Button
          kind="text"
          size="small"
          className="mt-2"
          aria-expanded={showsAll}
          onClick={() => setShowsAll(!showsAll)}
        >
          {showsAll ? 'Only the worst' : `${countOf(more, 'more finding')}`}
        </Button>
      )}
      {unsent > 0 && (
        <p className="mt-2 text-sm text-soft">
          {countOf(unsent, 'further finding')} in trouble {unsent === 1 ? 'is' : 'are'} in the whole report, not here;
          the strips of the motions do not show {unsent === 1 ? 'it' : 'them'} either.
        </p>
      )}
    </Section>
  );
}

const entry = (scene: Scene, finding: Finding, display: LengthDisplay): ReactNode => (
  <>
    <span className="font-semibold">{pairName(scene, finding)}</span>
    <span className="text-right font-bold">
      <VerdictReading finding={finding} display={display} />
    </span>
    <span className="text-sm text-soft">{whereWords(scene, finding)}</span>
    <span className="text-right text-sm">
      <VerdictMark verdict={finding.verdict} />
    </span>
  </>
);
