import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { mayShow, type Role } from '#shared/access';
import { changeTeam, deleteTeam, leaveTeam } from '#shared/api';
import { ConfirmDialog } from '../../components/confirm-dialog';
import { IconButton } from '../../components/icon-button';
import { Menu, MenuItem, MenuRule } from '../../components/menu';
import { NameDialog } from '../../components/name-dialog';
import { HolesMark } from '../../components/pictograms';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';
import { isProblem, sayProblem } from '../../lib/api-problem';
import { shownInPlace } from '../../lib/query-client';

export interface TeamMenuProps {
  readonly team: { readonly id: string; readonly name: string; readonly role: Role };
}

/** Rename, leave, delete. */
export function TeamMenu({ team }: TeamMenuProps) {
  const [asks, setAsks] = useState<'rename' | 'leave' | 'delete' | null>(null);
  const close = (): void => setAsks(null);
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const params = { teamId: team.id };
  const goHome = async (text: string): Promise<void> => {
    await navigate('/', { replace: true });
    queryClient.removeQueries({ queryKey: ['team', team.id] });
    await queryClient.invalidateQueries({ queryKey: ['me'] });
    notify({ text });
  };
  const rename = useMutation({
    mutationFn: (name: string) => callApi(changeTeam, { params, body: { name } }),
    onSuccess: async () => {
      close();
      await queryClient.invalidateQueries({ queryKey: ['team', team.id] });
      await queryClient.invalidateQueries({ queryKey: ['me'] });
    },
    meta: shownInPlace,
  });
  const leave = useMutation({
    mutationFn: () => callApi(leaveTeam, { params }),
    onSuccess: () => goHome(`You have left ${team.name}.`),
    meta: shownInPlace,
  });
  const remove = useMutation({
    mutationFn: () => callApi(deleteTeam, { params, body: { name: team.name } }),
    onSuccess: () => goHome(`${team.name} is deleted.`),
    meta: shownInPlace,
  });
  const mustHandOver = leave.isError && isProblem(leave.error, 'team/last-owner');
  return (
    <>
      <Menu
        trigger={
          <IconButton label={`More for ${team.name}`} hint={false}>
            <HolesMark />
          </IconButton>
        }
      >
        {mayShow(team.role, 'team.change') && <MenuItem onSelect={() => setAsks('rename')}>Rename the team</MenuItem>}
        <MenuItem onSelect={() => setAsks('leave')}>Leave the team</MenuItem>
        {mayShow(team.role, 'team.delete') && (
          <>
            <MenuRule />
            <MenuItem danger onSelect={() => setAsks('delete')}>
              Delete the team
            </MenuItem>
          </>
        )}
      </Menu>
      <NameDialog
        open={asks === 'rename'}
        onOpenChange={close}
        title="Rename the team"
        label="Name of the team"
        start={team.name}
        action="Rename"
        busy={rename.isPending}
        fault={rename.isError ? sayProblem(rename.error) : null}
        onSend={rename.mutate}
      />
      <ConfirmDialog
        open={asks === 'leave'}
        onOpenChange={(open) => {
          if (!open) leave.reset();
          if (!open) close();
        }}
        title={`Leave ${team.name}?`}
        action="Leave the team"
        busy={leave.isPending}
        error={
          leave.isError
            ? mustHandOver
              ? 'You are its last owner. On the people page, make somebody else an owner first.'
              : sayProblem(leave.error)
            : null
        }
        onConfirm={() => leave.mutate()}
      >
        <p>You no longer see its projects. What you did in them stays. An owner can invite you again.</p>
      </ConfirmDialog>
      <ConfirmDialog
        open={asks === 'delete'}
        onOpenChange={close}
        title={`Delete ${team.name}?`}
        action="Delete the team"
        danger
        busy={remove.isPending}
        error={remove.isError ? sayProblem(remove.error) : null}
        typed={{ label: `Type the name of the team: ${team.name}`, text: team.name }}
        onConfirm={() => remove.mutate()}
      >
        <p>All its projects, scenes, meshes, dry fits, pictures and share links go with it, for everybody.</p>
        <p className="font-semibold">This cannot be undone.</p>
      </ConfirmDialog>
    </>
  );
}
