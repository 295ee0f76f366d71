// Meshes that are still on their way or that could not be read: a picture without them must say so.
import { useBench, useOpen } from '../bench-model';
import { useMeshVersion } from '../viewport/use-mesh-version';
import { meshNamesOf } from './static-scene';

export function MeshNotes() {
  const { meshes } = useBench();
  const scene = useOpen((o) => o.scene);
  useMeshVersion();
  const states = meshNamesOf(scene).map((mesh) => ({ mesh, drawing: meshes.get(mesh) }));
  const failed = states.filter(({ drawing }) => drawing?.state === 'failed');
  const reading = states.filter(({ drawing }) => drawing === undefined || drawing.state === 'reading').length;
  if (failed.length === 0 && reading === 0) return null;
  return (
    <div className="scene-notes" role="status">
      {reading > 0 && <p>Reading {reading === 1 ? 'a mesh' : `${reading} meshes`} …</p>}
      {failed.length > 0 && (
        <p>
          {failed.length === 1 ? 'A mesh is' : `${failed.length} meshes are`} not drawn: it could not be read.{' '}
          <button
            type="button"
            className="button-text"
            onClick={() => failed.forEach(({ mesh }) => meshes.retry(mesh))}
          >
            Try again
          </button>
        </p>
      )}
    </div>
  );
}
