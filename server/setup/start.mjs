// `npm start`: from a bare machine to the running product, and in seconds when all is there.
import { spawn } from 'node:child_process';
import net from 'node:net';
import path from 'node:path';
import { ensureAllBuilt } from './build.mjs';
import { runDatabaseCommand } from './db.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { startPostgres, stopPostgres } from './postgres.mjs';
import { fail, runOrFail, say } from './say.mjs';
import { loadEnvFile } from './env-file.mjs';

const portIsFree = (port, host) =>
  new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => resolve(false));
    server.listen(port, host, () => server.close(() => resolve(true)));
  });

/** Runs the server until it ends; signals go on to it, so that it can drain. */
function runServer(env) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [path.join(ROOT, 'dist/server/main.js')], {
      cwd: ROOT,
      stdio: ['ignore', 'inherit', 'inherit'],
      env,
    });
    let asked = 0;
    const forward = (signal) => {
      asked += 1;
      // a terminal's Ctrl-C reaches the child by itself as well; a second one means now
      child.kill(asked > 1 ? 'SIGKILL' : signal);
    };
    process.on('SIGINT', () => forward('SIGTERM'));
    process.on('SIGTERM', () => forward('SIGTERM'));
    child.on('exit', (code, signal) => resolve(asked > 0 ? 0 : (code ?? (signal ? 1 : 0))));
  });
}

await runOrFail('the product is brought up', async () => {
  checkNode();
  loadEnvFile();
  const port = Number(process.env.PORT || 4180);
  const host = process.env.HOST || '127.0.0.1';
  if (!(await portIsFree(port, host))) {
    fail(
      `Port ${port} on ${host} is taken by another program, or may not be used. Stop that program, or set PORT to another one.`,
    );
  }
  ensureNpmPackages();
  const outside = process.env.DATABASE_URL;
  const postgres = outside ? null : await startPostgres('main');
  const stop = () => {
    if (postgres?.startedHere) stopPostgres('main');
  };
  let code;
  try {
    ensureAllBuilt();
    const env = {
      ...process.env,
      DATABASE_URL: outside ?? postgres.url,
      GAPWRIGHT_FILES: process.env.GAPWRIGHT_FILES ?? path.join(postgres?.base ?? ROOT, 'files'),
      PORT: String(port),
      HOST: host,
    };
    runDatabaseCommand('migrate', env.DATABASE_URL, env);
    if (env.GAPWRIGHT_MODE !== 'production') runDatabaseCommand('seed', env.DATABASE_URL, env);
    code = await runServer(env);
  } finally {
    stop();
  }
  say('Stopped.');
  process.exit(code);
});
