import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { Hole } from '../components/hole';
import { Menu, MenuItem, MenuLabel, MenuLink, MenuRule } from '../components/menu';
import { BendMark } from '../components/pictograms';
import { notify } from '../components/toast';
import { signOut } from '../lib/auth-calls';
import { meQuery, serverFactsQuery, sessionQuery } from '../lib/queries/account';

/** The person's tag in the head: teams, account, the way out. */
export function AccountTag() {
  const session = useQuery(sessionQuery());
  const me = useQuery({ ...meQuery(), enabled: session.data === true });
  const facts = useQuery(serverFactsQuery());
  const queryClient = useQueryClient();
  const navigate = useNavigate();

  if (me.data === undefined) {
    return session.data === false ? (
      <Link to="/sign-in" className="link font-semibold">
        Sign in
      </Link>
    ) : null;
  }
  const { name, email, teams } = me.data;
  const leave = async (): Promise<void> => {
    const answer = await signOut();
    if (!answer.ok) {
      notify({ text: answer.sentence, problem: true });
      return;
    }
    // away first: a page that loses its data while it is open would ask for it again
    await navigate('/sign-in', { replace: true });
    queryClient.clear();
  };
  return (
    <Menu
      trigger={
        <button
          type="button"
          className="cut-tag flex min-h-10 max-w-60 min-w-0 items-center gap-2.5 py-1 pr-3 pl-3.5 font-semibold"
        >
          <Hole />
          <span className="truncate">{name}</span>
          <BendMark className="flex-none text-soft" />
        </button>
      }
    >
      <MenuLabel>{email}</MenuLabel>
      {teams.map((team) => (
        <MenuLink key={team.id} to={`/teams/${team.id}`}>
          {team.name}
        </MenuLink>
      ))}
      {teams.length > 0 && <MenuRule />}
      <MenuLink to="/">All your teams</MenuLink>
      <MenuLink to="/account">Account and units</MenuLink>
      {facts.data?.mailShelf === true && <MenuLink to="/mail">Mail shelf</MenuLink>}
      <MenuLink to="/help/cautions">Cautions</MenuLink>
      <MenuRule />
      <MenuItem onSelect={() => void leave()}>Sign out</MenuItem>
    </Menu>
  );
}
