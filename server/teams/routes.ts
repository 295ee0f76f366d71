import { and, asc, eq } from 'drizzle-orm';
import type { Router } from 'express';
import {
  changePerson,
  changeTeam,
  createTeam,
  deleteTeam,
  leaveTeam,
  listPeople,
  readTeam,
  removePerson,
} from '#shared/api';
import type { Role } from '#shared/access';
import { tables, type Queryable } from '../db/client';
import { ApiError } from '../http/api-error';
import { mount } from '../http/mount';
import type { Services } from '../http/services';
import { pictureKeysOfTeam } from '../pictures/rules';
import { invitationRoutes } from './invitation-routes';
import { changePeople, removeGuest, removeMember } from './rules';

const { membership, team, user } = tables;

async function describeTeam(db: Queryable, id: string, role: Role) {
  const [row] = await db.select().from(team).where(eq(team.id, id));
  if (row === undefined) throw new ApiError('thing/missing');
  return { id: row.id, name: row.name, role, createdAt: row.createdAt.toISOString() };
}

async function listMembers(db: Queryable, teamId: string, personId?: string) {
  const rows = await db
    .select({ id: user.id, name: user.name, email: user.email, role: membership.role, since: membership.since })
    .from(membership)
    .innerJoin(user, eq(user.id, membership.personId))
    .where(and(eq(membership.teamId, teamId), personId === undefined ? undefined : eq(membership.personId, personId)))
    .orderBy(asc(user.name), asc(user.id));
  return rows.map((r) => ({ ...r, since: r.since.toISOString() }));
}

export function teamRoutes(router: Router, services: Services): void {
  const { db } = services;

  mount(router, services, createTeam, async ({ person, body }) => {
    const id = await db.transaction(async (tx) => {
      const [row] = await tx.insert(team).values({ name: body.name }).returning({ id: team.id });
      await tx.insert(membership).values({ teamId: row!.id, personId: person.id, role: 'owner' });
      return row!.id;
    });
    return describeTeam(db, id, 'owner');
  });

  mount(router, services, readTeam, ({ params, role }) => describeTeam(db, params.teamId, role));

  mount(router, services, changeTeam, async ({ params, body, role }) => {
    await db.update(team).set({ name: body.name }).where(eq(team.id, params.teamId));
    return describeTeam(db, params.teamId, role);
  });

  mount(router, services, deleteTeam, async ({ params, body }) => {
    const pictures = await pictureKeysOfTeam(db, params.teamId);
    const gone = await db
      .delete(team)
      .where(and(eq(team.id, params.teamId), eq(team.name, body.name.trim())))
      .returning({ id: team.id });
    if (gone.length === 0) throw new ApiError('team/name-differs');
    const { store } = services;
    for (const kind of ['meshes', 'displays']) {
      for (const key of await store.keys(`${kind}/${params.teamId}`)) await store.remove(key);
    }
    for (const key of pictures) await store.remove(key);
    return null;
  });

  mount(router, services, leaveTeam, async ({ params, person }) => {
    await changePeople(db, params.teamId, (tx) => removeMember(tx, params.teamId, person.id));
    return null;
  });

  mount(router, services, listPeople, ({ params }) => listMembers(db, params.teamId));

  mount(router, services, changePerson, async ({ params, body }) => {
    await changePeople(db, params.teamId, async (tx) => {
      const changed = await tx
        .update(membership)
        .set({ role: body.role })
        .where(and(eq(membership.teamId, params.teamId), eq(membership.personId, params.personId)))
        .returning({ id: membership.personId });
      if (changed.length === 0) throw new ApiError('thing/missing');
      // one who becomes a guest again later begins without projects
      if (body.role !== 'guest') await removeGuest(tx, params.teamId, params.personId);
    });
    return (await listMembers(db, params.teamId, params.personId))[0]!;
  });

  mount(router, services, removePerson, async ({ params }) => {
    const wasThere = await changePeople(db, params.teamId, (tx) => removeMember(tx, params.teamId, params.personId));
    if (!wasThere) throw new ApiError('thing/missing');
    return null;
  });

  invitationRoutes(router, services);
}
