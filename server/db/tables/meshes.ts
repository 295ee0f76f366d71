import {
  bigint,
  doublePrecision,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import { user } from './accounts';
import { team } from './teams';

/** A team's mesh; the file itself lies in the storage under its hash. */
export const mesh = pgTable(
  'mesh',
  {
    teamId: uuid('team_id')
      .notNull()
      .references(() => team.id, { onDelete: 'cascade' }),
    sha256: text('sha256').notNull(),
    name: text('name').notNull(),
    bytes: bigint('bytes', { mode: 'number' }).notNull(),
    form: text('form', { enum: ['binary', 'text'] }).notNull(),
    triangles: integer('triangles').notNull(),
    low: doublePrecision('low').array().notNull(),
    high: doublePrecision('high').array().notNull(),
    kind: text('kind', { enum: ['body', 'sheet'] }).notNull(),
    badEdges: integer('bad_edges').notNull(),
    shells: integer('shells').notNull(),
    dropped: integer('dropped').notNull(),
    unit: text('unit'),
    guess: text('guess').notNull(),
    uploadedBy: text('uploaded_by').references(() => user.id, { onDelete: 'set null' }),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.sha256] }), index('mesh_uploaded_by').on(t.uploadedBy)],
);
