// A dry fit from the button to the report.
import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { cancelDryFit, listDryFits, readDryFit, readRevision, runDryFit, saveDocument } from '#shared/api';
import type { Report } from '#shared/check';
import { tables } from '../../../server/db/client';
import { block, mesh, motion, part, sceneOf, swing } from '../../fixtures/scenes';
import { boxSoup, torusSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { call, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import {
  dryFit,
  jobCount,
  makeProject,
  makeScene,
  save,
  startWorker,
  twoBlocks,
  until,
  upload,
  workOff,
} from '../support/things';

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

const ask = (sceneId: string, saveNumber = 1) =>
  call(server, team.designer, runDryFit, { params: { sceneId }, body: { saveNumber } });
const look = (dryFitId: string) => must(server, team.reviewer, readDryFit, { params: { dryFitId } });
const reportOf = async (revisionId: string) =>
  (await must(server, team.reviewer, readRevision, { params: { revisionId } })).report as Report;
const arm = (name: string) =>
  part('arm', [mesh(name)], { motions: [motion([swing(40)])], pose: { at: [0, 0, 40] }, tolerance: 2 });

test('the report is the command line’s, finding for finding', async () => {
  const stl = binaryStl(boxSoup(20, 20, 60));
  const others = [
    part('wall', [block([5, 80, 80])], { pose: { at: [27, 0, 40] } }),
    part('post', [block([8, 8, 8])], { pose: { at: [0, 45, 40] } }),
  ];
  const { mesh: stored } = await upload(server, team.designer, team.id, stl);
  const sceneId = await makeScene(server, team.designer, projectId, sceneOf([arm(stored.sha256), ...others]));
  const { revisionId, id } = await dryFit(server, team.designer, sceneId);
  const report = await reportOf(revisionId);
  const folder = await mkdtemp(path.join(os.tmpdir(), 'gapwright-cli-'));
  await writeFile(path.join(folder, 'arm.stl'), stl);
  await writeFile(path.join(folder, 'scene.json'), JSON.stringify(sceneOf([arm('arm.stl'), ...others])));
  const text = await new Promise<string>((resolve) => {
    execFile(process.execPath, ['--import', 'tsx', 'server/cli/check.ts', path.join(folder, 'scene.json')], (_, out) =>
      resolve(out),
    );
  });
  await rm(folder, { recursive: true });
  const fromCommand = JSON.parse(text) as Report;
  expect(fromCommand.findings.length).toBeGreaterThan(3);
  expect(report.findings).toEqual(fromCommand.findings);
  expect(report.totals).toEqual(fromCommand.totals);
  expect(report.totals.hits).toBeGreaterThan(0);
  const count = report.findings.length;
  expect(await look(id)).toMatchObject({
    state: 'done',
    done: count,
    total: count,
    totals: report.totals,
    problem: null,
  });
});

test('pressed twice, at once or one after the other, it runs once', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const answers = await Promise.all([ask(sceneId), ask(sceneId), ask(sceneId)]);
  expect(answers.map((a) => a.status)).toEqual([202, 202, 202]);
  expect(new Set(answers.map((a) => a.body.id)).size).toBe(1);
  expect(answers[0].body).toMatchObject({
    state: 'queued',
    done: 0,
    total: 0,
    number: 1,
    startedBy: 'Dieter Designer',
  });
  await workOff(server);
  expect(await must(server, team.owner, listDryFits, { params: { sceneId } })).toHaveLength(1);
});

test('a finished report never changes: a second run on the same save is a second dry fit', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const first = await dryFit(server, team.designer, sceneId);
  const before = await look(first.id);
  const second = await dryFit(server, team.designer, sceneId);
  expect(second.id).not.toBe(first.id);
  expect(second.revisionId).toBe(first.revisionId);
  expect(await look(first.id)).toEqual(before);
  expect((await call(server, team.designer, cancelDryFit, { params: { dryFitId: first.id } })).code).toBe(
    'dry-fit/ended',
  );
});

test('a save that is no longer the newest is not checked', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  await save(server, team.owner, sceneId, 1, twoBlocks('Newer'));
  const answer = await ask(sceneId, 1);
  expect([answer.status, answer.code]).toEqual([409, 'scene/newer']);
  expect(await jobCount(server)).toBe(0);
});

