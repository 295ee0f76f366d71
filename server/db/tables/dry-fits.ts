import { sql } from 'drizzle-orm';
import { index, integer, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { user } from './accounts';
import { revision, scene } from './scenes';

const at = (name: string) => timestamp(name, { withTimezone: true });

export const dryFit = pgTable(
  'dry_fit',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scene.id, { onDelete: 'cascade' }),
    revisionId: uuid('revision_id')
      .notNull()
      .references(() => revision.id, { onDelete: 'cascade' }),
    state: text('state', { enum: ['queued', 'running', 'done', 'failed', 'cancelled'] })
      .notNull()
      .default('queued'),
    done: integer('done').notNull().default(0),
    total: integer('total').notNull().default(0),
    problem: text('problem'),
    totals: jsonb('totals').$type<Record<'hits' | 'tight' | 'loose' | 'seated' | 'clears', number>>(),
    report: jsonb('report'),
    startedBy: text('started_by').references(() => user.id, { onDelete: 'set null' }),
    createdAt: at('created_at').notNull().defaultNow(),
    endedAt: at('ended_at'),
  },
  (t) => [
    index('dry_fit_scene').on(t.sceneId, t.createdAt),
    index('dry_fit_revision').on(t.revisionId),
    index('dry_fit_started_by').on(t.startedBy),
  ],
);

/** A picture taken by a browser, stored with the revision it shows. */
export const picture = pgTable(
  'picture',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    revisionId: uuid('revision_id')
      .notNull()
      .references(() => revision.id, { onDelete: 'cascade' }),
    kind: text('kind', { enum: ['view', 'finding'] }).notNull(),
    findingKey: text('finding_key'),
    standpoint: text('standpoint').notNull(),
    width: integer('width').notNull(),
    height: integer('height').notNull(),
    storageKey: text('storage_key').notNull(),
    takenBy: text('taken_by').references(() => user.id, { onDelete: 'set null' }),
    createdAt: at('created_at').notNull().defaultNow(),
  },
  (t) => [
    index('picture_revision').on(t.revisionId, t.createdAt),
    index('picture_taken_by').on(t.takenBy),
    uniqueIndex('picture_of_finding')
      .on(t.revisionId, t.findingKey)
      .where(sql`kind = 'finding'`),
  ],
);

export const share = pgTable(
  'share',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    revisionId: uuid('revision_id')
      .notNull()
      .references(() => revision.id, { onDelete: 'cascade' }),
    /** In plain, because a member must be able to copy the link again; it opens no more than he may see anyway. */
    token: text('token').notNull().unique(),
    pictureId: uuid('picture_id').references(() => picture.id, { onDelete: 'set null' }),
    madeBy: text('made_by').references(() => user.id, { onDelete: 'set null' }),
    createdAt: at('created_at').notNull().defaultNow(),
    revokedAt: at('revoked_at'),
  },
  (t) => [
    index('share_revision').on(t.revisionId),
    index('share_picture').on(t.pictureId),
    index('share_made_by').on(t.madeBy),
  ],
);
