// `npm test`: every check there is, each step named; the last line counts them.
import { spawnSync } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { ensureAllBuilt } from './build.mjs';
import { checkNode, ensureChromium, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { startPostgres, stopPostgres } from './postgres.mjs';
import { runOrFail, say, sentenceOf } from './say.mjs';

const bin = (name) => path.join(ROOT, 'node_modules/.bin', name);
const scratch = fs.mkdtempSync(path.join(os.tmpdir(), 'gapwright-test-'));

function run(command, args, env = {}) {
  const result = spawnSync(command, args, {
    cwd: ROOT,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, ...env },
  });
  return result.status === 0;
}

/** A step that either passes or fails as one. */
const whole = (command, args) => () => (run(bin(command), args) ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 });

/** Vitest's or Playwright's own counts; a run that ended without a report is one failure. */
function counted(file, read, ok) {
  try {
    const counts = read(JSON.parse(fs.readFileSync(file, 'utf8')));
    return ok || counts.failed > 0 ? counts : { ...counts, failed: 1 };
  } catch {
    return { passed: 0, failed: 1 };
  }
}

const vitest = (name, args) => (env) => {
  const file = path.join(scratch, `${name}.json`);
  const ok = run(
    bin('vitest'),
    ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${file}`, ...args],
    env,
  );
  return counted(
    file,
    (r) => ({
      passed: r.numPassedTests,
      failed: r.numFailedTests + (r.numFailedTestSuites > 0 && r.numFailedTests === 0 ? 1 : 0),
    }),
    ok,
  );
};

function playwright(env) {
  const file = path.join(scratch, 'browser.json');
  const args = ['test', '--config', 'e2e/playwright.config.ts', '--reporter=list,json'];
  const ok = run(bin('playwright'), args, { ...env, PLAYWRIGHT_JSON_OUTPUT_NAME: file });
  return counted(file, ({ stats }) => ({ passed: stats.expected, failed: stats.unexpected + stats.flaky }), ok);
}

function build() {
  try {
    ensureAllBuilt();
    return { passed: 1, failed: 0 };
  } catch (error) {
    say(sentenceOf(error, 'the product is built'));
    return { passed: 0, failed: 1 };
  }
}

const STEPS = [
  ['format', whole('prettier', ['--check', '--log-level', 'warn', '.'])],
  ['lint', whole('eslint', ['--config', '.config/eslint.config.js', '.'])],
  [
    'types',
    () =>
      run(bin('tsc'), ['--noEmit']) && run(bin('tsc'), ['--noEmit', '-p', 'shared/tsconfig.json'])
        ? { passed: 1, failed: 0 }
        : { passed: 0, failed: 1 },
  ],
  ['architecture', vitest('architecture', ['tests/architecture.test.ts'])],
  ['build', build],
  ['vitest', vitest('vitest', ['--exclude', 'tests/architecture.test.ts'])],
  ['playwright', playwright],
];

await runOrFail('the tests are brought up', async () => {
  checkNode();
  ensureNpmPackages();
  ensureChromium();
  const postgres = await startPostgres('test');
  const stop = () => {
    if (postgres.startedHere) stopPostgres('test');
    fs.rmSync(scratch, { recursive: true, force: true });
  };
  for (const signal of ['SIGINT', 'SIGTERM']) {
    process.on(signal, () => {
      stop();
      process.exit(130);
    });
  }
  const only = process.argv.slice(2);
  let passed = 0;
  let failed = 0;
  const failedSteps = [];
  try {
    for (const [name, step] of STEPS) {
      if (only.length > 0 && !only.includes(name)) continue;
      say(`\n── ${name} ──`);
      const begun = Date.now();
      const counts = step({ TEST_DATABASE_URL: postgres.url });
      passed += counts.passed;
      failed += counts.failed;
      if (counts.failed > 0) failedSteps.push(name);
      say(
        `── ${name}: ${counts.passed} passed, ${counts.failed} failed, ${((Date.now() - begun) / 1000).toFixed(1)} s`,
      );
    }
  } finally {
    stop();
  }
  if (failedSteps.length > 0) console.log(`Failed in: ${failedSteps.join(', ')}`);
  console.log(`${passed} passed, ${failed} failed`);
  process.exit(failed > 0 ? 1 : 0);
});
