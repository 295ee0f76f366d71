// npm's packages: installed from the lock file if they are missing or of another lock.
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { withLock } from './lock.mjs';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';
import { decidingLine, fail, say, tellsOfFullDisk } from './say.mjs';

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    fail(`Node ${process.versions.node} is too old: install Node 20.19 or newer.`);
  }
}

const MODULES = path.join(ROOT, 'node_modules');
const STAMP = path.join(MODULES, '.gapwright-lock');
/** Lies there while npm works: packages beside it may be halves. */
const WORKING = path.join(ROOT, '.local/installing-packages');

const lockHash = () =>
  createHash('sha256')
    .update(fs.readFileSync(path.join(ROOT, 'package-lock.json')))
    .update(process.versions.modules)
    .digest('hex');

function isInstalled(wanted) {
  return !fs.existsSync(WORKING) && fs.existsSync(STAMP) && fs.readFileSync(STAMP, 'utf8') === wanted;
}

/**
 * Installs npm's packages unless they are there.
 * @param {{ quiet?: boolean }} [options]
 */
export async function ensureNpmPackages({ quiet = false } = {}) {
  if (isInstalled(lockHash())) return;
  await withLock(ROOT, 'npm packages are installed', async () => {
    const wanted = lockHash();
    if (isInstalled(wanted)) return;
    if (!quiet) say('Installing npm packages from the lock file …');
    // what an interrupted run left is not mended but made anew; else packages that somebody works with stay in place
    const anew = !fs.existsSync(MODULES) || fs.existsSync(WORKING);
    fs.mkdirSync(path.dirname(WORKING), { recursive: true });
    fs.writeFileSync(WORKING, '');
    const verb = anew ? ['ci'] : ['install', '--no-save'];
    const result = await run('npm', [...verb, '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], {
      cwd: ROOT,
      env: { ...process.env, NODE_ENV: 'development' },
    });
    if (result.missing) fail('npm could not be started. Install npm 11.');
    if (result.status !== 0) {
      if (tellsOfFullDisk(result.text)) {
        fail('The disk is full while npm packages are installed. Free some space and run it again.');
      }
      fail(
        `npm packages could not be installed: ${decidingLine(result.text, /npm (error|ERR!) (?!code|errno|syscall)/)}`,
      );
    }
    fs.writeFileSync(STAMP, wanted);
    fs.rmSync(WORKING);
  });
}
