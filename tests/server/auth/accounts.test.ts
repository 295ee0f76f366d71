// Accounts from sign-up to a new password.
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readMe } from '#shared/api';
import { tables } from '../../../server/db/client';
import { auth, linkIn, mailsTo, newAccount, PASSWORD, signIn, signUp } from '../support/accounts';
import { call } from '../support/call';
import { startTestServer, type TestServer } from '../support/server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const isSignedIn = async (cookie: string | null): Promise<boolean> =>
  (await call(server, null, readMe, { headers: { cookie: cookie ?? '' } })).status === 200;

describe('signing up', () => {
  test('a mail confirms the address; before that nobody is let in, after that he is', async () => {
    const up = await signUp(server, 'nora@shop.example');
    expect([up.status, up.cookie]).toEqual([200, null]);
    const early = await signIn(server, 'nora@shop.example');
    expect([early.status, early.code, early.cookie]).toEqual([403, 'EMAIL_NOT_VERIFIED', null]);
    const link = await linkIn(server, 'nora@shop.example');
    const confirmed = await fetch(server.url + link, { redirect: 'manual' });
    expect(confirmed.status).toBeLessThan(400);
    const late = await signIn(server, 'nora@shop.example');
    expect(late.status).toBe(200);
    const me = await call(server, null, readMe, { headers: { cookie: late.cookie! } });
    expect(me.body).toMatchObject({ name: 'Nora New', email: 'nora@shop.example', teams: [], words: 'us' });
  });

  test('an address that is taken gets the same answer as a new one, and its account stays as it is', async () => {
    await newAccount(server, 'taken@shop.example');
    const again = await signUp(server, 'taken@shop.example', { password: 'somebody else’s', name: 'Mallory' });
    const fresh = await signUp(server, 'fresh@shop.example', { password: 'somebody else’s', name: 'Mallory' });
    expect(again.status).toBe(fresh.status);
    const shape = (a: unknown): string[] => Object.keys((a as { user: object }).user).sort();
    expect(shape(again.body)).toEqual(shape(fresh.body));
    expect((again.body as { token: unknown }).token).toBeNull();
    expect((await signIn(server, 'taken@shop.example', 'somebody else’s')).status).toBe(401);
    expect((await signIn(server, 'taken@shop.example')).status).toBe(200);
    const [row] = await server.db.select().from(tables.user).where(eq(tables.user.email, 'taken@shop.example'));
    expect(row!.name).toBe('Nora New');
  });

  test.each([
    ['display', 'mm'],
    ['words', 'uk'],
  ])('a sign-up cannot set %s', async (field, value) => {
    const email = `sets-${field}@shop.example`;
    await signUp(server, email, { [field]: value });
    const rows = await server.db.select().from(tables.user).where(eq(tables.user.email, email));
    for (const row of rows) expect(row).toMatchObject({ display: null, words: 'us' });
    await newAccount(server, `plain-${field}@shop.example`);
    expect(rows.length).toBeLessThanOrEqual(1);
  });

  test('nor make itself confirmed', async () => {
    await signUp(server, 'verified@shop.example', { emailVerified: true, role: 'owner', id: 'chosen' });
    const [row] = await server.db.select().from(tables.user).where(eq(tables.user.email, 'verified@shop.example'));
    expect(row?.emailVerified ?? false).toBe(false);
    expect(row?.id).not.toBe('chosen');
  });

  test.each([
    ['a short password', { password: '123456789' }],
    ['no name', { name: ' ' }],
    ['a name without end', { name: 'n'.repeat(20_000) }],
    ['a name with a NUL', { name: 'No\0ra' }],
    ['a name of two lines', { name: 'Nora\r\nBcc: all@shop.example' }],
    ['no address', { email: 'nora' }],
  ])('%s is refused', async (_, fields) => {
    const before = await server.db.$count(tables.user);
    expect((await signUp(server, `r${before}@shop.example`, fields)).status).toBe(400);
    expect(await server.db.$count(tables.user)).toBe(before);
  });
});

