import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo, useState, type ReactNode } from 'react';
import { useParams, useSearchParams } from 'react-router-dom';
import { useStore } from 'zustand';
import { mayShow } from '#shared/access';
import type { Project } from '#shared/api';
import { loadScene, type Scene } from '#shared/scene';
import { ButtonLink } from '../components/button';
import { ErrorState, LoadingState } from '../components/states';
import { useOpenBench, type OpenBench, type SittingPlace } from '../document/hooks';
import { Bench } from '../features/bench/bench';
import { BenchContext, FactsContext, type Bench as BenchValue, type BenchFacts } from '../features/bench/bench-model';
import { newBench } from '../features/bench/new-bench';
import { captureNamed } from '../features/bench/scene-view/capture-named';
import { useBenchFacts } from '../features/bench/use-bench-facts';
import { DryFitButton } from '../features/dry-fits/dry-fit-button';
import { PictureButton } from '../features/shares/picture-button';
import { tell, type Told } from '../lib/api-problem';
import { useMe } from '../lib/me';
import { projectQuery } from '../lib/queries/projects';
import { documentQuery, type ReadDocument } from '../lib/queries/scenes';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  const { sceneId = '' } = useParams();
  // another scene is another sitting
  return <ScenePage key={sceneId} sceneId={sceneId} />;
}

function ScenePage({ sceneId }: { readonly sceneId: string }) {
  const document = useQuery(documentQuery(sceneId));
  const projectId = document.data?.projectId;
  const project = useQuery({ ...projectQuery(projectId ?? ''), enabled: projectId !== undefined });
  const loaded = useMemo(
    () => (document.data === undefined ? null : loadScene(document.data.document)),
    [document.data],
  );
  if (document.isError && document.data === undefined) {
    return <Trouble told={tell(document.error)} onRetry={() => void document.refetch()} />;
  }
  if (loaded?.ok === false) {
    const [{ path, reason }] = loaded.refusals;
    const sentence =
      'This scene cannot be read by this version of the program. Load the page again; nothing was changed.';
    return <Trouble told={{ sentence, detail: `${path}: ${reason}`, requestNumber: null }} projectId={projectId} />;
  }
  if (project.isError && project.data === undefined) {
    return <Trouble told={tell(project.error)} projectId={projectId} onRetry={() => void project.refetch()} />;
  }
  if (document.data === undefined || loaded === null || project.data === undefined) return <Reading />;
  return <Sitting document={document.data} scene={loaded.scene} project={project.data} />;
}

interface SittingProps {
  readonly document: ReadDocument;
  readonly scene: Scene;
  readonly project: Project;
}

function Sitting({ document, scene, project }: SittingProps) {
  const { id: personId } = useMe();
  const queryClient = useQueryClient();
  const { sceneId, teamId, projectId, saveNumber, canEdit } = document;
  // what the sitting started from; a later read of the document is the sitting's own affair
  const [place] = useState((): SittingPlace => ({
    sceneId,
    teamId,
    personId,
    canEdit,
    server: { saveNumber, scene },
    onEnd: () => void queryClient.invalidateQueries({ queryKey: ['project', projectId] }),
  }));
  const opened = useOpenBench(place);
  return opened === null ? <Reading /> : <OpenedBench opened={opened} project={project} />;
}

function OpenedBench({ opened, project }: { readonly opened: OpenBench; readonly project: Project }) {
  const bench = useMemo(() => newBench(opened, project.teamId), [opened, project.teamId]);
  const facts = useBenchFacts(project, opened.open);
  const [search] = useSearchParams();
  usePageTitle(useStore(opened.open, (o) => o.scene.name));
  return (
    <BenchContext value={bench}>
      <FactsContext value={facts}>
        <Bench
          startFinding={search.get('finding')}
          actions={<Actions bench={bench} facts={facts} opened={opened} project={project} />}
        />
      </FactsContext>
    </BenchContext>
  );
}

interface ActionsProps {
  readonly bench: BenchValue;
  readonly facts: BenchFacts;
  readonly opened: OpenBench;
  readonly project: Project;
}

/** What the head of the bench offers for the scene as a whole. */
function Actions({ bench, facts, opened, project }: ActionsProps) {
  const { open, live, saveNow } = opened;
  const sceneId = useStore(open, (o) => o.sceneId);
  const saveNumber = useStore(open, (o) => o.save.saveNumber);
  const dryFit = { sceneId, saveNumber, saveNow, canRun: mayShow(project.role, 'dry-fit.run') };
  return (
    <>
      <PictureButton
        canTake={mayShow(project.role, 'picture.take')}
        sceneId={sceneId}
        projectId={project.id}
        projectName={project.name}
        display={facts.display}
        saveNow={saveNow}
        capture={() => captureNamed(bench.view, facts.words)}
        now={() => ({ scene: open.getState().scene, findings: live.getState().findings })}
        dryFit={<DryFitButton {...dryFit} quiet />}
      />
      <DryFitButton {...dryFit} />
    </>
  );
}

const Ground = ({ children }: { readonly children: ReactNode }) => (
  <main id="main" tabIndex={-1} className="on-dye min-h-dvh bg-ground">
    <div className="mx-auto max-w-2xl px-4 py-16">{children}</div>
  </main>
);

function Reading() {
  return (
    <Ground>
      <h1 className="sr-only">Scene</h1>
      <LoadingState what="the scene" />
    </Ground>
  );
}

interface TroubleProps {
  readonly told: Told;
  readonly projectId?: string | undefined;
  readonly onRetry?: () => void;
}

function Trouble({ told, projectId, onRetry }: TroubleProps) {
  usePageTitle('Scene');
  return (
    <Ground>
      <h1 className="sr-only">Scene</h1>
      <ErrorState
        {...told}
        {...(onRetry === undefined ? {} : { onRetry })}
        action={
          <ButtonLink size="small" to={projectId === undefined ? '/' : `/projects/${projectId}`}>
            {projectId === undefined ? 'To your teams' : 'To the project'}
          </ButtonLink>
        }
      />
    </Ground>
  );
}
