// One contender in a process of its own, so that its memory is its own: `contender.ts engine|contacts|distances SCENE RUNS`. Answers with
// one line of JSON.
import { checkScene, planCheck } from '#shared/check';
import { readyScene } from './demo-scene';
import { STRIDE } from './stride';
import { SampledPeer } from './sampled-peer';

export interface Times {
  readonly scene: string;
  readonly parts: number;
  readonly triangles: number;
  readonly findings: number;
  /** Each run, ms. */
  readonly runs: readonly number[];
  /** Most memory that the process held while it ran, above what it held when all was ready, MB. */
  readonly grownBy: number;
  /** Most memory that the process ever held, MB. */
  readonly peak: number;
}

const [kind = '', file = '', runs = '5'] = process.argv.slice(2);
const scene = readyScene(file);
const peer = kind === 'engine' ? null : new SampledPeer(scene.prepared);
const work = (): unknown => {
  if (peer === null) return checkScene(scene.prepared, scene.sha256);
  return kind === 'contacts' ? peer.contacts() : peer.distances(STRIDE);
};

globalThis.gc?.();
const before = process.memoryUsage().rss;
const times: number[] = [];
// the first run warms the compiler up and does not count, unless it is the only one
const rounds = Number(runs) > 1 ? Number(runs) + 1 : 1;
for (let i = 0; i < rounds; i += 1) {
  const begun = performance.now();
  work();
  if (rounds === 1 || i > 0) times.push(performance.now() - begun);
}
const peakKb = process.resourceUsage().maxRSS;
const answer: Times = {
  scene: scene.name,
  parts: scene.prepared.components.length,
  triangles: scene.prepared.meshes.reduce((sum, m) => sum + m.triangles, 0),
  findings: planCheck(scene.prepared).tasks.length,
  runs: times,
  grownBy: Math.max(0, peakKb * 1024 - before) / 1e6,
  peak: (peakKb * 1024) / 1e6,
};
process.stdout.write(`${JSON.stringify(answer)}\n`);
