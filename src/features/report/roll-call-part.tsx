// The roll-call as the report tells it: what is missing first, since nothing can clear a part that was left out.
import type { RollCallEntry } from '#shared/review';
import type { LengthDisplay } from '#shared/units';
import { Section } from '../../components/page-head';
import { Need } from '../../components/sentence-line';
import { countOf } from '../../lib/format';
import { nameOf } from '../../lib/finding-words';
import type { ReportModel } from './report-model';

export interface RollCallPartProps {
  readonly model: ReportModel;
  readonly display: LengthDisplay;
  /** Turns the product's own words into the person's. */
  readonly say: (text: string) => string;
}

const missingWords = (entry: RollCallEntry): string =>
  entry.lacks === null ? 'not placed' : `placed, but its ${entry.lacks} not`;

export function RollCallPart({ model: { scene, roll, missing, boxes }, display, say }: RollCallPartProps) {
  const placed = roll.filter((e) => e.state === 'placed');
  const absent = roll.filter((e) => e.state === 'not-on-this-car');
  const guesses = scene.components.filter((c) => c.source === 'guess');
  return (
    <Section
      title="Roll-call"
      note={
        missing.length === 0 ? 'nothing is missing' : `${countOf(missing.length, 'thing')} of ${roll.length} missing`
      }
      className="scroll-mt-4"
    >
      <div id="roll-call" className="grid gap-4 scroll-mt-20 sm:grid-cols-2">
        {(missing.length > 0 || boxes.length > 0) && (
          <ul className="report-missing sm:col-span-2">
            {missing.map((entry) => (
              <li key={entry.key}>
                <b>{say(entry.label)}</b>
                <span>{missingWords(entry)}; nothing in this report says whether there is room for it</span>
              </li>
            ))}
            {boxes.map((box) => (
              <li key={box.name}>
                <b>{box.name}</b>
                <span>
                  has no joint to {box.lacks.map((wall) => `the ${say(wall)}`).join(' or ')}; a pedal box that hangs on
                  one plane flexes and cracks the wall
                </span>
              </li>
            ))}
          </ul>
        )}
        <p>
          <span className="report-label">placed</span>
          {placed.length === 0 ? 'nothing of the list' : placed.map((e) => say(e.label)).join(', ')}
        </p>
        <p>
          <span className="report-label">not on this car</span>
          {absent.length === 0 ? 'nothing was said to be absent' : absent.map((e) => say(e.label)).join(', ')}
        </p>
        {guesses.length > 0 && (
          <p className="sm:col-span-2">
            <span className="report-label">stands on a guess</span>
            {guesses.map((c, i) => (
              <span key={c.id}>
                {i > 0 && ', '}
                {nameOf(scene, c.id)} (<Need mm={c.tolerance} display={display} /> either way)
              </span>
            ))}
          </p>
        )}
      </div>
    </Section>
  );
}
