// The thread that reads meshes: strictly, away from the requests. One job in, one answer out.
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { parentPort, workerData } from 'node:worker_threads';
import { encodeDisplayMesh } from '#shared/api';
import { meshExtent, meshFromSoup, readStl } from '#shared/geometry';
import { displayMeshOf } from './display';

export type MeshJob =
  { readonly kind: 'judge'; readonly file: string } | { readonly kind: 'display'; readonly bytes: Uint8Array };

export interface MeshFacts {
  readonly form: 'binary' | 'text';
  readonly triangles: number;
  readonly low: [number, number, number];
  readonly high: [number, number, number];
  readonly kind: 'body' | 'sheet';
  readonly badEdges: number;
  readonly shells: number;
  readonly dropped: number;
}
export type MeshAnswer =
  | { readonly kind: 'judged'; readonly facts: MeshFacts; readonly sha256: string }
  | { readonly kind: 'refused'; readonly reason: string }
  | { readonly kind: 'display'; readonly bytes: Uint8Array };

/** Beyond this a coordinate cannot be meant in any unit, 100 m being the farthest anything may lie. */
const LARGEST_COORDINATE = 1e9;

function judge(file: string): MeshAnswer {
  const bytes = readFileSync(file);
  const read = readStl(bytes);
  if (!read.ok) return { kind: 'refused', reason: read.reason };
  const result = meshFromSoup(read.soup);
  if (!result.ok) return { kind: 'refused', reason: result.reason };
  const { mesh } = result;
  const { low, high } = meshExtent(mesh);
  if ([...low, ...high].some((x) => Math.abs(x) > LARGEST_COORDINATE)) {
    return { kind: 'refused', reason: 'a coordinate is far beyond 100 m in every unit: the file is damaged' };
  }
  if (low.every((x, k) => x === high[k])) return { kind: 'refused', reason: 'the mesh has no extent' };
  return {
    kind: 'judged',
    sha256: createHash('sha256').update(bytes).digest('hex'),
    facts: {
      form: read.form,
      triangles: mesh.triangles.length / 3,
      low,
      high,
      kind: mesh.kind,
      badEdges: mesh.badEdges,
      shells: mesh.shellCorners.length,
      dropped: mesh.droppedDegenerate + mesh.droppedRepeats,
    },
  };
}

async function display(bytes: Uint8Array): Promise<MeshAnswer> {
  const read = readStl(bytes);
  const result = read.ok ? meshFromSoup(read.soup) : read;
  if (!result.ok) return { kind: 'refused', reason: result.reason };
  return { kind: 'display', bytes: encodeDisplayMesh(await displayMeshOf(result.mesh)) };
}

const job = workerData as MeshJob;
parentPort?.postMessage(job.kind === 'judge' ? judge(job.file) : await display(job.bytes));
