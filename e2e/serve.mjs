// The built product on a fresh database, for the browser tests: `node e2e/serve.mjs PORT`.
import { spawn, spawnSync } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import pg from 'pg';

const ROOT = fileURLToPath(new URL('..', import.meta.url));
const NAME = 'gapwright_browser';
const port = process.argv[2];

const server = process.env.TEST_DATABASE_URL;
if (!server) {
  console.error('TEST_DATABASE_URL is missing: run the browser tests with `npm test`, or name a PostgreSQL in it.');
  process.exit(1);
}
const admin = new pg.Client({ connectionString: server });
await admin.connect();
await admin.query(`drop database if exists ${NAME} with (force)`);
await admin.query(`create database ${NAME}`);
await admin.end();

const url = new URL(server);
url.pathname = `/${NAME}`;
const files = fs.mkdtempSync(path.join(os.tmpdir(), 'gapwright-browser-'));
const env = {
  ...process.env,
  DATABASE_URL: url.href,
  GAPWRIGHT_FILES: files,
  GAPWRIGHT_MODE: 'local',
  HOST: '127.0.0.1',
  PORT: port,
  BASE_URL: `http://127.0.0.1:${port}`,
  // each test comes from an address of its own, as visitors do behind a proxy, and so has its own rate limits
  TRUST_PROXY: 'loopback',
  LOG_LEVEL: 'error',
};
const compiled = (name) => path.join(ROOT, 'dist/server', `${name}.js`);
for (const step of ['migrate', 'seed']) {
  const { status } = spawnSync(process.execPath, [compiled(step)], { cwd: ROOT, stdio: 'inherit', env });
  if (status !== 0) process.exit(1);
}

const child = spawn(process.execPath, [compiled('main')], { cwd: ROOT, stdio: 'inherit', env });
const clear = () => fs.rmSync(files, { recursive: true, force: true });
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill('SIGTERM'));
child.on('exit', (code) => {
  clear();
  process.exit(code ?? 0);
});
