// Share links: what the public sees of one revision, and what it does not.
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import {
  changePerson,
  deleteProject,
  deleteScene,
  freezeRevision,
  listShares,
  makeShare,
  readShared,
  readSharedMesh,
  readSharedPicture,
  restoreScene,
  revokeShare,
} from '#shared/api';
import { block, mesh, part, sceneOf } from '../../fixtures/scenes';
import { torusSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { call, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { dryFit, makeProject, makeScene, PNG, takePicture, twoBlocks, upload } from '../support/things';

const NASTY = `"><script>alert('x')</script> & $& $1`;
const STL = binaryStl(torusSoup(100, 20, 24, 16));
let server: TestServer;
let team: TestTeam;
let clientFolder: string;
let projectId: string;
let sceneId: string;
let revisionId: string;
let sha256: string;
beforeAll(async () => {
  clientFolder = await mkdtemp(path.join(os.tmpdir(), 'gapwright-client-'));
  await writeFile(path.join(clientFolder, 'index.html'), '<head><!--share-tags--></head><body>the page</body>');
  server = await startTestServer({ clientFolder });
  team = await makeTeam(server);
  sha256 = (await upload(server, team.designer, team.id, STL, 'secret supplier part.stl')).mesh.sha256;
});
beforeEach(async () => {
  projectId = (await makeProject(server, team.designer, team.id, `Coupe ${NASTY}`)).id;
  const parts = [
    part('ring', [mesh(sha256)], { note: 'paid 900 for it', tolerance: 2 }),
    part('post', [block([10, 10, 10])], { name: `Post ${NASTY}`, pose: { at: [300, 0, 0] } }),
  ];
  sceneId = await makeScene(server, team.designer, projectId, sceneOf(parts, { name: `Layout ${NASTY}` }));
  revisionId = (await dryFit(server, team.designer, sceneId)).revisionId;
});
afterAll(async () => {
  await server.close();
  await rm(clientFolder, { recursive: true });
});

const make = async (pictureId: string | null = null) => {
  const share = await must(server, team.designer, makeShare, { params: { revisionId }, body: { pictureId } });
  return { ...share, token: /\/s\/([\w-]+)$/.exec(share.url)![1]! };
};
const see = (token: string) => call(server, null, readShared, { params: { token } });
const page = async (token: string) => (await fetch(`${server.url}/s/${token}`)).text();

test('a link cannot be guessed, and no two are alike', async () => {
  const [one, two] = [await make(), await make()];
  expect(one.token).toMatch(/^[\w-]{32}$/);
  expect(one.token).not.toBe(two.token);
  expect(one.url).toBe(`http://gapwright.test/s/${one.token}`);
  expect(await must(server, team.reviewer, listShares, { params: { projectId } })).toHaveLength(2);
});

test('the public sees the revision, its summary and its picture, and nobody’s name, address, note or file', async () => {
  const picture = await takePicture(server, team.designer, revisionId);
  const { token } = await make(picture.id);
  const { body, status } = await see(token);
  expect(status).toBe(200);
  expect(body).toMatchObject({ projectName: `Coupe ${NASTY}`, number: 1, verdict: 'clears', hasPicture: true });
  expect(body.missing.length).toBeGreaterThan(3);
  const text = JSON.stringify(body) + (await page(token));
  for (const secret of [
    ...['Dieter', 'Olga', 'Rita', 'shop.example', 'Tin Lizard', 'secret supplier', 'paid 900', '"tolerance"'],
    ...[sha256, team.id, team.designer.id, projectId, sceneId],
  ]) {
    expect(text, secret).not.toContain(secret);
  }
  const shown = await call(server, null, readSharedPicture, { params: { token } });
  expect(Buffer.compare(shown.body as unknown as Uint8Array, PNG)).toBe(0);
});

test('its mesh is a display mesh, never the supplier’s file, and its headers do not name that file', async () => {
  const { token } = await make();
  const answer = await call(server, null, readSharedMesh, { params: { token, index: 0 } });
  const bytes = answer.body as unknown as Uint8Array;
  expect(new TextDecoder().decode(bytes.slice(0, 4))).toBe('GWDM');
  expect(bytes.length).toBeLessThan(STL.length);
  expect(JSON.stringify([...answer.headers])).not.toContain(sha256);
  for (const index of [1, 2000, -1, 'x']) {
    expect((await call(server, null, readSharedMesh, { params: { token, index } })).status, String(index)).toBe(404);
  }
  const { mesh: other } = await upload(server, team.designer, team.id, binaryStl(torusSoup(90, 20, 24, 16)));
  const file = await fetch(`${server.url}/api/teams/${team.id}/meshes/${other.sha256}/file`);
  expect(file.status).toBe(401);
});

describe('gone', () => {
  const all = async (token: string) => {
    const params = { token, index: 0 };
    const codes = [];
    for (const endpoint of [readShared, readSharedPicture, readSharedMesh]) {
      const answer = await call(server, null, endpoint, { params });
      codes.push(`${answer.status} ${answer.code ?? ''}`);
    }
    return codes;
  };

  test('a revoked link opens nothing any more: page, picture and mesh', async () => {
    const picture = await takePicture(server, team.designer, revisionId);
    const share = await make(picture.id);
    expect((await page(share.token)).includes('og:title')).toBe(true);
    await must(server, team.owner, revokeShare, { params: { shareId: share.id } });
    expect(new Set(await all(share.token))).toEqual(new Set(['410 share/revoked']));
    expect(await page(share.token)).not.toContain('og:');
    const [listed] = await must(server, team.reviewer, listShares, { params: { projectId } });
    expect(listed!.revokedAt).not.toBeNull();
  });

  test('so does one of a deleted scene, until it is brought back, and of a deleted project', async () => {
    const { token } = await make();
    await must(server, team.designer, deleteScene, { params: { sceneId } });
    expect(new Set(await all(token))).toEqual(new Set(['410 share/revoked']));
    await must(server, team.designer, restoreScene, { params: { sceneId }, body: {} });
    expect((await see(token)).status).toBe(200);
    await must(server, team.designer, deleteProject, { params: { projectId } });
    expect(new Set(await all(token))).toEqual(new Set(['410 share/revoked']));
  });

  test.each(['x', 'a'.repeat(32), '%00', '..%2f..', "' or 1=1 --"])('a link of %s is nothing', async (token) => {
    expect((await see(token)).status).toBe(404);
    const answer = await fetch(`${server.url}/s/${encodeURIComponent(token)}`);
    expect(answer.status).toBe(200);
    expect(await answer.text()).toBe('<head><meta name="robots" content="noindex" /></head><body>the page</body>');
  });

  test('a NUL in a link is no fault of the server', async () => {
    expect((await fetch(`${server.url}/s/%00`)).status).toBe(200);
    expect((await fetch(`${server.url}/api/shared/%00`)).status).toBe(404);
    expect((await fetch(`${server.url}/s/%ff`)).status).toBe(400);
  });
});

test('the tags say what it is, and no name in them becomes markup', async () => {
  const picture = await takePicture(server, team.designer, revisionId);
  const { token } = await make(picture.id);
  const html = await page(token);
  expect(html).not.toContain('<script');
  expect(html).toContain('&lt;script&gt;alert(&#39;x&#39;)&lt;/script&gt; &amp; $&amp; $1');
  expect(html).toMatch(/<meta property="og:title" content="Coupe [^"<>]*: Layout [^"<>]*, revision 1" \/>/);
  expect(html).toContain(`<meta property="og:image" content="http://gapwright.test/api/shared/${token}/picture" />`);
  expect(html).toContain('trial-fit in metal');
  expect(html.match(/<body>/g)).toHaveLength(1);
  const headers = (await fetch(`${server.url}/s/${token}`)).headers;
  expect(headers.get('referrer-policy')).toBe('no-referrer');
  expect(headers.get('content-security-policy')).toContain("frame-ancestors 'none'");
});

test('only a revision with a report is shared, with a picture of its own', async () => {
  const other = await makeScene(server, team.designer, projectId, twoBlocks('Unchecked'));
  const frozen = await must(server, team.designer, freezeRevision, {
    params: { sceneId: other },
    body: { saveNumber: 1 },
  });
  const early = await call(server, team.designer, makeShare, { params: frozen, body: {} });
  expect([early.status, early.code]).toEqual([409, 'dry-fit/not-done']);
  const foreign = await takePicture(server, team.designer, frozen.revisionId);
  const wrong = await call(server, team.designer, makeShare, {
    params: { revisionId },
    body: { pictureId: foreign.id },
  });
  expect(wrong.code).toBe('request/invalid');
});

test('who loses the right to share does not lose the links he made', async () => {
  const { token } = await make();
  const at = { params: { teamId: team.id, personId: team.designer.id } };
  await must(server, team.owner, changePerson, { ...at, body: { role: 'reviewer' } });
  expect((await call(server, team.designer, makeShare, { params: { revisionId }, body: {} })).status).toBe(403);
  expect((await see(token)).status).toBe(200);
  await must(server, team.owner, changePerson, { ...at, body: { role: 'designer' } });
});
