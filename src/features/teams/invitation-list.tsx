import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { resendInvitation, withdrawInvitation } from '#shared/api';
import { Button } from '../../components/button';
import { ErrorState, LoadingState } from '../../components/states';
import { notify } from '../../components/toast';
import { When } from '../../components/when';
import { callApi } from '../../lib/api';
import { tell } from '../../lib/api-problem';
import { invitationsQuery } from '../../lib/queries/teams';

/** Invitations that were not answered yet. */
export function InvitationList({ teamId }: { readonly teamId: string }) {
  const invitations = useQuery(invitationsQuery(teamId));
  const queryClient = useQueryClient();
  const refresh = () => queryClient.invalidateQueries({ queryKey: ['team', teamId, 'invitations'] });
  const resend = useMutation({
    mutationFn: (invitationId: string) => callApi(resendInvitation, { params: { teamId, invitationId } }),
    onSuccess: ({ email }) => notify({ text: `The invitation went to ${email} again.` }),
    onSettled: refresh,
  });
  const withdraw = useMutation({
    mutationFn: (invitationId: string) => callApi(withdrawInvitation, { params: { teamId, invitationId } }),
    onSuccess: () => notify({ text: 'The invitation is withdrawn; its link no longer works.' }),
    onSettled: refresh,
  });
  if (invitations.isPending) return <LoadingState what="the invitations" />;
  if (invitations.isError)
    return <ErrorState {...tell(invitations.error)} onRetry={() => void invitations.refetch()} />;
  if (invitations.data.length === 0) return <p className="text-soft">None is waiting for an answer.</p>;
  const isBusy = resend.isPending || withdraw.isPending;
  return (
    <ul>
      {invitations.data.map((invitation) => (
        <li
          key={invitation.id}
          className="flex flex-wrap items-baseline justify-between gap-x-4 border-t border-dashed border-line py-2 first:border-0"
        >
          <span className="min-w-0">
            <b className="break-all">{invitation.email}</b> as {invitation.role}
            <span className="block text-sm text-soft">
              by {invitation.invitedBy}, <When iso={invitation.createdAt} />; works until{' '}
              <When iso={invitation.expiresAt} />
            </span>
          </span>
          <span className="flex gap-4">
            <Button kind="text" size="small" disabled={isBusy} onClick={() => resend.mutate(invitation.id)}>
              Send again<span className="sr-only"> to {invitation.email}</span>
            </Button>
            <Button kind="text" size="small" disabled={isBusy} onClick={() => withdraw.mutate(invitation.id)}>
              Withdraw<span className="sr-only"> from {invitation.email}</span>
            </Button>
          </span>
        </li>
      ))}
    </ul>
  );
}
