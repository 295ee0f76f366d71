import { index, pgTable, text, timestamp, unique, uuid } from 'drizzle-orm/pg-core';
import { user } from './accounts';

const at = (name: string) => timestamp(name, { withTimezone: true });

export const team = pgTable('team', {
  id: uuid('id').primaryKey().defaultRandom(),
  name: text('name').notNull(),
  createdAt: at('created_at').notNull().defaultNow(),
});

export const membership = pgTable(
  'membership',
  {
    teamId: uuid('team_id')
      .notNull()
      .references(() => team.id, { onDelete: 'cascade' }),
    personId: text('person_id')
      .notNull()
      .references(() => user.id, { onDelete: 'cascade' }),
    role: text('role', { enum: ['owner', 'designer', 'reviewer', 'guest'] }).notNull(),
    since: at('since').notNull().defaultNow(),
  },
  (t) => [unique('membership_once').on(t.teamId, t.personId), index('membership_person').on(t.personId)],
);

export const invitation = pgTable(
  'invitation',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    teamId: uuid('team_id')
      .notNull()
      .references(() => team.id, { onDelete: 'cascade' }),
    email: text('email').notNull(),
    role: text('role', { enum: ['owner', 'designer', 'reviewer', 'guest'] }).notNull(),
    /** Projects that an invited guest is added to on accepting. */
    projects: uuid('projects').array().notNull().default([]),
    state: text('state', { enum: ['open', 'accepted', 'declined', 'withdrawn'] })
      .notNull()
      .default('open'),
    invitedBy: text('invited_by').references(() => user.id, { onDelete: 'set null' }),
    createdAt: at('created_at').notNull().defaultNow(),
    expiresAt: at('expires_at').notNull(),
  },
  (t) => [index('invitation_team').on(t.teamId), index('invitation_email').on(t.email)],
);
