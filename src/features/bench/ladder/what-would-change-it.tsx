// "What would change it": the move in the shop's directions, tried on the bench before it is made.
import { useEffect, useState } from 'react';
import type { Finding } from '#shared/check';
import { Button } from '../../../components/button';
import { Length } from '../../../components/fraction';
import { useBench, useFacts, useOpen } from '../bench-model';
import { labelOf, shift } from '../edits';
import { nameOf } from '../../../lib/finding-words';
import { freeingOf, movedBy, type Freeing } from './freeing';

export function WhatWouldChangeIt({ finding }: { readonly finding: Finding }) {
  const { open } = useBench();
  const { display } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  // what is tried stays what it was, though the finding moves with it
  const [tried, setTried] = useState<Freeing | null>(null);
  const { setPreview } = open.getState();
  useEffect(() => () => setPreview(null), [setPreview]);
  const freeing = tried ?? freeingOf(scene, finding);
  if (freeing === null) return null;
  const moved = movedBy(scene, freeing, finding.between);
  const group = scene.groups.find((g) => g.id === moved.group);
  const way = freeing.moves.map((m, i) => (
    <b key={m.direction} className="whitespace-nowrap">
      {i > 0 && <span className="font-normal">and </span>}
      <Length mm={m.distance} display={display} options={{ denominator: 32, rounding: 'up' }} /> {m.direction}{' '}
    </b>
  ));
  const name = nameOf(scene, freeing.part);
  const edit = { label: labelOf('Move', scene, moved), edit: (s: typeof scene) => shift(s, moved, freeing.vector) };
  return (
    <section className="freeing" aria-label="What would change it">
      <p>
        {freeing.verified ? (
          <>
            <b>{name}</b> {way} frees this pair.
          </>
        ) : (
          <>
            Straight apart, <b>{name}</b> would have to go {way}.
          </>
        )}
        {group !== undefined && <> It takes its group along, {group.name}.</>}
      </p>
      {canEdit && (
        <div className="freeing-deeds">
          <Button
            size="small"
            aria-pressed={tried !== null}
            onClick={() => {
              setPreview(tried === null ? edit.edit : null);
              setTried(tried === null ? freeing : null);
            }}
          >
            {tried !== null ? 'Put it back' : 'Try it'}
          </Button>
          <Button
            size="small"
            kind="main"
            onClick={() => {
              setTried(null);
              setPreview(null);
              open.getState().apply(edit);
            }}
          >
            Move it there
          </Button>
        </div>
      )}
    </section>
  );
}
