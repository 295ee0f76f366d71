// `npm run dev`: Vite with hot reload in front, the server built and restarted whenever its sources change.
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { ensureBuilt } from './build.mjs';
import { checkSettings, compiled, migrate, seedDemo } from './commands.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { dataFolder, ROOT } from './places.mjs';
import { refuseTakenPort } from './port.mjs';
import { releasePostgres, startPostgres } from './postgres.mjs';
import { heedSignals, stopIfAsked } from './run.mjs';
import { fail, runOrFail, say, sentenceOf } from './say.mjs';
import { DEFAULT_PORT, loadEnvFile, outsideDatabase, serverEnv } from './settings.mjs';

const VITE_PORT = '5173';
/** Editors save in several steps. */
const QUIET_MS = 300;

function launch(args, env) {
  const child = spawn(process.execPath, args, { cwd: ROOT, stdio: ['ignore', 'inherit', 'inherit', 'ipc'], env });
  const ended = new Promise((resolve) => child.once('exit', resolve));
  return {
    ended,
    end: () => {
      child.kill('SIGTERM');
      return ended;
    },
  };
}

/** The server, one at a time; a new one comes up only when its build, tables and settings are sound. */
function createServerKeeper(env) {
  let server = null;
  let work = Promise.resolve();
  const renew = async () => {
    try {
      const isNew = await ensureBuilt('server');
      if (server !== null && !isNew) return;
      await checkSettings(env);
      await server?.end();
      server = null;
      await migrate(env);
      await seedDemo(env);
      server = launch([compiled('main')], env);
    } catch (error) {
      say(sentenceOf(error, 'the server is restarted'));
    }
  };
  return {
    renew: () => (work = work.then(renew)),
    end: () => work.then(() => server?.end()),
  };
}

function watch(onChange) {
  let timer = null;
  const changed = () => {
    clearTimeout(timer);
    timer = setTimeout(onChange, QUIET_MS);
  };
  const watchers = ['server', 'shared', '.config'].map((folder) =>
    fs.watch(path.join(ROOT, folder), { recursive: true }, changed),
  );
  return () => {
    clearTimeout(timer);
    for (const watcher of watchers) watcher.close();
  };
}

async function develop(databaseUrl, port) {
  const address = `http://127.0.0.1:${VITE_PORT}`;
  const env = {
    ...serverEnv(databaseUrl),
    PORT: port,
    // links in mails lead to the pages that reload
    BASE_URL: process.env.BASE_URL || address,
    GAPWRIGHT_ORIGINS: `${address},http://localhost:${VITE_PORT}`,
  };
  const keeper = createServerKeeper(env);
  await keeper.renew();
  stopIfAsked();
  const vite = launch(
    [path.join(ROOT, 'node_modules/vite/bin/vite.js'), '--host', '127.0.0.1', '--port', VITE_PORT, '--strictPort'],
    env,
  );
  const unwatch = watch(() => void keeper.renew());
  const end = () => void vite.end();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, end);
  await vite.ended;
  unwatch();
  await keeper.end();
}

await runOrFail('the development server is brought up', async () => {
  checkNode();
  heedSignals();
  loadEnvFile();
  if (process.env.GAPWRIGHT_MODE === 'production') fail('GAPWRIGHT_MODE is production; npm run dev is for local work.');
  const port = process.env.PORT || String(DEFAULT_PORT);
  await refuseTakenPort('127.0.0.1', port, dataFolder('main'));
  await refuseTakenPort('127.0.0.1', VITE_PORT, dataFolder('main'));
  await ensureNpmPackages();
  const outside = outsideDatabase();
  if (outside !== null) await develop(outside, port);
  else {
    try {
      const { url } = await startPostgres('main', { note: `npm run dev at http://127.0.0.1:${VITE_PORT}` });
      await develop(url, port);
    } finally {
      await releasePostgres('main');
    }
  }
  process.exit(0);
});
