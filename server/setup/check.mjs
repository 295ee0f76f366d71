// `npm run check`: the compiled command, built first if its sources changed. Says nothing of its own.
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { ensureBuilt, isBuilt } from './build.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { sentenceOf, say } from './say.mjs';

try {
  checkNode();
  // the built command holds all it needs
  if (!isBuilt('check')) {
    await ensureNpmPackages({ quiet: true });
    await ensureBuilt('check', { quiet: true });
  }
  // npm runs this in the project's folder; a relative scene is meant from where the person stands
  if (process.env.INIT_CWD) process.chdir(process.env.INIT_CWD);
} catch (error) {
  say(sentenceOf(error, 'the check is prepared'));
  process.exit(2);
}
const command = path.join(ROOT, 'dist/check/check.js');
process.argv.splice(1, 1, command);
await import(pathToFileURL(command).href);
