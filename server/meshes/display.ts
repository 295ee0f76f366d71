// A mesh thinned out for drawing: few enough triangles for a phone, rounded, and no longer the supplier's file.
import { MeshoptSimplifier } from 'meshoptimizer';
import type { DisplayMesh } from '#shared/api';
import type { Mesh } from '#shared/geometry';

/** Triangles of a display mesh, about. */
const TARGET = 20_000;
/** How far the surface may move, as a share of the mesh's extent. */
const ERROR = 0.01;

export async function displayMeshOf(mesh: Mesh): Promise<DisplayMesh> {
  await MeshoptSimplifier.ready;
  const positions = Float32Array.from(mesh.corners);
  const target = Math.min(mesh.triangles.length, TARGET * 3);
  // even a small mesh is simplified a little, so that what goes out is never the file itself
  const [simplified] = MeshoptSimplifier.simplify(mesh.triangles, positions, 3, target, ERROR, ['LockBorder']);
  let index = simplified;
  if (index.length > target * 2) {
    // a surface full of borders and folds resists; for looking at, a rougher method will do
    [index] = MeshoptSimplifier.simplifySloppy(mesh.triangles, positions, 3, null, target, ERROR);
  }
  return compact(positions, index.length >= 3 ? index : mesh.triangles);
}

/** Only the corners that are used, in order of use. */
function compact(positions: Float32Array, index: Uint32Array): DisplayMesh {
  const places = new Map<number, number>();
  const out = new Uint32Array(index.length);
  const used: number[] = [];
  for (let i = 0; i < index.length; i += 1) {
    const corner = index[i]!;
    let place = places.get(corner);
    if (place === undefined) {
      place = places.size;
      places.set(corner, place);
      used.push(positions[3 * corner]!, positions[3 * corner + 1]!, positions[3 * corner + 2]!);
    }
    out[i] = place;
  }
  return { positions: Float32Array.from(used), index: out };
}
