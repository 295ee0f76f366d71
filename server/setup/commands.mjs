// The server's own commands, compiled: settings, tables, demo. Each is silent when all is well.
import path from 'node:path';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';
import { decidingLine, fail, tellsOfFullDisk } from './say.mjs';

/** @param {string} name */
export const compiled = (name) => path.join(ROOT, 'dist/server', `${name}.js`);

async function command(name, env, what) {
  const { status, text } = await run(process.execPath, [compiled(name)], { cwd: ROOT, env });
  if (status === 0) return;
  if (tellsOfFullDisk(text))
    fail(`The disk is full while ${what}. Free some space and run it again; nothing was lost.`);
  fail(decidingLine(text));
}

/**
 * Refuses settings that the server would refuse.
 * @param {Record<string, string | undefined>} env
 */
export const checkSettings = (env) => command('settings', env, 'the settings are read');

/**
 * Brings the tables up to date.
 * @param {Record<string, string | undefined>} env
 */
export const migrate = (env) => command('migrate', env, 'the database is brought up to date');

/**
 * Makes the demo team if it is not there.
 * @param {Record<string, string | undefined>} env
 */
export const seedDemo = (env) => command('seed', env, 'the demo is made');
