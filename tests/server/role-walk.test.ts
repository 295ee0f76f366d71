// Every endpoint with every role, with somebody outside the team, and with nobody signed in. What a role may is written out
// here once more, by hand from the table of the product's roles, and not taken from the code that decides.
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { ENDPOINTS } from '#shared/api';
import { boxSoup } from '../fixtures/soups';
import { binaryStl } from '../fixtures/stl';
import { call, fileForm, type Parts } from './support/call';
import { startTestServer, type TestServer } from './support/server';
import { PNG, twoBlocks } from './support/things';
import { makeActors, makeWorld, type Actors, type World } from './support/world';

type Actor = keyof Actors | 'nobody';
const ACTORS: readonly Actor[] = ['nobody', 'stranger', 'otherGuest', 'guest', 'reviewer', 'designer', 'owner'];

const owners = ['owner'] as const;
const makers = ['owner', 'designer'] as const;
const members = ['owner', 'designer', 'reviewer'] as const;
const readers = ['owner', 'designer', 'reviewer', 'guest'] as const;
const team = [...readers, 'otherGuest'] as const;
const signedIn = [...team, 'stranger'] as const;
const anyone = [...signedIn, 'nobody'] as const;

interface Case {
  readonly may: readonly Actor[];
  /** What another guest of the team is told: 403 of the team's things, 404 of a project he was not added to. */
  readonly on: 'team' | 'project' | 'none';
  readonly parts: (w: World, a: Actors) => Parts;
}

const onTeam = (may: readonly Actor[], parts: (w: World, a: Actors) => Parts = () => ({})): Case => ({
  may,
  on: 'team',
  parts: (w, a) => ({ ...parts(w, a), params: { teamId: w.teamId, ...parts(w, a).params } }),
});
const onProject = (may: readonly Actor[], parts: (w: World, a: Actors) => Parts = () => ({})): Case => ({
  may,
  on: 'project',
  parts: (w, a) => ({
    ...parts(w, a),
    // what an endpoint does not name is left out of its address
    params: { ...w, ...parts(w, a).params },
  }),
});
const open = (may: readonly Actor[], parts: (w: World) => Parts = () => ({})): Case => ({ may, on: 'none', parts });

const CASES: Readonly<Record<string, Case>> = {
  readMe: open(signedIn),
  changeMe: open(signedIn, () => ({ body: { words: 'uk' } })),
  readServerFacts: open(anyone),
  listShelvedMail: open(anyone),
  createTeam: open(signedIn, () => ({ body: { name: 'New team' } })),
  readInvitation: open(signedIn, (w) => ({ params: { invitationId: w.invitationId } })),
  acceptInvitation: open(signedIn, (w) => ({ params: { invitationId: w.invitationId }, body: {} })),
  declineInvitation: open(signedIn, (w) => ({ params: { invitationId: w.invitationId }, body: {} })),
  readShared: open(anyone, (w) => ({ params: { token: w.token } })),
  readSharedPicture: open(anyone, (w) => ({ params: { token: w.token } })),
  readSharedMesh: open(anyone, (w) => ({ params: { token: w.token, index: 0 } })),

  readTeam: onTeam(team),
  leaveTeam: onTeam(team, () => ({ body: {} })),
  changeTeam: onTeam(owners, () => ({ body: { name: 'Renamed' } })),
  deleteTeam: onTeam(owners, () => ({ body: { name: 'Tin Lizard Garage' } })),
  listPeople: onTeam(members),
  changePerson: onTeam(owners, (_, a) => ({ params: { personId: a.reviewer.id }, body: { role: 'designer' } })),
  removePerson: onTeam(owners, (_, a) => ({ params: { personId: a.reviewer.id } })),
  listInvitations: onTeam(owners),
  invite: onTeam(owners, () => ({ body: { email: `${randomUUID()}@shop.example`, role: 'guest' } })),
  resendInvitation: onTeam(owners, (w) => ({ params: { invitationId: w.invitationId }, body: {} })),
  withdrawInvitation: onTeam(owners, (w) => ({ params: { invitationId: w.invitationId } })),
  listProjects: onTeam(team),
  createProject: onTeam(makers, () => ({ body: { name: 'Roadster' } })),
  listMeshes: onTeam(members),
  uploadMesh: onTeam(makers, () => ({ form: fileForm(binaryStl(boxSoup(30, 30, 30))) })),

  readProject: onProject(readers),
  changeProject: onProject(makers, () => ({ body: { notes: 'measured again' } })),
  deleteProject: onProject(makers),
  restoreProject: onProject(makers, () => ({ body: {} })),
  listGuests: onProject(members),
  setGuest: onProject(makers, (_, a) => ({ params: { personId: a.otherGuest.id }, body: { added: true } })),
  listActivity: onProject(readers),
  listProjectMeshes: onProject(readers),
  listScenes: onProject(readers),
  createScene: onProject(makers, () => ({ body: { name: 'Layout 2' } })),
  listShares: onProject(members),
  changeScene: onProject(makers, () => ({ body: { name: 'Layout 3' } })),
  duplicateScene: onProject(makers, () => ({ body: { name: 'Layout 4' } })),
  deleteScene: onProject(makers),
  restoreScene: onProject(makers, () => ({ body: {} })),
  readDocument: onProject(readers),
  saveDocument: onProject(makers, () => ({ body: { base: 1, saveId: randomUUID(), document: twoBlocks() } })),
  runDryFit: onProject(makers, () => ({ body: { saveNumber: 1 } })),
  listDryFits: onProject(readers),
  readDryFit: onProject(readers),
  cancelDryFit: onProject(makers, (w) => ({ params: { dryFitId: w.queuedId }, body: {} })),
  freezeRevision: onProject(makers, () => ({ body: { saveNumber: 1 } })),
  readRevision: onProject(readers),
  storePicture: onProject(makers, () => ({
    query: { kind: 'view', standpoint: 'Overhead' },
    form: fileForm(PNG, 'view.png'),
  })),
  readPicture: onProject(readers),
  deletePicture: onProject(makers),
  makeShare: onProject(makers, () => ({ body: {} })),
  revokeShare: onProject(makers),
  readMesh: onProject(readers),
  readMeshFile: onProject(readers),
  readDisplayMesh: onProject(readers),
  changeMesh: onProject(makers, () => ({ body: { unit: 'in' } })),
  deleteMesh: onProject(makers),
};

