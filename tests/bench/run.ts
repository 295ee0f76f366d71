// `npm run bench`: the whole check of each demo scene, beside a plain loop over three-mesh-bvh that samples the same
// comparisons. Ratios within one run count; the times themselves are this machine's.
import { spawnSync } from 'node:child_process';
import { cpus } from 'node:os';
import path from 'node:path';
import type { Times } from './contender';
import { demoScenes } from './demo-scene';

const ENGINE_RUNS = 5;
/** The peer takes long: fewer runs, and no run to warm up. */
const PEER_RUNS = 1;

function contend(kind: 'engine' | 'peer', file: string, runs: number): Times {
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
const ms = (value: number): string => `${value < 100 ? value.toFixed(1) : Math.round(value)} ms`;
const mb = (value: number): string => `${Math.round(value)} MB`;

const rows: string[][] = [
  [
    'scene',
    'findings',
    'mesh triangles',
    'engine, proven',
    'peer, 200 samples',
    'ratio',
    'engine memory',
    'peer memory',
  ],
];
let isSlower = false;
for (const file of demoScenes()) {
  const engine = contend('engine', file, ENGINE_RUNS);
  const peer = contend('peer', file, PEER_RUNS);
  const ratio = median(peer.runs) / median(engine.runs);
  if (ratio < 1) isSlower = true;
  rows.push([
    `${engine.scene} (${engine.parts} parts)`,
    String(engine.findings),
    String(engine.triangles),
    ms(median(engine.runs)),
    ms(median(peer.runs)),
    `${ratio.toFixed(1)}x`,
    `${mb(engine.grownBy)} (peak ${mb(engine.peak)})`,
    `${mb(peer.grownBy)} (peak ${mb(peer.peak)})`,
  ]);
}

const widths = rows[0]!.map((_, i) => Math.max(...rows.map((row) => row[i]!.length)));
for (const row of rows)
  process.stdout.write(
    `${row
      .map((cell, i) => cell.padEnd(widths[i]!))
      .join('  ')
      .trimEnd()}\n`,
  );
process.stdout.write(
  `\nNode ${process.version}, ${cpus()[0]?.model ?? 'unknown processor'}; engine: median of ${ENGINE_RUNS} runs after one to warm up, ` +
    `one thread; peer: ${PEER_RUNS} run. Trees are built before the clock starts.\n`,
);
if (isSlower) {
  process.stderr.write('The engine is slower than its peer on a scene above.\n');
  process.exitCode = 1;
}
