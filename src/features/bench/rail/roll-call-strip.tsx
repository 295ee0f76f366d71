// The roll-call in a line: how much of what belongs in the zone is there. It opens the whole list.
import { useMemo } from 'react';
import { looseBoxes, missingFrom, type LooseBox, type RollCallEntry } from '#shared/review';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { inWords } from '../../../lib/part-words';
import { useBench, useFacts, useOpen, useSession } from '../bench-model';
import { nameOf } from '../../../lib/finding-words';
import { useRollCall } from './use-roll-call';

export function RollCallStrip() {
  const { session } = useBench();
  const { entries } = useRollCall();
  const { words } = useFacts();
  const missing = missingFrom(entries).length;
  const loose = useLooseBoxes();
  return (
    <>
      <button type="button" className="roll-call" onClick={() => session.getState().set({ sheet: 'roll-call' })}>
        <b>Roll-call</b>
        <span className="roll-call-pips" aria-hidden="true">
          {entries.map((entry) => (
            <i key={entry.key} data-state={entry.state} />
          ))}
        </span>
        <span>{missing === 0 ? 'all answered' : `${missing} missing`}</span>
        {loose.length > 0 && <span className="roll-call-warning">{inWords(sayLoose(loose[0]!), words)}</span>}
      </button>
      <RollCallSheet />
    </>
  );
}

/** A pedal box that hangs on one plane only. */
const sayLoose = ({ name, lacks }: LooseBox): string => `${name} has no joint to the ${lacks.join(' and the ')}`;

function useLooseBoxes(): readonly LooseBox[] {
  const scene = useOpen((o) => o.scene);
  return useMemo(() => looseBoxes(scene), [scene]);
}

const STATE_WORDS: Readonly<Record<RollCallEntry['state'], string>> = {
  placed: 'placed',
  'not-on-this-car': 'not on this car',
  missing: 'missing',
};

function RollCallSheet() {
  const { session } = useBench();
  const { words } = useFacts();
  const isOpen = useSession((s) => s.sheet === 'roll-call');
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { entries, answer } = useRollCall();
  const { set } = session.getState();
  const loose = useLooseBoxes();
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) set({ sheet: null });
      }}
      title="Roll-call"
      lead="The worst mistake is a part that was left out. Each of these is placed, or not on this car; there is no third."
    >
      {loose.map((box) => (
        <p key={box.name} className="roll-loose">
          <b>{inWords(sayLoose(box), words)}.</b>{' '}
          {inWords('A box that is bolted to only one of the two flexes. Joint its parts to firewall and cowl.', words)}
        </p>
      ))}
      <ul className="roll-list">
        {entries.map((entry) => (
          <li key={entry.key} data-state={entry.state}>
            <span className="roll-name">{inWords(entry.label, words)}</span>
            <span className="roll-state">
              {STATE_WORDS[entry.state]}
              {entry.lacks !== null && `: its ${entry.lacks}`}
            </span>
            <span className="roll-parts">{entry.components.map((id) => nameOf(scene, id)).join(', ')}</span>
            <span className="roll-deeds">
              {canEdit && entry.state === 'missing' && (
                <Button size="small" onClick={() => set({ sheet: 'shelf', shelfFor: entry.key })}>
                  Place one
                </Button>
              )}
              {answer !== null && entry.components.length === 0 && (
                <Button size="small" onClick={() => answer(entry.key, entry.state === 'missing')}>
                  {entry.state === 'missing' ? 'Not on this car' : 'It is on this car'}
                </Button>
              )}
            </span>
          </li>
        ))}
      </ul>
    </Dialog>
  );
}
