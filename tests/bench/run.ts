// `npm run bench`: the whole check of each demo scene, beside a plain loop over three-mesh-bvh that samples the same
// comparisons. Ratios within one run count; the times themselves are this machine's.
import { spawnSync } from 'node:child_process';
import { cpus } from 'node:os';
import path from 'node:path';
import type { Times } from './contender';
import { demoScenes } from './demo-scene';
import { SAMPLES } from './sampled-peer';
import { STRIDE } from './stride';

const ENGINE_RUNS = 5;
const CONTACT_RUNS = 3;

function contend(kind: 'engine' | 'contacts' | 'distances', file: string, runs: number): Times {
  const script = path.join(import.meta.dirname, 'contender.ts');
  const args = ['--expose-gc', '--import', 'tsx', script, kind, file, String(runs)];
  const result = spawnSync(process.execPath, args, { encoding: 'utf8', maxBuffer: 1e8 });
  if (result.status !== 0) throw new Error(`${kind} on ${file}: ${result.stderr}`);
  return JSON.parse(result.stdout) as Times;
}

const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  return ((sorted[(sorted.length - 1) >> 1] ?? NaN) + (sorted[sorted.length >> 1] ?? NaN)) / 2;
};
const ms = (value: number): string =>
  value < 10_000 ? `${value.toFixed(value < 100 ? 1 : 0)} ms` : `${Math.round(value / 1000)} s`;
const memory = ({ grownBy, peak }: Times): string => `${Math.round(grownBy)} MB more, ${Math.round(peak)} MB in all`;

let isSlower = false;
for (const file of demoScenes()) {
  const engine = contend('engine', file, ENGINE_RUNS);
  const contacts = contend('contacts', file, CONTACT_RUNS);
  const distances = contend('distances', file, 1);
  const own = median(engine.runs);
  const yesOrNo = median(contacts.runs);
  const gaps = median(distances.runs) * STRIDE;
  if (gaps < own) isSlower = true;
  const rows = [
    ['engine: proven gaps, spans, push-outs', ms(own), '1x', memory(engine)],
    [
      `three-mesh-bvh: yes or no at ${SAMPLES} samples`,
      ms(yesOrNo),
      `${(yesOrNo / own).toFixed(2)}x`,
      memory(contacts),
    ],
    [`three-mesh-bvh: distance at ${SAMPLES} samples`, ms(gaps), `${Math.round(gaps / own)}x`, memory(distances)],
  ];
  process.stdout.write(
    `${engine.scene}: ${engine.parts} parts, ${engine.findings} findings, ${engine.triangles} triangles in meshes\n`,
  );
  for (const [what = '', time = '', ratio = '', held = ''] of rows) {
    process.stdout.write(`  ${what.padEnd(46)} ${time.padStart(10)} ${ratio.padStart(9)}   ${held}\n`);
  }
}
process.stdout.write(
  `Node ${process.version}, ${cpus()[0]?.model ?? 'unknown processor'}, one thread. Engine: median of ${ENGINE_RUNS} runs after one to warm up; ` +
    `yes or no: of ${CONTACT_RUNS}; distances: one sample in ${STRIDE} timed, the time scaled up. Trees are built before the clock starts.\n`,
);
if (isSlower) {
  process.stderr.write('The engine is slower than the distances of its peer on a scene above.\n');
  process.exitCode = 1;
}
