// A revision whose dry fit has not come through: how far it is, or how it ended.
import { ButtonLink } from '../../components/button';
import { ProgressBar } from '../../components/progress-bar';
import { EmptyState } from '../../components/states';
import { isUnderWay } from '../../lib/queries/dry-fits';
import type { Revision } from './revision';

export function NoReport({ revision }: { readonly revision: Revision }) {
  const { dryFit, number, sceneId } = revision;
  if (dryFit !== null && isUnderWay(dryFit)) {
    const { done, total } = dryFit;
    return (
      <div className="py-4">
        <ProgressBar
          label={`Dry fit of revision ${number}`}
          note={total === 0 ? 'waiting for its turn' : `${done} of ${total} findings; the report comes by itself`}
          share={total === 0 ? null : done / total}
        />
      </div>
    );
  }
  const isFailed = dryFit?.state === 'failed';
  return (
    <EmptyState
      small
      title={isFailed ? `The dry fit of revision ${number} failed` : `Revision ${number} has no report`}
      action={
        <>
          <ButtonLink kind="main" to={`/scenes/${sceneId}/dry-fits`}>
            To the dry fits
          </ButtonLink>
          <ButtonLink to={`/scenes/${sceneId}`}>To the bench</ButtonLink>
        </>
      }
    >
      {isFailed && dryFit.problem !== null
        ? dryFit.problem
        : 'No dry fit of it has come through. Run one from the list of dry fits.'}
    </EmptyState>
  );
}
