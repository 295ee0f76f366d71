// Jobs: a queue in PostgreSQL (graphile-worker), so that any server may do them and none is lost with the server that took it.
import { hostname } from 'node:os';
import { and, eq, inArray, lt, or, sql } from 'drizzle-orm';
import { EventEmitter } from 'node:events';
import {
  Logger as QueueLogger,
  makeWorkerUtils,
  run,
  type Runner,
  type TaskList,
  type WorkerEvents,
} from 'graphile-worker';
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import { tables, type Database, type Queryable } from '../db/client';
import { isAlive } from './processes';

const { workerSeen } = tables;

export interface JobNames {
  'dry-fit': { readonly dryFitId: string };
  sweep: Readonly<Record<string, never>>;
}
export type JobName = keyof JobNames;

/** `signal` is aborted when the server stops; the job is then done again elsewhere. */
export type JobHandlers = { readonly [N in JobName]: (payload: JobNames[N], signal: AbortSignal) => Promise<void> };

export interface Jobs {
  /** Puts a job in the queue, inside the caller's transaction if it has one. */
  readonly add: <N extends JobName>(
    tx: Queryable,
    name: N,
    payload: JobNames[N],
    options?: { readonly key?: string },
  ) => Promise<void>;
}

export const jobs: Jobs = {
  async add(tx, name, payload, options = {}) {
    await tx.execute(
      sql`select graphile_worker.add_job(${name}::text, ${JSON.stringify(payload)}::json, job_key => ${options.key ?? null}::text, max_attempts => 5)`,
    );
  },
};

/** A worker that was not seen for this long is dead. */
const DEAD_AFTER_MS = 60_000;
const BEAT_MS = 15_000;

export interface JobRunner {
  readonly stop: () => Promise<void>;
}

interface RunnerOptions {
  readonly db: Database;
  readonly pool: Pool;
  readonly concurrency: number;
  readonly handlers: JobHandlers;
  /** Called after the jobs of dead workers were given back: for what no job will end any more. */
  readonly onFreed?: () => Promise<void>;
  readonly log: Logger;
}

/** Gives the jobs of dead workers back: at once for those of this machine whose process is gone, else after a minute. */
async function freeDeadWorkers(options: RunnerOptions, unlock: (ids: string[]) => Promise<void>): Promise<void> {
  const { db } = options;
  const here = await db.select().from(workerSeen).where(eq(workerSeen.host, hostname()));
  // a container that starts again has its old name and number: what was seen before this process began is not its own
  const began = new Date(Date.now() - process.uptime() * 1000);
  const isGone = (w: (typeof here)[number]): boolean => (w.pid === process.pid ? w.seenAt < began : !isAlive(w.pid));
  const gone = here.filter(isGone).map((w) => w.workerId);
  const dead = await db
    .select({ id: workerSeen.workerId })
    .from(workerSeen)
    .where(
      or(
        lt(workerSeen.seenAt, new Date(Date.now() - DEAD_AFTER_MS)),
        gone.length > 0 ? inArray(workerSeen.workerId, gone) : undefined,
      ),
    );
  // one that was killed before its first sign of life
  const unknown = await db.execute<{ id: string }>(sql`
    select distinct locked_by as id from graphile_worker.jobs j
    where locked_at < now() - make_interval(secs => ${DEAD_AFTER_MS / 1000})
      and not exists (select from worker_seen w where w.worker_id = j.locked_by)`);
  const ids = [...dead, ...unknown.rows].map((w) => w.id);
  if (ids.length === 0) return;
  await unlock(ids);
  await db.delete(workerSeen).where(inArray(workerSeen.workerId, ids));
  options.log.warn({ workers: ids.length }, 'jobs of dead workers were given back');
}

/** Starts working on jobs. */
export async function startJobs(options: RunnerOptions): Promise<JobRunner> {
  const { db, pool, handlers, log } = options;
  // its lines go where all others go; faults come with the events below
  const logger = new QueueLogger(() => (level, message) => {
    if (['error', 'warning'].includes(level)) log.warn({ level }, message);
    else log.debug({ level }, message);
  });
  const utils = await makeWorkerUtils({ pgPool: pool, logger });
  const free = async (): Promise<void> => {
    await freeDeadWorkers(options, (ids) => utils.forceUnlockWorkers(ids));
    await options.onFreed?.();
  };
  await free();
  const stopping = new AbortController();
  const taskList: TaskList = Object.fromEntries(
    Object.entries(handlers).map(([name, handler]) => [
      name,
      (payload: unknown) => (handler as (p: unknown, s: AbortSignal) => Promise<void>)(payload, stopping.signal),
    ]),
  );
  const events = new EventEmitter() as WorkerEvents;
  const workers = new Set<string>();
  const beat = async (): Promise<void> => {
    for (const workerId of workers) {
      await db
        .insert(workerSeen)
        .values({ workerId, host: hostname(), pid: process.pid, seenAt: new Date() })
        .onConflictDoUpdate({ target: workerSeen.workerId, set: { seenAt: new Date() } });
    }
  };
  const quietly = (work: Promise<void>): void => {
    work.catch((error: unknown) => log.error({ err: error }, 'worker housekeeping failed'));
  };
  // jobs are locked under the pool's name, not under those of its workers
  events.on('pool:create', ({ workerPool }) => {
    workers.add(workerPool.id);
    quietly(beat());
  });
  events.on('job:error', ({ job, error }) => log.warn({ job: job.task_identifier, err: error }, 'a job failed'));
  const runner: Runner = await run({
    pgPool: pool,
    logger,
    concurrency: options.concurrency,
    taskList,
    events,
    noHandleSignals: true,
    pollInterval: 1000,
    crontab: '17 3 * * * sweep',
  });
  const beats = setInterval(() => quietly(beat()), BEAT_MS);
  const frees = setInterval(() => quietly(free()), DEAD_AFTER_MS);
  return {
    async stop() {
      clearInterval(beats);
      clearInterval(frees);
      stopping.abort();
      await runner.stop();
      if (workers.size > 0) {
        await db
          .delete(workerSeen)
          .where(and(inArray(workerSeen.workerId, [...workers]), eq(workerSeen.pid, process.pid)));
      }
      await utils.release();
    },
  };
}
