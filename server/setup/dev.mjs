// `npm run dev`: Vite with hot reload in front, the server built and restarted whenever its sources change.
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { ensureBuilt } from './build.mjs';
import { runDatabaseCommand } from './db.mjs';
import { loadEnvFile } from './env-file.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { startPostgres, stopPostgres } from './postgres.mjs';
import { runOrFail, say, sentenceOf } from './say.mjs';

await runOrFail('the development server is brought up', async () => {
  checkNode();
  loadEnvFile();
  ensureNpmPackages();
  const postgres = await startPostgres('main');
  const port = process.env.PORT ?? '4180';
  const env = {
    ...process.env,
    PORT: port,
    DATABASE_URL: process.env.DATABASE_URL ?? postgres.url,
    GAPWRIGHT_FILES: process.env.GAPWRIGHT_FILES ?? path.join(postgres.base, 'files'),
    GAPWRIGHT_ORIGINS: 'http://localhost:5173,http://127.0.0.1:5173',
  };
  let server = null;
  let ending = false;
  const restart = () => {
    try {
      ensureBuilt('server');
      runDatabaseCommand('migrate', env.DATABASE_URL, env);
      runDatabaseCommand('seed', env.DATABASE_URL, env);
    } catch (error) {
      say(sentenceOf(error, 'the server is built'));
      return;
    }
    const launch = () => {
      if (!ending)
        server = spawn(process.execPath, [path.join(ROOT, 'dist/server/main.js')], {
          cwd: ROOT,
          stdio: 'inherit',
          env,
        });
    };
    if (server === null || server.exitCode !== null) launch();
    else {
      server.once('exit', launch);
      server.kill('SIGTERM');
    }
  };
  restart();
  const vite = spawn(process.execPath, [path.join(ROOT, 'node_modules/vite/bin/vite.js'), '--host', '127.0.0.1'], {
    cwd: ROOT,
    stdio: 'inherit',
    env,
  });
  let timer = null;
  const changed = () => {
    clearTimeout(timer);
    timer = setTimeout(restart, 300);
  };
  const watchers = ['server', 'shared'].map((folder) =>
    fs.watch(path.join(ROOT, folder), { recursive: true }, changed),
  );
  const end = () => {
    if (ending) return;
    ending = true;
    for (const watcher of watchers) watcher.close();
    vite.kill('SIGTERM');
    const finish = () => {
      if (postgres.startedHere) stopPostgres('main');
      process.exit(0);
    };
    if (server === null || server.exitCode !== null) finish();
    else {
      server.once('exit', finish);
      server.kill('SIGTERM');
    }
  };
  process.on('SIGINT', end);
  process.on('SIGTERM', end);
  vite.on('exit', end);
});
