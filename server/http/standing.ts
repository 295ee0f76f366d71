// What a person is to a thing: found with one query, from the thing up to its team.
import { and, arrayContains, eq, isNotNull, or, sql } from 'drizzle-orm';
import type { Standing } from '#shared/access';
import type { ThingKind } from '#shared/api';
import { tables, type Queryable } from '../db/client';

const { dryFit, membership, mesh, picture, project, projectGuest, revision, scene, share } = tables;

/** The team, and the project if there is one, that a thing belongs to. */
interface Home {
  readonly teamId: string;
  readonly projectId: string | null;
}

type Params = Readonly<Record<string, string>>;

async function homeOf(db: Queryable, kind: ThingKind, id: string, params: Params): Promise<Home | undefined> {
  const fields = { teamId: project.teamId, projectId: project.id };
  switch (kind) {
    case 'team':
      return { teamId: id, projectId: null };
    case 'project':
      return (await db.select(fields).from(project).where(eq(project.id, id)))[0];
    case 'scene':
      return (
        await db.select(fields).from(scene).innerJoin(project, eq(project.id, scene.projectId)).where(eq(scene.id, id))
      )[0];
    case 'mesh':
      return (
        await db
          .select({ teamId: mesh.teamId, projectId: sql<null>`null` })
          .from(mesh)
          .where(and(eq(mesh.teamId, params['teamId'] ?? ''), eq(mesh.sha256, id)))
      )[0];
    case 'dry-fit':
      return (
        await db
          .select(fields)
          .from(dryFit)
          .innerJoin(scene, eq(scene.id, dryFit.sceneId))
          .innerJoin(project, eq(project.id, scene.projectId))
          .where(eq(dryFit.id, id))
      )[0];
    case 'revision':
      return (
        await db
          .select(fields)
          .from(revision)
          .innerJoin(scene, eq(scene.id, revision.sceneId))
          .innerJoin(project, eq(project.id, scene.projectId))
          .where(eq(revision.id, id))
      )[0];
    case 'picture':
      return (
        await db
          .select(fields)
          .from(picture)
          .innerJoin(revision, eq(revision.id, picture.revisionId))
          .innerJoin(scene, eq(scene.id, revision.sceneId))
          .innerJoin(project, eq(project.id, scene.projectId))
          .where(eq(picture.id, id))
      )[0];
    case 'share':
      return (
        await db
          .select(fields)
          .from(share)
          .innerJoin(revision, eq(revision.id, share.revisionId))
          .innerJoin(scene, eq(scene.id, revision.sceneId))
          .innerJoin(project, eq(project.id, scene.projectId))
          .where(eq(share.id, id))
      )[0];
  }
}

/** Whether a guest was added to the project, or, for a mesh, to a project whose scenes or revisions use it. */
async function isAdded(db: Queryable, personId: string, kind: ThingKind, home: Home, id: string): Promise<boolean> {
  if (kind === 'mesh') {
    const rows = await db
      .select({ one: sql`1` })
      .from(projectGuest)
      .innerJoin(project, and(eq(project.id, projectGuest.projectId), eq(project.teamId, home.teamId)))
      .innerJoin(scene, eq(scene.projectId, project.id))
      .leftJoin(revision, and(eq(revision.sceneId, scene.id), arrayContains(revision.meshes, [id])))
      .where(and(eq(projectGuest.personId, personId), or(arrayContains(scene.meshes, [id]), isNotNull(revision.id))))
      .limit(1);
    return rows.length > 0;
  }
  if (home.projectId === null) return false;
  const rows = await db
    .select({ one: sql`1` })
    .from(projectGuest)
    .where(and(eq(projectGuest.personId, personId), eq(projectGuest.projectId, home.projectId)));
  return rows.length > 0;
}

const STRANGER: Standing = { role: null, addedToProject: false };

/** The standing of a person towards the thing that a request names; a stranger's if there is no such thing. */
export async function findStanding(
  db: Queryable,
  personId: string,
  kind: ThingKind,
  id: string,
  params: Params,
): Promise<Standing> {
  const home = await homeOf(db, kind, id, params);
  if (home === undefined) return STRANGER;
  const [row] = await db
    .select({ role: membership.role })
    .from(membership)
    .where(and(eq(membership.teamId, home.teamId), eq(membership.personId, personId)));
  if (row === undefined) return STRANGER;
  const addedToProject = row.role === 'guest' && (await isAdded(db, personId, kind, home, id));
  return { role: row.role, addedToProject };
}
