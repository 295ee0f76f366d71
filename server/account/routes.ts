import { and, eq, gt } from 'drizzle-orm';
import type { Router } from 'express';
import { changeMe, listShelvedMail, readMe, readServerFacts } from '#shared/api';
import type { Person } from '../auth/auth';
import { tables, type Queryable } from '../db/client';
import { DEMO_PEOPLE, DEMO_PASSWORD } from '../db/demo-people';
import { ApiError } from '../http/api-error';
import { mount } from '../http/mount';
import type { Services } from '../http/services';
import { readShelf } from '../mail/shelf';

const { invitation, membership, team, user } = tables;

async function describe(db: Queryable, person: Person) {
  const teams = await db
    .select({ id: team.id, name: team.name, role: membership.role })
    .from(membership)
    .innerJoin(team, eq(team.id, membership.teamId))
    .where(eq(membership.personId, person.id))
    .orderBy(team.name);
  const invitations = person.emailVerified
    ? await db
        .select({ id: invitation.id, team: team.name, role: invitation.role })
        .from(invitation)
        .innerJoin(team, eq(team.id, invitation.teamId))
        .where(
          and(
            eq(invitation.email, person.email.toLowerCase()),
            eq(invitation.state, 'open'),
            gt(invitation.expiresAt, new Date()),
          ),
        )
    : [];
  return { ...person, teams, invitations };
}

export function accountRoutes(router: Router, services: Services): void {
  const { db, config } = services;
  mount(router, services, readMe, ({ person }) => describe(db, person));

  mount(router, services, changeMe, async ({ person, body }) => {
    await db
      .update(user)
      .set({ ...body, updatedAt: new Date() })
      .where(eq(user.id, person.id));
    return describe(db, { ...person, ...body });
  });

  mount(router, services, readServerFacts, async () => {
    const isShelf = config.mail.kind === 'shelf';
    if (config.mode === 'production') return { mode: 'production' as const, mailShelf: false, demoAccounts: [] };
    const there = new Set((await db.select({ email: user.email }).from(user)).map((u) => u.email));
    return {
      mode: 'local' as const,
      mailShelf: isShelf,
      demoAccounts: DEMO_PEOPLE.filter((p) => there.has(p.email)).map((p) => ({ ...p, password: DEMO_PASSWORD })),
    };
  });

  mount(router, services, listShelvedMail, async ({ query }) => {
    if (config.mode === 'production' || config.mail.kind !== 'shelf') throw new ApiError('thing/missing');
    const mails = await readShelf(db, query.to);
    return mails.map((m) => ({ ...m, sentAt: m.sentAt.toISOString() }));
  });
}
