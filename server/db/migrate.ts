// `node dist/server/migrate.js`: brings the database to the newest tables; several at once wait for one another.
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { runMigrations as migrateJobs } from 'graphile-worker';
import { Client } from 'pg';

/** Any number, the same for all who migrate. */
const LOCK = 7_214_011;

function migrationsFolder(): string {
  // from dist/server/ as from server/db/
  return path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../drizzle');
}

/** Runs all migrations, ours and the job queue's. `reset` drops everything first. */
export async function migrateDatabase(url: string, options: { readonly reset?: boolean } = {}): Promise<void> {
  const client = new Client({ connectionString: url, application_name: 'gapwright-migrate' });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [LOCK]);
    if (options.reset === true) {
      await client.query('drop schema if exists public, drizzle, graphile_worker cascade');
      await client.query('create schema public');
    }
    await migrate(drizzle(client), { migrationsFolder: migrationsFolder() });
    await migrateJobs({ connectionString: url });
  } finally {
    await client.end();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const url = process.env['DATABASE_URL'];
  if (url === undefined) {
    process.stderr.write('The setting DATABASE_URL is missing.\n');
    process.exit(1);
  }
  try {
    await migrateDatabase(url, { reset: process.env['GAPWRIGHT_RESET'] === 'yes' });
  } catch (error) {
    process.stderr.write(
      `The database could not be brought up to date: ${error instanceof Error ? error.message : String(error)}\n`,
    );
    process.exit(1);
  }
}
