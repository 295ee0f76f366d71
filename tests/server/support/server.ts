// The application on a database of its own and a port of its own, for one test file.
import { mkdir, mkdtemp, readdir, rm } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { createApp } from '../../../server/app';
import { createAuth } from '../../../server/auth/auth';
import { readConfig, type Config } from '../../../server/config';
import { createLimits } from '../../../server/http/limits';
import { createLog } from '../../../server/http/log';
import type { Services } from '../../../server/http/services';
import { jobs } from '../../../server/jobs/jobs';
import { createMailer } from '../../../server/mail/mailer';
import { createFileStore } from '../../../server/storage/file-store';
import { createTestDatabase, type TestDatabase } from '../test-database';

export interface TestServer extends Services, Pick<TestDatabase, 'pool'> {
  readonly databaseUrl: string;
  readonly url: string;
  /** Lines of the log so far. */
  readonly logged: () => string;
  /** Names of the files that lie in the folder of uploads on their way. */
  readonly incoming: () => Promise<string[]>;
  readonly close: () => Promise<void>;
}

export interface ServerOptions {
  readonly env?: Readonly<Record<string, string>>;
  /** The limits as they are in production; otherwise so wide that no test meets them. */
  readonly strict?: boolean;
  readonly clientFolder?: string;
  readonly services?: (services: Services) => Partial<Services>;
}

export async function startTestServer(options: ServerOptions = {}): Promise<TestServer> {
  const database = await createTestDatabase();
  const files = await mkdtemp(path.join(os.tmpdir(), 'gapwright-test-'));
  await mkdir(path.join(files, 'incoming'));
  const config: Config = readConfig({
    DATABASE_URL: database.url,
    GAPWRIGHT_FILES: files,
    BASE_URL: 'http://gapwright.test',
    TRUST_PROXY: 'loopback',
    ...options.env,
  });
  const lines: string[] = [];
  const log = createLog(config.logLevel, { write: (line: string) => void lines.push(line) });
  const { db, pool } = database;
  const strict = options.strict === true;
  const mailer = createMailer(config, db, () => undefined);
  const limits = createLimits(pool, strict ? 1 : 1000);
  const auth = createAuth(db, config, mailer, limits, { log, strict });
  const store = await createFileStore(config);
  const plain: Services = { config, db, auth, mailer, store, jobs, limits, log, ready: () => true };
  const services: Services = { ...plain, ...options.services?.(plain) };
  const { clientFolder } = options;
  const server = createServer(createApp(services, clientFolder === undefined ? {} : { clientFolder }));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    ...services,
    pool,
    databaseUrl: database.url,
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    logged: () => lines.join(''),
    incoming: () => readdir(path.join(files, 'incoming')),
    async close() {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      mailer.close();
      await database.close();
      await rm(files, { recursive: true, force: true });
    },
  };
}
