// `npm start`: from a bare machine to the running product, and in seconds when all is there.
import { spawn } from 'node:child_process';
import { ensureAllBuilt } from './build.mjs';
import { checkSettings, compiled, migrate, seedDemo } from './commands.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { dataFolder, ROOT } from './places.mjs';
import { refuseTakenPort } from './port.mjs';
import { releasePostgres, startPostgres } from './postgres.mjs';
import { heedSignals, stopIfAsked } from './run.mjs';
import { runOrFail, say } from './say.mjs';
import { DEFAULT_HOST, DEFAULT_PORT, loadEnvFile, outsideDatabase, serverEnv } from './settings.mjs';

/** A second Ctrl-C counts only after this: npm and the terminal both pass the first one on. */
const IMPATIENT_AFTER_MS = 1000;

/** Runs the server until it ends; a signal goes on to it, so that it can drain. Gives its exit code. */
function runServer(env) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [compiled('main')], {
      cwd: ROOT,
      // the server ends by itself when this process is gone: the fourth one tells it
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
      // a group of its own: the terminal's Ctrl-C comes through us alone
      detached: true,
      env,
    });
    let askedAt = 0;
    const forward = () => {
      if (askedAt === 0) {
        askedAt = Date.now();
        child.kill('SIGTERM');
      } else if (Date.now() - askedAt > IMPATIENT_AFTER_MS) child.kill('SIGKILL');
    };
    process.on('SIGINT', forward);
    process.on('SIGTERM', forward);
    process.on('SIGHUP', forward);
    child.once('exit', (code) => resolve(askedAt > 0 ? 0 : (code ?? 1)));
  });
}

async function bringUp(env, isLocal) {
  await migrate(env);
  if (isLocal) await seedDemo(env);
  stopIfAsked();
  return runServer(env);
}

await runOrFail('the product is brought up', async () => {
  checkNode();
  heedSignals();
  loadEnvFile();
  const host = process.env.HOST || DEFAULT_HOST;
  const port = process.env.PORT || String(DEFAULT_PORT);
  await refuseTakenPort(host, port, dataFolder('main'));
  await ensureNpmPackages();
  await ensureAllBuilt();
  const outside = outsideDatabase();
  await checkSettings(serverEnv(outside ?? 'postgres://ours'));
  const isLocal = process.env.GAPWRIGHT_MODE !== 'production';
  let code;
  if (outside !== null) code = await bringUp(serverEnv(outside), isLocal);
  else {
    try {
      const { url } = await startPostgres('main', { note: `npm start at http://${host}:${port}` });
      code = await bringUp(serverEnv(url), isLocal);
    } finally {
      await releasePostgres('main');
    }
  }
  if (code === 0) say('Stopped.');
  process.exit(code);
});
