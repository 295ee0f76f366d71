// A stage for the browser tests: the built product on a database and a folder of its own, with the demo in it. Everything is
// gone when it ends.   node server/setup/stage.mjs PORT
import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { ensureAllBuilt } from './build.mjs';
import { compiled, migrate, seedDemo } from './commands.mjs';
import { ROOT } from './places.mjs';
import { createDatabase, dropDatabase, releasePostgres, startPostgres } from './postgres.mjs';
import { heedSignals, stopIfAsked } from './run.mjs';
import { runOrFail } from './say.mjs';

/** The settings of a local product, whatever this machine's own are. */
function stageEnv(port, databaseUrl, files) {
  const { PATH, HOME, LANG, TZ } = process.env;
  return {
    ...{ PATH, HOME, LANG, TZ },
    PORT: port,
    BASE_URL: `http://127.0.0.1:${port}`,
    DATABASE_URL: databaseUrl,
    GAPWRIGHT_FILES: files,
    LOG_LEVEL: process.env.STAGE_LOG_LEVEL ?? 'warn',
  };
}

function play(env) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [compiled('main')], {
      cwd: ROOT,
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
      env,
    });
    for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill('SIGTERM'));
    child.once('exit', (code) => resolve(code ?? 0));
  });
}

await runOrFail('the stage of the browser tests is set up', async () => {
  heedSignals();
  const port = process.argv[2] ?? '0';
  await ensureAllBuilt();
  const files = fs.mkdtempSync(path.join(os.tmpdir(), 'gapwright-stage-'));
  const name = `gapwright_test_stage_${randomBytes(4).toString('hex')}`;
  let code;
  try {
    await startPostgres('test', { quiet: true, note: 'browser tests' });
    try {
      const env = stageEnv(port, await createDatabase('test', name), files);
      await migrate(env);
      await seedDemo(env);
      stopIfAsked();
      code = await play(env);
    } finally {
      await dropDatabase('test', name);
    }
  } finally {
    await releasePostgres('test');
    fs.rmSync(files, { recursive: true, force: true });
  }
  process.exit(code);
});
