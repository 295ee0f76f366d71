// Projects, scenes, meshes and dry fits made through the API, and the worker that carries dry fits out.
import { randomUUID } from 'node:crypto';
import { createProject, createScene, runDryFit, saveDocument, storePicture, uploadMesh } from '#shared/api';
import { loadScene } from '#shared/scene';
import { endForsakenDryFits, runDryFitJob } from '../../../server/dry-fits/run';
import { startJobs, type JobRunner } from '../../../server/jobs/jobs';
import { block, part, sceneOf } from '../../fixtures/scenes';
import { fileForm, must } from './call';
import type { TestPerson } from './people';
import type { TestServer } from './server';

type Json = Readonly<Record<string, unknown>>;

/** Two blocks, 20 mm apart. */
export const twoBlocks = (name = 'Layout 1', more: Json = {}): Json =>
  sceneOf([part('left', [block([10, 10, 10])]), part('right', [block([10, 10, 10])], { pose: { at: [0, 30, 0] } })], {
    name,
    ...more,
  });

export async function makeProject(server: TestServer, person: TestPerson, teamId: string, name = 'Coupe') {
  return must(server, person, createProject, { params: { teamId }, body: { name } });
}

export async function save(server: TestServer, person: TestPerson, sceneId: string, base: number, document: unknown) {
  const body = { base, saveId: randomUUID(), document };
  return (await must(server, person, saveDocument, { params: { sceneId }, body })).saveNumber;
}

/** A scene that holds a document; its save number is 1. */
export async function makeScene(
  server: TestServer,
  person: TestPerson,
  projectId: string,
  document: Json = twoBlocks(),
): Promise<string> {
  const { id } = await must(server, person, createScene, { params: { projectId }, body: { name: document['name'] } });
  await save(server, person, id, 0, document);
  return id;
}

export async function upload(server: TestServer, person: TestPerson, teamId: string, bytes: Uint8Array, name?: string) {
  return must(server, person, uploadMesh, { params: { teamId }, form: fileForm(bytes, name) });
}

/** A worker on the server's queue. */
export function startWorker(server: TestServer, handlers: { dryFit?: (id: string) => Promise<void> } = {}) {
  const { db, pool, store, log } = server;
  return startJobs({
    db,
    pool,
    log,
    concurrency: 1,
    handlers: {
      'dry-fit': ({ dryFitId }, signal) =>
        handlers.dryFit?.(dryFitId) ?? runDryFitJob({ db, store, log }, dryFitId, signal),
      sweep: () => Promise.resolve(),
    },
    onFreed: () => endForsakenDryFits(db),
  });
}

export async function until(what: string, isSo: () => Promise<boolean>, ms = 20_000): Promise<void> {
  const end = Date.now() + ms;
  while (!(await isSo())) {
    if (Date.now() > end) throw new Error(`in vain waited for: ${what}`);
    await new Promise((resolve) => setTimeout(resolve, 30));
  }
}

export async function jobCount(server: TestServer): Promise<number> {
  const { rows } = await server.pool.query<{ n: number }>('select count(*)::int as n from graphile_worker.jobs');
  return rows[0]!.n;
}

/** Works off all that is in the queue. */
export async function workOff(server: TestServer): Promise<void> {
  const worker: JobRunner = await startWorker(server);
  try {
    await until('the queue to be empty', async () => (await jobCount(server)) === 0);
  } finally {
    await worker.stop();
  }
}

/** Runs the dry fit of a scene to its end; gives the revision. */
export async function dryFit(server: TestServer, person: TestPerson, sceneId: string, saveNumber = 1) {
  const asked = await must(server, person, runDryFit, { params: { sceneId }, body: { saveNumber } });
  await workOff(server);
  return asked;
}

/** The smallest PNG there is, one grey pixel. */
export const PNG = new Uint8Array(
  Buffer.from('iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAAAAAA6fptVAAAACklEQVR4nGNoAAAAggCBd81ytgAAAABJRU5ErkJggg==', 'base64'),
);

export async function takePicture(server: TestServer, person: TestPerson, revisionId: string, bytes = PNG) {
  return must(server, person, storePicture, {
    params: { revisionId },
    query: { kind: 'view', standpoint: 'Overhead' },
    form: fileForm(bytes, 'view.png'),
  });
}

/** A document as the server keeps it. */
export function loaded(document: unknown) {
  const result = loadScene(document);
  if (!result.ok) throw new Error(result.refusals[0].reason);
  return result.scene;
}
