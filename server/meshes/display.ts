// A mesh thinned out for drawing: few enough triangles for a phone, rounded, and no longer the supplier's file.
import { MeshoptSimplifier } from 'meshoptimizer';
import type { DisplayMesh } from '#shared/api';
import type { Mesh } from '#shared/geometry';

/** Triangles of a display mesh, about. */
const TARGET = 20_000;
/** How far the surface may move, as a share of the mesh's extent: of a small mesh hardly, of a large one a little. */
const ERROR = { small: 0.002, large: 0.01 } as const;

export async function displayMeshOf(mesh: Mesh): Promise<DisplayMesh> {
  await MeshoptSimplifier.ready;
  const positions = Float32Array.from(mesh.corners);
  const isSmall = mesh.triangles.length <= TARGET * 3;
  // a small mesh is thinned out too, as far as it hardly shows, so that what goes out is never the file itself
  const target = isSmall ? 3 * Math.ceil(mesh.triangles.length / 6) : TARGET * 3;
  const error = isSmall ? ERROR.small : ERROR.large;
  const [simplified] = MeshoptSimplifier.simplify(mesh.triangles, positions, 3, target, error, ['LockBorder']);
  let index = simplified;
  if (!isSmall && index.length > target * 2) {
    // a surface full of borders and folds resists; for looking at, a rougher method will do
    [index] = MeshoptSimplifier.simplifySloppy(mesh.triangles, positions, 3, null, target, error);
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
