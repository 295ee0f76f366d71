import { useInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { mayShow, type Role } from '#shared/access';
import { Button } from '../../components/button';
import { DrawerLabel } from '../../components/drawer-label';
import { JobRack } from '../../components/job-card';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { tell } from '../../lib/api-problem';
import { projectsQuery } from '../../lib/queries/projects';
import { FirstJob } from './first-job';
import { ProjectCard } from './project-card';
import { NewProjectDialog } from './project-dialog';

const SHOWN = 4;

export interface TeamDrawerProps {
  readonly team: { readonly id: string; readonly name: string; readonly role: Role };
}

/** A team and the projects that were worked on last, on the first page. */
export function TeamDrawer({ team }: TeamDrawerProps) {
  const query = useInfiniteQuery(projectsQuery(team.id, { limit: SHOWN }));
  const [isOpening, setOpening] = useState(false);
  const projects = query.data?.pages[0]?.projects ?? [];
  const mayCreate = mayShow(team.role, 'project.create');
  return (
    <section aria-label={team.name}>
      <div className="mb-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <h2 className="max-w-full">
            <DrawerLabel>
              <Link to={`/teams/${team.id}`} className="no-underline hover:underline">
                {team.name}
              </Link>
            </DrawerLabel>
          </h2>
          <span className="text-sm text-soft">you are {team.role === 'owner' ? 'an owner' : `a ${team.role}`}</span>
        </div>
        <nav aria-label={`Pages of ${team.name}`} className="flex flex-wrap gap-x-5 gap-y-1">
          <Link to={`/teams/${team.id}`} className="link">
            All projects
          </Link>
          {mayShow(team.role, 'people.read') && (
            <Link to={`/teams/${team.id}/people`} className="link">
              People
            </Link>
          )}
          {mayShow(team.role, 'mesh.list') && (
            <Link to={`/teams/${team.id}/meshes`} className="link">
              Meshes
            </Link>
          )}
        </nav>
      </div>
      {query.isPending && <LoadingState what="the projects" />}
      {query.isError && <ErrorState {...tell(query.error)} onRetry={() => void query.refetch()} />}
      {query.isSuccess && projects.length === 0 && <NoProject team={team} />}
      <JobRack label={`Projects of ${team.name}`}>
        {projects.map((project) => (
          <li key={project.id}>
            <ProjectCard project={project} headingLevel={3} />
          </li>
        ))}
      </JobRack>
      {projects.length > 0 && mayCreate && (
        <Button className="mt-4" onClick={() => setOpening(true)}>
          New project
        </Button>
      )}
      <NewProjectDialog teamId={team.id} open={isOpening} onOpenChange={setOpening} />
    </section>
  );
}

/** What a team without an open project shows, by what the person may do. */
export function NoProject({ team }: { readonly team: { readonly id: string; readonly role: Role } }) {
  if (mayShow(team.role, 'project.create')) return <FirstJob teamId={team.id} />;
  return (
    <EmptyState title="No project to read yet">
      {team.role === 'guest'
        ? 'You are a guest of this team and see the projects you were added to. Ask an owner or a designer to add you.'
        : 'An owner or a designer of the team opens projects. Once there is one, it shows here.'}
    </EmptyState>
  );
}
