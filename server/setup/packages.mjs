// npm's and Debian's packages: installed if they are missing, else left alone.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { isRoot, ROOT } from './places.mjs';
import { fail, say } from './say.mjs';

export function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    fail(`Node ${process.versions.node} is too old: install Node 20.19 or newer.`);
  }
}

const stampFile = path.join(ROOT, 'node_modules/.gapwright-lock');
const lockHash = () =>
  createHash('sha256')
    .update(fs.readFileSync(path.join(ROOT, 'package-lock.json')))
    .update(process.versions.modules)
    .digest('hex');

/** Installs from the lock file when node_modules is missing, half-made or of another lock. */
export function ensureNpmPackages({ quiet = false } = {}) {
  const wanted = lockHash();
  try {
    if (fs.readFileSync(stampFile, 'utf8') === wanted) return;
  } catch {
    // no stamp: packages are missing or were installed by hand
  }
  if (!quiet) say('Installing npm packages from the lock file …');
  const result = spawnSync(
    'npm',
    ['install', '--no-save', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'],
    {
      cwd: ROOT,
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'pipe'],
      env: { ...process.env, NODE_ENV: 'development' },
    },
  );
  if (result.error) fail(`npm could not be started (${result.error.message}). Install npm 11.`);
  if (result.status !== 0) {
    const text = `${result.stdout}\n${result.stderr}`;
    if (/ENOSPC|no space left/i.test(text))
      fail('The disk is full while npm packages are installed. Free some space and run it again.');
    const line =
      text.split('\n').find((l) => /npm (error|ERR!)/.test(l) && !/code/.test(l)) ?? text.trim().split('\n').at(-1);
    fail(`npm packages could not be installed: ${line}`);
  }
  fs.writeFileSync(stampFile, wanted);
}

/** How to run a command with the rights of root, or a sentence why not. */
function asRoot(need) {
  if (isRoot) return [];
  if (spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0) return ['sudo', '-n'];
  const hasSudo = !spawnSync('sudo', ['-V'], { stdio: 'ignore' }).error;
  if (hasSudo && process.stdin.isTTY) return ['sudo'];
  return fail(`${need} is missing and this user may not install it. Run as root: apt-get install -y ${need}`);
}

/** Installs a Debian package. */
export function installDebianPackage(name, { quiet = false } = {}) {
  if (spawnSync('apt-get', ['--version'], { stdio: 'ignore' }).error) {
    fail(`${name} is missing and this is no Debian machine. Install it by hand (see README.md).`);
  }
  const prefix = asRoot(name);
  if (!quiet) say(`Installing Debian's ${name} …`);
  const run = (...args) => {
    const [command, ...rest] = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', '-q', ...args];
    return spawnSync(command, rest, {
      encoding: 'utf8',
      stdio: [process.stdin.isTTY ? 'inherit' : 'ignore', 'pipe', 'pipe'],
    });
  };
  const install = () => run('install', '-y', '--no-install-recommends', name);
  let result = install();
  if (result.status !== 0) {
    // an old or empty package list is the usual reason
    run('update');
    result = install();
  }
  if (result.status !== 0) {
    const text = `${result.stdout}\n${result.stderr}`;
    if (/no space left/i.test(text))
      fail(`The disk is full while Debian's ${name} is installed. Free some space and run it again.`);
    const line = text.split('\n').find((l) => /^E: /.test(l)) ?? 'apt-get failed';
    fail(`Debian's ${name} could not be installed: ${line}`);
  }
}

/** Debian's Chromium for the browser tests. */
export function ensureChromium() {
  if (!fs.existsSync('/usr/bin/chromium')) installDebianPackage('chromium');
}
