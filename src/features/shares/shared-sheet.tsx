// What a share link shows: the sentence, the figures, the picture, the scene to turn, the worst findings, the cautions.
import { useState, type ReactNode } from 'react';
import { readSharedPicture } from '#shared/api';
import { findingKey, type Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { Cautions } from '../../components/cautions';
import { Section } from '../../components/page-head';
import { SentenceLine } from '../../components/sentence-line';
import { Stamp } from '../../components/stamp';
import { Select } from '../../components/text-field';
import { VERDICT_WORDS, VerdictMark, VerdictTotals } from '../../components/verdict-mark';
import { VerdictReading } from '../../components/verdict-reading';
import { When } from '../../components/when';
import { Wordmark } from '../../components/wordmark';
import { addressOf } from '../../lib/api';
import { pairName, whereWords } from '../../lib/finding-words';
import { sharedFindings, sharedSentence, type SharedRevision } from './shared-scene';
import './shares.css';

export interface SharedSheetProps {
  readonly token: string;
  readonly shared: SharedRevision;
  readonly scene: Scene | null;
  readonly display: LengthDisplay;
  readonly onDisplay: (display: LengthDisplay) => void;
  /** Turns the product's own words into the reader's. */
  readonly say: (text: string) => string;
  /** The scene in 3D. */
  readonly drawing: ReactNode;
  /** Null as long as the scene is not drawn. */
  readonly onFinding: ((finding: Finding) => void) | null;
}

export function SharedSheet({ token, shared, scene, display, onDisplay, say, drawing, onFinding }: SharedSheetProps) {
  const { projectName, sceneName, number, createdAt, missing, totals, hasPicture } = shared;
  const verdict = VERDICT_WORDS.find((word) => word === shared.verdict) ?? null;
  const findings = sharedFindings(shared);
  const picture = addressOf(readSharedPicture, { token });
  return (
    <div className="on-card min-h-dvh bg-ground">
      <main id="main" tabIndex={-1} className="shared-page">
        <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2 border-b-2 border-strong pb-3">
          <div className="min-w-0">
            <Wordmark className="text-xl" />
            <h1 className="mt-2 text-lg leading-snug font-extrabold">
              {projectName}: {sceneName}
            </h1>
            <p className="text-sm text-soft">
              revision {number}, <When iso={createdAt} />
            </p>
          </div>
          <Select
            label="Lengths in"
            labelHidden
            className="w-40"
            value={display}
            onChange={(event) => onDisplay(event.target.value as LengthDisplay)}
          >
            <option value="in">inches, fractions</option>
            <option value="in-decimal">inches, decimal</option>
            <option value="mm">millimetres</option>
          </Select>
        </header>
        <div>
          <p className="shared-sentence">
            {verdict !== null && (
              <Stamp colour={verdict} className="mr-3 align-baseline">
                <VerdictMark verdict={verdict} />
              </Stamp>
            )}
            <SentenceLine parts={sharedSentence(shared)} display={display} />
          </p>
          <div className="mt-4 flex flex-wrap items-baseline gap-x-6 gap-y-2">
            <VerdictTotals totals={totals} className="!gap-x-6" />
          </div>
          {missing.length > 0 && (
            <p className="mt-3 border-l-4 border-tight pl-3">
              <b>Not in this scene, so not checked:</b> {missing.map(say).join(', ')}.
            </p>
          )}
        </div>
        <div className="shared-body">
          <div className="shared-side">
            {hasPicture && (
              <a href={picture} className="block" aria-label="The picture in full size">
                <img
                  src={picture}
                  alt={`${sceneName}, revision ${number}, with its worst findings`}
                  className="taken-picture"
                />
              </a>
            )}
            {scene !== null && (
              <FindingList scene={scene} findings={findings} display={display} onFinding={onFinding} />
            )}
          </div>
          <section aria-label="The scene in 3D">{drawing}</section>
        </div>
        <Cautions />
      </main>
    </div>
  );
}

type FindingListProps = Pick<SharedSheetProps, 'display' | 'onFinding'> & {
  readonly scene: Scene;
  readonly findings: readonly Finding[];
};

function FindingList({ scene, findings, display, onFinding }: FindingListProps) {
  const [open, setOpen] = useState<string | null>(null);
  if (findings.length === 0) return null;
  const entry = (finding: Finding): ReactNode => (
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
  return (
    <Section title="Closest calls" note={onFinding === null ? undefined : 'tap one to see it'}>
      <ul>
        {findings.map((finding) => {
          const key = findingKey(finding);
          return (
            <li key={key}>
              {onFinding === null ? (
                <div className="shared-finding">{entry(finding)}</div>
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
                  {entry(finding)}
                </button>
              )}
            </li>
          );
        })}
      </ul>
    </Section>
  );
}
