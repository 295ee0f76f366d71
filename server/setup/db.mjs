// `npm run db:*`: the project's own PostgreSQL by hand.
import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { ensureBuilt } from './build.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { startPostgres, stopPostgres } from './postgres.mjs';
import { fail, runOrFail, say } from './say.mjs';

/** Runs a compiled database command against a server that is up. */
export function runDatabaseCommand(name, url, extraEnv = {}) {
  const file = path.join(ROOT, 'dist/server', `${name}.js`);
  const result = spawnSync(process.execPath, [file], {
    cwd: ROOT,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, DATABASE_URL: url, ...extraEnv },
  });
  if (result.status !== 0)
    fail(`The database step "${name}" failed; the lines above say why. Nothing half-done was kept.`);
}

const COMMANDS = {
  async url() {
    console.log((await startPostgres('main', { quiet: true })).url);
  },
  async migrate() {
    const { url } = await startPostgres('main');
    ensureBuilt('server');
    runDatabaseCommand('migrate', url);
  },
  async seed() {
    const { url, base } = await startPostgres('main');
    ensureBuilt('server');
    runDatabaseCommand('migrate', url);
    runDatabaseCommand('seed', url, { GAPWRIGHT_FILES: process.env.GAPWRIGHT_FILES ?? path.join(base, 'files') });
  },
  async reset() {
    if (!process.argv.includes('--yes'))
      fail('This drops all data of this checkout. Run it again as: npm run db:reset -- --yes');
    const { url } = await startPostgres('main');
    ensureBuilt('server');
    runDatabaseCommand('migrate', url, { GAPWRIGHT_RESET: 'yes' });
  },
  stop() {
    say(stopPostgres('main') ? 'PostgreSQL stopped.' : 'PostgreSQL was not running.');
  },
};

if (process.argv[1]?.endsWith('db.mjs')) {
  await runOrFail('the database is set up', async () => {
    checkNode();
    ensureNpmPackages();
    const command = COMMANDS[process.argv[2]];
    if (command === undefined) fail(`Unknown: ${process.argv[2]}. There are ${Object.keys(COMMANDS).join(', ')}.`);
    await command();
  });
}
