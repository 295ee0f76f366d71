// Where things lie: the checkout, and the data that outlasts it.
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = fs.realpathSync(fileURLToPath(new URL('../..', import.meta.url)));
export const isRoot = process.getuid?.() === 0;

/** Two checkouts on one machine must not share a database: the folder is named after the checkout's path. */
const checkoutKey = createHash('sha256').update(ROOT).digest('hex').slice(0, 10);

/** The folder for lasting data of one purpose (`main` or `test`). Nothing in it is ever cleared by age. */
export function dataFolder(purpose) {
  const set = process.env.GAPWRIGHT_DATA;
  if (set) return path.resolve(set, purpose);
  const home = isRoot
    ? '/var/lib/gapwright'
    : path.join(process.env.XDG_DATA_HOME || path.join(os.homedir(), '.local/share'), 'gapwright');
  return path.join(home, `${path.basename(ROOT).replace(/[^A-Za-z0-9_-]/g, '_')}-${checkoutKey}`, purpose);
}

/** A port that this checkout prefers, so that two checkouts seldom want the same. */
export function preferredPort(base) {
  return base + (parseInt(checkoutKey.slice(0, 6), 16) % 400);
}
