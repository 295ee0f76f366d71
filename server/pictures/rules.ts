// What is kept about pictures, for other resources too.
import { eq, inArray } from 'drizzle-orm';
import { tables, type Queryable } from '../db/client';

const { picture, project, revision, scene } = tables;

/** Storage keys of the pictures of scenes. */
export async function pictureKeysOfScenes(db: Queryable, sceneIds: readonly string[]): Promise<string[]> {
  if (sceneIds.length === 0) return [];
  const rows = await db
    .select({ key: picture.storageKey })
    .from(picture)
    .innerJoin(revision, eq(revision.id, picture.revisionId))
    .where(inArray(revision.sceneId, [...sceneIds]));
  return rows.map((r) => r.key);
}

/** Storage keys of all pictures of a team. */
export async function pictureKeysOfTeam(db: Queryable, teamId: string): Promise<string[]> {
  const scenes = await db
    .select({ id: scene.id })
    .from(scene)
    .innerJoin(project, eq(project.id, scene.projectId))
    .where(eq(project.teamId, teamId));
  return pictureKeysOfScenes(
    db,
    scenes.map((s) => s.id),
  );
}
