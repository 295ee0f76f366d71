// Saving: what is built on what, and that nothing is lost or half done.
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { createScene, deleteMesh, deleteScene, readDocument, saveDocument } from '#shared/api';
import { diffScenes, MAX_DOCUMENT_BYTES, patchHead } from '#shared/scene';
import { block, mesh, part, sceneOf } from '../../fixtures/scenes';
import { boxSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { call, must, problemOf } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { whileLocked } from '../support/while-locked';
import { loaded, makeProject, makeScene, save, twoBlocks, upload } from '../support/things';

let server: TestServer;
let team: TestTeam;
let sceneId: string;
beforeAll(async () => {
  server = await startTestServer();
  team = await makeTeam(server);
});
beforeEach(async () => {
  const project = await makeProject(server, team.designer, team.id);
  sceneId = await makeScene(server, team.designer, project.id);
});
afterAll(() => server.close());

const read = () => must(server, team.designer, readDocument, { params: { sceneId } });
const put = (body: object, person = team.designer) =>
  call(server, person, saveDocument, { params: { sceneId }, body: { saveId: randomUUID(), ...body } });

test('a new scene is an empty document that loads', async () => {
  const project = await makeProject(server, team.designer, team.id);
  const made = await must(server, team.designer, createScene, {
    params: { projectId: project.id },
    body: { name: 'New' },
  });
  const open = await must(server, team.designer, readDocument, { params: { sceneId: made.id } });
  expect(loaded(open.document)).toMatchObject({ name: 'New', components: [], display: 'in' });
  expect(open).toMatchObject({ saveNumber: 0, saveId: null, canEdit: true, teamId: team.id });
});

test('a document comes back as it was saved, to every number', async () => {
  const exact = twoBlocks('Exact', { accuracy: 0.1 + 0.2, rules: { gap: 1 / 3, touch: 1e-4 } });
  expect(await save(server, team.designer, sceneId, 1, exact)).toBe(2);
  expect(loaded((await read()).document)).toEqual(loaded(exact));
});

test('a difference is applied to the save it was made on', async () => {
  const before = loaded((await read()).document);
  const after = patchHead(before, { name: 'Renamed by a difference' });
  const answer = await put({ base: 1, difference: diffScenes(before, after) });
  expect([answer.status, answer.body]).toEqual([200, { saveNumber: 2 }]);
  expect(loaded((await read()).document)).toEqual(after);
});

describe('somebody else was faster', () => {
  test('the late one gets the newer document and its number, and changes nothing', async () => {
    await save(server, team.owner, sceneId, 1, twoBlocks('By the owner'));
    const answer = await put({ base: 1, document: twoBlocks('Too late') });
    expect([answer.status, answer.code]).toEqual([409, 'scene/newer']);
    const data = problemOf(answer).data as { saveNumber: number; document: { name: string } };
    expect([data.saveNumber, data.document.name]).toEqual([2, 'By the owner']);
    expect(await read()).toMatchObject({ saveNumber: 2, document: { name: 'By the owner' } });
  });

  test('a base that does not exist yet is as wrong as an old one', async () => {
    expect((await put({ base: 7, document: twoBlocks() })).code).toBe('scene/newer');
  });

  test('of ten saves at the same moment exactly one is carried out', async () => {
    const answers = await whileLocked(server, `select from scene where id = '${sceneId}' for update`, 5, () =>
      Array.from({ length: 10 }, (_, i) => put({ base: 1, document: twoBlocks(`Try ${i}`) })),
    );
    expect(answers.filter((a) => a.status === 200)).toHaveLength(1);
    expect(answers.filter((a) => a.code === 'scene/newer')).toHaveLength(9);
    const winner = answers.findIndex((a) => a.status === 200);
    expect(await read()).toMatchObject({ saveNumber: 2, document: { name: `Try ${winner}` } });
  });
});

test('the same save sent twice, because its answer was lost, is carried out once', async () => {
  const saveId = randomUUID();
  const body = { base: 1, saveId, document: twoBlocks('Once') };
  const lock = `select from scene where id = '${sceneId}' for update`;
  const answers = await whileLocked(server, lock, 3, () => [put(body), put(body), put(body)]);
  expect(answers.map((a) => a.body)).toEqual([{ saveNumber: 2 }, { saveNumber: 2 }, { saveNumber: 2 }]);
  await save(server, team.owner, sceneId, 2, twoBlocks('Later'));
  expect((await put(body)).body).toEqual({ saveNumber: 2 });
  expect(await read()).toMatchObject({ saveNumber: 3, document: { name: 'Later' } });
});

describe('refused, and nothing changed:', () => {
  const wrong = (more: object): object => ({ ...twoBlocks(), ...more });
  test.each<[string, object, string, string]>([
    ['an unknown key', { document: wrong({ colour: 'red' }) }, 'scene/refused', 'colour'],
    [
      'a size of 0',
      { document: sceneOf([part('a', [block([0, 1, 1])])]) },
      'scene/refused',
      'components[0].solids[0].shape.size[0]',
    ],
    ['another format', { document: wrong({ format: 'other' }) }, 'scene/refused', 'format'],
    ['a later version', { document: wrong({ version: 99 }) }, 'scene/refused', 'version'],
    ['no document', { document: null }, 'scene/refused', ''],
    ['a NUL in a name', { document: wrong({ name: 'a\0b' }) }, 'scene/refused', 'name'],
    ['a mesh that nobody has', { document: sceneOf([part('a', [mesh('0'.repeat(64))])]) }, 'scene/mesh-missing', ''],
    ['neither document nor difference', {}, 'request/invalid', ''],
    ['both', { document: twoBlocks(), difference: {} }, 'request/invalid', ''],
    ['a difference of another document', { difference: { components: { removed: ['nothing'] } } }, '', ''],
  ])('%s', async (_, body, code, path) => {
    const before = await read();
    const answer = await put({ base: 1, ...body });
    expect(answer.status).toBeGreaterThanOrEqual(400);
    expect(answer.status).toBeLessThan(500);
    if (code !== '') expect(answer.code).toBe(code);
    if (path !== '') expect(problemOf(answer).faults?.[0]?.path).toBe(path);
    expect(await read()).toEqual(before);
  });

  test('a document of more than 4 MB', async () => {
    const note = 'x'.repeat(2000);
    const many = Array.from({ length: 450 }, (_, i) =>
      part(
        `p${i}`,
        Array.from({ length: 4 }, (_, k) => block([1, 1, 1], {}, `s${k}`)),
        { note, name: 'n'.repeat(100) },
      ),
    );
    const recipe = {
      kind: 'plate',
      params: Object.fromEntries(Array.from({ length: 300 }, (_, i) => [`p${i}`, 0.123456789012345])),
    };
    const document = sceneOf(many.map((p) => ({ ...p, recipe })));
    expect(JSON.stringify(document).length).toBeGreaterThan(MAX_DOCUMENT_BYTES);
    const answer = await put({ base: 1, document });
    expect([answer.status, answer.code]).toEqual([422, 'scene/refused']);
    expect(problemOf(answer).faults?.[0]?.reason).toMatch(/bytes, more than the 4194304 allowed/);
    expect((await read()).saveNumber).toBe(1);
  });

  test('a mesh of another team, though it lies in the storage', async () => {
    const other = await makeTeam(server, 'Others');
    const { mesh: theirs } = await upload(server, other.designer, other.id, binaryStl(boxSoup(3, 4, 5)));
    const document = sceneOf([part('a', [mesh(theirs.sha256)])]);
    const answer = await put({ base: 1, document });
    expect([answer.status, answer.code]).toEqual([422, 'scene/mesh-missing']);
  });
});

test('a mesh that is being deleted and saved with at the same moment is either kept or refused', async () => {
  for (let i = 0; i < 6; i += 1) {
    const { mesh: own } = await upload(server, team.designer, team.id, binaryStl(boxSoup(3, 4, 6 + i)));
    const { saveNumber: base } = await read();
    const [gone, saved] = await Promise.all([
      call(server, team.designer, deleteMesh, { params: { teamId: team.id, sha256: own.sha256 } }),
      put({ base, document: sceneOf([part('a', [mesh(own.sha256)])]) }),
    ]);
    expect([
      [200, 'scene/mesh-missing'],
      ['mesh/in-use', 200],
    ]).toContainEqual([gone.code ?? gone.status, saved.code ?? saved.status]);
  }
});

test('a deleted scene takes no saves, and says so', async () => {
  await must(server, team.owner, deleteScene, { params: { sceneId } });
  const answer = await put({ base: 1, document: twoBlocks() });
  expect([answer.status, answer.code]).toEqual([410, 'scene/deleted']);
});
