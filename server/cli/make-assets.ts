// `npm run assets`: makes the demo's meshes and scenes again, from the numbers in server/cli/demo.
import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { demoFiles } from './demo/files';

const FOLDER = path.resolve(import.meta.dirname, '../../assets/demo');

mkdirSync(FOLDER, { recursive: true });
for (const [name, bytes] of demoFiles()) {
  writeFileSync(path.join(FOLDER, name), bytes);
  process.stdout.write(`${name}: ${bytes.length} bytes\n`);
}
