import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Button } from '../../components/button';
import { JobRack } from '../../components/job-card';
import { ListBar } from '../../components/list-bar';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { tell } from '../../lib/api-problem';
import { countOf } from '../../lib/format';
import { projectsQuery } from '../../lib/queries/projects';
import { useListQuery } from '../../lib/use-list-query';
import { ProjectCard } from './project-card';

const SORTS = { updated: 'last changed', name: 'by name', created: 'last opened' } as const;
const STATES = { open: 'open', archived: 'archive', deleted: 'deleted' } as const;

const NOTHING = {
  open: 'No project is open',
  archived: 'The archive is empty',
  deleted: 'Nothing was deleted in the last 30 days',
} as const;

export interface ProjectListProps {
  readonly teamId: string;
  /** What stands there while the team has no open project at all. */
  readonly empty: ReactNode;
  /** Whether the person may see what was deleted, to bring it back. */
  readonly mayRestore: boolean;
}

/** A team's projects, searched, sorted, page by page. */
export function ProjectList({ teamId, empty, mayRestore }: ProjectListProps) {
  const list = useListQuery(['updated', 'name', 'created'], ['open', 'archived', 'deleted']);
  const { search, sort, state } = list;
  const query = useInfiniteQuery(projectsQuery(teamId, { search, sort, state, limit: 30 }));
  const projects = query.data?.pages.flatMap((page) => page.projects) ?? [];
  const isNone = query.isSuccess && projects.length === 0;
  if (isNone && state === 'open' && !list.isNarrowed) {
    return (
      <>
        {empty}
        <div className="mt-6 flex gap-5">
          <Button kind="text" onClick={() => list.set({ state: 'archived' })}>
            Look into the archive
          </Button>
          {mayRestore && (
            <Button kind="text" onClick={() => list.set({ state: 'deleted' })}>
              Look at what was deleted
            </Button>
          )}
        </div>
      </>
    );
  }
  return (
    <>
      <ListBar
        searchLabel="Search the projects"
        search={search}
        sort={sort}
        sorts={SORTS}
        state={state}
        states={mayRestore ? STATES : { open: STATES.open, archived: STATES.archived }}
        onChange={list.set}
      />
      {query.isPending && <LoadingState what="the projects" />}
      {query.isError && <ErrorState {...tell(query.error)} onRetry={() => void query.refetch()} />}
      {isNone && (
        <EmptyState
          title={search === '' ? NOTHING[state] : `No project fits “${search}”`}
          small
          action={
            <Button size="small" onClick={() => list.set({ search: '', state: 'open' })}>
              Show the open projects
            </Button>
          }
        />
      )}
      <p role="status" className="sr-only">
        {query.isSuccess && countOf(projects.length, 'project')}
      </p>
      <JobRack label="Projects">
        {projects.map((project) => (
          <li key={project.id}>
            <ProjectCard project={project} headingLevel={2} />
          </li>
        ))}
      </JobRack>
      {query.hasNextPage && (
        <Button className="mt-4" busy={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
          More projects
        </Button>
      )}
    </>
  );
}
