// `npm run db:*`: the database by hand.
import { ensureBuilt } from './build.mjs';
import { checkSettings, migrate, seedDemo } from './commands.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { releasePostgres, startPostgres, stopPostgres } from './postgres.mjs';
import { fail, runOrFail, say } from './say.mjs';
import { loadEnvFile, outsideDatabase, serverEnv } from './settings.mjs';

/** Starts our own server unless the settings name another, and leaves it running: its address is of no use otherwise. */
async function address() {
  return outsideDatabase() ?? (await startPostgres('main', { quiet: true, note: 'npm run db:url', keep: true })).url;
}

/** Does something with the database, and leaves our own server as it was found. */
async function withDatabase(work) {
  await ensureNpmPackages();
  await ensureBuilt('server');
  const outside = outsideDatabase();
  const url = outside ?? (await startPostgres('main', { note: 'npm run db' })).url;
  try {
    await work(serverEnv(url));
  } finally {
    if (outside === null) await releasePostgres('main');
  }
}

const COMMANDS = {
  async url() {
    console.log(await address());
  },
  async start() {
    await address();
    say('PostgreSQL runs. npm run db:url tells its address, npm run db:stop stops it.');
  },
  migrate: () => withDatabase(migrate),
  seed: () =>
    withDatabase(async (env) => {
      await checkSettings(env);
      await migrate(env);
      await seedDemo(env);
    }),
  async reset() {
    if (!process.argv.includes('--yes')) {
      fail('This drops all data in the database. If that is meant, run: npm run db:reset -- --yes');
    }
    await withDatabase((env) => migrate({ ...env, GAPWRIGHT_RESET: 'yes' }));
  },
  async stop() {
    if (outsideDatabase() !== null) fail('DATABASE_URL names a database that is not ours to stop.');
    say((await stopPostgres('main')) ? 'PostgreSQL stopped.' : 'PostgreSQL was not running.');
  },
};

await runOrFail('the database is set up', async () => {
  checkNode();
  loadEnvFile();
  const name = process.argv[2] ?? '';
  if (!Object.hasOwn(COMMANDS, name)) fail(`Unknown: "${name}". There are ${Object.keys(COMMANDS).join(', ')}.`);
  await COMMANDS[name]();
});
