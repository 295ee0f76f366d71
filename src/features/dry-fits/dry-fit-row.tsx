import { Link } from 'react-router-dom';
import type { DryFit } from '#shared/api';
import { Button } from '../../components/button';
import { ProgressBar } from '../../components/progress-bar';
import { Cell, Row } from '../../components/table';
import { VerdictMark, VerdictTotals } from '../../components/verdict-mark';
import { When } from '../../components/when';
import { isUnderWay } from '../../lib/queries/dry-fits';
import { endSentence, isAllClear, progressNote, shareOf } from './dry-fit-words';
import { useCancelDryFit } from './use-dry-fit-deeds';

export interface DryFitRowProps {
  readonly dryFit: DryFit;
  readonly mayRun: boolean;
  /** Starts one of the scene as it is now. */
  readonly onRunAgain: () => void;
  readonly isStarting: boolean;
}

/** One dry fit of a scene: what it found, or how far it is, or how it ended. */
export function DryFitRow({ dryFit, mayRun, onRunAgain, isStarting }: DryFitRowProps) {
  const cancel = useCancelDryFit();
  const { state, number, totals, startedBy, createdAt } = dryFit;
  const runs = isUnderWay(dryFit);
  return (
    <Row>
      <Cell head="Revision" className="figures sm:w-28">
        <span className="text-xl font-extrabold">{number}</span>
      </Cell>
      <Cell head="Found" className="sm:pr-6">
        {runs && (
          <ProgressBar
            label={state === 'queued' ? 'Waiting' : 'Dry fit'}
            note={progressNote(dryFit)}
            share={shareOf(dryFit)}
            {...(mayRun ? { onCancel: () => cancel.mutate(dryFit) } : {})}
          />
        )}
        {state === 'done' &&
          totals !== null &&
          (isAllClear(dryFit) ? (
            <span className="inline-flex flex-wrap gap-x-4">
              <VerdictMark verdict="clears" />
              <span className="text-soft">every pair that was checked</span>
            </span>
          ) : (
            <VerdictTotals totals={totals} />
          ))}
        {(state === 'failed' || state === 'cancelled') && (
          <p className={state === 'failed' ? 'font-semibold text-hits' : 'text-soft'}>
            {state === 'failed' && <span className="font-extrabold">Failed. </span>}
            {endSentence(dryFit)}
          </p>
        )}
      </Cell>
      <Cell head="Run by" className="text-sm text-soft sm:w-52">
        {startedBy}, <When iso={createdAt} />
      </Cell>
      <Cell className="max-sm:pt-2 sm:w-40 sm:text-right">
        {state === 'done' && (
          <Link to={`/revisions/${dryFit.revisionId}/report`} className="link font-semibold">
            Report of revision {number}
          </Link>
        )}
        {state === 'failed' && mayRun && (
          <Button size="small" busy={isStarting} onClick={onRunAgain}>
            Run again
          </Button>
        )}
      </Cell>
    </Row>
  );
}
