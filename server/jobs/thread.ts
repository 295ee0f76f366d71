// Worker threads: compiled files beside the server's own, one job each.
import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';

/** Where a compiled thread lies: beside the compiled server, or, for tests that run the sources, in dist/server. */
export function threadFile(name: string): string {
  const here = path.dirname(fileURLToPath(import.meta.url));
  const beside = path.join(here, `${name}.js`);
  for (const candidate of [beside, path.join(here, `../${name}.js`), path.join(here, `../../dist/server/${name}.js`)]) {
    if (existsSync(candidate)) return candidate;
  }
  throw new Error(`the worker thread ${name} is not built: run npm run build`);
}

export interface ThreadOptions {
  readonly data: unknown;
  /** Memory that the thread may take, MB. */
  readonly memory: number;
  readonly signal?: AbortSignal | undefined;
  /** Messages on the way to the answer. */
  readonly onMessage?: (message: unknown) => void;
  /** Tells which message is the answer; the first one if left out. */
  readonly isAnswer?: (message: unknown) => boolean;
}

/** Runs a thread to its answer. Rejects if it fails, runs out of memory or is aborted. */
export function runThread(name: string, options: ThreadOptions): Promise<unknown> {
  return new Promise((resolve, reject) => {
    if (options.signal?.aborted === true) return reject(new Error('aborted'));
    const worker = new Worker(threadFile(name), {
      workerData: options.data,
      resourceLimits: { maxOldGenerationSizeMb: options.memory },
    });
    const abort = (): void => {
      void worker.terminate();
      reject(new Error('aborted'));
    };
    options.signal?.addEventListener('abort', abort, { once: true });
    worker.on('message', (message: unknown) => {
      if (options.isAnswer === undefined || options.isAnswer(message)) {
        resolve(message);
        void worker.terminate();
      } else options.onMessage?.(message);
    });
    worker.on('error', reject);
    worker.on('exit', () => {
      options.signal?.removeEventListener('abort', abort);
      reject(new Error('the thread ended without an answer'));
    });
  });
}
