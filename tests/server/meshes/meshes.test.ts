// Meshes that are there: changed, shown, deleted, seen by guests; and the thread that reads them.
import { mkdtemp, readdir, rm, utimes, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  changeMesh,
  decodeDisplayMesh,
  deleteMesh,
  listMeshes,
  listProjectMeshes,
  readDisplayMesh,
  readMesh,
  readMeshFile,
  setGuest,
} from '#shared/api';
import { sweepIncoming } from '../../../server/http/upload';
import { createQueue } from '../../../server/jobs/queue';
import { runThread } from '../../../server/jobs/thread';
import { mesh, part, sceneOf } from '../../fixtures/scenes';
import { boxSoup, torusSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { call, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { makeProject, makeScene, upload } from '../support/things';

let server: TestServer;
let team: TestTeam;
beforeAll(async () => {
  server = await startTestServer();
  team = await makeTeam(server);
});
afterAll(() => server.close());

let size = 20;
const fresh = async (name?: string) => {
  size += 1;
  return (await upload(server, team.designer, team.id, binaryStl(boxSoup(size, 10, 10)), name)).mesh;
};
const at = (sha256: string) => ({ params: { teamId: team.id, sha256 } });

test('a person says the unit and the name; an empty change changes nothing', async () => {
  const { sha256 } = await fresh();
  expect(await must(server, team.designer, changeMesh, { ...at(sha256), body: { unit: 'in' } })).toMatchObject({
    unit: 'in',
  });
  expect(await must(server, team.designer, changeMesh, { ...at(sha256), body: {} })).toMatchObject({ unit: 'in' });
  expect((await call(server, team.designer, changeMesh, { ...at(sha256), body: { unit: 'cubit' } })).status).toBe(400);
});

test('lists are searched and sorted', async () => {
  await fresh('zinc plate.stl');
  await fresh('Alu plate.stl');
  const named = await must(server, team.reviewer, listMeshes, {
    params: { teamId: team.id },
    query: { search: 'PLATE', sort: 'name' },
  });
  expect(named.map((m) => m.name)).toEqual(['Alu plate.stl', 'zinc plate.stl']);
});

test('one that a scene uses stays; one that none uses goes, with its files', async () => {
  const { sha256 } = await fresh('liner.stl');
  const project = await makeProject(server, team.designer, team.id);
  await makeScene(server, team.designer, project.id, sceneOf([part('a', [mesh(sha256)])], { name: 'Layout 1' }));
  const kept = await call(server, team.designer, deleteMesh, at(sha256));
  expect([kept.status, kept.code]).toEqual([409, 'mesh/in-use']);
  expect(kept.detail).toContain('“Layout 1” (Coupe)');
  const used = await must(server, team.reviewer, listProjectMeshes, { params: { projectId: project.id } });
  expect(used).toMatchObject([{ sha256, name: 'liner.stl', scenes: ['Layout 1'] }]);

  const other = await fresh();
  await must(server, team.designer, readDisplayMesh, at(other.sha256));
  expect(await server.store.keys(`displays/${team.id}`)).toHaveLength(1);
  await must(server, team.designer, deleteMesh, at(other.sha256));
  expect((await server.store.keys(`meshes/${team.id}`)).some((k) => k.includes(other.sha256))).toBe(false);
  expect(await server.store.keys(`displays/${team.id}`)).toEqual([]);
  expect((await call(server, team.designer, readMesh, at(other.sha256))).status).toBe(404);
});

test('deleted just when the same file is uploaded again, it is there with its file', async () => {
  const bytes = binaryStl(boxSoup(7, 7, 7));
  const { mesh: one } = await upload(server, team.designer, team.id, bytes);
  const { has } = server.store;
  // between the look at the storage and the row
  Object.assign(server.store, {
    has: async (key: string) => {
      Object.assign(server.store, { has });
      const isThere = await has(key);
      await must(server, team.designer, deleteMesh, at(one.sha256));
      return isThere;
    },
  });
  expect(await upload(server, team.designer, team.id, bytes)).toMatchObject({ isNew: true });
  const file = await call(server, team.designer, readMeshFile, at(one.sha256));
  expect(Buffer.compare(file.body as unknown as Uint8Array, bytes)).toBe(0);
  expect(await server.incoming()).toEqual([]);
});

test('a guest reads a mesh that a project of his uses, and no other', async () => {
  const [used, unused] = [await fresh(), await fresh()];
  const project = await makeProject(server, team.designer, team.id);
  const sceneId = await makeScene(
    server,
    team.designer,
    project.id,
    sceneOf([part('a', [mesh(used.sha256)])], { name: 'G' }),
  );
  expect(sceneId).toBeTruthy();
  expect((await call(server, team.guest, readMeshFile, at(used.sha256))).status).toBe(404);
  const guest = { params: { projectId: project.id, personId: team.guest.id }, body: { added: true } };
  await must(server, team.designer, setGuest, guest);
  expect((await call(server, team.guest, readMeshFile, at(used.sha256))).status).toBe(200);
  expect((await call(server, team.guest, readMeshFile, at(unused.sha256))).status).toBe(404);
});

test('the display mesh is thinned out and small enough for a phone, whatever the file', async () => {
  for (const soup of [torusSoup(200, 60, 60, 40), torusSoup(200, 60, 300, 200)]) {
    const { mesh: big } = await upload(server, team.designer, team.id, binaryStl(soup));
    const answer = await call(server, team.designer, readDisplayMesh, at(big.sha256));
    const bytes = answer.body as unknown as Uint8Array;
    const shown = decodeDisplayMesh(bytes.buffer as ArrayBuffer)!;
    const triangles = shown.index.length / 3;
    expect(triangles).toBeGreaterThan(100);
    expect(triangles).toBeLessThan(Math.min(21_000, 0.8 * big.triangles));
    // it still is where the mesh is, to within a hundredth of its size
    const reach = Math.max(...shown.positions.map(Math.abs));
    expect(Math.abs(reach - 260)).toBeLessThan(5.2);
  }
});

test('a file is answered with 304 where the browser has it, and is never run or sniffed', async () => {
  const { sha256 } = await fresh();
  const first = await call(server, team.designer, readMeshFile, at(sha256));
  expect(first.headers.get('x-content-type-options')).toBe('nosniff');
  expect(first.headers.get('cache-control')).toBe('private, no-cache');
  // said aloud: left alone, fetch would ask for a fresh copy
  const headers = { 'if-none-match': first.headers.get('etag')!, 'cache-control': 'max-age=0' };
  expect((await call(server, team.designer, readMeshFile, { ...at(sha256), headers })).status).toBe(304);
});

test('a row whose file is gone from the storage is nothing, without the file’s headers', async () => {
  const { sha256 } = await fresh();
  await server.store.remove(`meshes/${team.id}/${sha256}.stl`);
  const answer = await call(server, team.designer, readMeshFile, at(sha256));
  expect([answer.status, answer.code]).toEqual([404, 'thing/missing']);
  expect(answer.headers.get('cache-control')).toBe('no-store');
  expect(answer.headers.get('content-disposition')).toBeNull();
  expect(answer.headers.get('etag') ?? '').not.toContain(sha256);
  // sending the file again mends it
  await upload(server, team.designer, team.id, binaryStl(boxSoup(size, 10, 10)));
  expect((await call(server, team.designer, readMeshFile, at(sha256))).status).toBe(200);
});

test('a thread that fails, runs out of memory or is called off rejects', async () => {
  const judge = (file: string, memory: number, signal?: AbortSignal) =>
    runThread('mesh-worker', { data: { kind: 'judge', file }, memory, signal });
  await expect(judge('/nowhere/at.stl', 256)).rejects.toThrow(/ENOENT/);
  await expect(judge('/nowhere/at.stl', 256, AbortSignal.abort())).rejects.toThrow('aborted');
  const folder = await mkdtemp(path.join(os.tmpdir(), 'gapwright-thread-'));
  const file = path.join(folder, 'large.stl');
  await writeFile(file, binaryStl(torusSoup(200, 60, 400, 300)));
  await expect(judge(file, 4)).rejects.toThrow(/memory/);
  await rm(folder, { recursive: true });
});

test('at most so many threads run at a time, and the others get their turn', async () => {
  const queue = createQueue(2);
  let [running, most] = [0, 0];
  const work = async (): Promise<void> => {
    running += 1;
    most = Math.max(most, running);
    await new Promise((resolve) => setTimeout(resolve, 5));
    running -= 1;
    if (most === 1) throw new Error('unreachable');
  };
  await Promise.all(Array.from({ length: 9 }, () => queue(work)));
  expect(most).toBe(2);
  await expect(queue(work, AbortSignal.abort())).rejects.toThrow('aborted');
});

test('what a killed server left half-uploaded is swept; what another server is taking in is not', async () => {
  const files = await mkdtemp(path.join(os.tmpdir(), 'gapwright-sweep-'));
  const folder = path.join(files, 'incoming');
  await sweepIncoming(files);
  const own = os
    .hostname()
    .toLowerCase()
    .replace(/[^a-z0-9]/g, '');
  const names = [`${own}-999999999-dead`, `${own}-${process.ppid}-alive`, 'elsewhere-12-young', 'elsewhere-12-old'];
  for (const name of names) await writeFile(path.join(folder, name), 'x');
  const longAgo = new Date(Date.now() - 25 * 60 * 60 * 1000);
  await utimes(path.join(folder, names[3]!), longAgo, longAgo);
  await sweepIncoming(files);
  expect((await readdir(folder)).sort()).toEqual([names[1], names[2]].sort());
  await rm(files, { recursive: true });
});
