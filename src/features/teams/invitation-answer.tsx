import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { ROLE_MEANING } from '#shared/access';
import { acceptInvitation, declineInvitation } from '#shared/api';
import { Button, ButtonLink } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { Hole } from '../../components/hole';
import { ErrorState, LoadingState } from '../../components/states';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';
import { sayProblem, tell } from '../../lib/api-problem';
import { useMe } from '../../lib/me';
import { invitationQuery } from '../../lib/queries/teams';
import { shownInPlace } from '../../lib/query-client';

/** The page behind the link of an invitation's mail. */
export function InvitationAnswer({ invitationId }: { readonly invitationId: string }) {
  const me = useMe();
  const invitation = useQuery(invitationQuery(invitationId));
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const params = { invitationId };
  const accept = useMutation({
    mutationFn: () => callApi(acceptInvitation, { params }),
    onSuccess: async ({ teamId }) => {
      await queryClient.invalidateQueries({ queryKey: ['me'] });
      await navigate(`/teams/${teamId}`, { replace: true });
    },
    meta: shownInPlace,
  });
  const decline = useMutation({
    mutationFn: () => callApi(declineInvitation, { params }),
    onSuccess: async () => {
      await queryClient.invalidateQueries({ queryKey: ['me'] });
      notify({ text: 'You have declined the invitation.' });
      await navigate('/', { replace: true });
    },
    meta: shownInPlace,
  });
  if (invitation.isPending) return <LoadingState what="the invitation" />;
  if (invitation.isError) {
    return (
      <ErrorState
        {...tell(invitation.error)}
        onRetry={() => void invitation.refetch()}
        action={
          <ButtonLink size="small" to="/">
            To your teams
          </ButtonLink>
        }
      />
    );
  }
  const { team, role, invitedBy } = invitation.data;
  const failed = accept.error ?? decline.error;
  return (
    <div className="cut max-w-xl px-6 py-6 [--cut:26px]">
      <Hole ring className="ml-1" />
      <p className="mt-3 text-2xl font-light">
        {invitedBy} invites you to <b className="font-extrabold">{team}</b> as <b className="font-extrabold">{role}</b>.
      </p>
      <p className="mt-1 text-soft">
        {role}: {ROLE_MEANING[role]}.
      </p>
      <p className="mt-1 text-sm text-soft">
        You are signed in as {me.name}, <span className="break-all">{me.email}</span>.
      </p>
      <FormFault text={failed === null ? null : sayProblem(failed)} />
      <div className="mt-5 flex gap-3 border-t border-dashed border-line pt-4">
        <Button kind="main" busy={accept.isPending} onClick={() => accept.mutate()}>
          Join the team
        </Button>
        <Button busy={decline.isPending} onClick={() => decline.mutate()}>
          Decline
        </Button>
      </div>
    </div>
  );
}
