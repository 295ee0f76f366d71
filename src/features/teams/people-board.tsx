// The people of a team with all that an owner can do about them.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Role } from '#shared/access';
import { changePerson, removePerson, type Person } from '#shared/api';
import { ConfirmDialog } from '../../components/confirm-dialog';
import { Section } from '../../components/page-head';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { useMe } from '../../lib/me';
import { shownInPlace } from '../../lib/query-client';
import { PeopleTable } from './people-table';

export interface PeopleBoardProps {
  readonly team: { readonly id: string; readonly name: string; readonly role: Role };
}

export function PeopleBoard({ team }: PeopleBoardProps) {
  const me = useMe();
  const queryClient = useQueryClient();
  const [leaving, setLeaving] = useState<Person | null>(null);
  const [heir, setHeir] = useState<Person | null>(null);
  const refresh = async (): Promise<void> => {
    await queryClient.invalidateQueries({ queryKey: ['team', team.id] });
    // the person's own role may be another now
    await queryClient.invalidateQueries({ queryKey: ['me'] });
  };
  const setRole = (personId: string, role: Role) =>
    callApi(changePerson, { params: { teamId: team.id, personId }, body: { role } });

  const change = useMutation({
    mutationFn: ({ person, role }: { person: Person; role: Role }) => setRole(person.id, role),
    onSuccess: (_, { person, role }) => {
      notify({
        text: `${person.name} is ${role} now.`,
        ...(person.id === me.id ? {} : { undo: () => change.mutate({ person, role: person.role }) }),
      });
    },
    onSettled: refresh,
  });
  const remove = useMutation({
    mutationFn: (person: Person) => callApi(removePerson, { params: { teamId: team.id, personId: person.id } }),
    onSuccess: (_, person) => {
      setLeaving(null);
      notify({ text: `${person.name} is no longer in ${team.name}.` });
    },
    onSettled: refresh,
    meta: shownInPlace,
  });
  const handOver = useMutation({
    // the new owner first: a team is never without one
    mutationFn: async (person: Person) => {
      await setRole(person.id, 'owner');
      await setRole(me.id, 'designer');
    },
    onSuccess: (_, person) => {
      setHeir(null);
      notify({ text: `${team.name} is handed over to ${person.name}. You are a designer in it now.` });
    },
    onSettled: refresh,
    meta: shownInPlace,
  });
  return (
    <Section title="People">
      <PeopleTable
        teamId={team.id}
        role={team.role}
        onChangeRole={(person, role, letGo) => change.mutate({ person, role }, { onError: letGo })}
        onRemove={(person) => {
          remove.reset();
          setLeaving(person);
        }}
        onHandOver={(person) => {
          handOver.reset();
          setHeir(person);
        }}
      />
      <ConfirmDialog
        open={leaving !== null}
        onOpenChange={() => setLeaving(null)}
        title={`Remove ${leaving?.name ?? ''}?`}
        action="Remove from the team"
        danger
        busy={remove.isPending}
        error={remove.isError ? sayProblem(remove.error) : null}
        onConfirm={() => leaving !== null && remove.mutate(leaving)}
      >
        <p>
          {leaving?.name} no longer sees the projects of {team.name}. What {leaving?.name} did in them stays. To let
          somebody back in, invite again.
        </p>
      </ConfirmDialog>
      <ConfirmDialog
        open={heir !== null}
        onOpenChange={() => setHeir(null)}
        title={`Hand ${team.name} over to ${heir?.name ?? ''}?`}
        action="Hand over"
        busy={handOver.isPending}
        error={handOver.isError ? sayProblem(handOver.error) : null}
        onConfirm={() => heir !== null && handOver.mutate(heir)}
      >
        <p>
          {heir?.name} becomes an owner, and you become a designer: you go on working in the projects, but the team and
          its people are no longer yours to change.
        </p>
      </ConfirmDialog>
    </Section>
  );
}
