// One finding in full: mark and word, the pair, where on the stroke, what would change it, the rule, the figures, a picture.
import { Link } from 'react-router-dom';
import { findingKey, type Finding } from '#shared/check';
import { freeingParts } from '#shared/review';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { Fraction, Gap } from '../../components/fraction';
import { Need, SentenceLine } from '../../components/sentence-line';
import { StrokeTrack } from '../../components/stroke-track';
import { VerdictMark } from '../../components/verdict-mark';
import { pairName, readingOf, whereWords } from '../../lib/finding-words';
import type { WordChoice } from '../../lib/part-words';
import { ruleName, ruleWords } from '../../lib/rule-words';
import { strokesOf } from '../../lib/strokes';
import { FindingPicture, type PictureState } from './finding-picture';

export interface FindingEntryProps {
  readonly scene: Scene;
  readonly sceneId: string;
  readonly finding: Finding;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
  readonly picture: PictureState;
}

export function FindingEntry({ scene, sceneId, finding, display, words, picture }: FindingEntryProps) {
  const name = pairName(scene, finding);
  const bench = `/scenes/${sceneId}?finding=${encodeURIComponent(findingKey(finding))}`;
  return (
    <li className="finding-entry">
      <FindingPicture picture={picture} alt={`${name}, ${whereWords(scene, finding)}`} to={bench} />
      <div className="min-w-0">
        {finding.insideSheet === true && (
          <p className="report-first mb-1.5">
            One of the two seems to lie <b>inside a broken scan</b>. The gap below is to its surface alone: look before
            you trust it.
          </p>
        )}
        <h3 className="flex flex-wrap items-baseline gap-x-3 text-lg leading-snug">
          <VerdictMark verdict={finding.verdict} />
          <Link to={bench} className="finding-entry-name">
            {name}
          </Link>
        </h3>
        <p className="text-soft">{whereWords(scene, finding)}</p>
        <Change scene={scene} finding={finding} display={display} />
        {strokesOf(scene, finding).map((stroke) => (
          <StrokeTrack
            key={`${stroke.component.id}.${stroke.motion.id}`}
            {...stroke}
            category={stroke.component.category}
          />
        ))}
        <p className="mt-1.5 text-sm text-soft">
          Rule: {ruleName(scene, finding, words)}
          {finding.rule !== 'joint' && <> · {ruleWords(scene, finding)}</>}
        </p>
      </div>
      <Figures scene={scene} finding={finding} display={display} />
    </li>
  );
}

type Said = Pick<FindingEntryProps, 'scene' | 'finding' | 'display'>;

/** What would change it, in the shop's directions. */
function Change({ scene, finding, display }: Said) {
  if (finding.verdict === 'hits') {
    const parts = freeingParts(scene, finding, true);
    return parts.length === 0 ? null : (
      <p className="finding-entry-change">
        <SentenceLine parts={[...parts, '.']} display={display} />
      </p>
    );
  }
  if (finding.verdict === 'tight') {
    return (
      <p className="finding-entry-change">
        <SentenceLine parts={[{ need: -finding.margin }, ' more room would clear it.']} display={display} />
      </p>
    );
  }
  return finding.verdict === 'loose' ? (
    <p className="finding-entry-change">A joint, but the two do not meet: close the gap, or take the joint out.</p>
  ) : null;
}

function Figures({ scene, finding, display }: Said) {
  const tolerance = finding.between.reduce(
    (sum, id) => sum + (scene.components.find((c) => c.id === id)?.tolerance ?? 0),
    0,
  );
  const isJoint = finding.rule === 'joint';
  const { word, parts } = readingOf(finding, display);
  return (
    <dl className="finding-entry-figures">
      <div>
        <dt>{word === '' ? 'gap' : word}</dt>
        <dd className="font-bold">{parts === null ? 'no depth known' : <Fraction parts={parts} />}</dd>
      </div>
      {!isJoint && (
        <>
          <div>
            <dt>needs</dt>
            <dd>
              <Need mm={finding.required} display={display} />
            </dd>
          </div>
          <div>
            <dt>tolerances</dt>
            <dd>
              <Need mm={tolerance} display={display} />
            </dd>
          </div>
          <div>
            <dt>margin</dt>
            <dd>
              <Gap mm={finding.margin} display={display} />
            </dd>
          </div>
        </>
      )}
    </dl>
  );
}
