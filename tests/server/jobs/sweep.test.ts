// The nightly sweep: what has run out goes, what has not stays.
import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { deleteScene, readMe } from '#shared/api';
import { tables } from '../../../server/db/client';
import { KEPT_DAYS, sweep } from '../../../server/jobs/sweep';
import { call, must } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { dryFit, makeProject, makeScene, takePicture } from '../support/things';

const DAY = 24 * 60 * 60 * 1000;
const ago = (ms: number): Date => new Date(Date.now() - ms);
let server: TestServer;
let team: TestTeam;
beforeAll(async () => {
  server = await startTestServer();
  team = await makeTeam(server);
});
afterAll(() => server.close());

test('scenes deleted 30 days ago go with their revisions and pictures; younger ones stay', async () => {
  const project = await makeProject(server, team.designer, team.id);
  const ids: string[] = [];
  for (const days of [KEPT_DAYS + 1, KEPT_DAYS - 1]) {
    const sceneId = await makeScene(server, team.designer, project.id);
    const { revisionId } = await dryFit(server, team.designer, sceneId);
    await takePicture(server, team.designer, revisionId);
    await must(server, team.designer, deleteScene, { params: { sceneId } });
    await server.db
      .update(tables.scene)
      .set({ deletedAt: ago(days * DAY) })
      .where(eq(tables.scene.id, sceneId));
    ids.push(sceneId);
  }
  await sweep(server.db, server.store);
  expect((await server.db.select().from(tables.scene)).map((s) => s.id)).toEqual([ids[1]]);
  expect((await server.db.select().from(tables.revision)).map((r) => r.sceneId)).toEqual([ids[1]]);
  expect(await server.store.keys('pictures')).toHaveLength(1);
});

test('sessions and links that have run out go, counted limits and old mails too; nobody is signed out', async () => {
  const { db, pool } = server;
  const late = { id: randomUUID(), token: 'late', userId: team.guest.id, expiresAt: ago(1000) };
  await db.insert(tables.session).values(late);
  await db.insert(tables.verification).values([
    { id: 'old', identifier: 'a', value: 'b', expiresAt: ago(1000) },
    { id: 'new', identifier: 'a', value: 'b', expiresAt: new Date(Date.now() + DAY) },
  ]);
  await db.insert(tables.rateLimit).values([
    { id: 'old', key: 'old', count: 1, lastRequest: Date.now() - 2 * DAY },
    { id: 'new', key: 'new', count: 1, lastRequest: Date.now() },
  ]);
  await db.insert(tables.limit).values([
    { key: 'old', points: 1, expire: Date.now() - 1000 },
    { key: 'new', points: 1, expire: Date.now() + 1000 * 60 },
  ]);
  const mail = { to: 'a@shop.example', subject: 's', text: 't' };
  await db.insert(tables.shelvedMail).values([{ ...mail, sentAt: ago(40 * DAY) }, mail]);
  await sweep(db, server.store);
  expect(await db.select().from(tables.session).where(eq(tables.session.token, 'late'))).toEqual([]);
  expect((await db.select().from(tables.verification)).map((v) => v.id)).toEqual(['new']);
  expect((await db.select().from(tables.rateLimit)).map((r) => r.id)).toEqual(['new']);
  const { rows } = await pool.query<{ key: string }>(`select key from limit_points where key in ('old', 'new')`);
  expect(rows.map((r) => r.key)).toEqual(['new']);
  expect(await db.$count(tables.shelvedMail)).toBe(1);
  expect((await call(server, team.guest, readMe)).status).toBe(200);
});
