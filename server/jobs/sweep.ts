// The nightly sweep: what was deleted 30 days ago goes for good, and what nobody reads any more.
import { and, isNotNull, lt, or, sql } from 'drizzle-orm';
import { tables, type Database } from '../db/client';
import { sweepShelf } from '../mail/shelf';
import { pictureKeysOfScenes } from '../pictures/rules';
import type { FileStore } from '../storage/file-store';

const { project, rateLimit, scene, sceneSave, session, verification } = tables;

const DAYS = 24 * 60 * 60 * 1000;
export const KEPT_DAYS = 30;

export async function sweep(db: Database, store: FileStore, now = new Date()): Promise<void> {
  const before = new Date(now.getTime() - KEPT_DAYS * DAYS);
  const gone = await db
    .select({ id: scene.id })
    .from(scene)
    .innerJoin(project, sql`${project.id} = ${scene.projectId}`)
    .where(or(lt(scene.deletedAt, before), lt(project.deletedAt, before)));
  const keys = await pictureKeysOfScenes(
    db,
    gone.map((g) => g.id),
  );
  await db.transaction(async (tx) => {
    await tx.delete(scene).where(and(isNotNull(scene.deletedAt), lt(scene.deletedAt, before)));
    await tx.delete(project).where(and(isNotNull(project.deletedAt), lt(project.deletedAt, before)));
    await tx.delete(sceneSave).where(lt(sceneSave.at, before));
    await tx.delete(session).where(lt(session.expiresAt, now));
    await tx.delete(verification).where(lt(verification.expiresAt, now));
    await tx.delete(rateLimit).where(lt(rateLimit.lastRequest, now.getTime() - DAYS));
    await tx.execute(sql`delete from limit_points where expire is not null and expire < ${now.getTime()}`);
  });
  for (const key of keys) await store.remove(key);
  await sweepShelf(db, before);
}
