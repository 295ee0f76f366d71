// Builds what is out of date: the client, the server with its workers, the command line.
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { withLock } from './lock.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';
import { fail, runOrFail, say, tellsOfFullDisk } from './say.mjs';

const PARTS = {
  client: {
    sources: ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'package-lock.json'],
    config: 'vite.config.ts',
    proof: 'index.html',
  },
  server: {
    sources: ['server', 'shared', '.config', 'package-lock.json'],
    config: '.config/vite.server.config.ts',
    proof: 'main.js',
  },
  check: {
    sources: ['server/cli/check.ts', 'shared', '.config', 'package-lock.json'],
    config: '.config/vite.check.config.ts',
    proof: 'check.js',
  },
};

/** @typedef {keyof typeof PARTS} Part */

const outOf = (name) => path.join(ROOT, 'dist', name);
const stampOf = (name) => path.join(outOf(name), '.sources');

/** A hash over names, sizes and times of the sources: cheap, and it changes whenever a file does. */
function sourcesHash(sources) {
  const hash = createHash('sha256');
  const walk = (file) => {
    const stat = fs.statSync(file, { throwIfNoEntry: false });
    if (stat === undefined) return;
    if (stat.isDirectory()) for (const name of fs.readdirSync(file).sort()) walk(path.join(file, name));
    else hash.update(`${file}\0${stat.size}\0${stat.mtimeMs}\n`);
  };
  for (const source of sources) walk(path.join(ROOT, source));
  return hash.update(process.version).digest('hex');
}

/**
 * Whether a part is built from the sources as they are.
 * @param {Part} name
 */
export function isBuilt(name) {
  const stamp = stampOf(name);
  return fs.existsSync(stamp) && fs.readFileSync(stamp, 'utf8') === sourcesHash(PARTS[name].sources);
}

async function build(name, quiet) {
  const { sources, config, proof } = PARTS[name];
  // taken before: what changes while it is built is built the next time
  const stamp = sourcesHash(sources);
  if (!quiet) say(`Building the ${name} …`);
  const out = outOf(name);
  const making = path.join(ROOT, 'dist', `.making-${name}`);
  const old = path.join(ROOT, 'dist', `.old-${name}`);
  const vite = path.join(ROOT, 'node_modules/vite/bin/vite.js');
  const args = [vite, 'build', '--config', config, '--outDir', making, '--emptyOutDir', '--logLevel', 'warn'];
  const result = await run(process.execPath, args, { cwd: ROOT, env: { ...process.env, NODE_ENV: 'production' } });
  if (result.status !== 0 || !fs.existsSync(path.join(making, proof))) {
    fs.rmSync(making, { recursive: true, force: true });
    if (tellsOfFullDisk(result.text)) {
      fail(`The disk is full while the ${name} is built. Free some space and run it again.`);
    }
    say(result.text.trim());
    fail(`The ${name} could not be built; the lines above say why.`);
  }
  fs.writeFileSync(path.join(making, path.basename(stampOf(name))), stamp);
  // a server that runs from the old files finds whole ones at any time
  fs.rmSync(old, { recursive: true, force: true });
  if (fs.existsSync(out)) fs.renameSync(out, old);
  fs.renameSync(making, out);
  fs.rmSync(old, { recursive: true, force: true });
}

/**
 * Builds one part if its sources changed since.
 * @param {Part} name
 * @param {{ quiet?: boolean }} [options]
 * @returns {Promise<boolean>} whether it was built now
 */
export async function ensureBuilt(name, { quiet = false } = {}) {
  if (isBuilt(name)) return false;
  return withLock(outOf(name), `the ${name} is built`, async () => {
    if (isBuilt(name)) return false;
    await build(name, quiet);
    return true;
  });
}

/** @param {{ quiet?: boolean }} [options] */
export async function ensureAllBuilt(options) {
  for (const name of /** @type {Part[]} */ (Object.keys(PARTS))) await ensureBuilt(name, options);
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  await runOrFail('the product is built', async () => {
    checkNode();
    await ensureNpmPackages();
    await ensureAllBuilt();
  });
}
