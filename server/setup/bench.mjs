// `npm run bench`: time and memory of the engine beside its peers, in one run.
import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { fail, runOrFail } from './say.mjs';

await runOrFail('the benchmarks are run', async () => {
  checkNode();
  await ensureNpmPackages();
  const args = ['--expose-gc', '--import', 'tsx', path.join(ROOT, 'tests/bench/run.ts'), ...process.argv.slice(2)];
  const result = spawnSync(process.execPath, args, { cwd: ROOT, stdio: 'inherit' });
  if (result.status !== 0) fail('A benchmark failed; the lines above say why.');
});
