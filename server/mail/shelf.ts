// The local stand-in for a mail server: a nodemailer transport that puts each mail on a shelf, where a page shows it.
import type { SentMessageInfo, Transport } from 'nodemailer';
import { desc, eq, lt } from 'drizzle-orm';
import { tables, type Database } from '../db/client';

const { shelvedMail } = tables;

export function shelfTransport(db: Database): Transport<SentMessageInfo> {
  return {
    name: 'shelf',
    version: '1',
    send(mail, done) {
      const { to, subject, text } = mail.data;
      // the mailer always gives one recipient as an object
      const address = typeof to === 'object' && 'address' in to ? (to.address ?? '') : '';
      db.insert(shelvedMail)
        .values({ to: address.toLowerCase(), subject: subject ?? '', text: typeof text === 'string' ? text : '' })
        .then(
          () =>
            done(null, {
              envelope: mail.message.getEnvelope(),
              messageId: mail.message.messageId(),
            }),
          (error: unknown) =>
            done(error instanceof Error ? error : new Error(String(error)), undefined as unknown as SentMessageInfo),
        );
    },
  };
}

/** The newest mails on the shelf, to one address or to all. */
export function readShelf(db: Database, to: string | undefined) {
  return db
    .select()
    .from(shelvedMail)
    .where(to === undefined ? undefined : eq(shelvedMail.to, to.toLowerCase()))
    .orderBy(desc(shelvedMail.sentAt))
    .limit(100);
}

/** Takes mails off the shelf that nobody will read any more. */
export async function sweepShelf(db: Database, before: Date): Promise<void> {
  await db.delete(shelvedMail).where(lt(shelvedMail.sentAt, before));
}
