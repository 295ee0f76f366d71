import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { setGuest } from '#shared/api';
import { CheckBox } from '../../components/choice';
import { ErrorState, LoadingState } from '../../components/states';
import { useHeld } from '../../components/use-held';
import { callApi } from '../../lib/api';
import { tell } from '../../lib/api-problem';
import { guestsQuery } from '../../lib/queries/projects';

export interface GuestListProps {
  readonly projectId: string;
  readonly teamId: string;
  readonly mayChange: boolean;
}

/** Which of the team's guests may read this project. */
export function GuestList({ projectId, teamId, mayChange }: GuestListProps) {
  const guests = useQuery(guestsQuery(projectId));
  if (guests.isPending) return <LoadingState what="the guests" />;
  if (guests.isError) return <ErrorState {...tell(guests.error)} onRetry={() => void guests.refetch()} />;
  if (guests.data.length === 0) {
    return (
      <p className="text-soft">
        The team has no guests.{' '}
        <Link to={`/teams/${teamId}/people`} className="link">
          People of the team
        </Link>
      </p>
    );
  }
  const shown = mayChange ? guests.data : guests.data.filter((guest) => guest.added);
  if (shown.length === 0) return <p className="text-soft">No guest was added to this project.</p>;
  return (
    <ul className="grid gap-1">
      {shown.map((guest) => (
        <li key={guest.id}>{mayChange ? <GuestBox projectId={projectId} guest={guest} /> : guest.name}</li>
      ))}
    </ul>
  );
}

interface GuestBoxProps {
  readonly projectId: string;
  readonly guest: { readonly id: string; readonly name: string; readonly email: string; readonly added: boolean };
}

function GuestBox({ projectId, guest }: GuestBoxProps) {
  const queryClient = useQueryClient();
  const [added, hold, letGo] = useHeld(guest.added);
  const set = useMutation({
    mutationFn: (next: boolean) =>
      callApi(setGuest, { params: { projectId, personId: guest.id }, body: { added: next } }),
    onError: letGo,
    onSettled: () => queryClient.invalidateQueries({ queryKey: guestsQuery(projectId).queryKey }),
  });
  return (
    <CheckBox
      label={guest.name}
      hint={<span className="break-all">{guest.email}</span>}
      checked={added}
      onChange={(event) => {
        hold(event.target.checked);
        set.mutate(event.target.checked);
      }}
    />
  );
}
