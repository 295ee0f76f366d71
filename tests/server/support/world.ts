// A team with one of everything in it, put straight into the database: for tests that ask who may do what.
import { createHash, randomUUID } from 'node:crypto';
import { encodeDisplayMesh } from '#shared/api';
import { canonicalSceneText } from '#shared/scene';
import { tables } from '../../../server/db/client';
import { displayKey, meshKey } from '../../../server/meshes/rules';
import { newToken } from '../../../server/shares/rules';
import { block, mesh, part, reportOf, sceneOf } from '../../fixtures/scenes';
import { boxSoup } from '../../fixtures/soups';
import { binaryStl } from '../../fixtures/stl';
import { join, signInAs, type TestPerson } from './people';
import type { TestServer } from './server';
import { loaded, PNG } from './things';

const SOUP = boxSoup(20, 20, 20);
export const STL = binaryStl(SOUP);
export const SHA = createHash('sha256').update(STL).digest('hex');
const DOCUMENT = loaded(
  sceneOf([part('liner', [mesh(SHA)]), part('bracket', [block([10, 10, 10])], { pose: { at: [0, 60, 0] } })]),
);
const REPORT = reportOf({ ...DOCUMENT }, { [SHA]: SOUP });

export interface Actors {
  readonly owner: TestPerson;
  readonly designer: TestPerson;
  readonly reviewer: TestPerson;
  /** Added to the project. */
  readonly guest: TestPerson;
  /** A guest of the team who was added to another project. */
  readonly otherGuest: TestPerson;
  /** Signed in, and in another team. */
  readonly stranger: TestPerson;
}

export async function makeActors(server: TestServer): Promise<Actors> {
  return {
    owner: await signInAs(server, 'Olga Owner'),
    designer: await signInAs(server, 'Dieter Designer'),
    reviewer: await signInAs(server, 'Rita Reviewer'),
    guest: await signInAs(server, 'Gil Guest'),
    otherGuest: await signInAs(server, 'Otto Otherguest'),
    stranger: await signInAs(server, 'Sina Stranger'),
  };
}

export interface World {
  readonly teamId: string;
  readonly projectId: string;
  readonly sceneId: string;
  readonly revisionId: string;
  readonly dryFitId: string;
  readonly queuedId: string;
  readonly pictureId: string;
  readonly shareId: string;
  readonly token: string;
  readonly sha256: string;
  /** Goes to the address of whoever is named in `inviting`. */
  readonly invitationId: string;
}

async function makeRevision(server: TestServer, projectId: string, by: string) {
  const { db, store } = server;
  const meshes = [SHA];
  const fields = { projectId, name: DOCUMENT.name, document: DOCUMENT, parts: 2, meshes, saveNumber: 1, updatedBy: by };
  const [scene] = await db.insert(tables.scene).values(fields).returning();
  const sceneId = scene!.id;
  const documentText = canonicalSceneText(DOCUMENT);
  const sha256 = createHash('sha256').update(documentText).digest('hex');
  const [revision] = await db
    .insert(tables.revision)
    .values({ sceneId, number: 1, saveNumber: 1, documentText, sha256, meshes, madeBy: by })
    .returning();
  const revisionId = revision!.id;
  const ended = { state: 'done' as const, report: REPORT, totals: { ...REPORT.totals }, endedAt: new Date() };
  const fit = { sceneId, revisionId, startedBy: by };
  const fits = await db
    .insert(tables.dryFit)
    .values([{ ...fit, ...ended }, fit])
    .returning({ id: tables.dryFit.id });
  const storageKey = `pictures/${revisionId}/${randomUUID()}.png`;
  await store.putBytes(storageKey, PNG);
  const [picture] = await db
    .insert(tables.picture)
    .values({ revisionId, kind: 'view', standpoint: 'Overhead', width: 1, height: 1, storageKey, takenBy: by })
    .returning();
  const token = newToken();
  const [share] = await db
    .insert(tables.share)
    .values({ revisionId, token, pictureId: picture!.id, madeBy: by })
    .returning();
  const [dryFitId, queuedId] = fits.map((f) => f.id);
  return {
    sceneId,
    revisionId,
    dryFitId: dryFitId!,
    queuedId: queuedId!,
    pictureId: picture!.id,
    shareId: share!.id,
    token,
  };
}

export async function makeWorld(server: TestServer, actors: Actors, inviting: TestPerson): Promise<World> {
  const { db, store } = server;
  const [team] = await db.insert(tables.team).values({ name: 'Tin Lizard Garage' }).returning();
  const teamId = team!.id;
  const { owner, designer, reviewer, guest, otherGuest } = actors;
  for (const [person, role] of [
    [owner, 'owner'],
    [designer, 'designer'],
    [reviewer, 'reviewer'],
    [guest, 'guest'],
    [otherGuest, 'guest'],
  ] as const) {
    await join(server, teamId, person, role);
  }
  // so that the owner may leave
  await join(server, teamId, await signInAs(server, 'Second Owner'), 'owner');
  const projects = await db
    .insert(tables.project)
    .values([
      { teamId, name: 'Coupe' },
      { teamId, name: 'Wagon' },
    ])
    .returning();
  const projectId = projects[0]!.id;
  await db.insert(tables.projectGuest).values([
    { projectId, personId: guest.id },
    { projectId: projects[1]!.id, personId: otherGuest.id },
  ]);
  await db.insert(tables.mesh).values({
    ...{ teamId, sha256: SHA, name: 'liner.stl', bytes: STL.length, form: 'binary' as const, triangles: 12 },
    ...{ low: [-10, -10, -10], high: [10, 10, 10], kind: 'body' as const, badEdges: 0, shells: 1, dropped: 0 },
    ...{ guess: 'mm', uploadedBy: designer.id },
  });
  await store.putBytes(meshKey(teamId, SHA), STL);
  const display = { positions: Float32Array.from(SOUP.slice(0, 9)), index: Uint32Array.of(0, 1, 2) };
  await store.putBytes(displayKey(teamId, SHA), encodeDisplayMesh(display));
  const [invitation] = await db
    .insert(tables.invitation)
    .values({ teamId, email: inviting.email, role: 'reviewer', expiresAt: new Date(Date.now() + 1e6) })
    .returning();
  const rest = await makeRevision(server, projectId, designer.id);
  return { teamId, projectId, sha256: SHA, invitationId: invitation!.id, ...rest };
}
