// Starts the server, and ends it: reads the settings, opens what it needs, listens; on a signal it finishes what is under
// way and closes.
import { existsSync } from 'node:fs';
import type { Server } from 'node:http';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { inArray } from 'drizzle-orm';
import { createApp } from './app';
import { createAuth } from './auth/auth';
import { ConfigFault, readConfig } from './config';
import { DEMO_PASSWORD, DEMO_PEOPLE } from './db/demo-people';
import { openDatabase, tables, type Database } from './db/client';
import { endForsakenDryFits, runDryFitJob } from './dry-fits/run';
import { createLimits } from './http/limits';
import { createLog } from './http/log';
import { jobs, startJobs } from './jobs/jobs';
import { sweep } from './jobs/sweep';
import { createMailer } from './mail/mailer';
import { sweepIncoming } from './http/upload';
import { createFileStore } from './storage/file-store';

/** Their password stands in the source: a database that was a demo's cannot go into production. */
async function refuseDemoAccounts(db: Database): Promise<void> {
  const demo = inArray(
    tables.user.email,
    DEMO_PEOPLE.map((p) => p.email),
  );
  if ((await db.$count(tables.user, demo)) === 0) return;
  throw new ConfigFault(
    'The setting DATABASE_URL names a database with the demo accounts, whose password everybody knows. Give production a database of its own.',
  );
}

/** Requests that are under way get this long. */
const DRAIN_MS = 3000;

function listen(server: Server, port: number, host: string): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => resolve());
  });
}

function close(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), DRAIN_MS).unref();
  });
}

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = createLog(config.logLevel);
  const database = openDatabase(config.databaseUrl, config.databasePool, (error) =>
    log.error({ err: error }, 'database'),
  );
  const { db, pool } = database;
  if (config.mode === 'production') await refuseDemoAccounts(db);
  const mailer = createMailer(config, db, (error) => log.error({ err: error }, 'a mail was not sent'));
  const limits = createLimits(pool);
  const store = await createFileStore(config);
  await sweepIncoming(config.files);
  let isReady = true;
  const auth = createAuth(db, config, mailer, limits, { log, strict: true });
  const clientFolder = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../client');
  const app = createApp(
    { config, db, auth, mailer, store, jobs, limits, log, ready: () => isReady },
    existsSync(clientFolder) ? { clientFolder } : {},
  );
  const runner =
    config.dryFitWorkers === 0
      ? null
      : await startJobs({
          db,
          pool,
          log,
          concurrency: config.dryFitWorkers,
          onFreed: () => endForsakenDryFits(db),
          handlers: {
            'dry-fit': (payload, signal) => runDryFitJob({ db, store, log }, payload.dryFitId, signal),
            sweep: () => sweep(db, store),
          },
        });
  const { createServer } = await import('node:http');
  const server = createServer(app);
  // large meshes over slow lines take long; headers must not
  server.requestTimeout = 30 * 60 * 1000;
  server.headersTimeout = 20_000;

  let isEnding = false;
  const end = async (): Promise<void> => {
    if (isEnding) return;
    isEnding = true;
    isReady = false;
    await Promise.all([close(server), runner?.stop()]);
    mailer.close();
    await database.close();
  };
  const stop = (): void => {
    end().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'the server did not end cleanly');
        process.exit(1);
      },
    );
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, stop);
  // `npm start` was killed: it would have stopped this server
  process.on('disconnect', stop);
  try {
    await listen(server, config.port, config.host);
  } catch (error) {
    await end();
    throw error;
  }
  announce(config.baseUrl, config.mode === 'local');
}

function announce(address: string, isLocal: boolean): void {
  const lines = [`Gapwright is at ${address}`];
  if (isLocal) {
    lines.push(`Demo accounts, password "${DEMO_PASSWORD}":`);
    for (const person of DEMO_PEOPLE) lines.push(`  ${person.role.padEnd(9)} ${person.email}`);
    lines.push('Stop it with Ctrl-C.');
  }
  process.stdout.write(`${lines.join('\n')}\n`);
}

main().catch((error: unknown) => {
  const { code } = error as NodeJS.ErrnoException;
  const text =
    error instanceof ConfigFault
      ? error.message
      : code === 'EADDRINUSE'
        ? 'The port is taken by another program. Stop it, or set PORT to another one.'
        : code === 'EACCES'
          ? 'This user may not listen on that port. Set PORT to one above 1023.'
          : `The server could not start: ${error instanceof Error ? error.message : String(error)}`;
  process.stderr.write(`${text}\n`);
  process.exit(1);
});
