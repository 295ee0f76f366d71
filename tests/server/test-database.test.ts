import { Client } from 'pg';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { tables } from '../../server/db/client';
import { createTestDatabase, type TestDatabase } from './test-database';

let first: TestDatabase;
let second: TestDatabase;

beforeAll(async () => {
  first = await createTestDatabase();
  second = await createTestDatabase();
});

afterAll(async () => {
  await first.close();
  await second.close();
});

test('a fresh database has all tables, the job queue, and nobody in it', async () => {
  expect(await first.db.select().from(tables.user)).toEqual([]);
  expect(await first.db.select().from(tables.scene)).toEqual([]);
  const { rows } = await first.pool.query<{ queue: string | null }>(
    `select to_regclass('graphile_worker.jobs')::text as queue`,
  );
  expect(rows[0]?.queue).toBe('graphile_worker.jobs');
});

test('what one test file writes, another does not see', async () => {
  await first.db.insert(tables.team).values({ name: 'Bench Row' });
  expect(await first.db.select().from(tables.team)).toHaveLength(1);
  expect(await second.db.select().from(tables.team)).toEqual([]);
});

test('a closed database is gone, even with somebody still in it', async () => {
  const third = await createTestDatabase();
  const forgotten = new Client({ connectionString: third.url });
  forgotten.on('error', () => undefined);
  await forgotten.connect();
  await third.close();
  const name = new URL(third.url).pathname.slice(1);
  const { rowCount } = await first.pool.query('select from pg_database where datname = $1', [name]);
  expect(rowCount).toBe(0);
});
