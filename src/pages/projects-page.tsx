import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { mayShow } from '#shared/access';
import { Button } from '../components/button';
import { NewProjectDialog } from '../features/projects/project-dialog';
import { ProjectList } from '../features/projects/project-list';
import { NoProject } from '../features/projects/team-drawer';
import { TeamFrame } from '../features/teams/team-frame';

export function Component() {
  const { teamId = '' } = useParams();
  const [isOpening, setOpening] = useState(false);
  return (
    <TeamFrame
      teamId={teamId}
      page="Projects"
      actions={(team) =>
        mayShow(team.role, 'project.create') && (
          <Button kind="main" onClick={() => setOpening(true)}>
            New project
          </Button>
        )
      }
    >
      {(team) => (
        <>
          <ProjectList
            teamId={team.id}
            mayRestore={mayShow(team.role, 'project.delete')}
            empty={<NoProject team={team} />}
          />
          <NewProjectDialog teamId={team.id} open={isOpening} onOpenChange={setOpening} />
        </>
      )}
    </TeamFrame>
  );
}
