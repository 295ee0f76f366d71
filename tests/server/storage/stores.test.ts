// Both ways of keeping files, through the same tests: a folder, and object storage.
import { randomBytes } from 'node:crypto';
import { mkdtemp, readdir, rm, stat, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { readDisplayMesh, readMeshFile, readPicture } from '#shared/api';
import { readConfig } from '../../../server/config';
import { createFileStore, type FileStore } from '../../../server/storage/file-store';
import { collect } from '../../../server/storage/stored';
import { torusSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { call, must } from '../support/call';
import { startObjectStorage, type ObjectStorage } from '../support/object-storage';
import { makeTeam } from '../support/people';
import { startTestServer } from '../support/server';
import { dryFit, makeProject, makeScene, PNG, takePicture, upload } from '../support/things';

let objects: ObjectStorage;
let folder: string;
beforeAll(async () => {
  objects = await startObjectStorage();
  folder = await mkdtemp(path.join(os.tmpdir(), 'gapwright-store-'));
});
afterAll(async () => {
  await objects.close();
  await rm(folder, { recursive: true, force: true });
});

const KINDS = { 'a folder': () => ({}), 'object storage': () => objects.env };

describe.each(Object.entries(KINDS))('%s', (_, env) => {
  let store: FileStore;
  beforeEach(async () => {
    const files = path.join(folder, randomBytes(4).toString('hex'));
    store = await createFileStore(readConfig({ DATABASE_URL: 'postgres://x', GAPWRIGHT_FILES: files, ...env() }));
    for (const key of await store.keys('meshes')) await store.remove(key);
  });

  const text = (bytes: Uint8Array | null) => (bytes === null ? null : new TextDecoder().decode(bytes));
  const put = (key: string, content: string) => store.putBytes(key, new TextEncoder().encode(content));

  test('what is put is there, byte for byte', async () => {
    await put('meshes/a/one.stl', 'one');
    expect(await store.has('meshes/a/one.stl')).toBe(true);
    expect(text(await store.readBytes('meshes/a/one.stl'))).toBe('one');
    const file = (await store.open('meshes/a/one.stl'))!;
    expect(file.bytes).toBe(3);
    expect(text(await collect(file.stream))).toBe('one');
  });

  test('a file is taken, however large, and gone from where it lay', async () => {
    const bytes = randomBytes(12_000_000);
    const file = path.join(folder, randomBytes(4).toString('hex'));
    await writeFile(file, bytes);
    await store.takeFile('meshes/a/large.stl', file);
    await expect(stat(file)).rejects.toThrow(/ENOENT/);
    const stored = (await store.open('meshes/a/large.stl'))!;
    expect(stored.bytes).toBe(bytes.length);
    expect(Buffer.compare(await collect(stored.stream), bytes)).toBe(0);
  });

  test('a file that is not there is not taken, and leaves nothing', async () => {
    await expect(store.takeFile('meshes/a/x.stl', path.join(folder, 'nowhere'))).rejects.toThrow(/ENOENT/);
    expect(await store.has('meshes/a/x.stl')).toBe(false);
    expect(await store.keys('meshes')).toEqual([]);
  });

  test('a second put under a key takes the first one’s place', async () => {
    await put('meshes/a/one.stl', 'one');
    await put('meshes/a/one.stl', 'another');
    expect(text(await store.readBytes('meshes/a/one.stl'))).toBe('another');
  });

  test('nothing is under a key that was never put, or was removed', async () => {
    await put('meshes/a/one.stl', 'one');
    await store.remove('meshes/a/one.stl');
    await store.remove('meshes/a/one.stl');
    for (const key of ['meshes/a/one.stl', 'meshes/never.stl']) {
      expect([await store.has(key), await store.open(key), await store.readBytes(key)]).toEqual([false, null, null]);
    }
  });

  test('keys are listed under their prefix, whole parts of it only', async () => {
    for (const key of ['meshes/a/1.stl', 'meshes/a/2.stl', 'meshes/ab/3.stl']) await put(key, key);
    expect(await store.keys('meshes/a')).toEqual(['meshes/a/1.stl', 'meshes/a/2.stl']);
    expect(await store.keys('meshes')).toHaveLength(3);
    expect(await store.keys('nothing')).toEqual([]);
  });

  test.each(['../x', '/x', 'a/../b', 'a//b', 'A', 'a\0', '', 'a/', 'a.b.c'])('%j is no key', async (key) => {
    await expect(put(key, 'x')).rejects.toThrow('not a storage key');
    await expect(store.open(key)).rejects.toThrow('not a storage key');
    await expect(store.remove(key)).rejects.toThrow('not a storage key');
  });

  test('many keys at once', async () => {
    const keys = Array.from({ length: 30 }, (_, i) => `meshes/many/${String(i).padStart(4, '0')}.stl`);
    await Promise.all(keys.map((key) => put(key, 'x')));
    expect(await store.keys('meshes/many')).toEqual(keys);
  });

  test('the product works on it: upload, display, dry fit, picture', async () => {
    const server = await startTestServer({ env: env() });
    try {
      const team = await makeTeam(server);
      const stl = binaryStl(torusSoup(100, 20, 20, 12));
      const { mesh } = await upload(server, team.designer, team.id, stl);
      const at = { params: { teamId: team.id, sha256: mesh.sha256 } };
      const file = await call(server, team.designer, readMeshFile, at);
      expect(Buffer.compare(file.body as unknown as Uint8Array, stl)).toBe(0);
      expect((await call(server, team.designer, readDisplayMesh, at)).status).toBe(200);
      const project = await makeProject(server, team.designer, team.id);
      const { revisionId } = await dryFit(server, team.designer, await makeScene(server, team.designer, project.id));
      const picture = await takePicture(server, team.designer, revisionId);
      const shown = await must(server, team.reviewer, readPicture, { params: { pictureId: picture.id } });
      expect(Buffer.compare(shown as unknown as Uint8Array, PNG)).toBe(0);
      expect(await server.incoming()).toEqual([]);
    } finally {
      await server.close();
    }
  });
});

test('in a folder, half-written files are not listed', async () => {
  const store = await createFileStore(
    readConfig({ DATABASE_URL: 'postgres://x', GAPWRIGHT_FILES: path.join(folder, 'half') }),
  );
  await store.putBytes('meshes/one.stl', new Uint8Array(3));
  await writeFile(path.join(folder, 'half/store/meshes/two.stl.123.part'), 'half');
  expect(await store.keys('meshes')).toEqual(['meshes/one.stl']);
  expect(await readdir(path.join(folder, 'half/store/meshes'))).toHaveLength(2);
});
