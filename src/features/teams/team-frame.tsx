// The head that the pages of one team have in common: its name, its dividers, what can be done with the whole team.
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { mayShow, type Role } from '#shared/access';
import { PageHead } from '../../components/page-head';
import { ErrorState, LoadingState } from '../../components/states';
import { IndexTabs } from '../../components/tabs';
import { tell } from '../../lib/api-problem';
import { teamQuery } from '../../lib/queries/teams';
import { usePageTitle } from '../../lib/use-page-title';
import { TeamMenu } from './team-menu';

export interface TeamHere {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
}

export interface TeamFrameProps {
  readonly teamId: string;
  /** The page within the team, for the title. */
  readonly page: string;
  /** Beside the team's name. */
  readonly actions?: (team: TeamHere) => ReactNode;
  readonly children: (team: TeamHere) => ReactNode;
}

export function TeamFrame({ teamId, page, actions, children }: TeamFrameProps) {
  const query = useQuery(teamQuery(teamId));
  const team = query.data;
  usePageTitle(team === undefined ? page : `${page} of ${team.name}`);
  if (team === undefined) {
    return query.isError ? (
      <>
        <h1 className="sr-only">Team</h1>
        <ErrorState {...tell(query.error)} onRetry={() => void query.refetch()} />
      </>
    ) : (
      <LoadingState what="the team" />
    );
  }
  const base = `/teams/${team.id}`;
  return (
    <>
      <PageHead
        title={team.name}
        crumbs={[{ label: 'Your teams', to: '/' }]}
        actions={
          <>
            {actions?.(team)}
            <TeamMenu team={team} />
          </>
        }
      />
      <div className="mb-6">
        <IndexTabs
          label={`Pages of ${team.name}`}
          tabs={[
            { to: base, label: 'Projects' },
            ...(mayShow(team.role, 'people.read') ? [{ to: `${base}/people`, label: 'People' }] : []),
            ...(mayShow(team.role, 'mesh.list') ? [{ to: `${base}/meshes`, label: 'Meshes' }] : []),
          ]}
        />
      </div>
      {children(team)}
    </>
  );
}
