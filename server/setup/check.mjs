// `npm run check`: the compiled command, built first if its sources changed. Says nothing of its own.
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { ensureBuilt } from './build.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { sentenceOf, say } from './say.mjs';

try {
  checkNode();
  ensureNpmPackages({ quiet: true });
  ensureBuilt('check', { quiet: true });
} catch (error) {
  say(sentenceOf(error, 'the check is prepared'));
  process.exit(2);
}
// npm runs this in the project's folder; a relative scene is meant from where the person stands
if (process.env.INIT_CWD) process.chdir(process.env.INIT_CWD);
process.argv.splice(1, 1, path.join(ROOT, 'dist/check/check.js'));
await import(pathToFileURL(process.argv[1]).href);
