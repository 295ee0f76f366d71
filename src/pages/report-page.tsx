import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useMemo, useState } from 'react';
import { useParams } from 'react-router-dom';
import { mayShow } from '#shared/access';
import { decodeDisplayMesh, readDisplayMesh } from '#shared/api';
import { reportSentence, sentenceText } from '#shared/review';
import { ButtonLink } from '../components/button';
import { EmptyState, ErrorState, LoadingState } from '../components/states';
import { Report } from '../features/report/report';
import { readRevisionReport, type ReportModel } from '../features/report/report-model';
import { NoReport } from '../features/report/no-report';
import { useFindingPictures } from '../features/report/use-finding-pictures';
import { RevisionShares } from '../features/shares/revision-shares';
import { fetchFile } from '../lib/api';
import { localProblem, sayProblem, tell } from '../lib/api-problem';
import { displayFor, useMe, useRoleIn } from '../lib/me';
import { revisionQuery } from '../lib/queries/dry-fits';
import { usePageTitle } from '../lib/use-page-title';

const StaticDarkroom = lazy(async () => ({
  default: (await import('../features/bench/scene-view/static-darkroom')).StaticDarkroom,
}));

export function Component() {
  const { revisionId = '' } = useParams();
  const revision = useQuery(revisionQuery(revisionId));
  const read = useMemo(() => (revision.data === undefined ? null : readRevisionReport(revision.data)), [revision.data]);
  usePageTitle(
    read?.ok === true
      ? `Report of ${read.model.scene.name}, revision ${read.model.revision.number}`
      : 'Interference report',
  );
  if (read?.ok === true) return <ReportSheet key={revisionId} model={read.model} />;
  return (
    <>
      <h1 className="sr-only">Interference report</h1>
      {revision.isPending && <LoadingState what="the report" />}
      {revision.isError && (
        <ErrorState
          {...tell(revision.error)}
          onRetry={() => void revision.refetch()}
          action={
            <ButtonLink size="small" to="/">
              To your teams
            </ButtonLink>
          }
        />
      )}
      {read?.ok === false && read.why === 'none' && revision.data !== undefined && (
        <NoReport revision={revision.data} />
      )}
      {read?.ok === false && read.why === 'unreadable' && (
        <EmptyState small title="This page cannot read that report">
          It was written by another version of the product. Load the page again; if it stays, run a dry fit again.
        </EmptyState>
      )}
    </>
  );
}

function ReportSheet({ model }: { readonly model: ReportModel }) {
  const { revision, scene, report } = model;
  const me = useMe();
  const role = useRoleIn(revision.teamId);
  const display = displayFor(me, revision.projectDisplay, scene.display);
  const pictures = useFindingPictures(model, mayShow(role, 'picture.take'));
  const team = me.teams.find((each) => each.id === revision.teamId);
  const [drawn] = useState({ scene, findings: report.findings });
  const loadMesh = async (sha256: string) => {
    const mesh = decodeDisplayMesh(await fetchFile(readDisplayMesh, { teamId: revision.teamId, sha256 }));
    if (mesh === null) throw localProblem('answer/unreadable');
    return mesh;
  };
  return (
    <Report
      model={model}
      display={display}
      words={me.words}
      pictures={pictures}
      crumbs={[
        ...(team === undefined ? [] : [{ label: team.name, to: `/teams/${revision.teamId}` }]),
        { label: revision.projectName, to: `/projects/${revision.projectId}` },
        { label: scene.name, to: `/scenes/${revision.sceneId}` },
      ]}
    >
      {mayShow(role, 'share.read') && (
        <RevisionShares
          projectId={revision.projectId}
          projectName={revision.projectName}
          revisionId={revision.id}
          sentence={sentenceText(reportSentence(scene, report).parts, display)}
          pictures={revision.pictures}
          mayMake={mayShow(role, 'share.make')}
        />
      )}
      {pictures.awaited > 0 && (
        <Suspense fallback={null}>
          <StaticDarkroom
            {...drawn}
            loadMesh={loadMesh}
            say={sayProblem}
            display={display}
            words={me.words}
            onReady={pictures.start}
            onFail={pictures.fail}
          />
        </Suspense>
      )}
    </Report>
  );
}