test('one part alone is nothing to check', async () => {
  const sceneId = await makeScene(server, team.designer, projectId, sceneOf([part('only', [block([1, 1, 1])])]));
  expect((await ask(sceneId)).code).toBe('scene/empty');
});

test('a mesh whose file is gone fails the dry fit, with the reason', async () => {
  const { mesh: stored } = await upload(server, team.designer, team.id, binaryStl(boxSoup(9, 9, 9)));
  const document = sceneOf([part('a', [mesh(stored.sha256)]), part('b', [block([1, 1, 1])])]);
  const sceneId = await makeScene(server, team.designer, projectId, document);
  await server.store.remove(`meshes/${team.id}/${stored.sha256}.stl`);
  const { id } = await dryFit(server, team.designer, sceneId);
  const ended = await look(id);
  expect(ended).toMatchObject({ state: 'failed', totals: null });
  expect(ended.problem).toContain(stored.sha256.slice(0, 12));
});

test('one cancelled in the queue is not begun', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const { id, revisionId } = (await ask(sceneId)).body;
  expect(await must(server, team.designer, cancelDryFit, { params: { dryFitId: id } })).toMatchObject({
    state: 'cancelled',
  });
  await workOff(server);
  expect((await look(id)).state).toBe('cancelled');
  expect(await reportOf(revisionId)).toBeNull();
});

describe('one that takes long', () => {
  let slowScene: string;
  beforeEach(async () => {
    // two rings of many facets that swing through one another's reach, in every combination
    const { mesh: ring } = await upload(server, team.designer, team.id, binaryStl(torusSoup(100, 20, 80, 40)));
    const swinging = (id: string, y: number) =>
      part(id, [mesh(ring.sha256)], {
        pose: { at: [0, y, 0] },
        motions: [motion([swing(300)]), motion([swing(200)], { id: 'back', use: 'service' })],
      });
    const document = sceneOf([swinging('a', 0), swinging('b', 47), swinging('c', 94)], { accuracy: 0.001 });
    slowScene = await makeScene(server, team.designer, projectId, document);
  });

  test('tells its progress, and ends at once when it is cancelled', async () => {
    const { id } = (await ask(slowScene)).body;
    const worker = await startWorker(server);
    try {
      await until('progress', async () => (await look(id)).total > 0);
      const underway = await look(id);
      expect(underway.state).toBe('running');
      expect(underway.done).toBeLessThan(underway.total);
      await must(server, team.designer, cancelDryFit, { params: { dryFitId: id } });
      await until('the job to end', async () => (await jobCount(server)) === 0, 3000);
      expect(await look(id)).toMatchObject({ state: 'cancelled', totals: null });
    } finally {
      await worker.stop();
    }
  });

  test('goes back into the queue when its server stops, and the stop does not wait for it', async () => {
    const { id } = (await ask(slowScene)).body;
    const worker = await startWorker(server);
    await until('it to run', async () => (await look(id)).state === 'running');
    const began = Date.now();
    await worker.stop();
    expect(Date.now() - began).toBeLessThan(3000);
    expect((await look(id)).state).toBe('queued');
    expect(await jobCount(server)).toBe(1);
    // the next server's time: shorter here, by a lighter document under the same dry fit
    const [revision] = await server.db.select().from(tables.revision).where(eq(tables.revision.sceneId, slowScene));
    const documentText = JSON.stringify(twoBlocks());
    await server.db
      .update(tables.revision)
      .set({ documentText, meshes: [] })
      .where(eq(tables.revision.id, revision!.id));
    // after a fault the queue waits a little; here nothing is to be waited for
    await server.pool.query('update graphile_worker._private_jobs set run_at = now()');
    await workOff(server);
    expect((await look(id)).state).toBe('done');
  });
});

test('what was saved meanwhile is kept, and the report is of what was asked', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const { revisionId } = (await ask(sceneId)).body;
  const body = { base: 1, saveId: crypto.randomUUID(), document: sceneOf([], { name: 'Emptied' }) };
  await must(server, team.owner, saveDocument, { params: { sceneId }, body });
  await workOff(server);
  expect((await reportOf(revisionId)).scene.name).toBe('Layout 1');
});
