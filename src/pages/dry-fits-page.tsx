import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { mayShow } from '#shared/access';
import { loadScene } from '#shared/scene';
import { ButtonLink } from '../components/button';
import { Cautions } from '../components/cautions';
import { PageHead } from '../components/page-head';
import { ErrorState, LoadingState } from '../components/states';
import { DryFitList } from '../features/dry-fits/dry-fit-list';
import { tell } from '../lib/api-problem';
import { useMe, useRoleIn } from '../lib/me';
import { keptSceneQuery } from '../lib/queries/dry-fits';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  const { sceneId = '' } = useParams();
  const kept = useQuery(keptSceneQuery(sceneId));
  const me = useMe();
  const role = useRoleIn(kept.data?.teamId);
  const loaded = kept.data === undefined ? null : loadScene(kept.data.document);
  const name = loaded?.ok === true ? loaded.scene.name : 'Scene';
  usePageTitle(kept.data === undefined ? 'Dry fits' : `Dry fits of ${name}`);
  if (kept.data === undefined) {
    return (
      <>
        <h1 className="sr-only">Dry fits</h1>
        {kept.isError ? (
          <ErrorState
            {...tell(kept.error)}
            onRetry={() => void kept.refetch()}
            action={
              <ButtonLink size="small" to="/">
                To your teams
              </ButtonLink>
            }
          />
        ) : (
          <LoadingState what="the scene" />
        )}
      </>
    );
  }
  const { projectId, projectName, teamId } = kept.data;
  const team = me.teams.find((each) => each.id === teamId);
  return (
    <>
      <PageHead
        title="Dry fits"
        lead={<>of “{name}”</>}
        crumbs={[
          ...(team === undefined ? [] : [{ label: team.name, to: `/teams/${teamId}` }]),
          { label: projectName, to: `/projects/${projectId}` },
          { label: name, to: `/scenes/${sceneId}` },
        ]}
        actions={<ButtonLink to={`/scenes/${sceneId}`}>To the bench</ButtonLink>}
      />
      <DryFitList sceneId={sceneId} mayRun={mayShow(role, 'dry-fit.run')} />
      <div className="mt-10 max-w-2xl">
        <Cautions />
      </div>
    </>
  );
}
