// Before the server's tests: a PostgreSQL of the tests' own, the worker threads built, and one migrated database that the
// tests' databases are copied from.
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { Client } from 'pg';
import { migrateDatabase } from '../../server/db/migrate';
import { ensureBuilt } from '../../server/setup/build.mjs';
import { releasePostgres, startPostgres } from '../../server/setup/postgres.mjs';
import { databaseUrl, TEMPLATE_PREFIX, TEST_PREFIX } from './test-database';

const ROOT = path.resolve(import.meta.dirname, '../..');
/** Any number; runs that start together wait for one another. */
const LOCK = 7_214_012;

/** Changes with the migrations, ours and the job queue's. */
function templateName(): string {
  const hash = createHash('sha256');
  const files = readdirSync(path.join(ROOT, 'drizzle'), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath, entry.name));
  for (const file of files.sort()) hash.update(readFileSync(file));
  hash.update(readFileSync(path.join(ROOT, 'node_modules/graphile-worker/package.json')));
  return TEMPLATE_PREFIX + hash.digest('hex').slice(0, 16);
}

async function exists(admin: Client, name: string): Promise<boolean> {
  const { rowCount } = await admin.query('select from pg_database where datname = $1', [name]);
  return rowCount === 1;
}

async function makeTemplate(admin: Client, url: string): Promise<string> {
  const name = templateName();
  if (await exists(admin, name)) return name;
  const making = `${name}_making`;
  await admin.query(`drop database if exists ${making} with (force)`);
  await admin.query(`create database ${making}`);
  await migrateDatabase(databaseUrl(url, making));
  // a template of the right name is always a whole one
  await admin.query(`alter database ${making} rename to ${name}`);
  return name;
}

/** Drops what killed runs left: databases of the tests' kind, hours old, with nobody in them. */
async function sweepLeftovers(admin: Client, keep: string): Promise<void> {
  const { rows } = await admin.query<{ name: string }>(
    `select datname as name from pg_database d
     where (starts_with(datname, $1) or starts_with(datname, $2)) and datname <> $3
       and (pg_stat_file('base/' || d.oid || '/PG_VERSION')).modification < now() - interval '2 hours'
       and not exists (select from pg_stat_activity a where a.datid = d.oid)`,
    [TEST_PREFIX, TEMPLATE_PREFIX, keep],
  );
  for (const { name } of rows) await admin.query(`drop database if exists ${name}`);
}

export default async function setup(): Promise<() => Promise<void>> {
  const given = process.env['TEST_DATABASE_URL'];
  const url = given ?? (await startPostgres('test', { quiet: true })).url;
  await ensureBuilt('server', { quiet: true });
  const admin = new Client({ connectionString: url });
  await admin.connect();
  try {
    await admin.query('select pg_advisory_lock($1)', [LOCK]);
    const template = await makeTemplate(admin, url);
    await sweepLeftovers(admin, template);
    process.env['TEST_DATABASE_URL'] = url;
    process.env['TEST_DATABASE_TEMPLATE'] = template;
  } finally {
    await admin.end();
  }
  return async () => {
    if (given === undefined) await releasePostgres('test');
  };
}
