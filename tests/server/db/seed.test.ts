// The demo team on the real database: made once, with dry fits that the server's own worker carries out.
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { asc, eq } from 'drizzle-orm';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Report } from '#shared/check';
import { loadScene } from '#shared/scene';
import { readConfig, type Config } from '../../../server/config';
import { tables } from '../../../server/db/client';
import { DEMO_PEOPLE } from '../../../server/db/demo-people';
import { seedDemo } from '../../../server/db/seed';
import { runDryFitJob } from '../../../server/dry-fits/run';
import { meshKey } from '../../../server/meshes/rules';
import { createFileStore, type FileStore } from '../../../server/storage/file-store';
import { createTestDatabase, type TestDatabase } from '../test-database';

const MM_PER_UNIT: Readonly<Record<string, number>> = { mm: 1, cm: 10, in: 25.4, m: 1000 };

let database: TestDatabase;
let files: string;
let config: Config;
let store: FileStore;

beforeAll(async () => {
  database = await createTestDatabase();
  files = await mkdtemp(path.join(os.tmpdir(), 'gapwright-seed-'));
  config = readConfig({ DATABASE_URL: database.url, GAPWRIGHT_FILES: files });
  store = await createFileStore(config);
  expect(await seedDemo(database.db, store, config)).toBe(true);
});

afterAll(async () => {
  await database.close();
  await rm(files, { recursive: true, force: true });
});

const scenesInOrder = () => database.db.select().from(tables.scene).orderBy(asc(tables.scene.createdAt));

test('one team, a person in each role, the guest in the project', async () => {
  const { db } = database;
  const members = await db
    .select({ name: tables.user.name, role: tables.membership.role })
    .from(tables.membership)
    .innerJoin(tables.user, eq(tables.user.id, tables.membership.personId));
  const byRole = (rows: readonly { name: string; role: string }[]) =>
    rows.map(({ name, role }) => `${role} ${name}`).sort();
  expect(byRole(members)).toEqual(byRole(DEMO_PEOPLE));
  expect(await db.select().from(tables.team)).toHaveLength(1);
  expect(await db.select().from(tables.projectGuest)).toHaveLength(1);
});

test('three scenes that load, whose meshes are stored in the unit that the scenes read them in', async () => {
  const meshes = await database.db.select().from(tables.mesh);
  expect(meshes.map((m) => m.name).sort()).toEqual([
    'engine-corner.stl',
    'fender-liner-left.stl',
    'fender-liner-right.stl',
    'wiper-motor.stl',
  ]);
  for (const mesh of meshes) expect(await store.has(meshKey(mesh.teamId, mesh.sha256)), mesh.name).toBe(true);
  const scenes = await scenesInOrder();
  expect(scenes).toHaveLength(3);
  let read = 0;
  for (const { document, meshes: named } of scenes) {
    const loaded = loadScene(document);
    if (!loaded.ok) throw new Error(loaded.refusals[0].reason);
    const shapes = loaded.scene.components.flatMap((c) => c.solids.map((s) => s.shape));
    for (const shape of shapes) {
      if (shape.kind !== 'mesh') continue;
      const mesh = meshes.find((m) => m.sha256 === shape.mesh)!;
      expect(named).toContain(shape.mesh);
      expect(MM_PER_UNIT[mesh.unit!], mesh.name).toBe(shape.scale);
      read += 1;
    }
  }
  expect(read).toBe(12);
});

test('what was done stands in the order in which it was done', async () => {
  const done = await database.db.select().from(tables.activity).orderBy(asc(tables.activity.at));
  expect(done.map(({ what }) => what.replace(/ “.*/, ''))).toEqual([
    'made the project',
    'made the scene',
    'ran a dry fit of',
    'made the scene',
    'ran a dry fit of',
    'made the scene',
  ]);
});

test('a second run changes nothing and leaves no file behind', async () => {
  const count = async () =>
    Promise.all([
      database.db.$count(tables.team),
      database.db.$count(tables.user),
      database.db.$count(tables.project),
      database.db.$count(tables.scene),
      database.db.$count(tables.mesh),
      database.db.$count(tables.dryFit),
      database.db.$count(tables.activity),
    ]);
  const before = await count();
  expect(await seedDemo(database.db, store, config)).toBe(false);
  expect(await count()).toEqual(before);
  expect(await readdir(path.join(files, 'incoming'))).toEqual([]);
});

test('a server in production makes no demo accounts', async () => {
  await expect(seedDemo(database.db, store, { ...config, mode: 'production' })).rejects.toThrow(/production/);
});

describe('the dry fits that the seed asks for', () => {
  const waiting = () => database.db.select().from(tables.dryFit).orderBy(asc(tables.dryFit.createdAt));

  test('wait in the queue for the two finished layouts; the one under way has none', async () => {
    const scenes = await scenesInOrder();
    const asked = (await waiting()).map((d) => d.sceneId);
    expect(asked.sort()).toEqual([scenes[0]!.id, scenes[1]!.id].sort());
    const { rows } = await database.pool.query<{ identifier: string }>(
      'select task_identifier as identifier from graphile_worker.jobs',
    );
    expect(rows.map((r) => r.identifier)).toEqual(['dry-fit', 'dry-fit']);
  });

  test('are carried out by the job that the server runs: one layout clears, the other has its five pairs', async () => {
    const log = pino({ level: 'silent' });
    for (const { id } of await waiting()) {
      await runDryFitJob({ db: database.db, store, log }, id, new AbortController().signal);
    }
    const scenes = await scenesInOrder();
    const done = await waiting();
    expect(done.map((d) => d.state)).toEqual(['done', 'done']);
    const [clear, conflicts] = [0, 1].map((i) => done.find((d) => d.sceneId === scenes[i]!.id)!.report as Report);
    expect(clear!.totals).toMatchObject({ hits: 0, tight: 0, loose: 0 });
    const pairs = new Set(conflicts!.findings.filter((f) => f.verdict === 'hits').map((f) => f.between.join(' ')));
    expect(pairs.size).toBe(5);
    expect(conflicts!.totals).toMatchObject({ tight: 0, loose: 0 });
    // the project shows its latest: the layout with the conflicts
    expect(done.at(-1)!.sceneId).toBe(scenes[1]!.id);
  });
});
