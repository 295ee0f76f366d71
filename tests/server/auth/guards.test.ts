// What stands before the accounts: other sites, limits, closed doors of the library.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { changeMe, createTeam, readMe } from '#shared/api';
import { auth, mailsTo, newAccount, signIn, signUp } from '../support/accounts';
import { call } from '../support/call';
import { signInAs, type TestPerson } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { until } from '../support/things';

let server: TestServer;
let person: TestPerson;
beforeAll(async () => {
  server = await startTestServer({ strict: true });
  person = await signInAs(server, 'Pia Person');
});
afterAll(() => server.close());

const from = (address: string) => ({ 'x-forwarded-for': address });

describe('requests of other sites', () => {
  const post = (headers: Record<string, string>) =>
    call(server, person, createTeam, { body: { name: 'Made from afar' }, headers });

  test.each([
    ['another site’s page', { origin: 'https://elsewhere.example' }],
    ['a page without an origin', { origin: 'null' }],
    ['a page of a like-sounding site', { origin: 'http://gapwright.test.elsewhere.example' }],
    ['a browser that says cross-site', { 'sec-fetch-site': 'cross-site' }],
    ['a browser that says same-site', { 'sec-fetch-site': 'same-site' }],
  ])('%s cannot change anything with the person’s cookie', async (_, headers) => {
    const answer = await post(headers);
    expect([answer.status, answer.code]).toEqual([403, 'request/forbidden-origin']);
  });

  test('nor sign anybody in or up', async () => {
    const headers = { origin: 'https://elsewhere.example' };
    expect((await signIn(server, 'x@shop.example', 'whatever it is', headers)).status).toBe(403);
    expect((await auth(server, '/sign-up/email', {}, headers)).status).toBe(403);
  });

  test('its own pages can', async () => {
    expect((await post({ origin: 'http://gapwright.test' })).status).toBe(201);
    expect((await post({ 'sec-fetch-site': 'same-origin' })).status).toBe(201);
  });

  test('a form cannot be sent where JSON is meant', async () => {
    const headers = { 'content-type': 'text/plain' };
    expect((await call(server, person, changeMe, { body: { words: 'uk' }, headers })).status).toBe(415);
    const answer = await auth(server, '/sign-in/email', '{"email":"a@b.example","password":"x"}', headers);
    expect(answer.status).toBe(415);
  });
});

describe('doors of the library that are closed', () => {
  test.each([
    '/sign-in/social',
    '/change-email',
    '/update-user',
    '/delete-user',
    '/list-sessions',
    '/revoke-sessions',
    '/link-social',
    '/callback/github',
    '/error',
    '/ok',
    '/reset-password/a/b',
    '/sign-up/email/',
    '//sign-up/email',
    '/SIGN-UP/EMAIL',
  ])('%s answers 404', async (path) => {
    for (const body of [undefined, {}]) {
      const answer = await auth(server, path, body, { cookie: person.cookie });
      expect(answer.status).toBe(404);
    }
  });

  test('a sign-up of 33 kB is refused unread', async () => {
    const answer = await signUp(server, 'big@shop.example', { callbackURL: 'x'.repeat(33_000) });
    expect(answer.status).toBe(413);
  });
});

describe('limits', () => {
  test('so many guesses from one address, whatever it says of itself, and not more; others are let in', async () => {
    await newAccount(server, 'calm@shop.example');
    const answers: number[] = [];
    for (let i = 0; i < 22; i += 1) {
      const headers = {
        ...from('198.51.100.7'),
        'x-gapwright-address': `203.0.113.${i}`,
        'x-client-ip': `203.0.113.${i}`,
      };
      answers.push((await signIn(server, `guess${i}@shop.example`, 'a wrong password', headers)).status);
    }
    expect(answers.slice(0, 20).every((s) => s === 401)).toBe(true);
    expect(answers.slice(20)).toEqual([429, 429]);
    expect((await signIn(server, 'calm@shop.example', undefined, from('198.51.100.8'))).status).toBe(200);
  });

  test('so many guesses at one account from many addresses, and not more', async () => {
    const answers: number[] = [];
    for (let i = 0; i < 22; i += 1) {
      const email = i % 2 === 0 ? 'target@shop.example' : 'Target@Shop.example';
      answers.push((await signIn(server, email, 'a wrong password', from(`203.0.113.${i}`))).status);
    }
    expect(answers.slice(0, 20).every((s) => s === 401)).toBe(true);
    expect(answers.slice(20)).toEqual([429, 429]);
  });

  test('so many mails to one address, and not more', async () => {
    await newAccount(server, 'flooded@shop.example');
    for (let i = 0; i < 14; i += 1) {
      const body = { email: 'flooded@shop.example', redirectTo: '/new-password' };
      await auth(server, '/request-password-reset', body, from(`192.0.2.${i}`));
    }
    // one confirmed the address, and counted
    await until('the mails', async () => (await mailsTo(server, 'flooded@shop.example')).length >= 10);
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(await mailsTo(server, 'flooded@shop.example')).toHaveLength(10);
  });

  test('who must wait is told how long', async () => {
    const answer = await signIn(server, 'target@shop.example', 'a wrong password', from('203.0.113.99'));
    expect((answer.body as { data: { seconds: number } }).data.seconds).toBeGreaterThan(0);
  });
});

test('nothing of what was typed stands in the log: no password, address or token', async () => {
  const me = await call(server, person, readMe);
  expect(me.status).toBe(200);
  const log = server.logged();
  expect(log.length).toBeGreaterThan(1000);
  for (const secret of ['a long enough one', 'a wrong password', '@shop.example', person.cookie.slice(30, 60)]) {
    expect(log).not.toContain(secret);
  }
});
