// Jobs and the servers that take them: each is done once, and none is lost with the server that took it.
import { spawn, type ChildProcess } from 'node:child_process';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { readDryFit, runDryFit } from '#shared/api';
import { tables } from '../../../server/db/client';
import { endForsakenDryFits, runDryFitJob } from '../../../server/dry-fits/run';
import { jobs } from '../../../server/jobs/jobs';
import { call, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { jobCount, makeProject, makeScene, startWorker, twoBlocks, until, workOff } from '../support/things';

let server: TestServer;
let team: TestTeam;
let projectId: string;
beforeAll(async () => {
  server = await startTestServer();
  team = await makeTeam(server);
});
beforeEach(async () => {
  projectId = (await makeProject(server, team.designer, team.id)).id;
});
afterAll(() => server.close());

const ask = async (name = 'Layout 1') => {
  const sceneId = await makeScene(server, team.designer, projectId, twoBlocks(name));
  return (await must(server, team.designer, runDryFit, { params: { sceneId }, body: { saveNumber: 1 } })).id;
};
const look = (dryFitId: string) => must(server, team.designer, readDryFit, { params: { dryFitId } });
const run = (id: string) =>
  runDryFitJob({ db: server.db, store: server.store, log: server.log }, id, new AbortController().signal);

test('two workers share the queue, and each job is done by one of them', async () => {
  const ids: string[] = [];
  for (let i = 0; i < 6; i += 1) ids.push(await ask(`Layout ${i}`));
  const done: string[][] = [[], []];
  const workers = await Promise.all(
    done.map((list) =>
      startWorker(server, {
        dryFit: async (id) => {
          list.push(id);
          await new Promise((resolve) => setTimeout(resolve, 40));
          await run(id);
        },
      }),
    ),
  );
  await until('the queue to be empty', async () => (await jobCount(server)) === 0);
  for (const worker of workers) await worker.stop();
  expect(done.flat().sort()).toEqual(ids.sort());
  expect(done.every((list) => list.length > 0)).toBe(true);
  for (const id of ids) expect((await look(id)).state).toBe('done');
});

function startStuckProcess(): Promise<ChildProcess> {
  const script = path.join(import.meta.dirname, '../support/stuck-worker.ts');
  const child = spawn(process.execPath, ['--import', 'tsx', script, server.databaseUrl], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  return new Promise((resolve, reject) => {
    child.stdout.once('data', () => resolve(child));
    child.once('exit', () => reject(new Error('the process ended before it took the job')));
  });
}

test('a job of a killed server is taken up by the next one at once', async () => {
  const id = await ask();
  const stuck = await startStuckProcess();
  await until('its sign of life', async () => (await server.db.$count(tables.workerSeen)) === 1);
  stuck.kill('SIGKILL');
  await new Promise((resolve) => stuck.once('exit', resolve));
  const began: string[] = [];
  const worker = await startWorker(server, {
    dryFit: async (dryFitId) => {
      began.push(dryFitId);
      await run(dryFitId);
    },
  });
  try {
    await until('the dry fit to be done', async () => (await look(id)).state === 'done', 8000);
  } finally {
    await worker.stop();
  }
  expect(began).toEqual([id]);
  expect(await server.db.$count(tables.workerSeen)).toBe(0);
});

test('one of a server on another machine is taken up when it was silent for a minute, and not before', async () => {
  const id = await ask();
  await server.pool.query(
    `update graphile_worker._private_jobs set locked_by = 'w-elsewhere', locked_at = now(), attempts = 1`,
  );
  const seen = { workerId: 'w-elsewhere', host: 'elsewhere', pid: 1, seenAt: new Date(Date.now() - 30_000) };
  await server.db.insert(tables.workerSeen).values(seen);
  const early = await startWorker(server);
  await new Promise((resolve) => setTimeout(resolve, 400));
  await early.stop();
  expect((await look(id)).state).toBe('queued');
  await server.db.update(tables.workerSeen).set({ seenAt: new Date(Date.now() - 61_000) });
  await workOff(server);
  expect((await look(id)).state).toBe('done');
});

test('one of a server that was killed before its first sign of life is taken up after a minute', async () => {
  const id = await ask();
  const lockedSince = (seconds: number) =>
    server.pool.query(
      `update graphile_worker._private_jobs set locked_by = 'nobody', locked_at = now() - make_interval(secs => $1)`,
      [seconds],
    );
  await lockedSince(30);
  const early = await startWorker(server);
  await new Promise((resolve) => setTimeout(resolve, 400));
  await early.stop();
  expect((await look(id)).state).toBe('queued');
  await lockedSince(61);
  await workOff(server);
  expect((await look(id)).state).toBe('done');
});

test('a job that is thrown out of the transaction it was put in is not there', async () => {
  const before = await jobCount(server);
  const thrown = server.db.transaction(async (tx) => {
    await jobs.add(tx, 'dry-fit', { dryFitId: '0' });
    throw new Error('thought better of it');
  });
  await expect(thrown).rejects.toThrow('thought better of it');
  expect(await jobCount(server)).toBe(before);
});

test('a dry fit that brought down its server as often as it may is ended, and can be asked for again', async () => {
  const id = await ask();
  await server.pool.query('update graphile_worker._private_jobs set attempts = max_attempts');
  await server.db.update(tables.dryFit).set({ state: 'running' }).where(eq(tables.dryFit.id, id));
  await endForsakenDryFits(server.db);
  const ended = await look(id);
  expect(ended.state).toBe('failed');
  expect(ended.problem).toMatch(/several times/);
  const again = await call(server, team.designer, runDryFit, {
    params: { sceneId: ended.sceneId },
    body: { saveNumber: 1 },
  });
  expect(again.body.id).not.toBe(id);
  // one that is being worked on, or waits for its turn, is let alone
  await endForsakenDryFits(server.db);
  expect((await look(again.body.id)).state).toBe('queued');
  await server.pool.query(`delete from graphile_worker._private_jobs where key = 'dry-fit-${id}'`);
  await workOff(server);
  expect((await look(again.body.id)).state).toBe('done');
});

test('a job whose dry fit is over, or gone, does nothing', async () => {
  const id = await ask();
  await workOff(server);
  const before = await look(id);
  await run(id);
  expect(await look(id)).toEqual(before);
  await run('00000000-0000-4000-8000-000000000000');
});
