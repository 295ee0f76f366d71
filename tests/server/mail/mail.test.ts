// Mail: on the shelf on one's own machine, over SMTP elsewhere.
import { afterAll, beforeAll, expect, test } from 'vitest';
import { SMTPServer } from 'smtp-server';
import type { AddressInfo } from 'node:net';
import { listShelvedMail, readServerFacts } from '#shared/api';
import { readConfig } from '../../../server/config';
import { createMailer } from '../../../server/mail/mailer';
import { sweepShelf } from '../../../server/mail/shelf';
import { call, must } from '../support/call';
import { startTestServer, type TestServer } from '../support/server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const to = (address: string, name = 'Nora') => ({ name, address });

test('mails lie on the shelf, the newest first, each for its address', async () => {
  await server.mailer.sendVerification(to('Nora@shop.example'), 'http://gapwright.test/verify?token=1');
  await server.mailer.sendReset(to('nora@shop.example'), 'http://gapwright.test/reset/2');
  await server.mailer.sendReset(to('other@shop.example'), 'http://gapwright.test/reset/3');
  const mails = await must(server, null, listShelvedMail, { query: { to: 'NORA@shop.example' } });
  expect(mails.map((m) => m.subject)).toEqual(['Choose a new password', 'Confirm your address']);
  expect(mails[0]!.text).toContain('http://gapwright.test/reset/2');
  expect(await must(server, null, listShelvedMail)).toHaveLength(3);
});

test('an address with a comma is one recipient, a name with a line break no header', async () => {
  await server.mailer.sendReset(to('"a,b"@shop.example', 'Nora\r\nBcc: all@shop.example'), 'http://x');
  const [mail] = await must(server, null, listShelvedMail);
  expect(mail!.to).toBe('"a,b"@shop.example');
  expect(mail!.text.split('\n')[0]).toBe('Hello Nora Bcc: all@shop.example,');
});

test('old mails are taken off the shelf', async () => {
  await sweepShelf(server.db, new Date(Date.now() - 60_000));
  expect((await must(server, null, listShelvedMail)).length).toBeGreaterThan(0);
  await sweepShelf(server.db, new Date(Date.now() + 60_000));
  expect(await must(server, null, listShelvedMail)).toEqual([]);
});

test('in production there is no shelf', async () => {
  const production = await startTestServer({
    env: {
      GAPWRIGHT_MODE: 'production',
      GAPWRIGHT_SECRET: 'k'.repeat(40),
      GAPWRIGHT_MAIL: 'smtp',
      SMTP_URL: 'smtp://127.0.0.1:1',
    },
  });
  expect((await call(production, null, listShelvedMail)).code).toBe('thing/missing');
  expect((await call(production, null, readServerFacts)).body).toEqual({
    mode: 'production',
    mailShelf: false,
    demoAccounts: [],
  });
  await production.close();
});

test('over SMTP a mail arrives with sender, one recipient and the link', async () => {
  const received: { to: string[]; text: string }[] = [];
  const post = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData(stream, session, done) {
      let text = '';
      stream.on('data', (chunk: Buffer) => (text += chunk.toString('utf8')));
      stream.on('end', () => {
        received.push({ to: session.envelope.rcptTo.map((r) => r.address), text });
        done();
      });
    },
  });
  await new Promise<void>((resolve) => post.listen(0, '127.0.0.1', resolve));
  const { port } = post.server.address() as AddressInfo;
  const config = readConfig({
    DATABASE_URL: server.databaseUrl,
    GAPWRIGHT_MAIL: 'smtp',
    SMTP_URL: `smtp://127.0.0.1:${port}`,
    MAIL_FROM: 'The shop <shop@gaps.example>',
  });
  const mailer = createMailer(config, server.db, () => undefined);
  const facts = { team: 'Row\r\nX: y', invitedBy: 'Olga', role: 'guest', url: 'http://gapwright.test/invitation/1' };
  await mailer.sendInvitation('ines@shop.example', facts);
  mailer.close();
  await new Promise<void>((resolve) => post.close(() => resolve()));
  expect(received).toHaveLength(1);
  expect(received[0]!.to).toEqual(['ines@shop.example']);
  expect(received[0]!.text).toMatch(/^From: The shop <shop@gaps\.example>/m);
  expect(received[0]!.text).not.toMatch(/^X: y/m);
  expect(received[0]!.text).toContain('http://gapwright.test/invitation/1');
});

test('a mail server that is away is told to the log', async () => {
  const faults: unknown[] = [];
  const config = readConfig({
    DATABASE_URL: server.databaseUrl,
    GAPWRIGHT_MAIL: 'smtp',
    SMTP_URL: 'smtp://127.0.0.1:1',
  });
  const mailer = createMailer(config, server.db, (error) => faults.push(error));
  await expect(mailer.sendReset(to('nora@shop.example'), 'http://x')).rejects.toThrow(/ECONNREFUSED/);
  expect(faults).toHaveLength(1);
});
