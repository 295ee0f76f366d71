// Where things lie: the checkout, and the data that outlasts it.
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = fs.realpathSync(fileURLToPath(new URL('../..', import.meta.url)));
export const isRoot = process.getuid?.() === 0;

const hashOfPath = createHash('sha256').update(ROOT).digest('hex').slice(0, 10);
const read = (file) => {
  try {
    return fs.readFileSync(file, 'utf8').trim();
  } catch {
    return null;
  }
};

const keyFile = (checkout) => path.join(checkout, '.local/checkout-key');
const ownerFile = (folder) => path.join(folder, 'checkout');

function home() {
  if (isRoot) return '/var/lib/gapwright';
  return path.join(process.env.XDG_DATA_HOME || path.join(os.homedir(), '.local/share'), 'gapwright');
}

/**
 * The folder of this checkout among those of all checkouts. Its key is made of the checkout's first path and noted in the
 * checkout, so that the data stays with a checkout that is moved or renamed; a copy of a checkout gets a key of its own.
 */
function checkoutFolder(create) {
  const noted = read(keyFile(ROOT));
  if (noted !== null && /^[\w-]+-[0-9a-f]{10}$/.test(noted)) {
    const folder = path.join(home(), noted);
    const owner = read(ownerFile(folder));
    const isCopy = owner !== null && owner !== ROOT && read(keyFile(owner)) === noted;
    if (!isCopy) return note(folder, noted, create);
  }
  const key = `${path.basename(ROOT).replace(/[^A-Za-z0-9_-]/g, '_')}-${hashOfPath}`;
  return note(path.join(home(), key), key, create);
}

function note(folder, key, create) {
  if (!create) return folder;
  makeFolder(folder);
  if (read(ownerFile(folder)) !== ROOT) fs.writeFileSync(ownerFile(folder), `${ROOT}\n`);
  if (read(keyFile(ROOT)) !== key) {
    try {
      fs.mkdirSync(path.dirname(keyFile(ROOT)), { recursive: true });
      fs.writeFileSync(keyFile(ROOT), `${key}\n`);
    } catch {
      // another user's checkout: the path alone is the key then
    }
  }
  return folder;
}

/**
 * Makes a folder that others may pass through but not read: root's PostgreSQL runs as another user.
 * @param {string} folder
 */
export function makeFolder(folder) {
  const missing = [];
  for (let at = folder; !fs.existsSync(at); at = path.dirname(at)) missing.unshift(at);
  // one by one: made all at once, a folder in a place that takes none is tried for ever
  for (const at of missing) {
    try {
      fs.mkdirSync(at);
    } catch (error) {
      // another process was faster
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error;
    }
    // whatever the umask says; folders that were there stay as they are
    fs.chmodSync(at, isRoot ? 0o711 : 0o700);
  }
}

/**
 * The folder for lasting data of one purpose. Nothing in it is ever cleared by age.
 * @param {'main' | 'test'} purpose
 * @param {{ create?: boolean }} [options]
 * @returns {string}
 */
export function dataFolder(purpose, { create = false } = {}) {
  const set = process.env.GAPWRIGHT_DATA;
  const folder = path.join(set ? path.resolve(ROOT, set) : checkoutFolder(create), purpose);
  if (create) makeFolder(folder);
  // one name for one folder, however it is reached
  return fs.existsSync(folder) ? fs.realpathSync(folder) : folder;
}

/**
 * A port that this checkout prefers, so that two checkouts seldom want the same.
 * @param {number} base
 */
export const preferredPort = (base) => base + (Number.parseInt(hashOfPath.slice(0, 6), 16) % 400);
