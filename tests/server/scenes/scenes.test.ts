// Scenes as things in a list: made, renamed, copied, archived, deleted and brought back.
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import {
  changeScene,
  createScene,
  deleteProject,
  deleteScene,
  duplicateScene,
  freezeRevision,
  listScenes,
  readDocument,
  readRevision,
  restoreScene,
} from '#shared/api';
import { call, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { dryFit, makeProject, makeScene, save, twoBlocks } from '../support/things';

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

const lines = (query: Record<string, string> = {}) =>
  must(server, team.designer, listScenes, { params: { projectId }, query });
const names = async (query: Record<string, string> = {}) => (await lines(query)).map((s) => s.name);
const make = (name: string) => must(server, team.designer, createScene, { params: { projectId }, body: { name } });
const at = (sceneId: string) => ({ params: { sceneId } });

test('lists are sorted and searched', async () => {
  for (const name of ['banana 50%', 'Apple', 'cherry']) await make(name);
  expect(await names({ sort: 'name' })).toEqual(['Apple', 'banana 50%', 'cherry']);
  expect(await names({ sort: 'created' })).toEqual(['cherry', 'Apple', 'banana 50%']);
  expect(await names({ search: 'AN' })).toEqual(['banana 50%']);
  expect(await names({ search: '50%' })).toEqual(['banana 50%']);
  expect(await names({ search: '_' })).toEqual([]);
});

test('renaming changes the document, and counts as a save', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const line = await must(server, team.designer, changeScene, { ...at(sceneId), body: { name: 'Layout 9' } });
  expect(line).toMatchObject({ name: 'Layout 9', saveNumber: 2, parts: 2 });
  const open = await must(server, team.designer, readDocument, at(sceneId));
  expect(open.document).toMatchObject({ name: 'Layout 9' });
  const same = await must(server, team.designer, changeScene, { ...at(sceneId), body: { name: 'Layout 9' } });
  expect(same.saveNumber).toBe(2);
});

test('a copy has a life of its own', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const copy = await must(server, team.designer, duplicateScene, { ...at(sceneId), body: { name: 'Variant' } });
  await save(server, team.designer, copy.id, 0, twoBlocks('Variant', { display: 'in' }));
  expect((await must(server, team.designer, readDocument, at(sceneId))).document).toMatchObject({
    name: 'Layout 1',
    display: 'mm',
  });
  expect(await names({ sort: 'name' })).toEqual(['Layout 1', 'Variant']);
});

test('archived and deleted scenes have lists of their own; deletion can be undone', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  await must(server, team.designer, changeScene, { ...at(sceneId), body: { archived: true } });
  expect([await names(), await names({ state: 'archived' })]).toEqual([[], ['Layout 1']]);
  await must(server, team.designer, changeScene, { ...at(sceneId), body: { archived: false } });
  await must(server, team.designer, deleteScene, at(sceneId));
  expect([await names(), await names({ state: 'deleted' })]).toEqual([[], ['Layout 1']]);
  for (const endpoint of [readDocument, changeScene, duplicateScene] as const) {
    const body = endpoint.method === 'GET' ? undefined : { name: 'x' };
    const answer = await call(server, team.designer, endpoint, { ...at(sceneId), body });
    expect([answer.status, answer.code], endpoint.path).toEqual([410, 'scene/deleted']);
  }
  await must(server, team.designer, restoreScene, { ...at(sceneId), body: {} });
  expect(await names()).toEqual(['Layout 1']);
});

test('a deleted project takes its scenes along', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  await must(server, team.designer, deleteProject, { params: { projectId } });
  expect((await call(server, team.designer, readDocument, at(sceneId))).code).toBe('project/deleted');
  const made = await call(server, team.designer, createScene, { params: { projectId }, body: { name: 'x' } });
  expect(made.code).toBe('project/deleted');
});

test('a line says whether the scene still is what was checked, also after a change that was taken back', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  await dryFit(server, team.designer, sceneId);
  expect((await lines())[0]!.latest).toMatchObject({ number: 1, hits: 0, current: true });
  await save(server, team.designer, sceneId, 1, twoBlocks('Changed'));
  expect((await lines())[0]!.latest).toMatchObject({ number: 1, current: false });
  await save(server, team.designer, sceneId, 2, twoBlocks());
  await dryFit(server, team.designer, sceneId, 3);
  expect((await lines())[0]!.latest).toMatchObject({ number: 1, current: true });
});

test('a revision stays what it was when the scene goes on', async () => {
  const sceneId = await makeScene(server, team.designer, projectId);
  const freeze = (saveNumber: number) =>
    must(server, team.designer, freezeRevision, { ...at(sceneId), body: { saveNumber } });
  const first = await freeze(1);
  expect(await freeze(1)).toEqual(first);
  const before = await must(server, team.reviewer, readRevision, { params: { revisionId: first.revisionId } });
  await save(server, team.designer, sceneId, 1, twoBlocks('Other'));
  expect((await freeze(2)).number).toBe(2);
  expect(await must(server, team.reviewer, readRevision, { params: { revisionId: first.revisionId } })).toEqual(before);
  const late = await call(server, team.designer, freezeRevision, { ...at(sceneId), body: { saveNumber: 1 } });
  expect(late.code).toBe('scene/newer');
});
