import { PageHead } from '../components/page-head';
import { FirstJob } from '../features/projects/first-job';
import { TeamDrawer } from '../features/projects/team-drawer';
import { NewTeamButton } from '../features/teams/new-team-button';
import { OpenInvitations } from '../features/teams/open-invitations';
import { useMe } from '../lib/me';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  const { name, teams, invitations } = useMe();
  const isNew = teams.length === 0;
  usePageTitle('Your teams');
  return (
    <>
      <PageHead
        title={isNew ? `Good to see you, ${name}` : 'Your teams'}
        lead={isNew ? 'One card, and you are at the bench.' : undefined}
        actions={!isNew && <NewTeamButton />}
      />
      <OpenInvitations invitations={invitations} />
      {isNew && <FirstJob teamId={null} />}
      <div className="grid gap-12">
        {teams.map((team) => (
          <TeamDrawer key={team.id} team={team} />
        ))}
      </div>
    </>
  );
}
