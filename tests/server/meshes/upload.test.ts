// Meshes on their way in: judged, stored once, or refused without a trace.
import { createHash } from 'node:crypto';
import http from 'node:http';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { listMeshes, readMeshFile, uploadMesh } from '#shared/api';
import { tables } from '../../../server/db/client';
import { boxSoup, movedSoup, squareSoup, type Soup } from '../../fixtures/soups';
import { asciiStl, binaryStl, textBytes } from '../../fixtures/stl';
import { call, fileForm, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { until, upload } from '../support/things';

const MOST = 2_000_000;
let server: TestServer;
let team: TestTeam;
let isStoreBroken = false;
beforeAll(async () => {
  server = await startTestServer({
    env: { MAX_MESH_BYTES: String(MOST) },
    services: ({ store }) => ({
      store: {
        ...store,
        takeFile: (...args) =>
          isStoreBroken ? Promise.reject(new Error('the disk is full')) : store.takeFile(...args),
      },
    }),
  });
});
beforeEach(async () => {
  team = await makeTeam(server);
});
afterAll(() => server.close());

const take = (bytes: Uint8Array, name = 'part.stl') => upload(server, team.designer, team.id, bytes, name);
const tryTo = (form: FormData) => call(server, team.designer, uploadMesh, { params: { teamId: team.id }, form });

async function expectNothingLeft(): Promise<void> {
  expect(await server.incoming()).toEqual([]);
  expect(await server.store.keys(`meshes/${team.id}`)).toEqual([]);
  expect(await server.db.$count(tables.mesh)).toBe(0);
}

describe('judged', () => {
  beforeEach(() => server.db.delete(tables.mesh));
  const withoutLast = (soup: Soup): Soup => soup.slice(0, -9);
  const inches = boxSoup(4.25, 6, 9);
  test.each<[string, Uint8Array, object]>([
    [
      'a closed block',
      binaryStl(boxSoup(100, 50, 20)),
      {
        kind: 'body',
        triangles: 12,
        badEdges: 0,
        shells: 1,
        form: 'binary',
        guess: 'mm',
        low: [-50, -25, -10],
        high: [50, 25, 10],
      },
    ],
    [
      'a block without a lid',
      binaryStl(withoutLast(boxSoup(100, 50, 20))),
      { kind: 'sheet', triangles: 11, badEdges: 3, shells: 1 },
    ],
    ['a flat square', binaryStl(squareSoup(100, 50)), { kind: 'sheet', triangles: 2, badEdges: 4 }],
    [
      'two blocks apart',
      binaryStl([...boxSoup(100, 5, 5), ...movedSoup(boxSoup(5, 5, 5), [0, 50, 0])]),
      { kind: 'body', shells: 2 },
    ],
    [
      'a triangle twice',
      binaryStl([...boxSoup(100, 5, 5), ...boxSoup(100, 5, 5).slice(0, 9)]),
      { kind: 'body', triangles: 12, dropped: 1 },
    ],
    ['text', textBytes(asciiStl(boxSoup(100, 50, 20))), { kind: 'body', form: 'text', triangles: 12 }],
    ['a part in inches', binaryStl(inches), { guess: 'in' }],
    ['a part in metres', binaryStl(boxSoup(0.4, 0.2, 0.1)), { guess: 'm' }],
  ])('%s', async (_, bytes, facts) => {
    const { mesh } = await take(bytes);
    expect(mesh).toMatchObject({
      ...facts,
      unit: null,
      bytes: bytes.length,
      name: 'part.stl',
      uploadedBy: 'Dieter Designer',
    });
    expect(mesh.sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
    const file = await call(server, team.reviewer, readMeshFile, { params: { teamId: team.id, sha256: mesh.sha256 } });
    expect(Buffer.compare(file.body as unknown as Uint8Array, bytes)).toBe(0);
  });
});

test('the same file is stored once a team, whatever it is called, even at the same moment; another team has its own', async () => {
  const bytes = binaryStl(boxSoup(11, 12, 13));
  const both = await Promise.all([take(bytes, 'one.stl'), take(bytes, 'two.stl')]);
  expect(both.map((b) => b.isNew).sort()).toEqual([false, true]);
  expect((await take(bytes, 'three.stl')).isNew).toBe(false);
  expect(await must(server, team.designer, listMeshes, { params: { teamId: team.id } })).toHaveLength(1);
  const other = await makeTeam(server, 'Others');
  expect((await upload(server, other.designer, other.id, bytes)).isNew).toBe(true);
  expect(await must(server, other.designer, listMeshes, { params: { teamId: other.id } })).toHaveLength(1);
  expect(await server.incoming()).toEqual([]);
});

test.each([
  ['../../etc/passwd', 'passwd'],
  ['C:\\shop\\fender liner.STL', 'fender liner.STL'],
  ['Kotflügel “links”.stl', 'Kotflügel “links”.stl'],
  ['n'.repeat(300), 'n'.repeat(120)],
])('a file called %s is shown as its plain name, and never laid under it', async (name, shown) => {
  const { mesh } = await take(binaryStl(boxSoup(10 + name.length, 10, 10)), name);
  expect(mesh.name).toBe(shown);
  expect(await server.store.has(`meshes/${team.id}/${mesh.sha256}.stl`)).toBe(true);
  const file = await call(server, team.designer, readMeshFile, { params: { teamId: team.id, sha256: mesh.sha256 } });
  expect(file.headers.get('content-disposition')).toMatch(
    /^attachment; filename="[\x20-\x7e]+"; filename\*=UTF-8''[^\s"]+$/,
  );
});

describe('refused, with nothing left behind:', () => {
  beforeEach(() => server.db.delete(tables.mesh));
  const nan = binaryStl(boxSoup(10, 10, 10));
  new DataView(nan.buffer).setFloat32(96, Number.NaN, true);
  const whole = binaryStl(boxSoup(10, 10, 10));
  test.each<[string, Uint8Array, RegExp]>([
    ['an empty file', new Uint8Array(0), /empty/],
    ['a web page', textBytes('<!doctype html><title>404</title>'), /STL/i],
    ['a truncated one', whole.slice(0, -20), /truncated|fewer|bytes/],
    ['text that breaks off', textBytes(asciiStl(boxSoup(10, 10, 10)).slice(0, 700)), /./],
    ['a coordinate that is no number', nan, /finite|number/],
    ['no triangles at all', binaryStl([]), /triangle|empty/],
    ['triangles without area', binaryStl([0, 0, 0, 0, 0, 0, 0, 0, 0]), /triangle/],
    ['coordinates beyond everything', binaryStl(boxSoup(1e12, 1, 1)), /100 m/],
  ])('%s', async (_, bytes, reason) => {
    const answer = await tryTo(fileForm(bytes, 'bad.stl'));
    expect([answer.status, answer.code]).toEqual([422, 'mesh/refused']);
    expect(answer.detail).toMatch(/^bad\.stl was not taken: /);
    expect(answer.detail).toMatch(reason);
    await expectNothingLeft();
  });

  test('a file over the limit', async () => {
    const answer = await tryTo(fileForm(new Uint8Array(MOST + 1)));
    expect([answer.status, answer.code]).toEqual([413, 'mesh/too-large']);
    await until('the part that came to be gone', async () => (await server.incoming()).length === 0);
    await expectNothingLeft();
  });

  test('a form without a file, with a wrong field, with two files', async () => {
    expect((await tryTo(new FormData())).status).toBe(400);
    expect((await tryTo(fileForm(whole, 'a.stl', 'other'))).status).toBe(400);
    const two = fileForm(whole);
    two.append('file', new Blob([whole as Uint8Array<ArrayBuffer>]), 'b.stl');
    expect((await tryTo(two)).status).toBe(400);
    const json = await call(server, team.designer, uploadMesh, { params: { teamId: team.id }, body: {} });
    expect([json.status, json.code]).toEqual([400, 'mesh/no-file']);
    await until('all parts to be gone', async () => (await server.incoming()).length === 0);
    await expectNothingLeft();
  });

  test('an upload whose sender goes away in the middle', async () => {
    const socket = http.request(`${server.url}/api/teams/${team.id}/meshes`, {
      method: 'POST',
      headers: { cookie: team.designer.cookie, 'content-type': 'multipart/form-data; boundary=x' },
    });
    socket.on('error', () => undefined);
    socket.write('--x\r\ncontent-disposition: form-data; name="file"; filename="a.stl"\r\n\r\n');
    socket.write(new Uint8Array(500_000));
    await until('the first part to be there', async () => (await server.incoming()).length === 1);
    socket.destroy();
    await until('it to be gone', async () => (await server.incoming()).length === 0);
    await expectNothingLeft();
  });

  test('a storage that fails is the server’s fault, and says nothing of its disk', async () => {
    isStoreBroken = true;
    const answer = await tryTo(fileForm(whole));
    isStoreBroken = false;
    expect([answer.status, answer.code, answer.detail]).toEqual([500, 'server/failed', undefined]);
    await expectNothingLeft();
  });
});
