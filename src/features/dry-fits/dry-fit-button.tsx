// "Run dry fit" for the head of the bench: runs it, shows how far it is in the button's own place, and leads to the report.
import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { DryFit } from '#shared/api';
import { Button, ButtonLink } from '../../components/button';
import { IconButton } from '../../components/icon-button';
import { CrossMark } from '../../components/pictograms';
import { notify } from '../../components/toast';
import { sayProblem } from '../../lib/api-problem';
import { dryFitsQuery, isUnderWay } from '../../lib/queries/dry-fits';
import { endSentence, progressNote, shareOf } from './dry-fit-words';
import { useCancelDryFit, useRunDryFit } from './use-dry-fit-deeds';
import './dry-fit-button.css';

export interface DryFitButtonProps {
  readonly sceneId: string;
  /** The save that the bench stands at. */
  readonly saveNumber: number;
  /** Brings what is unsaved to the server; the save number, or null if it is not all there. */
  readonly saveNow: () => Promise<number | null>;
  readonly canRun: boolean;
  /** Another one on the page says how it ended. */
  readonly quiet?: boolean;
}

const UNSAVED =
  'The scene could not be saved, so there is nothing to check yet. See the save state at the top, then run it again.';

export function DryFitButton({ sceneId, saveNumber, saveNow, canRun, quiet = false }: DryFitButtonProps) {
  const dryFits = useQuery({ ...dryFitsQuery(sceneId), enabled: canRun });
  const [watched, setWatched] = useState<{ readonly id: string; readonly saveNumber: number } | null>(null);
  const run = useRunDryFit(sceneId, saveNow);
  const cancel = useCancelDryFit();
  // one that was under way when the bench was opened is watched as well
  const latest = dryFits.data?.find((each) => each.id === watched?.id || isUnderWay(each)) ?? null;
  useTold(quiet ? null : latest);
  if (!canRun) return null;
  const start = (): void =>
    run.mutate(undefined, {
      onSuccess: (dryFit) => {
        if (dryFit === null) notify({ text: UNSAVED, problem: true });
        else setWatched({ id: dryFit.id, saveNumber });
      },
      onError: (error) => notify({ text: sayProblem(error), problem: true }),
    });
  if (latest !== null && isUnderWay(latest)) {
    return <Running dryFit={latest} onCancel={() => cancel.mutate(latest)} isEnding={cancel.isPending} />;
  }
  const done = latest?.state === 'done' ? latest : null;
  const isCurrent = done !== null && watched?.saveNumber === saveNumber;
  return (
    <>
      {done !== null && (
        <ButtonLink
          kind={isCurrent ? 'main' : 'plain'}
          className={isCurrent ? undefined : 'max-sm:hidden'}
          to={`/revisions/${done.revisionId}/report`}
        >
          Report {done.number}
        </ButtonLink>
      )}
      <Button
        kind={isCurrent ? 'plain' : 'main'}
        className={isCurrent ? 'max-sm:hidden' : undefined}
        busy={run.isPending}
        onClick={start}
      >
        {run.isPending ? 'Saving' : 'Run dry fit'}
      </Button>
    </>
  );
}

interface RunningProps {
  readonly dryFit: DryFit;
  readonly onCancel: () => void;
  readonly isEnding: boolean;
}

function Running({ dryFit, onCancel, isEnding }: RunningProps) {
  const share = shareOf(dryFit);
  const percent = share === null ? undefined : Math.round(share * 100);
  return (
    <div className="dry-fit-run" title={progressNote(dryFit)}>
      <div
        role="progressbar"
        aria-label={`Dry fit of revision ${dryFit.number}`}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        aria-valuetext={progressNote(dryFit)}
      >
        <span className="dry-fit-run-words figures">
          {dryFit.state === 'queued' ? 'Waiting' : `Dry fit${percent === undefined ? '' : ` ${percent} %`}`}
        </span>
        <span className="dry-fit-run-track">
          {percent === undefined ? <span className="laser-run block" /> : <span style={{ width: `${percent}%` }} />}
        </span>
      </div>
      <IconButton label="Cancel the dry fit" disabled={isEnding} onClick={onCancel}>
        <CrossMark />
      </IconButton>
    </div>
  );
}

/** Says once how a dry fit that was watched has ended. */
function useTold(dryFit: DryFit | null): void {
  const seen = useRef<string | null>(null);
  useEffect(() => {
    if (dryFit === null) return;
    if (isUnderWay(dryFit)) {
      seen.current = dryFit.id;
      return;
    }
    if (seen.current !== dryFit.id) return;
    seen.current = null;
    if (dryFit.state === 'failed') notify({ text: endSentence(dryFit), problem: true });
    else if (dryFit.state === 'cancelled') notify({ text: 'The dry fit is cancelled. Nothing of it was kept.' });
    else notify({ text: `The dry fit of revision ${dryFit.number} is done.` });
  }, [dryFit]);
}
