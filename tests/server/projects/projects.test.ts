// Projects: lists, changes, deletion with undo, guests, the diary.
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import {
  changeProject,
  createProject,
  deleteProject,
  listActivity,
  listGuests,
  listProjects,
  readProject,
  restoreProject,
  setGuest,
} from '#shared/api';
import { tables } from '../../../server/db/client';
import { sweep } from '../../../server/jobs/sweep';
import { call, must, problemOf } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { dryFit, makeProject, makeScene, takePicture } from '../support/things';

let server: TestServer;
let team: TestTeam;
beforeAll(async () => {
  server = await startTestServer();
});
beforeEach(async () => {
  team = await makeTeam(server);
});
afterAll(() => server.close());

const list = async (query: Record<string, string> = {}, person = team.designer) =>
  must(server, person, listProjects, { params: { teamId: team.id }, query });
const names = async (query: Record<string, string> = {}, person = team.designer) =>
  (await list(query, person)).projects.map((p) => p.name);
const make = (name: string, more: object = {}) =>
  must(server, team.designer, createProject, { params: { teamId: team.id }, body: { name, ...more } });
const at = (id: string) => ({ params: { projectId: id } });

test('a project keeps the car in the team’s own words, its unit and its notes', async () => {
  const made = await make('  Coupe ', { car: 'our ’49 with the “short” cowl', display: 'in-decimal', notes: 'a\nb' });
  expect(made).toMatchObject({
    name: 'Coupe',
    car: 'our ’49 with the “short” cowl',
    display: 'in-decimal',
    notes: 'a\nb',
  });
  expect((await make('Plain')).display).toBe('in');
  const changed = await must(server, team.designer, changeProject, {
    ...at(made.id),
    body: { name: 'Coupe 2', notOnThisCar: ['booster', 'booster', 'heater'] },
  });
  expect(changed).toMatchObject({ name: 'Coupe 2', notOnThisCar: ['booster', 'heater'], notes: 'a\nb' });
});

test.each([
  ['an empty name', { name: '  ' }, 'name'],
  ['a name of 121', { name: 'x'.repeat(121) }, 'name'],
  ['a name of two lines', { name: 'a\nb' }, 'name'],
  ['a NUL in the notes', { name: 'a', notes: 'a\0' }, 'notes'],
  ['half a character', { name: 'a\ud800' }, 'name'],
  ['an unknown unit', { name: 'a', display: 'cubits' }, 'display'],
])('%s is refused with its place', async (_, body, path) => {
  const answer = await call(server, team.designer, createProject, { params: { teamId: team.id }, body });
  expect([answer.status, answer.code]).toEqual([400, 'request/invalid']);
  expect(problemOf(answer).faults?.map((f) => f.path)).toEqual([path]);
});

describe('the list', () => {
  test('is sorted by name, by making or by last change', async () => {
    for (const name of ['banana', 'Apple', 'cherry']) await make(name);
    const [banana] = (await list({ sort: 'name' })).projects.filter((p) => p.name === 'banana');
    await must(server, team.designer, changeProject, { ...at(banana!.id), body: { notes: 'touched' } });
    expect(await names({ sort: 'name' })).toEqual(['Apple', 'banana', 'cherry']);
    expect(await names({ sort: 'created' })).toEqual(['cherry', 'Apple', 'banana']);
    expect(await names()).toEqual(['banana', 'cherry', 'Apple']);
    expect(
      (await call(server, team.designer, listProjects, { params: { teamId: team.id }, query: { sort: 'x' } })).status,
    ).toBe(400);
  });

  test('finds by name or car, and takes % and _ for what they are', async () => {
    await make('100% done');
    await make('100 miles', { car: 'the_wagon' });
    expect(await names({ search: '100%' })).toEqual(['100% done']);
    expect(await names({ search: 'E_W' })).toEqual(['100 miles']);
    expect(await names({ search: '\\' })).toEqual([]);
    expect(await names({ search: "'; drop table project; --" })).toEqual([]);
    const nul = await call(server, team.designer, listProjects, {
      params: { teamId: team.id },
      query: { search: 'a\0' },
    });
    expect([nul.status, nul.code]).toEqual([400, 'request/invalid']);
  });

  test('comes page by page', async () => {
    for (let i = 0; i < 5; i += 1) await make(`P${i}`);
    const first = await list({ sort: 'name', limit: '2' });
    const second = await list({ sort: 'name', limit: '2', after: first.after! });
    const third = await list({ sort: 'name', limit: '2', after: second.after! });
    expect([first, second, third].flatMap((p) => p.projects.map((x) => x.name))).toEqual([
      'P0',
      'P1',
      'P2',
      'P3',
      'P4',
    ]);
    expect(third.after).toBeNull();
    for (const after of ['-1', 'x', '1e9']) {
      const answer = await call(server, team.designer, listProjects, { params: { teamId: team.id }, query: { after } });
      expect(answer.status, after).toBe(400);
    }
  });

  test('shows the figures of the latest dry fit, the picture and the count of scenes', async () => {
    const project = await make('Coupe');
    expect((await list()).projects[0]).toMatchObject({ scenes: 0, latest: null, pictureId: null });
    const sceneId = await makeScene(server, team.designer, project.id);
    const { revisionId } = await dryFit(server, team.designer, sceneId);
    const picture = await takePicture(server, team.designer, revisionId);
    const [line] = (await list()).projects;
    expect(line).toMatchObject({ scenes: 1, pictureId: picture.id, latest: { hits: 0, tight: 0, loose: 0 } });
  });
});

