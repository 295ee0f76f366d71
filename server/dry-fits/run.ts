// The job behind "Run dry fit". It may be started over at any point: it only ever moves its row from running to an end.
import { and, eq, inArray, sql } from 'drizzle-orm';
import type { Logger } from 'pino';
import { tables, type Database } from '../db/client';
import { runThread } from '../jobs/thread';
import { meshKey } from '../meshes/rules';
import type { FileStore } from '../storage/file-store';
import type { DryFitJob, DryFitMessage } from './worker';

const { dryFit, project, revision, scene } = tables;

/** How often the row is brought up to date, and looked at for a cancel. */
const BEAT_MS = 300;

interface Parts {
  readonly db: Database;
  readonly store: FileStore;
  readonly log: Logger;
}

async function loadJob({ db, store }: Parts, id: string): Promise<DryFitJob | string> {
  const [row] = await db
    .select({ revision, teamId: project.teamId })
    .from(dryFit)
    .innerJoin(revision, eq(revision.id, dryFit.revisionId))
    .innerJoin(scene, eq(scene.id, revision.sceneId))
    .innerJoin(project, eq(project.id, scene.projectId))
    .where(eq(dryFit.id, id));
  if (row === undefined) return 'its revision is gone';
  const meshes: { sha256: string; bytes: Uint8Array }[] = [];
  for (const sha256 of row.revision.meshes) {
    const bytes = await store.readBytes(meshKey(row.teamId, sha256));
    if (bytes === null) return `the file of the mesh ${sha256.slice(0, 12)} is missing from the storage`;
    meshes.push({ sha256, bytes });
  }
  return { documentText: row.revision.documentText, sha256: row.revision.sha256, meshes };
}

/** Ends a running dry fit; nothing happens if it was cancelled meanwhile. */
async function end(db: Database, id: string, fields: Partial<typeof dryFit.$inferInsert>): Promise<void> {
  await db
    .update(dryFit)
    .set({ ...fields, endedAt: new Date() })
    .where(and(eq(dryFit.id, id), eq(dryFit.state, 'running')));
}

/**
 * Ends the dry fits that no server will take up any more: their job is gone, or was begun as often as it may and brought the
 * server down each time. Otherwise one of them would stand there as running for ever.
 */
export async function endForsakenDryFits(db: Database): Promise<void> {
  await db.execute(sql`
    update dry_fit set state = 'failed', ended_at = now(),
      problem = 'The dry fit was begun several times and came to no end. If it does so again, tell whoever runs the server.'
    where state in ('queued', 'running') and not exists (
      select from graphile_worker.jobs j
      where j.key = 'dry-fit-' || dry_fit.id and (j.attempts < j.max_attempts or j.locked_at is not null))`);
}

/** Carries out one dry fit. Throws only if the server stops in the middle; then the queue gives it out again. */
export async function runDryFitJob(parts: Parts, id: string, signal: AbortSignal): Promise<void> {
  const { db, log } = parts;
  const [taken] = await db
    .update(dryFit)
    .set({ state: 'running', done: 0, total: 0 })
    .where(and(eq(dryFit.id, id), inArray(dryFit.state, ['queued', 'running'])))
    .returning({ id: dryFit.id });
  if (taken === undefined) return;
  const job = await loadJob(parts, id);
  if (typeof job === 'string') return end(db, id, { state: 'failed', problem: `The dry fit could not begin: ${job}.` });

  const cancelled = new AbortController();
  let progress = { done: 0, total: 0 };
  const beat = setInterval(() => {
    db.update(dryFit)
      .set(progress)
      .where(and(eq(dryFit.id, id), eq(dryFit.state, 'running')))
      .returning({ id: dryFit.id })
      .then(
        (rows) => {
          if (rows.length === 0) cancelled.abort();
        },
        (error: unknown) => log.warn({ err: error }, 'progress was not stored'),
      );
  }, BEAT_MS);
  try {
    const answer = (await runThread('dry-fit-worker', {
      data: job,
      memory: 4096,
      signal: AbortSignal.any([signal, cancelled.signal]),
      isAnswer: (m) => (m as DryFitMessage).kind !== 'progress',
      onMessage: (m) => {
        const { done, total } = m as Extract<DryFitMessage, { kind: 'progress' }>;
        progress = { done, total };
      },
    })) as DryFitMessage;
    clearInterval(beat);
    if (answer.kind === 'done') {
      const { report } = answer;
      const count = report.findings.length;
      await end(db, id, { state: 'done', report, totals: { ...report.totals }, done: count, total: count });
    } else if (answer.kind === 'refused') {
      await end(db, id, { state: 'failed', problem: `The revision cannot be checked: ${answer.reason}.` });
    }
  } catch (error) {
    clearInterval(beat);
    if (signal.aborted) {
      // it waits again until a server takes it up
      await db
        .update(dryFit)
        .set({ state: 'queued', done: 0, total: 0 })
        .where(and(eq(dryFit.id, id), eq(dryFit.state, 'running')));
      throw error;
    }
    if (cancelled.signal.aborted) return;
    log.error({ err: error, dryFit: id }, 'a dry fit failed');
    const problem = /memory/i.test(String(error))
      ? 'The dry fit ran out of memory: the meshes are too large for this server.'
      : 'The dry fit failed on the server. Run it again; if it fails again, tell whoever runs the server.';
    await end(db, id, { state: 'failed', problem });
  } finally {
    clearInterval(beat);
  }
}
