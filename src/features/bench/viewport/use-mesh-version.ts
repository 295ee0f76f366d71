import { useSyncExternalStore } from 'react';
import { useBench } from '../bench-model';

/** Draws again when a mesh has come in. */
export function useMeshVersion(): number {
  const { meshes } = useBench();
  return useSyncExternalStore(meshes.subscribe, meshes.version);
}
