// Pictures of a revision: PNGs and nothing else.
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { deletePicture, listScenes, readPicture, readRevision, storePicture } from '#shared/api';
import { tables } from '../../../server/db/client';
import { call, fileForm, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { dryFit, makeProject, makeScene, PNG, takePicture } from '../support/things';

let server: TestServer;
let team: TestTeam;
let projectId: string;
let revisionId: string;
beforeAll(async () => {
  server = await startTestServer();
  team = await makeTeam(server);
  projectId = (await makeProject(server, team.designer, team.id)).id;
  const sceneId = await makeScene(server, team.designer, projectId);
  revisionId = (await dryFit(server, team.designer, sceneId)).revisionId;
});
afterAll(() => server.close());

const send = (bytes: Uint8Array, query: Record<string, string> = {}, name = 'view.png') =>
  call(server, team.designer, storePicture, {
    params: { revisionId },
    query: { kind: 'view', standpoint: 'Driver’s seat', ...query },
    form: fileForm(bytes, name),
  });
const keys = () => server.store.keys('pictures');
const pictures = async () => (await must(server, team.designer, readRevision, { params: { revisionId } })).pictures;

test('a picture comes back as it was taken, with its facts', async () => {
  const picture = await takePicture(server, team.designer, revisionId);
  expect(picture).toMatchObject({
    width: 1,
    height: 1,
    kind: 'view',
    standpoint: 'Overhead',
    takenBy: 'Dieter Designer',
  });
  const answer = await call(server, team.reviewer, readPicture, { params: { pictureId: picture.id } });
  expect(Buffer.compare(answer.body as unknown as Uint8Array, PNG)).toBe(0);
  expect(answer.headers.get('content-type')).toBe('image/png');
  expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
  const [line] = await must(server, team.designer, listScenes, { params: { projectId } });
  expect(line!.pictureId).toBe(picture.id);
});

function withSize(width: number, height: number): Uint8Array {
  const bytes = PNG.slice();
  new DataView(bytes.buffer).setUint32(16, width);
  new DataView(bytes.buffer).setUint32(20, height);
  return bytes;
}

test.each<[string, Uint8Array]>([
  ['nothing', new Uint8Array(0)],
  ['a JPEG', Uint8Array.of(0xff, 0xd8, 0xff, 0xe0, ...new Uint8Array(60))],
  [
    'a drawing with a script',
    new TextEncoder().encode(`<svg xmlns="http://www.w3.org/2000/svg"><script>1</script></svg>${' '.repeat(60)}`),
  ],
  ['a web page', new TextEncoder().encode(`<!doctype html><script>1</script>${' '.repeat(60)}`)],
  ['the signature alone', PNG.slice(0, 8)],
  ['a PNG that breaks off', PNG.slice(0, -3)],
  ['a PNG with something hidden behind it', Uint8Array.of(...PNG, ...new TextEncoder().encode('<script>1</script>'))],
  ['a side of no pixels', withSize(0, 10)],
  ['a side of 10,000 pixels', withSize(10_000, 10)],
  ['more than 16 MB', new Uint8Array(16 * 1024 * 1024 + 1)],
])('%s is refused, and leaves nothing', async (_, bytes) => {
  const before = await keys();
  const answer = await send(bytes);
  expect([answer.status, answer.code]).toEqual([422, 'picture/refused']);
  expect(await keys()).toEqual(before);
  expect(await server.incoming()).toEqual([]);
});

test('its facts must fit together', async () => {
  expect((await send(PNG, { kind: 'finding' })).code).toBe('request/invalid');
  expect((await send(PNG, { kind: 'view', findingKey: 'a b' })).code).toBe('request/invalid');
  expect((await send(PNG, { kind: 'poster' })).code).toBe('request/invalid');
  expect((await send(PNG, { standpoint: 'x'.repeat(81) })).code).toBe('request/invalid');
  expect(await server.incoming()).toEqual([]);
});

test('a finding has one picture, the newest, even when two come at once', async () => {
  const finding = { kind: 'finding', findingKey: 'left right' };
  const before = (await keys()).length;
  await send(PNG, finding);
  const answers = await Promise.all([send(PNG, finding), send(PNG, finding), send(PNG, finding)]);
  expect(answers.map((a) => a.status)).toEqual([201, 201, 201]);
  expect((await pictures()).filter((p) => p.findingKey === 'left right')).toHaveLength(1);
  expect(await keys()).toHaveLength(before + 1);
});

test('a deleted picture is gone, with its file', async () => {
  const picture = await takePicture(server, team.designer, revisionId);
  const before = await keys();
  await must(server, team.designer, deletePicture, { params: { pictureId: picture.id } });
  expect(await keys()).toHaveLength(before.length - 1);
  expect((await call(server, team.designer, readPicture, { params: { pictureId: picture.id } })).status).toBe(404);
});

test('one whose revision goes away while it is sent leaves no file', async () => {
  const doomed = await makeScene(server, team.designer, projectId);
  const gone = (await dryFit(server, team.designer, doomed)).revisionId;
  const before = await keys();
  const { putBytes } = server.store;
  Object.assign(server.store, {
    putBytes: async (key: string, bytes: Uint8Array) => {
      await putBytes(key, bytes);
      await server.db.delete(tables.scene).where(eq(tables.scene.id, doomed));
    },
  });
  const answer = await call(server, team.designer, storePicture, {
    params: { revisionId: gone },
    query: { kind: 'view', standpoint: 'Overhead' },
    form: fileForm(PNG),
  });
  Object.assign(server.store, { putBytes });
  expect(answer.status).toBe(500);
  expect(await keys()).toEqual(before);
});
