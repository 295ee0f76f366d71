// The settings as the set-up sees them. What they may be is said in server/config.ts; here only what the set-up itself needs
// before any package is there.
import fs from 'node:fs';
import path from 'node:path';
import { dataFolder, ROOT } from './places.mjs';

/** Settings may lie in a file .env beside package.json; what the environment has already wins. */
export function loadEnvFile() {
  const file = path.join(ROOT, '.env');
  if (!fs.existsSync(file)) return;
  for (const line of fs.readFileSync(file, 'utf8').split('\n')) {
    const match = /^\s*(?:export\s+)?([A-Z][A-Z0-9_]*)\s*=\s*(.*?)\s*$/.exec(line);
    if (match === null) continue;
    const [, name = '', raw = ''] = match;
    process.env[name] ??= /^(".*"|'.*')$/.test(raw) ? raw.slice(1, -1) : raw;
  }
}

export const DEFAULT_PORT = 4180;
export const DEFAULT_HOST = '127.0.0.1';

/** The address of a database that is not ours to start, or null. */
export const outsideDatabase = () => process.env.DATABASE_URL || null;

/**
 * The environment that the server and its commands get.
 * @param {string} databaseUrl
 * @returns {Record<string, string | undefined>}
 */
export function serverEnv(databaseUrl) {
  return {
    ...process.env,
    DATABASE_URL: databaseUrl,
    GAPWRIGHT_FILES: process.env.GAPWRIGHT_FILES || path.join(dataFolder('main'), 'files'),
  };
}
