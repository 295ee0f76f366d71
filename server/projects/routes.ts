import { and, desc, eq, sql } from 'drizzle-orm';
import type { Router } from 'express';
import {
  changeProject,
  createProject,
  deleteProject,
  listActivity,
  listGuests,
  listProjects,
  readProject,
  restoreProject,
  setGuest,
} from '#shared/api';
import type { Role } from '#shared/access';
import { tables, type Queryable } from '../db/client';
import { ApiError } from '../http/api-error';
import { mount } from '../http/mount';
import type { Services } from '../http/services';
import { noteActivity } from './rules';
import { describeProject, listProjectLines } from './queries';

const { activity, membership, project, projectGuest, user } = tables;

async function findProject(db: Queryable, id: string, role: Role) {
  const [row] = await db.select().from(project).where(eq(project.id, id));
  if (row === undefined) throw new ApiError('thing/missing');
  if (row.deletedAt !== null) throw new ApiError('project/deleted');
  return describeProject(row, role);
}

/** Cursors of lists that are read page by page. */
function offsetOf(after: string | undefined): number {
  const offset = after === undefined ? 0 : Number(after);
  if (!Number.isInteger(offset) || offset < 0 || offset > 1_000_000) throw new ApiError('request/invalid');
  return offset;
}

export function projectRoutes(router: Router, services: Services): void {
  const { db } = services;

  mount(router, services, listProjects, async ({ params, query, person, role }) => {
    const offset = offsetOf(query.after);
    const lines = await listProjectLines(db, {
      ...query,
      teamId: params.teamId,
      personId: person.id,
      role,
      limit: query.limit + 1,
      offset,
    });
    const more = lines.length > query.limit;
    return { projects: lines.slice(0, query.limit), after: more ? String(offset + query.limit) : null };
  });

  mount(router, services, createProject, async ({ params, body, person, role }) => {
    const row = await db.transaction(async (tx) => {
      const [made] = await tx
        .insert(project)
        .values({ teamId: params.teamId, ...body })
        .returning();
      await noteActivity(tx, made!.id, person.id, 'made the project');
      return made!;
    });
    return describeProject(row, role);
  });

  mount(router, services, readProject, ({ params, role }) => findProject(db, params.projectId, role));

  mount(router, services, changeProject, async ({ params, body, person, role }) => {
    await findProject(db, params.projectId, role);
    const { notOnThisCar, ...rest } = body;
    await db.transaction(async (tx) => {
      await tx
        .update(project)
        .set({
          ...rest,
          ...(notOnThisCar === undefined ? {} : { notOnThisCar: [...new Set(notOnThisCar)] }),
          updatedAt: new Date(),
        })
        .where(eq(project.id, params.projectId));
      const what =
        body.archived === undefined
          ? notOnThisCar === undefined
            ? 'changed the project'
            : 'answered the roll-call'
          : body.archived
            ? 'archived the project'
            : 'took the project out of the archive';
      await noteActivity(tx, params.projectId, person.id, what);
    });
    return findProject(db, params.projectId, role);
  });

  mount(router, services, deleteProject, async ({ params, person }) => {
    await db.transaction(async (tx) => {
      await tx
        .update(project)
        .set({ deletedAt: sql`coalesce(${project.deletedAt}, now())` })
        .where(eq(project.id, params.projectId));
      await noteActivity(tx, params.projectId, person.id, 'deleted the project');
    });
    return null;
  });

  mount(router, services, restoreProject, async ({ params, person, role }) => {
    await db.transaction(async (tx) => {
      await tx.update(project).set({ deletedAt: null }).where(eq(project.id, params.projectId));
      await noteActivity(tx, params.projectId, person.id, 'brought the project back');
    });
    return findProject(db, params.projectId, role);
  });

  mount(router, services, listGuests, async ({ params }) => {
    return db
      .select({
        id: user.id,
        name: user.name,
        email: user.email,
        added: sql<boolean>`${projectGuest.personId} is not null`,
      })
      .from(project)
      .innerJoin(membership, and(eq(membership.teamId, project.teamId), eq(membership.role, 'guest')))
      .innerJoin(user, eq(user.id, membership.personId))
      .leftJoin(projectGuest, and(eq(projectGuest.projectId, project.id), eq(projectGuest.personId, user.id)))
      .where(eq(project.id, params.projectId))
      .orderBy(user.name, user.id);
  });

  mount(router, services, setGuest, async ({ params, body }) => {
    const [guest] = await db
      .select({ role: membership.role })
      .from(project)
      .innerJoin(membership, eq(membership.teamId, project.teamId))
      .where(and(eq(project.id, params.projectId), eq(membership.personId, params.personId)));
    if (guest === undefined) throw new ApiError('thing/missing');
    if (guest.role !== 'guest') throw new ApiError('person/not-guest');
    const row = { projectId: params.projectId, personId: params.personId };
    if (body.added) await db.insert(projectGuest).values(row).onConflictDoNothing();
    else {
      await db
        .delete(projectGuest)
        .where(and(eq(projectGuest.projectId, row.projectId), eq(projectGuest.personId, row.personId)));
    }
    return null;
  });

  mount(router, services, listActivity, async ({ params, query }) => {
    const offset = offsetOf(query.after);
    const rows = await db
      .select({ id: activity.id, who: user.name, what: activity.what, at: activity.at })
      .from(activity)
      .leftJoin(user, eq(user.id, activity.personId))
      .where(eq(activity.projectId, params.projectId))
      .orderBy(desc(activity.at), desc(activity.id))
      .limit(query.limit + 1)
      .offset(offset);
    const entries = rows
      .slice(0, query.limit)
      .map((r) => ({ id: r.id, who: r.who ?? 'somebody who has left', what: r.what, at: r.at.toISOString() }));
    return { entries, after: rows.length > query.limit ? String(offset + query.limit) : null };
  });
}