describe('signing in', () => {
  test('a wrong password and an unknown address are told apart by nothing', async () => {
    await newAccount(server, 'known@shop.example');
    const wrong = await signIn(server, 'known@shop.example', 'not the password');
    const unknown = await signIn(server, 'unknown@shop.example', 'not the password');
    expect([wrong.status, wrong.body]).toEqual([unknown.status, unknown.body]);
    expect(wrong.status).toBe(401);
    expect([wrong.cookie, unknown.cookie]).toEqual([null, null]);
  });

  test('the cookie is HttpOnly and SameSite=Lax, and ends with the sign-out', async () => {
    await newAccount(server, 'cookie@shop.example');
    const answer = await signIn(server, 'Cookie@Shop.example');
    const [set] = answer.headers.getSetCookie();
    expect(set).toMatch(/HttpOnly/i);
    expect(set).toMatch(/SameSite=Lax/i);
    expect(set).toMatch(/Path=\//i);
    expect(await isSignedIn(answer.cookie)).toBe(true);
    const forged = answer.cookie!.replace(/\.[^.]*$/, '.AAAA');
    expect(await isSignedIn(forged)).toBe(false);
    expect((await auth(server, '/sign-out', {}, { cookie: answer.cookie! })).status).toBe(200);
    expect(await isSignedIn(answer.cookie)).toBe(false);
  });

  test('under https the cookie is Secure', async () => {
    const secure = await startTestServer({ env: { BASE_URL: 'https://gapwright.test' } });
    try {
      await newAccount(secure, 'secure@shop.example');
      const [set] = (await signIn(secure, 'secure@shop.example')).headers.getSetCookie();
      expect(set).toMatch(/^__Secure-gapwright\.session_token=.*; Secure/i);
    } finally {
      await secure.close();
    }
  });

  test('a session that has run out is none', async () => {
    await newAccount(server, 'old@shop.example');
    const { cookie } = await signIn(server, 'old@shop.example');
    await server.db.update(tables.session).set({ expiresAt: new Date(Date.now() - 1000) });
    expect(await isSignedIn(cookie)).toBe(false);
  });
});

describe('a forgotten password', () => {
  const ask = (email: string) => auth(server, '/request-password-reset', { email, redirectTo: '/new-password' });
  const tokenOf = (link: string): string => /reset-password\/([^/?]+)/.exec(link)![1]!;

  test('the mailed token works once and ends all sessions', async () => {
    await newAccount(server, 'forgot@shop.example');
    const { cookie } = await signIn(server, 'forgot@shop.example');
    expect((await ask('forgot@shop.example')).status).toBe(200);
    const token = tokenOf(await linkIn(server, 'forgot@shop.example', 2));
    const reset = (newPassword: string) => auth(server, '/reset-password', { newPassword, token });
    expect((await reset('short')).status).toBe(400);
    expect((await reset('another long one')).status).toBe(200);
    expect(await isSignedIn(cookie)).toBe(false);
    expect((await signIn(server, 'forgot@shop.example', PASSWORD)).status).toBe(401);
    expect((await signIn(server, 'forgot@shop.example', 'another long one')).status).toBe(200);
    expect((await reset('a third long one')).status).toBe(400);
    expect((await signIn(server, 'forgot@shop.example', 'another long one')).status).toBe(200);
  });

  test('the token does not stand in the database, and does not outlive its hour', async () => {
    await newAccount(server, 'late@shop.example');
    await ask('late@shop.example');
    const token = tokenOf(await linkIn(server, 'late@shop.example', 2));
    const rows = await server.db.select().from(tables.verification);
    expect(JSON.stringify(rows)).not.toContain(token);
    await server.db.update(tables.verification).set({ expiresAt: new Date(Date.now() - 1000) });
    const answer = await auth(server, '/reset-password', { newPassword: 'another long one', token });
    expect(answer.status).toBe(400);
  });

  test('an unknown address gets the same answer, and no mail', async () => {
    await newAccount(server, 'here@shop.example');
    const known = await ask('here@shop.example');
    const unknown = await ask('nobody@shop.example');
    expect([unknown.status, unknown.body]).toEqual([known.status, known.body]);
    await linkIn(server, 'here@shop.example', 2);
    expect(await mailsTo(server, 'nobody@shop.example')).toEqual([]);
  });

  test('the link does not lead to another site', async () => {
    const answer = await auth(server, '/request-password-reset', {
      email: 'here@shop.example',
      redirectTo: 'https://elsewhere.example/steal',
    });
    expect(answer.status).toBe(403);
  });
});
