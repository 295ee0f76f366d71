// `npm test`: every check there is, each step named; the last line counts them. A step that fails does not keep the others
// from running: one run tells all that is wrong.
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { ensureAllBuilt } from './build.mjs';
import { ensureChromium } from './debian.mjs';
import { checkNode, ensureNpmPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { releasePostgres, startPostgres } from './postgres.mjs';
import { heedSignals, run, stopIfAsked } from './run.mjs';
import { runOrFail, say, sentenceOf } from './say.mjs';
import { playwrightCounts, vitestCounts } from './test-counts.mjs';

/** @typedef {import('./test-counts.mjs').Counts} Counts */

const PASSED = { passed: 1, failed: 0 };
const FAILED = { passed: 0, failed: 1 };

const bin = (name) => path.join(ROOT, 'node_modules/.bin', name);
const readJson = (file) => {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
};

/** Settings of this machine have no say in the tests. */
const SETTINGS =
  /^(GAPWRIGHT_(?!DATA$|PG_BIN$|PG_PORT$)|DATABASE_|S3_|SMTP_|MAIL_FROM$|BASE_URL$|PORT$|HOST$|TRUST_PROXY$|NODE_ENV$)/;
const testEnv = (extra) => ({
  ...Object.fromEntries(Object.entries(process.env).filter(([name]) => !SETTINGS.test(name))),
  ...extra,
});

async function succeeds(command, args, env = {}) {
  const { status } = await run(bin(command), args, { cwd: ROOT, env: testEnv(env), show: true });
  return status === 0;
}

/** A step that either passes or fails as one. */
const whole = (command, args) => async () => ((await succeeds(command, args)) ? PASSED : FAILED);

const vitest = (name, args) => async (env, scratch) => {
  const file = path.join(scratch, `${name}.json`);
  const all = ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${file}`, ...args];
  const ok = await succeeds('vitest', all, env);
  return vitestCounts(readJson(file), ok);
};

async function types() {
  let isSound = true;
  // the browser's code, the shared code that knows neither browser nor Node, and this folder
  for (const project of ['.', 'shared', 'server/setup']) {
    isSound = (await succeeds('tsc', ['--noEmit', '-p', project])) && isSound;
  }
  return isSound ? PASSED : FAILED;
}

async function build() {
  try {
    await ensureAllBuilt();
    return PASSED;
  } catch (error) {
    say(sentenceOf(error, 'the product is built'));
    return FAILED;
  }
}

async function playwright(env, scratch) {
  const file = path.join(scratch, 'browser.json');
  const args = ['test', '--config', 'e2e/playwright.config.ts', '--reporter=list,json'];
  const ok = await succeeds('playwright', args, { ...env, PLAYWRIGHT_JSON_OUTPUT_NAME: file });
  return playwrightCounts(readJson(file), ok);
}

/** @type {[string, (env: Record<string, string>, scratch: string) => Promise<Counts>][]} */
const STEPS = [
  ['format', whole('prettier', ['--check', '--log-level', 'warn', '.'])],
  ['lint', whole('eslint', ['--config', '.config/eslint.config.js', '.'])],
  ['types', types],
  ['architecture', vitest('architecture', ['tests/architecture.test.ts'])],
  ['build', build],
  ['vitest', vitest('vitest', ['--exclude', 'tests/architecture.test.ts'])],
  ['playwright', playwright],
];

/** Runs the steps; gives the sums and the names of the steps that failed. */
async function runSteps(steps, env, scratch) {
  const sums = { passed: 0, failed: 0 };
  const failedSteps = [];
  for (const [name, step] of steps) {
    stopIfAsked();
    say(`\n── ${name} ──`);
    const begun = Date.now();
    const { passed, failed } = await step(env, scratch);
    sums.passed += passed;
    sums.failed += failed;
    if (failed > 0) failedSteps.push(name);
    const seconds = ((Date.now() - begun) / 1000).toFixed(1);
    say(`── ${name}: ${passed} passed, ${failed} failed, ${seconds} s`);
  }
  return { ...sums, failedSteps };
}

await runOrFail('the tests are brought up', async () => {
  checkNode();
  heedSignals();
  const only = process.argv.slice(2);
  const steps = STEPS.filter(([name]) => only.length === 0 || only.includes(name));
  await ensureNpmPackages();
  await ensureChromium();
  const scratch = fs.mkdtempSync(path.join(os.tmpdir(), 'gapwright-test-'));
  let result;
  try {
    const { url } = await startPostgres('test', { note: 'npm test' });
    result = await runSteps(steps, { TEST_DATABASE_URL: url }, scratch);
  } finally {
    await releasePostgres('test');
    fs.rmSync(scratch, { recursive: true, force: true });
  }
  const { passed, failed, failedSteps } = result;
  if (failedSteps.length > 0) console.log(`Failed in: ${failedSteps.join(', ')}`);
  console.log(`${passed} passed, ${failed} failed`);
  process.exit(failed > 0 ? 1 : 0);
});
