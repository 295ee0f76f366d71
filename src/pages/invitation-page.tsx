import { useParams } from 'react-router-dom';
import { PageHead } from '../components/page-head';
import { InvitationAnswer } from '../features/teams/invitation-answer';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  const { invitationId = '' } = useParams();
  usePageTitle('Invitation');
  return (
    <>
      <PageHead title="Invitation" />
      <InvitationAnswer invitationId={invitationId} />
    </>
  );
}
