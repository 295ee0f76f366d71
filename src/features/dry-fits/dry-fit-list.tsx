import { useQuery } from '@tanstack/react-query';
import { Button, ButtonLink } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { Head, Table } from '../../components/table';
import { sayProblem, tell } from '../../lib/api-problem';
import { countOf } from '../../lib/format';
import { dryFitsQuery, isUnderWay } from '../../lib/queries/dry-fits';
import { DryFitRow } from './dry-fit-row';
import { useKeptSaveNumber, useRunDryFit } from './use-dry-fit-deeds';

export interface DryFitListProps {
  readonly sceneId: string;
  readonly mayRun: boolean;
}

/** All dry fits of a scene, with the button that runs one of what the scene is now. */
export function DryFitList({ sceneId, mayRun }: DryFitListProps) {
  const dryFits = useQuery(dryFitsQuery(sceneId));
  const run = useRunDryFit(sceneId, useKeptSaveNumber(sceneId));
  const isRunning = dryFits.data?.some(isUnderWay) === true;
  const isNone = dryFits.data?.length === 0;
  const start = (): void => run.mutate();
  const button = (
    <Button kind="main" busy={run.isPending || isRunning} onClick={start}>
      {isRunning ? 'Dry fit runs' : 'Run dry fit'}
    </Button>
  );
  return (
    <>
      {mayRun && !isNone && (
        <div className="mb-5 flex flex-wrap items-center gap-x-5 gap-y-2">
          {button}
          <p className="max-w-prose text-sm text-soft">
            It freezes the scene as the next revision and checks every pair at rest and over every motion.
          </p>
        </div>
      )}
      <div className="mb-4 empty:hidden">{run.isError && <FormFault text={sayProblem(run.error)} />}</div>
      {dryFits.isPending && <LoadingState what="the dry fits" />}
      {dryFits.isError && <ErrorState {...tell(dryFits.error)} onRetry={() => void dryFits.refetch()} />}
      {isNone && (
        <EmptyState
          title="No dry fit yet"
          action={
            <>
              {mayRun && button}
              <ButtonLink to={`/scenes/${sceneId}`}>To the bench</ButtonLink>
            </>
          }
        >
          {mayRun
            ? 'The gaps on the bench are a preview. A dry fit freezes the scene as a numbered revision, checks every pair at rest and over every motion, and its report is what is reviewed.'
            : 'Nobody has run a dry fit of this scene so far. Ask a designer of the team for one.'}
        </EmptyState>
      )}
      <p role="status" className="sr-only">
        {dryFits.isSuccess && !isNone && `${countOf(dryFits.data.length, 'dry fit')}${isRunning ? ', one runs' : ''}`}
      </p>
      {dryFits.data !== undefined && !isNone && (
        <Table
          label="Dry fits"
          head={
            <>
              <Head>Revision</Head>
              <Head>Found</Head>
              <Head>Run by</Head>
              <Head>
                <span className="sr-only">Report</span>
              </Head>
            </>
          }
        >
          {dryFits.data.map((dryFit) => (
            <DryFitRow key={dryFit.id} dryFit={dryFit} mayRun={mayRun} onRunAgain={start} isStarting={run.isPending} />
          ))}
        </Table>
      )}
    </>
  );
}
