import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { mayShow } from '#shared/access';
import type { Project } from '#shared/api';
import { ButtonLink } from '../components/button';
import { Hole } from '../components/hole';
import { IconButton } from '../components/icon-button';
import { Menu, MenuItem, MenuRule } from '../components/menu';
import { PageHead, Section } from '../components/page-head';
import { HolesMark } from '../components/pictograms';
import { Stamp } from '../components/stamp';
import { ErrorState, LoadingState } from '../components/states';
import { ProjectMeshes } from '../features/meshes/project-meshes';
import { ActivityList } from '../features/projects/activity-list';
import { GuestList } from '../features/projects/guest-list';
import { ProjectFactsDialog } from '../features/projects/project-dialog';
import { ProjectFacts } from '../features/projects/project-facts';
import { SceneList } from '../features/projects/scene-list';
import { useProjectDeeds } from '../features/projects/use-project-deeds';
import { tell } from '../lib/api-problem';
import { useMe } from '../lib/me';
import { projectQuery } from '../lib/queries/projects';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  const { projectId = '' } = useParams();
  const project = useQuery(projectQuery(projectId));
  usePageTitle(project.data?.name ?? 'Project');
  if (project.data !== undefined) return <ProjectSheet project={project.data} />;
  if (project.isPending) return <LoadingState what="the project" />;
  return (
    <>
      <h1 className="sr-only">Project</h1>
      <ErrorState
        {...tell(project.error)}
        onRetry={() => void project.refetch()}
        action={
          <ButtonLink size="small" to="/">
            To your teams
          </ButtonLink>
        }
      />
    </>
  );
}

function ProjectSheet({ project }: { readonly project: Project }) {
  const me = useMe();
  const navigate = useNavigate();
  const [isChanging, setChanging] = useState(false);
  const teamPath = `/teams/${project.teamId}`;
  const deeds = useProjectDeeds(project, () => void navigate(teamPath));
  const mayChange = mayShow(project.role, 'project.change');
  const team = me.teams.find((each) => each.id === project.teamId);
  return (
    <>
      <PageHead
        title={project.name}
        crumbs={[{ label: 'Your teams', to: '/' }, ...(team === undefined ? [] : [{ label: team.name, to: teamPath }])]}
        lead={project.archived ? <Stamp colour="tight">in the archive</Stamp> : undefined}
        actions={
          mayChange && (
            <Menu
              trigger={
                <IconButton label="More for this project" hint={false}>
                  <HolesMark />
                </IconButton>
              }
            >
              <MenuItem onSelect={() => setChanging(true)}>Change the facts</MenuItem>
              <MenuItem onSelect={() => deeds.archive(!project.archived)}>
                {project.archived ? 'Take out of the archive' : 'Put into the archive'}
              </MenuItem>
              <MenuRule />
              <MenuItem danger onSelect={deeds.remove}>
                Delete the project
              </MenuItem>
            </Menu>
          )
        }
      />
      <div className="grid gap-x-12 gap-y-10 lg:grid-cols-[minmax(0,1fr)_19rem]">
        <SceneList projectId={project.id} mayChange={mayShow(project.role, 'scene.change')} />
        <div className="ticket cut self-start">
          <Section title="Job card" actions={<Hole ring className="mr-3 !h-3.5 !w-3.5" />}>
            <ProjectFacts project={project} />
          </Section>
          <Section title="Meshes" note="in its scenes">
            <ProjectMeshes projectId={project.id} teamId={project.teamId} linked={mayShow(project.role, 'mesh.list')} />
          </Section>
          {mayShow(project.role, 'guests.read') && (
            <Section title="Guests" note="may read along">
              <GuestList
                projectId={project.id}
                teamId={project.teamId}
                mayChange={mayShow(project.role, 'guests.change')}
              />
            </Section>
          )}
          <Section title="Done so far">
            <ActivityList projectId={project.id} />
          </Section>
        </div>
      </div>
      {mayChange && <ProjectFactsDialog project={project} open={isChanging} onOpenChange={setChanging} />}
    </>
  );
}
