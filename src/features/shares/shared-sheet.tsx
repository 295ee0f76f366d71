// What a share link shows: the sentence, the figures, the picture, the scene to turn, the worst findings, the cautions.
import type { ReactNode } from 'react';
import { readSharedPicture } from '#shared/api';
import type { Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { Cautions } from '../../components/cautions';
import { SentenceLine } from '../../components/sentence-line';
import { Stamp } from '../../components/stamp';
import { Select } from '../../components/text-field';
import { VERDICT_WORDS, VerdictMark, VerdictTotals } from '../../components/verdict-mark';
import { When } from '../../components/when';
import { Wordmark } from '../../components/wordmark';
import { addressOf } from '../../lib/api';
import { FindingList } from './finding-list';
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
            className="w-48"
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
          {hasPicture && (
            <a href={picture} className="shared-picture block" aria-label="The picture in full size">
              <img
                src={picture}
                alt={`${sceneName}, revision ${number}, with its worst findings`}
                className="taken-picture"
              />
            </a>
          )}
          {scene !== null && (
            <section aria-label="The scene in 3D" className="shared-drawing">
              {drawing}
            </section>
          )}
          {scene !== null && (
            <FindingList scene={scene} findings={findings} totals={totals} display={display} onFinding={onFinding} />
          )}
        </div>
        <Cautions />
      </main>
    </div>
  );
}
