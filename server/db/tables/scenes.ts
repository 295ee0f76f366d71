import {
  boolean,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { user } from './accounts';
import { project } from './projects';

const at = (name: string) => timestamp(name, { withTimezone: true });

export const scene = pgTable(
  'scene',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    projectId: uuid('project_id')
      .notNull()
      .references(() => project.id, { onDelete: 'cascade' }),
    /** The document's name, kept beside it for lists. */
    name: text('name').notNull(),
    document: jsonb('document').notNull(),
    saveNumber: integer('save_number').notNull().default(0),
    saveId: uuid('save_id'),
    /** Counts of the document, kept beside it for lists and look-ups. */
    parts: integer('parts').notNull().default(0),
    meshes: text('meshes').array().notNull().default([]),
    archived: boolean('archived').notNull().default(false),
    createdAt: at('created_at').notNull().defaultNow(),
    updatedAt: at('updated_at').notNull().defaultNow(),
    updatedBy: text('updated_by').references(() => user.id, { onDelete: 'set null' }),
    deletedAt: at('deleted_at'),
  },
  (t) => [
    index('scene_project').on(t.projectId, t.updatedAt),
    index('scene_meshes').using('gin', t.meshes),
    index('scene_updated_by').on(t.updatedBy),
  ],
);

/** Every save by the id that its client gave it, so that a repeated one is known. */
export const sceneSave = pgTable(
  'scene_save',
  {
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scene.id, { onDelete: 'cascade' }),
    saveId: uuid('save_id').notNull(),
    saveNumber: integer('save_number').notNull(),
    savedBy: text('saved_by').references(() => user.id, { onDelete: 'set null' }),
    at: at('at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.sceneId, t.saveId] }),
    index('scene_save_at').on(t.at),
    index('scene_save_by').on(t.savedBy),
  ],
);

/** An unchangeable, numbered snapshot. */
export const revision = pgTable(
  'revision',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scene.id, { onDelete: 'cascade' }),
    number: integer('number').notNull(),
    saveNumber: integer('save_number').notNull(),
    /** Canonical JSON, byte for byte what the hash is of. */
    documentText: text('document_text').notNull(),
    sha256: text('sha256').notNull(),
    meshes: text('meshes').array().notNull().default([]),
    notOnThisCar: text('not_on_this_car').array().notNull().default([]),
    madeBy: text('made_by').references(() => user.id, { onDelete: 'set null' }),
    createdAt: at('created_at').notNull().defaultNow(),
  },
  (t) => [
    unique('revision_number').on(t.sceneId, t.number),
    index('revision_meshes').using('gin', t.meshes),
    index('revision_made_by').on(t.madeBy),
  ],
);
