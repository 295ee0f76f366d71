// Settings may lie in a file .env beside package.json; what the environment has already wins.
import fs from 'node:fs';
import path from 'node:path';
import { ROOT } from './places.mjs';

export function loadEnvFile() {
  const file = path.join(ROOT, '.env');
  if (!fs.existsSync(file)) return;
  for (const line of fs.readFileSync(file, 'utf8').split('\n')) {
    const match = /^\s*(?:export\s+)?([A-Z][A-Z0-9_]*)\s*=\s*(.*?)\s*$/.exec(line);
    if (match === null) continue;
    const [, name, raw] = match;
    process.env[name] ??= /^(".*"|'.*')$/.test(raw) ? raw.slice(1, -1) : raw;
  }
}
