// The nightly sweep: what was deleted 30 days ago goes for good, and what nobody reads any more.
import { and, inArray, isNotNull, lt, or, sql } from 'drizzle-orm';
import { tables, type Database } from '../db/client';
import { sweepShelf } from '../mail/shelf';
import type { FileStore } from '../storage/file-store';

const { picture, project, revision, scene, sceneSave } = tables;

const DAYS = 24 * 60 * 60 * 1000;
export const KEPT_DAYS = 30;

/** Storage keys of the pictures of scenes. */
async function pictureKeys(db: Database, sceneIds: readonly string[]): Promise<string[]> {
  if (sceneIds.length === 0) return [];
  const rows = await db
    .select({ key: picture.storageKey })
    .from(picture)
    .innerJoin(revision, sql`${revision.id} = ${picture.revisionId}`)
    .where(inArray(revision.sceneId, [...sceneIds]));
  return rows.map((r) => r.key);
}

export async function sweep(db: Database, store: FileStore, now = new Date()): Promise<void> {
  const before = new Date(now.getTime() - KEPT_DAYS * DAYS);
  const gone = await db
    .select({ id: scene.id })
    .from(scene)
    .innerJoin(project, sql`${project.id} = ${scene.projectId}`)
    .where(or(lt(scene.deletedAt, before), lt(project.deletedAt, before)));
  const keys = await pictureKeys(
    db,
    gone.map((g) => g.id),
  );
  await db.transaction(async (tx) => {
    await tx.delete(scene).where(and(isNotNull(scene.deletedAt), lt(scene.deletedAt, before)));
    await tx.delete(project).where(and(isNotNull(project.deletedAt), lt(project.deletedAt, before)));
    await tx.delete(sceneSave).where(lt(sceneSave.at, before));
    await tx.execute(sql`delete from limit_points where expire is not null and expire < ${Date.now()}`);
  });
  for (const key of keys) await store.remove(key);
  await sweepShelf(db, before);
}
