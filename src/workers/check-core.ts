// The live check itself, without worker, clock or network: takes one document after another, works in slices, and answers
// with what it has. When it is done its findings are those of checkScene, to the last bit.
import {
  assembleReport,
  computeFinding,
  findingKey,
  meshNames,
  planCheck,
  type Finding,
  type LoadedMesh,
  type Plan,
  type Task,
} from '#shared/check';
import { GapMeter } from '#shared/geometry';
import type { Scene } from '#shared/scene';
import type { LiveCheck } from './live-check';
import { TaskKeys } from './task-keys';
import { partsWith, usableScene, type Usable } from './usable-scene';

/** Findings that are kept for when their inputs come back: undo, and the other end of a drag. */
const MOST_FINDINGS = 8000;

interface Waiting {
  readonly task: Task;
  readonly name: string;
  readonly key: string;
  readonly rank: number;
  readonly margin: number;
}

/** The latest that was worked out for a pair in a configuration, in whatever document. */
interface Last {
  readonly finding: Finding;
  /** Number of the document. */
  readonly turn: number;
}

const NO_PLAN: Plan = { tasks: [], unchecked: [] };

export class CheckCore {
  private scene: Scene | null = null;
  private usable: Usable | null = null;
  private plan: Plan = NO_PLAN;
  private findings: Finding[] = [];
  private last = new Map<string, Last>();
  private turn = 0;
  private isPreview = false;
  /** Next one last. */
  private queue: Waiting[] = [];
  private troubles: string[] = [];
  private readonly meshes = new Map<string, LoadedMesh>();
  private readonly failed = new Map<string, string>();
  private readonly cache = new Map<string, Finding>();
  private readonly keys = new TaskKeys();
  private readonly meter = new GapMeter();

  /** @param onFault hears of comparisons that failed; the person gets a sentence for each */
  constructor(private readonly onFault: (error: unknown) => void = () => undefined) {}

  /** @param isPreview a hand is moving something, and the next document will be here before this one is done */
  take(scene: Scene, isPreview = false): void {
    this.scene = scene;
    this.isPreview = isPreview;
    this.turn += 1;
    this.usable = usableScene(scene, this.meshes);
    this.keys.take(this.usable.prepared);
    this.plan = planCheck(this.usable.prepared);
    this.findings = [];
    this.troubles = [];
    this.queue = [];
    const last = new Map<string, Last>();
    for (const task of this.plan.tasks) {
      const name = nameOf(task);
      const key = this.keys.keyOf(task);
      const known = this.cache.get(key);
      const before = this.last.get(name);
      if (known !== undefined) {
        this.remember(key, known);
        this.findings.push(known);
        last.set(name, { finding: known, turn: this.turn });
        continue;
      }
      if (before !== undefined) last.set(name, before);
      this.queue.push({ task, name, key, rank: this.rankOf(task, before), margin: before?.finding.margin ?? 0 });
    }
    this.last = last;
    this.queue.sort((x, y) => y.rank - x.rank || y.margin - x.margin);
  }

  /** Meshes of the document that are neither there nor known to be bad. */
  wanted(): string[] {
    if (this.scene === null) return [];
    return meshNames(this.scene).filter((name) => !this.meshes.has(name) && !this.failed.has(name));
  }

  putMesh(name: string, mesh: LoadedMesh): void {
    this.meshes.set(name, mesh);
    this.failed.delete(name);
    if (this.scene !== null) this.take(this.scene, this.isPreview);
  }

  /** @param sentence says what is wrong with it */
  failMesh(name: string, sentence: string): void {
    this.failed.set(name, sentence);
  }

  /** Meshes that could not be had are wanted again. */
  forgive(names: readonly string[]): void {
    for (const name of names) this.failed.delete(name);
  }

  /**
   * Works until `isOver` says so, at least for one comparison.
   * @returns whether there is more to do
   */
  run(isOver: () => boolean): boolean {
    while (this.usable !== null) {
      const next = this.queue.pop();
      if (next === undefined) return false;
      try {
        const finding = computeFinding(this.usable.prepared, next.task, this.meter);
        this.remember(next.key, finding);
        this.findings.push(finding);
        this.last.set(next.name, { finding, turn: this.turn });
      } catch (error) {
        this.onFault(error);
        const [a, b] = [next.task.a, next.task.b].map((side) => side.component.component.name) as [string, string];
        this.troubles.push(`The gap of ${a} and ${b} could not be worked out.`);
      }
      if (isOver()) break;
    }
    return this.queue.length > 0;
  }

  answer(): LiveCheck {
    const total = this.plan.tasks.length;
    const prepared = this.usable?.prepared;
    const isReading = this.wanted().length > 0;
    const problem = this.problem();
    const rest = problem === null ? 'done' : 'failed';
    return {
      phase: isReading ? 'reading-meshes' : this.queue.length > 0 ? 'checking' : rest,
      done: total - this.queue.length,
      total,
      findings: prepared === undefined ? [] : assembleReport(prepared, this.plan, this.shown(), '').findings,
      unchecked: this.plan.unchecked,
      meshes: prepared?.meshes ?? [],
      problem,
    };
  }

  private problem(): string | null {
    const { scene } = this;
    if (scene === null) return null;
    const unread = meshNames(scene).flatMap((name) => {
      const sentence = this.failed.get(name);
      return sentence === undefined ? [] : [`${partsWith(scene, name).join(', ')} not checked: ${sentence}`];
    });
    const all = [...unread, ...(this.usable?.problems ?? []), ...this.troubles];
    if (all.length === 0) return null;
    return all.length <= 2 ? all.join(' ') : `${all.slice(0, 2).join(' ')} And ${all.length - 2} more.`;
  }

  /** In a gesture the pairs still to come are shown as they were a moment ago, so that no gap blinks; else not at all. */
  private shown(): readonly Finding[] {
    if (!this.isPreview) return this.findings;
    return [...this.findings, ...this.queue.flatMap(({ name }) => this.last.get(name)?.finding ?? [])];
  }

  /**
   * What was just moved comes first, at rest before motions, and the tightest as last seen before the rest. In a gesture,
   * where no document is ever done, whatever was not worked out for longest comes first, with a start for what is at rest.
   */
  private rankOf(task: Task, before: Last | undefined): number {
    const motions = (task.a.motion === null ? 0 : 1) + (task.b.motion === null ? 0 : 1);
    if (!this.keys.isTouched(task)) return Number.MAX_SAFE_INTEGER - 2 + motions;
    return this.isPreview ? (before?.turn ?? 0) + 2 * motions : motions;
  }

  private remember(key: string, finding: Finding): void {
    this.cache.delete(key);
    this.cache.set(key, finding);
    if (this.cache.size <= MOST_FINDINGS) return;
    const oldest = this.cache.keys().next();
    if (oldest.done !== true) this.cache.delete(oldest.value);
  }
}

function nameOf({ a, b }: Task): string {
  const motions = [a, b].flatMap(({ motion }) =>
    motion === null ? [] : [{ component: motion.component, motion: motion.motion.id }],
  );
  return findingKey({ between: [a.component.component.id, b.component.component.id], motions });
}
