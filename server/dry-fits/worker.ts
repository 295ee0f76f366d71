// The thread that runs a dry fit: the same check as in the page, away from the requests.
import { parentPort, workerData } from 'node:worker_threads';
import { checkScene, loadedMesh, prepareScene, type Report } from '#shared/check';
import { meshFromStl } from '#shared/geometry';
import { loadScene } from '#shared/scene';

export interface DryFitJob {
  readonly documentText: string;
  readonly sha256: string;
  /** The files of the meshes that the document names. */
  readonly meshes: readonly { readonly sha256: string; readonly bytes: Uint8Array }[];
}

export type DryFitMessage =
  | { readonly kind: 'progress'; readonly done: number; readonly total: number }
  | { readonly kind: 'done'; readonly report: Report }
  | { readonly kind: 'refused'; readonly reason: string };

const send = (message: DryFitMessage): void => parentPort?.postMessage(message);

/** How often progress is told, findings apart and time apart. */
const EVERY_MS = 150;

function run(job: DryFitJob): DryFitMessage {
  const loaded = loadScene(JSON.parse(job.documentText));
  if (!loaded.ok) return { kind: 'refused', reason: `${loaded.refusals[0].path}: ${loaded.refusals[0].reason}` };
  const meshes = new Map<string, ReturnType<typeof loadedMesh>>();
  for (const { sha256, bytes } of job.meshes) {
    const read = meshFromStl(bytes);
    if (!read.ok) return { kind: 'refused', reason: `the mesh ${sha256.slice(0, 12)}: ${read.reason}` };
    meshes.set(sha256, loadedMesh(read.mesh, sha256));
  }
  const prepared = prepareScene(loaded.scene, meshes);
  if (!prepared.ok) return { kind: 'refused', reason: `${prepared.refusal.path}: ${prepared.refusal.reason}` };
  let told = 0;
  const report = checkScene(prepared.prepared, job.sha256, (done, total) => {
    const now = Date.now();
    if (now - told < EVERY_MS && done < total) return;
    told = now;
    send({ kind: 'progress', done, total });
  });
  return { kind: 'done', report };
}

send(run(workerData as DryFitJob));
