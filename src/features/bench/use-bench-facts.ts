// The facts of a bench from what the server knows of the person and the project; both can be changed from the bench.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useStore } from 'zustand';
import { mayShow } from '#shared/access';
import { changeMe, changeProject, type Me, type Project } from '#shared/api';
import type { RollCallKey } from '#shared/review';
import type { LengthDisplay } from '#shared/units';
import { callApi } from '../../lib/api';
import { displayFor, useMe } from '../../lib/me';
import { meQuery } from '../../lib/queries/account';
import { projectQuery } from '../../lib/queries/projects';
import type { Bench, BenchFacts } from './bench-model';

/** Shows a change at once, and the old state again if it could not be made. */
function useChangeDisplay() {
  const queryClient = useQueryClient();
  const { queryKey } = meQuery();
  return useMutation({
    mutationFn: (display: LengthDisplay) => callApi(changeMe, { body: { display } }),
    onMutate: async (display) => {
      await queryClient.cancelQueries({ queryKey });
      queryClient.setQueryData<Me>(queryKey, (me) => me && { ...me, display });
    },
    onSettled: () => queryClient.invalidateQueries({ queryKey }),
  });
}

function useChangeAbsent(projectId: string) {
  const queryClient = useQueryClient();
  const { queryKey } = projectQuery(projectId);
  return useMutation({
    mutationFn: (keys: readonly RollCallKey[]) =>
      callApi(changeProject, { params: { projectId }, body: { notOnThisCar: [...keys] } }),
    onMutate: async (keys) => {
      await queryClient.cancelQueries({ queryKey });
      queryClient.setQueryData<Project>(queryKey, (project) => project && { ...project, notOnThisCar: [...keys] });
    },
    onSettled: () => queryClient.invalidateQueries({ queryKey }),
  });
}

export function useBenchFacts(project: Project, open: Bench['open']): BenchFacts {
  const me = useMe();
  const documentDisplay = useStore(open, (o) => o.scene.display);
  const { mutate: setDisplay } = useChangeDisplay();
  const { mutate: setAbsent } = useChangeAbsent(project.id);
  const display = displayFor(me, project.display, documentDisplay);
  return useMemo(
    () => ({
      display,
      setDisplay: (next) => setDisplay(next),
      words: me.words,
      teamId: project.teamId,
      projectId: project.id,
      projectName: project.name,
      absent: project.notOnThisCar,
      setAbsent: mayShow(project.role, 'project.change') ? (keys) => setAbsent(keys) : null,
    }),
    [display, setDisplay, setAbsent, me.words, project],
  );
}