test('archived and deleted projects have lists of their own; deletion can be undone', async () => {
  const project = await make('Coupe');
  await must(server, team.designer, changeProject, { ...at(project.id), body: { archived: true } });
  expect([await names(), await names({ state: 'archived' })]).toEqual([[], ['Coupe']]);
  await must(server, team.designer, deleteProject, at(project.id));
  expect([await names({ state: 'archived' }), await names({ state: 'deleted' })]).toEqual([[], ['Coupe']]);
  const gone = await call(server, team.designer, readProject, at(project.id));
  expect([gone.status, gone.code]).toEqual([410, 'project/deleted']);
  const change = await call(server, team.designer, changeProject, { ...at(project.id), body: { name: 'x' } });
  expect(change.code).toBe('project/deleted');
  await must(server, team.designer, restoreProject, { ...at(project.id), body: {} });
  expect(await names({ state: 'archived' })).toEqual(['Coupe']);
});

test('after 30 days a deleted project goes for good, with its pictures; a younger one stays', async () => {
  const [old, young] = [await make('Old'), await make('Young')];
  const sceneId = await makeScene(server, team.designer, old.id);
  const { revisionId } = await dryFit(server, team.designer, sceneId);
  await takePicture(server, team.designer, revisionId);
  for (const p of [old, young]) await must(server, team.designer, deleteProject, at(p.id));
  const longAgo = new Date(Date.now() - 31 * 24 * 60 * 60 * 1000);
  await server.db.update(tables.project).set({ deletedAt: longAgo }).where(eq(tables.project.id, old.id));
  expect(await server.store.keys(`pictures/${revisionId}`)).toHaveLength(1);
  await sweep(server.db, server.store);
  expect(await names({ state: 'deleted' })).toEqual(['Young']);
  expect(await server.store.keys(`pictures/${revisionId}`)).toEqual([]);
  expect((await call(server, team.owner, readProject, at(old.id))).status).toBe(404);
});

test('a guest sees the projects he was added to, and no others', async () => {
  const [own, other] = [
    await makeProject(server, team.owner, team.id, 'Own'),
    await makeProject(server, team.owner, team.id),
  ];
  expect(await names({}, team.guest)).toEqual([]);
  const guest = { params: { projectId: own.id, personId: team.guest.id } };
  await must(server, team.designer, setGuest, { ...guest, body: { added: true } });
  expect(await names({}, team.guest)).toEqual(['Own']);
  expect(await must(server, team.reviewer, listGuests, at(own.id))).toMatchObject([{ name: 'Gil Guest', added: true }]);
  expect(await must(server, team.reviewer, listGuests, at(other.id))).toMatchObject([{ added: false }]);
  await must(server, team.designer, setGuest, { ...guest, body: { added: false } });
  expect(await names({}, team.guest)).toEqual([]);
});

test('the diary says who did what, the newest first', async () => {
  const project = await make('Coupe');
  await makeScene(server, team.owner, project.id);
  const { entries } = await must(server, team.reviewer, listActivity, at(project.id));
  expect(entries.map((e) => `${e.who} ${e.what}`)).toEqual([
    'Olga Owner worked on “Layout 1”',
    'Olga Owner made the scene “Layout 1”',
    'Dieter Designer made the project',
  ]);
});
