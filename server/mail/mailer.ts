// Mail: what is said, and how it goes out. The transport is nodemailer's, to a real server or to the shelf.
import nodemailer, { type Transporter } from 'nodemailer';
import type { Config } from '../config';
import type { Database } from '../db/client';
import { shelfTransport } from './shelf';

export interface Recipient {
  readonly name: string;
  readonly address: string;
}

export interface Mailer {
  readonly sendVerification: (to: Recipient, url: string) => Promise<void>;
  readonly sendReset: (to: Recipient, url: string) => Promise<void>;
  readonly sendInvitation: (
    address: string,
    facts: { team: string; invitedBy: string; role: string; url: string },
  ) => Promise<void>;
  readonly close: () => void;
}

/** Line breaks in a name or subject would write headers of their own. */
const oneLine = (text: string): string =>
  text
    .replace(/[\r\n\t\p{Cc}]+/gu, ' ')
    .trim()
    .slice(0, 200);

function createTransport(config: Config, db: Database): Transporter {
  if (config.mail.kind === 'shelf') return nodemailer.createTransport(shelfTransport(db));
  return nodemailer.createTransport({
    url: config.mail.url,
    // an invitation waits for its mail; a silent mail server must not keep it for minutes
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 20_000,
  });
}

export function createMailer(config: Config, db: Database, onError: (error: unknown) => void): Mailer {
  const transport = createTransport(config, db);
  const send = async (to: Recipient, subject: string, lines: readonly string[]): Promise<void> => {
    try {
      await transport.sendMail({
        from: config.mailFrom,
        // as an object: a comma in an address must not make two recipients of one
        to: { name: oneLine(to.name), address: to.address },
        subject: oneLine(subject),
        text: `${lines.join('\n\n')}\n`,
        disableFileAccess: true,
        disableUrlAccess: true,
      });
    } catch (error) {
      onError(error);
      throw error;
    }
  };
  return {
    sendVerification: (to, url) =>
      send(to, 'Confirm your address', [
        `Hello ${oneLine(to.name)},`,
        'open this link to confirm your mail address and begin:',
        url,
        'If you did not sign up at Gapwright, leave this mail alone.',
      ]),
    sendReset: (to, url) =>
      send(to, 'Choose a new password', [
        `Hello ${oneLine(to.name)},`,
        'open this link within an hour to choose a new password:',
        url,
        'If you did not ask for this, leave this mail alone: your password stays as it is.',
      ]),
    sendInvitation: (address, { team, invitedBy, role, url }) =>
      send({ name: '', address }, `${oneLine(invitedBy)} invites you to ${oneLine(team)}`, [
        'Hello,',
        `${oneLine(invitedBy)} invites you to the team “${oneLine(team)}” as ${role}.`,
        'Open this link, and sign in or sign up with this mail address:',
        url,
        'The link works for 14 days.',
      ]),
    close: () => transport.close(),
  };
}
