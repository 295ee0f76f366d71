// Teams and their people.
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import {
  changePerson,
  createTeam,
  deleteTeam,
  leaveTeam,
  listPeople,
  listProjects,
  readMe,
  readProject,
  removePerson,
  setGuest,
} from '#shared/api';
import { tables } from '../../../server/db/client';
import { boxSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { call, must } from '../support/call';
import { makeTeam, signInAs, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { whileLocked } from '../support/while-locked';
import { dryFit, makeProject, makeScene, takePicture, upload } from '../support/things';

let server: TestServer;
let team: TestTeam;
beforeAll(async () => {
  server = await startTestServer();
});
beforeEach(async () => {
  team = await makeTeam(server);
});
afterAll(() => server.close());

const params = () => ({ teamId: team.id });
const roleOf = (personId: string, role: string, by = team.owner) =>
  call(server, by, changePerson, { params: { ...params(), personId }, body: { role } });
const rolesNow = async () =>
  Object.fromEntries((await must(server, team.owner, listPeople, { params: params() })).map((p) => [p.name, p.role]));

test('whoever makes a team owns it, and may be in several in different roles', async () => {
  const made = await must(server, team.guest, createTeam, { body: { name: '  Gil’s own  ' } });
  expect(made).toMatchObject({ name: 'Gil’s own', role: 'owner' });
  const me = await must(server, team.guest, readMe);
  expect(me.teams.map((t) => [t.name, t.role])).toEqual([
    ['Gil’s own', 'owner'],
    ['Tin Lizard Garage', 'guest'],
  ]);
});

describe('roles', () => {
  test('an owner changes them, and they count at once', async () => {
    expect((await roleOf(team.guest.id, 'designer')).body).toMatchObject({ role: 'designer' });
    await makeProject(server, team.guest, team.id);
    expect((await roleOf(team.guest.id, 'reviewer')).status).toBe(200);
    const denied = await call(server, team.guest, createTeam, { body: { name: 'x' } });
    expect(denied.status).toBe(201);
    expect((await roleOf(team.owner.id, 'designer', team.guest)).code).toBe('access/denied');
    expect((await roleOf(team.guest.id, 'emperor')).code).toBe('request/invalid');
  });

  test('one who is made a guest again begins without projects', async () => {
    const project = await makeProject(server, team.designer, team.id);
    const at = { projectId: project.id, personId: team.guest.id };
    await must(server, team.owner, setGuest, { params: at, body: { added: true } });
    expect((await call(server, team.guest, readProject, { params: at })).status).toBe(200);
    await roleOf(team.guest.id, 'reviewer');
    await roleOf(team.guest.id, 'guest');
    expect((await call(server, team.guest, readProject, { params: at })).status).toBe(404);
    const seen = await must(server, team.guest, listProjects, { params: params() });
    expect(seen.projects).toEqual([]);
  });

  test('only guests are added to projects', async () => {
    const project = await makeProject(server, team.designer, team.id);
    const at = { projectId: project.id, personId: team.reviewer.id };
    const answer = await call(server, team.owner, setGuest, { params: at, body: { added: true } });
    expect([answer.status, answer.code]).toEqual([409, 'person/not-guest']);
  });
});

describe('the last owner', () => {
  test('can neither leave, nor be removed, nor take a lesser role', async () => {
    const own = { params: { ...params(), personId: team.owner.id } };
    expect((await call(server, team.owner, leaveTeam, { params: params() })).code).toBe('team/last-owner');
    expect((await call(server, team.owner, removePerson, own)).code).toBe('team/last-owner');
    expect((await roleOf(team.owner.id, 'designer')).code).toBe('team/last-owner');
    expect((await rolesNow())['Olga Owner']).toBe('owner');
  });

  test('hands over and leaves', async () => {
    await roleOf(team.designer.id, 'owner');
    expect((await call(server, team.owner, leaveTeam, { params: params() })).status).toBe(200);
    expect((await call(server, team.owner, listPeople, { params: params() })).status).toBe(404);
  });

  test('of two owners who leave at the same moment one stays', async () => {
    await roleOf(team.designer.id, 'owner');
    // both are out of the team already, and neither has looked yet whether an owner is left
    const answers = await whileLocked(server, 'lock table project_guest in exclusive mode', 2, () =>
      [team.owner, team.designer].map((p) => call(server, p, leaveTeam, { params: params() })),
    );
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409]);
    const left = await server.db.select().from(tables.membership).where(eq(tables.membership.teamId, team.id));
    expect(left.filter((m) => m.role === 'owner')).toHaveLength(1);
  });
});

test('one who was removed sees nothing of the team, whatever he has open', async () => {
  const project = await makeProject(server, team.designer, team.id);
  const at = { params: { ...params(), personId: team.designer.id } };
  await must(server, team.owner, removePerson, at);
  expect((await call(server, team.owner, removePerson, at)).code).toBe('thing/missing');
  expect((await call(server, team.designer, readProject, { params: { projectId: project.id } })).status).toBe(404);
  expect((await must(server, team.designer, readMe)).teams).toEqual([]);
});

test('people’s addresses are for members: a guest does not read them', async () => {
  expect((await call(server, team.guest, listPeople, { params: params() })).code).toBe('access/denied');
});

test('a team is deleted by its name, with all its files', async () => {
  const project = await makeProject(server, team.designer, team.id);
  await upload(server, team.designer, team.id, binaryStl(boxSoup(5, 6, 7)));
  const sceneId = await makeScene(server, team.designer, project.id);
  const { revisionId } = await dryFit(server, team.designer, sceneId);
  await takePicture(server, team.designer, revisionId);
  expect(await server.store.keys('meshes')).toHaveLength(1);
  expect(await server.store.keys('pictures')).toHaveLength(1);
  const wrong = await call(server, team.owner, deleteTeam, { params: params(), body: { name: 'Tin Lizard' } });
  expect(wrong.code).toBe('team/name-differs');
  await must(server, team.owner, deleteTeam, { params: params(), body: { name: 'Tin Lizard Garage' } });
  expect(await server.store.keys('meshes')).toEqual([]);
  expect(await server.store.keys('pictures')).toEqual([]);
  expect((await must(server, team.owner, readMe)).teams).toEqual([]);
});

test('one person in the team twice is refused by the database itself', async () => {
  const again = signInAs(server, 'Twin').then((p) =>
    server.db.insert(tables.membership).values([
      { teamId: team.id, personId: p.id, role: 'owner' },
      { teamId: team.id, personId: p.id, role: 'guest' },
    ]),
  );
  await expect(again).rejects.toThrow();
});
