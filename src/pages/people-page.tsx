import { useParams } from 'react-router-dom';
import { mayShow } from '#shared/access';
import { Section } from '../components/page-head';
import { InvitationList } from '../features/teams/invitation-list';
import { InviteForm } from '../features/teams/invite-form';
import { PeopleBoard } from '../features/teams/people-board';
import { RoleList } from '../features/teams/role-list';
import { TeamFrame } from '../features/teams/team-frame';

export function Component() {
  const { teamId = '' } = useParams();
  return (
    <TeamFrame teamId={teamId} page="People">
      {(team) => (
        <div className="grid gap-10">
          <PeopleBoard team={team} />
          <div className="grid gap-x-14 gap-y-10 md:grid-cols-2">
            {mayShow(team.role, 'people.change') && (
              <>
                <Section title="Invite by mail">
                  <InviteForm teamId={team.id} />
                </Section>
                <Section title="Invitations that wait">
                  <InvitationList teamId={team.id} />
                </Section>
              </>
            )}
            <Section title="What each role may do">
              <RoleList />
            </Section>
          </div>
        </div>
      )}
    </TeamFrame>
  );
}
