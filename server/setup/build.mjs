// Builds what is out of date: the client, the server with its workers, the command line.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { fail, runOrFail, say } from './say.mjs';

const PARTS = {
  client: {
    sources: ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'package-lock.json'],
    args: ['build', '--logLevel', 'warn'],
    proof: 'dist/client/index.html',
  },
  server: {
    sources: ['server', 'shared', '.config', 'package-lock.json'],
    args: ['build', '--config', '.config/vite.server.config.ts', '--logLevel', 'warn'],
    proof: 'dist/server/main.js',
  },
  check: {
    sources: ['server/cli/check.ts', 'shared', '.config', 'package-lock.json'],
    args: ['build', '--config', '.config/vite.check.config.ts', '--logLevel', 'error'],
    proof: 'dist/check/check.js',
  },
};

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

/** Builds one part if its sources changed since. */
export function ensureBuilt(name, { quiet = false } = {}) {
  const part = PARTS[name];
  const stampFile = path.join(ROOT, 'dist', `.${name}.stamp`);
  const wanted = sourcesHash(part.sources);
  const stamp = fs.existsSync(stampFile) ? fs.readFileSync(stampFile, 'utf8') : '';
  if (stamp === wanted && fs.existsSync(path.join(ROOT, part.proof))) return false;
  if (!quiet) say(`Building the ${name} …`);
  const vite = path.join(ROOT, 'node_modules/vite/bin/vite.js');
  const result = spawnSync(process.execPath, [vite, ...part.args], {
    cwd: ROOT,
    encoding: 'utf8',
    env: { ...process.env, NODE_ENV: 'production' },
  });
  if (result.status !== 0) {
    const text = `${result.stdout}\n${result.stderr}`;
    if (/ENOSPC|no space left/i.test(text))
      fail(`The disk is full while the ${name} is built. Free some space and run it again.`);
    say(text.trim());
    fail(`The ${name} could not be built; the lines above say why.`);
  }
  fs.mkdirSync(path.dirname(stampFile), { recursive: true });
  fs.writeFileSync(stampFile, wanted);
  return true;
}

export function ensureAllBuilt(options) {
  for (const name of Object.keys(PARTS)) ensureBuilt(name, options);
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  await runOrFail('the product is built', () => {
    checkNode();
    ensureNpmPackages();
    ensureAllBuilt();
  });
}
