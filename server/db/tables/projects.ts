import { boolean, index, pgTable, text, timestamp, unique, uuid } from 'drizzle-orm/pg-core';
import { user } from './accounts';
import { team } from './teams';

const at = (name: string) => timestamp(name, { withTimezone: true });

export const project = pgTable(
  'project',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    teamId: uuid('team_id')
      .notNull()
      .references(() => team.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    car: text('car').notNull().default(''),
    display: text('display', { enum: ['mm', 'in', 'in-decimal'] })
      .notNull()
      .default('in'),
    notes: text('notes').notNull().default(''),
    notOnThisCar: text('not_on_this_car').array().notNull().default([]),
    archived: boolean('archived').notNull().default(false),
    createdAt: at('created_at').notNull().defaultNow(),
    updatedAt: at('updated_at').notNull().defaultNow(),
    deletedAt: at('deleted_at'),
  },
  (t) => [index('project_team').on(t.teamId, t.updatedAt)],
);

export const projectGuest = pgTable(
  'project_guest',
  {
    projectId: uuid('project_id')
      .notNull()
      .references(() => project.id, { onDelete: 'cascade' }),
    personId: text('person_id')
      .notNull()
      .references(() => user.id, { onDelete: 'cascade' }),
  },
  (t) => [unique('project_guest_once').on(t.projectId, t.personId), index('project_guest_person').on(t.personId)],
);

/** Who did what in a project, for people to read. */
export const activity = pgTable(
  'activity',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    projectId: uuid('project_id')
      .notNull()
      .references(() => project.id, { onDelete: 'cascade' }),
    personId: text('person_id').references(() => user.id, { onDelete: 'set null' }),
    what: text('what').notNull(),
    at: at('at').notNull().defaultNow(),
  },
  (t) => [index('activity_project').on(t.projectId, t.at), index('activity_person').on(t.personId)],
);
