import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { ROLE_MEANING } from '#shared/access';
import { acceptInvitation, declineInvitation, type Me } from '#shared/api';
import { Button } from '../../components/button';
import { Hole } from '../../components/hole';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';

type Invited = Me['invitations'][number];

/** Invitations that wait for the person's word. */
export function OpenInvitations({ invitations }: { readonly invitations: readonly Invited[] }) {
  if (invitations.length === 0) return null;
  return (
    <ul aria-label="Invitations" className="mb-8 grid gap-3">
      {invitations.map((invitation) => (
        <li key={invitation.id}>
          <InvitationTag invitation={invitation} />
        </li>
      ))}
    </ul>
  );
}

function InvitationTag({ invitation }: { readonly invitation: Invited }) {
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const params = { invitationId: invitation.id };
  const refresh = () => queryClient.invalidateQueries({ queryKey: ['me'] });
  const accept = useMutation({
    mutationFn: () => callApi(acceptInvitation, { params }),
    onSuccess: async ({ teamId }) => {
      await refresh();
      await navigate(`/teams/${teamId}`);
    },
  });
  const decline = useMutation({
    mutationFn: () => callApi(declineInvitation, { params }),
    onSuccess: () => {
      notify({ text: `You have declined the invitation to ${invitation.team}.` });
      return refresh();
    },
  });
  return (
    <div className="cut-tag flex flex-wrap items-center gap-x-5 gap-y-3 py-3 pr-4 pl-4 [--paper-edge:var(--laser)]">
      <Hole ring className="ml-1" />
      <p className="grow basis-64">
        You are invited to <b>{invitation.team}</b> as <b>{invitation.role}</b>
        <span className="block text-sm text-soft">{ROLE_MEANING[invitation.role]}</span>
      </p>
      <div className="flex gap-3">
        <Button kind="main" size="small" busy={accept.isPending} onClick={() => accept.mutate()}>
          Join
        </Button>
        <Button size="small" busy={decline.isPending} onClick={() => decline.mutate()}>
          Decline
        </Button>
      </div>
    </div>
  );
}