/** Where the right is there and the thing itself says no. */
const OWN_ANSWER: Readonly<Record<string, number>> = { deleteMesh: 409 };

let server: TestServer;
let actors: Actors;

beforeAll(async () => {
  server = await startTestServer();
  actors = await makeActors(server);
});
afterAll(() => server.close());

test('the walk knows every endpoint, and no other', () => {
  expect(Object.keys(CASES).sort()).toEqual(Object.keys(ENDPOINTS).sort());
});

describe.each(Object.entries(ENDPOINTS))('%s', (name, endpoint) => {
  const { may, on, parts } = CASES[name]!;
  test(`${endpoint.method} ${endpoint.path} is for ${may.join(', ')}`, async () => {
    const person = (actor: Actor) => (actor === 'nobody' ? null : actors[actor]);
    const shared = await makeWorld(server, actors, actors.stranger);
    for (const actor of ACTORS.filter((a) => !may.includes(a))) {
      const answer = await call(server, person(actor), endpoint, parts(shared, actors));
      const hidden = actor === 'stranger' || (actor === 'otherGuest' && on === 'project');
      const expected = actor === 'nobody' ? 'session/missing' : hidden ? 'thing/missing' : 'access/denied';
      expect(`${actor}: ${answer.status} ${answer.code}`).toBe(
        `${actor}: ${actor === 'nobody' ? 401 : hidden ? 404 : 403} ${expected}`,
      );
    }
    for (const actor of may) {
      const world = await makeWorld(server, actors, person(actor) ?? actors.stranger);
      const answer = await call(server, person(actor), endpoint, parts(world, actors));
      expect(`${actor}: ${answer.status} ${answer.code ?? ''}`).toMatch(
        `${actor}: ${OWN_ANSWER[name] ?? endpoint.status}`,
      );
    }
  });
});

describe('ids of other things', () => {
  test.each([
    ['an id that cannot be one', 'not-an-id'],
    ['an id of nothing', randomUUID()],
    ['a NUL', 'a\0b'],
  ])('%s is nothing', async (_, id) => {
    for (const endpoint of Object.values(ENDPOINTS)) {
      if (endpoint.who.kind !== 'may') continue;
      const params = Object.fromEntries([...endpoint.path.matchAll(/:(\w+)/g)].map((m) => [m[1]!, id]));
      const answer = await call(server, actors.owner, endpoint, { params });
      expect(`${endpoint.path} ${answer.status} ${answer.code}`).toBe(`${endpoint.path} 404 thing/missing`);
    }
  });

  test('another team’s person, invitation or mesh is not reached through one’s own team', async () => {
    const own = await makeWorld(server, actors, actors.stranger);
    const otherActors = await makeActors(server);
    const other = await makeWorld(server, otherActors, otherActors.stranger);
    const { removePerson, changePerson, withdrawInvitation, resendInvitation, setGuest } = ENDPOINTS;
    const personId = otherActors.reviewer.id;
    const tries = [
      [removePerson!, { params: { teamId: own.teamId, personId } }],
      [changePerson!, { params: { teamId: own.teamId, personId }, body: { role: 'guest' } }],
      [withdrawInvitation!, { params: { teamId: own.teamId, invitationId: other.invitationId } }],
      [resendInvitation!, { params: { teamId: own.teamId, invitationId: other.invitationId }, body: {} }],
      [setGuest!, { params: { projectId: own.projectId, personId }, body: { added: true } }],
    ] as const;
    for (const [endpoint, parts] of tries) {
      expect((await call(server, actors.owner, endpoint, parts)).code, endpoint.path).toBe('thing/missing');
    }
  });
});
