import { and, desc, eq, gt, inArray, sql } from 'drizzle-orm';
import type { Router } from 'express';
import {
  acceptInvitation,
  declineInvitation,
  invite,
  listInvitations,
  readInvitation,
  resendInvitation,
  withdrawInvitation,
} from '#shared/api';
import type { Person } from '../auth/auth';
import { tables, type Queryable } from '../db/client';
import { ApiError } from '../http/api-error';
import { mount } from '../http/mount';
import type { Services } from '../http/services';
import { addMember, changePeople } from './rules';

const { invitation, membership, project, projectGuest, team, user } = tables;

const DAYS = 24 * 60 * 60 * 1000;
const lastsUntil = (): Date => new Date(Date.now() + 14 * DAYS);

async function describe(db: Queryable, teamId: string, id?: string) {
  const rows = await db
    .select({ invitation, invitedBy: user.name })
    .from(invitation)
    .leftJoin(user, eq(user.id, invitation.invitedBy))
    .where(
      and(
        eq(invitation.teamId, teamId),
        eq(invitation.state, 'open'),
        gt(invitation.expiresAt, new Date()),
        id === undefined ? undefined : eq(invitation.id, id),
      ),
    )
    .orderBy(desc(invitation.createdAt));
  return rows.map(({ invitation: i, invitedBy }) => ({
    id: i.id,
    email: i.email,
    role: i.role,
    projects: i.projects,
    invitedBy: invitedBy ?? 'somebody who has left',
    createdAt: i.createdAt.toISOString(),
    expiresAt: i.expiresAt.toISOString(),
  }));
}

/** The open invitation behind a secret id, if it went to the person's own, verified address. */
async function invitationFor(db: Queryable, id: string, person: Person) {
  const [row] = await db
    .select({ invitation, team: team.name, invitedBy: user.name })
    .from(invitation)
    .innerJoin(team, eq(team.id, invitation.teamId))
    .leftJoin(user, eq(user.id, invitation.invitedBy))
    .where(eq(invitation.id, id));
  if (row === undefined) throw new ApiError('thing/missing');
  if (!person.emailVerified || row.invitation.email !== person.email.toLowerCase()) {
    throw new ApiError('invitation/other-address');
  }
  if (row.invitation.state !== 'open' || row.invitation.expiresAt < new Date()) throw new ApiError('invitation/ended');
  return row;
}

export function invitationRoutes(router: Router, services: Services): void {
  const { db, mailer, limits, config } = services;

  const send = async (teamId: string, id: string, email: string, role: string, invitedBy: string): Promise<void> => {
    const [row] = await db.select({ name: team.name }).from(team).where(eq(team.id, teamId));
    const url = `${config.baseUrl}/invitation/${id}`;
    await mailer.sendInvitation(email, { team: row?.name ?? '', invitedBy, role, url });
  };

  mount(router, services, listInvitations, ({ params }) => describe(db, params.teamId));

  mount(router, services, invite, async ({ params, body, person }) => {
    const email = body.email.toLowerCase();
    const { teamId } = params;
    // before anything is stored: one who is told to wait has not invited anybody yet
    await limits.use('invite', person.id);
    await limits.use('mailTo', email);
    const [member] = await db
      .select({ id: user.id })
      .from(membership)
      .innerJoin(user, eq(user.id, membership.personId))
      .where(and(eq(membership.teamId, teamId), sql`lower(${user.email}) = ${email}`));
    if (member !== undefined) throw new ApiError('person/already-member');
    const projects =
      body.projects.length === 0
        ? []
        : await db
            .select({ id: project.id })
            .from(project)
            .where(and(eq(project.teamId, teamId), inArray(project.id, body.projects)));
    const id = await db.transaction(async (tx) => {
      // two clicks at once must not send two invitations
      await tx.execute(sql`select 1 from team where id = ${teamId} for update`);
      const [open] = await tx
        .select({ id: invitation.id })
        .from(invitation)
        .where(
          and(
            eq(invitation.teamId, teamId),
            eq(invitation.email, email),
            eq(invitation.state, 'open'),
            gt(invitation.expiresAt, new Date()),
          ),
        );
      if (open !== undefined) throw new ApiError('invitation/pending');
      const [row] = await tx
        .insert(invitation)
        .values({
          teamId,
          email,
          role: body.role,
          projects: projects.map((p) => p.id),
          invitedBy: person.id,
          expiresAt: lastsUntil(),
        })
        .returning({ id: invitation.id });
      return row!.id;
    });
    try {
      await send(teamId, id, email, body.role, person.name);
    } catch (error) {
      // an invitation that nobody was told of would only stand in the way of the next try
      await db.delete(invitation).where(eq(invitation.id, id));
      throw error;
    }
    return (await describe(db, teamId, id))[0]!;
  });

  mount(router, services, resendInvitation, async ({ params, person }) => {
    const [known] = await db
      .select({ email: invitation.email })
      .from(invitation)
      .where(and(eq(invitation.teamId, params.teamId), eq(invitation.id, params.invitationId)));
    if (known === undefined) throw new ApiError('thing/missing');
    await limits.use('invite', person.id);
    await limits.use('mailTo', known.email);
    const [row] = await db
      .update(invitation)
      .set({ expiresAt: lastsUntil() })
      .where(
        and(eq(invitation.teamId, params.teamId), eq(invitation.id, params.invitationId), eq(invitation.state, 'open')),
      )
      .returning();
    if (row === undefined) throw new ApiError('invitation/ended');
    await send(params.teamId, row.id, row.email, row.role, person.name);
    return (await describe(db, params.teamId, row.id))[0]!;
  });

  mount(router, services, withdrawInvitation, async ({ params }) => {
    const gone = await db
      .update(invitation)
      .set({ state: 'withdrawn' })
      .where(
        and(eq(invitation.teamId, params.teamId), eq(invitation.id, params.invitationId), eq(invitation.state, 'open')),
      )
      .returning({ id: invitation.id });
    if (gone.length === 0) throw new ApiError('thing/missing');
    return null;
  });

  mount(router, services, readInvitation, async ({ params, person }) => {
    const row = await invitationFor(db, params.invitationId, person);
    return {
      id: row.invitation.id,
      team: row.team,
      role: row.invitation.role,
      invitedBy: row.invitedBy ?? 'somebody who has left',
    };
  });

  mount(router, services, acceptInvitation, async ({ params, person }) => {
    const { invitation: found } = await invitationFor(db, params.invitationId, person);
    await changePeople(db, found.teamId, async (tx) => {
      const [taken] = await tx
        .update(invitation)
        .set({ state: 'accepted' })
        .where(and(eq(invitation.id, found.id), eq(invitation.state, 'open')))
        .returning({ id: invitation.id });
      if (taken === undefined) throw new ApiError('invitation/ended');
      await addMember(tx, found.teamId, person.id, found.role);
      if (found.role === 'guest' && found.projects.length > 0) {
        const still = await tx
          .select({ id: project.id })
          .from(project)
          .where(and(eq(project.teamId, found.teamId), inArray(project.id, found.projects)));
        if (still.length > 0) {
          await tx
            .insert(projectGuest)
            .values(still.map((p) => ({ projectId: p.id, personId: person.id })))
            .onConflictDoNothing();
        }
      }
    });
    return { teamId: found.teamId };
  });

  mount(router, services, declineInvitation, async ({ params, person }) => {
    const { invitation: found } = await invitationFor(db, params.invitationId, person);
    await db
      .update(invitation)
      .set({ state: 'declined' })
      .where(and(eq(invitation.id, found.id), eq(invitation.state, 'open')));
    return null;
  });
}
