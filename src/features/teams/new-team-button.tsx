import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { createTeam } from '#shared/api';
import { Button } from '../../components/button';
import { NameDialog } from '../../components/name-dialog';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { shownInPlace } from '../../lib/query-client';

export function NewTeamButton() {
  const [isOpen, setOpen] = useState(false);
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const create = useMutation({
    mutationFn: (name: string) => callApi(createTeam, { body: { name } }),
    onSuccess: async (team) => {
      await queryClient.invalidateQueries({ queryKey: ['me'] });
      await navigate(`/teams/${team.id}`);
    },
    meta: shownInPlace,
  });
  return (
    <>
      <Button onClick={() => setOpen(true)}>New team</Button>
      <NameDialog
        open={isOpen}
        onOpenChange={setOpen}
        title="New team"
        lead="A shop, or a group of friends. You are its first owner."
        label="Name of the team"
        start=""
        action="Found the team"
        busy={create.isPending}
        fault={create.isError ? sayProblem(create.error) : null}
        onSend={create.mutate}
      />
    </>
  );
}
