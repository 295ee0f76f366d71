// A fresh database for a test file, on the real PostgreSQL: a copy of the migrated template, dropped at the end.
import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { openDatabase, type DatabaseHandle } from '../../server/db/client';

export const TEST_PREFIX = 'gapwright_test_';
export const TEMPLATE_PREFIX = 'gapwright_template_';

export interface TestDatabase extends DatabaseHandle {
  readonly url: string;
}

/** The address of another database on the same server. */
export function databaseUrl(url: string, database: string): string {
  const other = new URL(url);
  other.pathname = `/${database}`;
  return other.href;
}

function fromSetup(name: string): string {
  const value = process.env[name];
  if (value === undefined) throw new Error(`${name} is not set: tests of the server lie in tests/server/`);
  return value;
}

async function asAdmin(url: string, statement: string): Promise<void> {
  const admin = new Client({ connectionString: url });
  await admin.connect();
  try {
    await admin.query(statement);
  } finally {
    await admin.end();
  }
}

/**
 * Makes a database with all tables and nothing in them.
 * Usage: `beforeAll(async () => { database = await createTestDatabase(); })` and `afterAll(() => database.close())`.
 */
export async function createTestDatabase(): Promise<TestDatabase> {
  const admin = fromSetup('TEST_DATABASE_URL');
  const name = TEST_PREFIX + randomBytes(6).toString('hex');
  await asAdmin(admin, `create database ${name} template ${fromSetup('TEST_DATABASE_TEMPLATE')}`);
  const url = databaseUrl(admin, name);
  const handle = openDatabase(url, 8, () => undefined);
  return {
    ...handle,
    url,
    async close() {
      await handle.close();
      // whoever is still connected (a job runner that a test forgot) must not keep the database alive
      await asAdmin(admin, `drop database if exists ${name} with (force)`);
    },
  };
}
