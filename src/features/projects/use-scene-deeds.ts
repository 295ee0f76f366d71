// What can be done with a scene from its project's page.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { changeScene, createScene, deleteScene, duplicateScene, restoreScene, type SceneLine } from '#shared/api';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';
import { shownInPlace } from '../../lib/query-client';

function useRefresh(projectId: string): () => Promise<void> {
  const queryClient = useQueryClient();
  return async () => {
    await Promise.all([
      queryClient.invalidateQueries({ queryKey: ['project', projectId] }),
      queryClient.invalidateQueries({ queryKey: ['team'] }),
    ]);
  };
}

/** Makes a scene in a project; `onMade` gets it. */
export function useCreateScene(projectId: string, onMade: (scene: SceneLine) => void) {
  const refresh = useRefresh(projectId);
  return useMutation({
    mutationFn: (name: string) => callApi(createScene, { params: { projectId }, body: { name } }),
    onSuccess: (scene) => {
      onMade(scene);
      void refresh();
    },
    meta: shownInPlace,
  });
}

export function useSceneDeeds(scene: SceneLine, onDone: () => void) {
  const refresh = useRefresh(scene.projectId);
  const params = { sceneId: scene.id };
  const { name } = scene;
  const restore = useMutation({
    mutationFn: () => callApi(restoreScene, { params }),
    onSuccess: () => {
      void refresh();
      notify({ text: `“${name}” is back.` });
    },
  });
  const archive = useMutation({
    mutationFn: (archived: boolean) => callApi(changeScene, { params, body: { archived } }),
    onSuccess: (_, archived) => {
      void refresh();
      notify({
        text: archived ? `“${name}” is in the archive.` : `“${name}” is out of the archive.`,
        undo: () => archive.mutate(!archived),
      });
    },
  });
  const remove = useMutation({
    mutationFn: () => callApi(deleteScene, { params }),
    onSuccess: () => {
      void refresh();
      notify({ text: `“${name}” is deleted. For 30 days it can be brought back.`, undo: () => restore.mutate() });
    },
  });
  const rename = useMutation({
    mutationFn: (next: string) => callApi(changeScene, { params, body: { name: next } }),
    onSuccess: () => {
      void refresh();
      onDone();
    },
    meta: shownInPlace,
  });
  const duplicate = useMutation({
    mutationFn: (next: string) => callApi(duplicateScene, { params, body: { name: next } }),
    onSuccess: (made) => {
      void refresh();
      onDone();
      notify({ text: `“${made.name}” is made from “${name}”.` });
    },
    meta: shownInPlace,
  });
  return { restore, archive, remove, rename, duplicate };
}
