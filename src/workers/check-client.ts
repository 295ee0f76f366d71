// The page's end of the check worker: gives it the newest document, drops late answers, starts it again when it dies or
// hangs.
import { createStore, type StoreApi } from 'zustand';
import type { Scene } from '#shared/scene';
import { NOTHING_CHECKED, type CheckAnswer, type CheckOrder, type LiveCheck } from './live-check';

/** As much of a Worker as is used. */
export interface CheckWorker {
  onmessage: ((event: MessageEvent<CheckAnswer>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  onmessageerror: ((event: MessageEvent) => void) | null;
  readonly postMessage: (order: CheckOrder) => void;
  readonly terminate: () => void;
}

export function spawnCheckWorker(): CheckWorker {
  return new Worker(new URL('./check-worker.ts', import.meta.url), { type: 'module', name: 'check' });
}

/** Silence that counts as hanging, ms. One comparison of two motions over large meshes may take a while. */
const SILENCE = 90_000;
const MOST_RESTARTS = 2;

export class CheckClient {
  readonly live: StoreApi<LiveCheck> = createStore<LiveCheck>()(() => NOTHING_CHECKED);
  private worker: CheckWorker | null = null;
  private version = 0;
  /** Answers to orders before this one are late. */
  private firstWelcome = 0;
  private latest: Scene | null = null;
  private wasPreview = false;
  /** The newest document of a gesture, while the worker has not answered to the one before. */
  private waiting: Scene | null = null;
  private isUnanswered = false;
  private restarts = 0;
  private watch: ReturnType<typeof setTimeout> | undefined;

  constructor(
    private readonly teamId: string,
    private readonly spawn: () => CheckWorker = spawnCheckWorker,
  ) {}

  /** Shows the worker the document as it is on the screen. `isPreview`: a hand is moving something. */
  show(scene: Scene, isPreview: boolean): void {
    if (scene === this.latest && isPreview === this.wasPreview) return;
    const isSameGesture = isPreview && this.wasPreview;
    this.latest = scene;
    this.wasPreview = isPreview;
    if (isSameGesture) {
      // a gesture's answers all come in, in order; else none would ever be new enough to be shown
      if (this.isUnanswered) this.waiting = scene;
      else this.send(scene);
      return;
    }
    this.restarts = 0;
    this.firstWelcome = this.version + 1;
    this.live.setState({ phase: 'checking' });
    this.send(scene);
  }

  stop(): void {
    clearTimeout(this.watch);
    this.worker?.terminate();
    this.worker = null;
    this.latest = null;
  }

  private send(scene: Scene): void {
    this.waiting = null;
    this.version += 1;
    this.isUnanswered = true;
    this.worker ??= this.start();
    this.worker.postMessage({ version: this.version, teamId: this.teamId, scene, isPreview: this.wasPreview });
    this.expectWord();
  }

  private start(): CheckWorker {
    const worker = this.spawn();
    worker.onmessage = ({ data }) => {
      if (worker === this.worker) this.hear(data);
    };
    const fail = (event: Event): void => {
      event.preventDefault();
      if (worker === this.worker) this.restart();
    };
    worker.onerror = fail;
    worker.onmessageerror = fail;
    return worker;
  }

  private hear({ version, check }: CheckAnswer): void {
    if (version < this.firstWelcome) {
      this.expectWord();
      return;
    }
    this.live.setState(check, true);
    if (version === this.version) {
      this.isUnanswered = false;
      // to come this far is a sign of health
      if (check.phase === 'done') this.restarts = 0;
      if (this.waiting !== null) {
        this.send(this.waiting);
        return;
      }
    }
    const isAtWork = check.phase === 'checking' || check.done < check.total;
    // done, or waiting for files
    if (version === this.version && !isAtWork) clearTimeout(this.watch);
    else this.expectWord();
  }

  private expectWord(): void {
    clearTimeout(this.watch);
    this.watch = setTimeout(() => this.restart(), SILENCE);
  }

  private restart(): void {
    clearTimeout(this.watch);
    this.worker?.terminate();
    this.worker = null;
    if (this.latest === null) return;
    if (this.restarts >= MOST_RESTARTS) {
      this.isUnanswered = false;
      this.live.setState({
        phase: 'failed',
        problem: 'The live check stops at this scene. Change something, or run a dry fit: the server checks it too.',
      });
      return;
    }
    this.restarts += 1;
    this.send(this.latest);
  }
}
