import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '../../components/button';
import { JobRack } from '../../components/job-card';
import { ListBar } from '../../components/list-bar';
import { NameDialog } from '../../components/name-dialog';
import { Section } from '../../components/page-head';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { sayProblem, tell } from '../../lib/api-problem';
import { countOf } from '../../lib/format';
import { useWords } from '../../lib/me';
import { scenesQuery } from '../../lib/queries/scenes';
import { useListQuery } from '../../lib/use-list-query';
import { FIRST_SCENE } from './facts-schema';
import { SceneCard } from './scene-card';
import { useCreateScene } from './use-scene-deeds';

const SORTS = { updated: 'last changed', name: 'by name', created: 'last made' } as const;
const STATES = { open: 'open', archived: 'archive', deleted: 'deleted' } as const;
const NOTHING = {
  open: 'No scene is open',
  archived: 'The archive is empty',
  deleted: 'Nothing was deleted in the last 30 days',
} as const;

export interface SceneListProps {
  readonly projectId: string;
  readonly mayChange: boolean;
}

/** The scenes of a project. A new one goes straight to the bench. */
export function SceneList({ projectId, mayChange }: SceneListProps) {
  const list = useListQuery(['updated', 'name', 'created'], ['open', 'archived', 'deleted']);
  const { search, sort, state } = list;
  const scenes = useQuery(scenesQuery(projectId, { search, sort, state }));
  const navigate = useNavigate();
  const say = useWords();
  const create = useCreateScene(projectId, (scene) => void navigate(`/scenes/${scene.id}`));
  const [isAsking, setAsking] = useState(false);
  const isNone = scenes.data?.length === 0;
  const isFresh = isNone && state === 'open' && search === '';
  return (
    <Section
      title="Scenes"
      note="one arrangement of parts each"
      actions={
        mayChange && (
          <Button kind={isFresh ? 'plain' : 'main'} size="small" onClick={() => setAsking(true)}>
            New scene
          </Button>
        )
      }
    >
      <ListBar
        searchLabel="Search the scenes"
        search={search}
        sort={sort}
        sorts={SORTS}
        state={state}
        states={mayChange ? STATES : { open: STATES.open, archived: STATES.archived }}
        onChange={list.set}
      />
      {scenes.isPending && <LoadingState what="the scenes" />}
      {scenes.isError && <ErrorState {...tell(scenes.error)} onRetry={() => void scenes.refetch()} />}
      {isFresh && (
        <EmptyState
          title="No scene yet"
          action={
            mayChange && (
              <Button kind="main" busy={create.isPending} onClick={() => create.mutate(FIRST_SCENE)}>
                Lay out the first scene
              </Button>
            )
          }
        >
          {mayChange
            ? say(
                'A scene holds firewall, column, pedal box and all that crowds around them. Begin with what cannot move: wiper motor, fender liner, engine.',
              )
            : 'Nobody has laid out a scene in this project so far.'}
          {create.isError && <p className="mt-2 font-semibold text-hits">{sayProblem(create.error)}</p>}
        </EmptyState>
      )}
      {isNone && !isFresh && (
        <EmptyState
          title={search === '' ? NOTHING[state] : `No scene fits “${search}”`}
          small
          action={
            <Button size="small" onClick={() => list.set({ search: '', state: 'open' })}>
              Show the open scenes
            </Button>
          }
        />
      )}
      <p role="status" className="sr-only">
        {scenes.isSuccess && countOf(scenes.data.length, 'scene')}
      </p>
      <JobRack label="Scenes">
        {scenes.data?.map((scene) => (
          <li key={scene.id}>
            <SceneCard scene={scene} mayChange={mayChange} />
          </li>
        ))}
      </JobRack>
      <NameDialog
        open={isAsking}
        onOpenChange={setAsking}
        title="New scene"
        lead="An empty bench. To try a variant of a scene, duplicate that one instead."
        label="Name of the scene"
        start={`Layout ${(scenes.data?.length ?? 0) + 1}`}
        action="To the bench"
        busy={create.isPending}
        fault={create.isError ? sayProblem(create.error) : null}
        onSend={create.mutate}
      />
    </Section>
  );
}
