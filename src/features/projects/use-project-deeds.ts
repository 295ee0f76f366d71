// What can be done with a whole project besides changing its facts. Everything that takes it away can be undone.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { changeProject, deleteProject, restoreProject } from '#shared/api';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';

interface Which {
  readonly id: string;
  readonly teamId: string;
  readonly name: string;
}

export interface ProjectDeeds {
  readonly archive: (archived: boolean) => void;
  readonly remove: () => void;
  readonly bringBack: () => void;
}

/** `onGone` is called when the project has left the place where it was shown. */
export function useProjectDeeds({ id, teamId, name }: Which, onGone?: () => void): ProjectDeeds {
  const queryClient = useQueryClient();
  const params = { projectId: id };
  const refresh = (): void => {
    void queryClient.invalidateQueries({ queryKey: ['team', teamId, 'projects'] });
    void queryClient.invalidateQueries({ queryKey: ['project', id] });
  };
  const restore = useMutation({
    mutationFn: () => callApi(restoreProject, { params }),
    onSuccess: () => {
      refresh();
      notify({ text: `“${name}” is back.` });
    },
  });
  const archive = useMutation({
    mutationFn: (archived: boolean) => callApi(changeProject, { params, body: { archived } }),
    onSuccess: (_, archived) => {
      refresh();
      notify({
        text: archived ? `“${name}” is in the archive.` : `“${name}” is out of the archive.`,
        undo: () => archive.mutate(!archived),
      });
    },
  });
  const remove = useMutation({
    mutationFn: () => callApi(deleteProject, { params }),
    onSuccess: () => {
      onGone?.();
      refresh();
      notify({ text: `“${name}” is deleted. For 30 days it can be brought back.`, undo: () => restore.mutate() });
    },
  });
  return { archive: archive.mutate, remove: () => remove.mutate(), bringBack: () => restore.mutate() };
}
