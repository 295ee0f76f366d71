// The meshes of the scene are asked for as soon as they are in it.
import { useEffect } from 'react';
import { useBench, useOpen } from './bench-model';
import { meshNamesOf } from './scene-view/static-scene';

export function useWantedMeshes(): void {
  const { meshes } = useBench();
  const components = useOpen((o) => o.scene.components);
  useEffect(() => meshes.want(meshNamesOf({ components })), [meshes, components]);
}
