// What the check worker does with the orders it gets: the newest document counts, meshes are fetched as they are wanted, and
// between two slices of work it listens.
import { CheckCore } from './check-core';
import type { CheckAnswer, CheckOrder } from './live-check';
import type { MeshAnswer } from './mesh-reader';

export interface DeskParts {
  readonly answer: (answer: CheckAnswer) => void;
  readonly readMesh: (teamId: string, name: string) => Promise<MeshAnswer>;
  /** Calls back after messages that have come in meanwhile. */
  readonly defer: (task: () => void) => void;
  /** ms */
  readonly now: () => number;
  /** Hears of comparisons that failed. */
  readonly onFault?: (error: unknown) => void;
}

/** Length of a slice of work, ms: short enough for gaps to follow a hand, long enough for motions to be in them. */
const SLICE = 80;
/** Meshes that could not be had are asked for again after this long, when the document changes, ms. */
const FORGIVE_AFTER = 5000;
/** Files read at once. */
const AT_ONCE = 3;

export function createCheckDesk({ answer, readMesh, defer, now, onFault }: DeskParts): (order: CheckOrder) => void {
  const core = new CheckCore(onFault);
  const reading = new Set<string>();
  const failedAt = new Map<string, number>();
  let order: CheckOrder | null = null;
  let isDeferred = false;

  const say = (): void => {
    if (order !== null) answer({ version: order.version, check: core.answer() });
  };
  const goOn = (): void => {
    if (isDeferred) return;
    isDeferred = true;
    defer(() => {
      isDeferred = false;
      const end = now() + SLICE;
      const isMore = core.run(() => now() >= end);
      say();
      if (isMore) goOn();
    });
  };
  const fetchWanted = (teamId: string): void => {
    for (const name of core.wanted()) {
      if (reading.size >= AT_ONCE) return;
      if (reading.has(name)) continue;
      reading.add(name);
      void readMesh(teamId, name)
        .catch((): MeshAnswer => ({ ok: false, sentence: 'its mesh could not be read.', again: true }))
        .then((result) => {
          reading.delete(name);
          if (result.ok) core.putMesh(name, result.mesh);
          else {
            core.failMesh(name, result.sentence);
            if (result.again) failedAt.set(name, now());
          }
          fetchWanted(teamId);
          goOn();
        });
    }
  };
  return (next) => {
    order = next;
    const due = [...failedAt].filter(([, at]) => now() - at >= FORGIVE_AFTER).map(([name]) => name);
    for (const name of due) failedAt.delete(name);
    core.forgive(due);
    core.take(next.scene, next.isPreview);
    fetchWanted(next.teamId);
    goOn();
  };
}
