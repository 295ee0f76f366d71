// Dry fits and revisions: how one is asked for, and how others see them.
import { and, desc, eq, inArray, sql } from 'drizzle-orm';
import type { DryFit, Picture } from '#shared/api';
import { tables, type Queryable, type Transaction } from '../db/client';
import { ApiError } from '../http/api-error';
import type { Jobs } from '../jobs/jobs';
import { noteActivity } from '../projects/rules';
import { freeze } from '../scenes/rules';

const { dryFit, picture, project, revision, scene, user } = tables;

const LEFT = 'somebody who has left';

/** Freezes the scene as it was seen and puts its dry fit in the queue; gives the dry fit's id. */
export async function askForDryFit(
  tx: Transaction,
  jobs: Jobs,
  seen: { readonly sceneId: string; readonly saveNumber: number },
  personId: string,
): Promise<string> {
  const frozen = await freeze(tx, seen.sceneId, seen.saveNumber, personId);
  if (frozen.scene.components.length < 2) throw new ApiError('scene/empty');
  const [waiting] = await tx
    .select({ id: dryFit.id })
    .from(dryFit)
    .where(and(eq(dryFit.revisionId, frozen.revisionId), inArray(dryFit.state, ['queued', 'running'])))
    .limit(1);
  // pressed twice: the one under way is the answer to both
  if (waiting !== undefined) return waiting.id;
  const [made] = await tx
    .insert(dryFit)
    .values({
      sceneId: seen.sceneId,
      revisionId: frozen.revisionId,
      startedBy: personId,
      // the latest counts, and several may be asked for in one transaction
      createdAt: sql`clock_timestamp()`,
    })
    .returning({ id: dryFit.id });
  await jobs.add(tx, 'dry-fit', { dryFitId: made!.id }, { key: `dry-fit-${made!.id}` });
  await noteActivity(
    tx,
    frozen.row.projectId,
    personId,
    `ran a dry fit of “${frozen.row.name}”, revision ${frozen.number}`,
  );
  return made!.id;
}

async function selectDryFits(db: Queryable, where: ReturnType<typeof eq>, limit: number): Promise<DryFit[]> {
  const rows = await db
    .select({
      id: dryFit.id,
      sceneId: dryFit.sceneId,
      revisionId: dryFit.revisionId,
      number: revision.number,
      state: dryFit.state,
      done: dryFit.done,
      total: dryFit.total,
      problem: dryFit.problem,
      totals: dryFit.totals,
      startedBy: user.name,
      createdAt: dryFit.createdAt,
      endedAt: dryFit.endedAt,
    })
    .from(dryFit)
    .innerJoin(revision, eq(revision.id, dryFit.revisionId))
    .leftJoin(user, eq(user.id, dryFit.startedBy))
    .where(where)
    .orderBy(desc(dryFit.createdAt))
    .limit(limit);
  return rows.map((r) => ({
    ...r,
    startedBy: r.startedBy ?? LEFT,
    createdAt: r.createdAt.toISOString(),
    endedAt: r.endedAt?.toISOString() ?? null,
  }));
}

export function listDryFitsOf(db: Queryable, sceneId: string): Promise<DryFit[]> {
  return selectDryFits(db, eq(dryFit.sceneId, sceneId), 200);
}

export async function findDryFit(db: Queryable, id: string): Promise<DryFit> {
  const [found] = await selectDryFits(db, eq(dryFit.id, id), 1);
  if (found === undefined) throw new ApiError('thing/missing');
  return found;
}

/** The dry fit that counts for a revision: its latest finished one, else its latest. */
async function dryFitOf(db: Queryable, revisionId: string): Promise<{ dryFit: DryFit; report: unknown } | null> {
  const [row] = await db
    .select({ id: dryFit.id, report: dryFit.report })
    .from(dryFit)
    .where(eq(dryFit.revisionId, revisionId))
    .orderBy(sql`(${dryFit.state} = 'done') desc`, desc(dryFit.createdAt))
    .limit(1);
  return row === undefined ? null : { dryFit: await findDryFit(db, row.id), report: row.report };
}

export function describePicture(row: typeof picture.$inferSelect, takenBy: string | null): Picture {
  const { storageKey: _key, ...rest } = row;
  return { ...rest, takenBy: takenBy ?? LEFT, createdAt: row.createdAt.toISOString() };
}

export async function listPictures(db: Queryable, revisionId: string): Promise<Picture[]> {
  const rows = await db
    .select({ picture, by: user.name })
    .from(picture)
    .leftJoin(user, eq(user.id, picture.takenBy))
    .where(eq(picture.revisionId, revisionId))
    .orderBy(desc(picture.createdAt));
  return rows.map((r) => describePicture(r.picture, r.by));
}

export async function findPicture(db: Queryable, id: string): Promise<typeof picture.$inferSelect> {
  const [row] = await db.select().from(picture).where(eq(picture.id, id));
  if (row === undefined) throw new ApiError('thing/missing');
  return row;
}

/** A revision with its document, the report that counts, and its pictures. */
export async function findRevision(db: Queryable, id: string) {
  const [row] = await db
    .select({ revision, project, sceneName: scene.name, sceneDeletedAt: scene.deletedAt, madeBy: user.name })
    .from(revision)
    .innerJoin(scene, eq(scene.id, revision.sceneId))
    .innerJoin(project, eq(project.id, scene.projectId))
    .leftJoin(user, eq(user.id, revision.madeBy))
    .where(and(eq(revision.id, id)));
  if (row === undefined) throw new ApiError('thing/missing');
  const counted = await dryFitOf(db, id);
  return { ...row, madeBy: row.madeBy ?? LEFT, dryFit: counted?.dryFit ?? null, report: counted?.report ?? null };
}
