// Tables of the services: mail on the shelf, workers that are alive.
import { index, integer, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';

const at = (name: string) => timestamp(name, { withTimezone: true });

export const shelvedMail = pgTable(
  'shelved_mail',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    to: text('to').notNull(),
    subject: text('subject').notNull(),
    text: text('text').notNull(),
    sentAt: at('sent_at').notNull().defaultNow(),
  },
  (t) => [index('shelved_mail_to').on(t.to, t.sentAt)],
);

/** A worker that has not been seen for a minute is dead, and its jobs are given to others. */
export const workerSeen = pgTable('worker_seen', {
  workerId: text('worker_id').primaryKey(),
  /** Where it runs, so that a restarted server knows its own dead at once. */
  host: text('host').notNull(),
  pid: integer('pid').notNull(),
  seenAt: at('seen_at').notNull().defaultNow(),
});
