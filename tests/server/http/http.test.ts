// What holds for every request: its number, its faults, its headers, what is logged.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { createTeam, listProjects, readMe, readServerFacts, saveDocument } from '#shared/api';
import { describeError, withoutSecrets } from '../../../server/http/log';
import { createLimits } from '../../../server/http/limits';
import { ApiError } from '../../../server/http/api-error';
import { call, problemOf } from '../support/call';
import { makeTeam, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { makeProject, makeScene } from '../support/things';

let server: TestServer;
let team: TestTeam;
beforeAll(async () => {
  server = await startTestServer();
  team = await makeTeam(server);
});
afterAll(() => server.close());

const raw = (path: string, init: RequestInit = {}) =>
  fetch(server.url + path, { ...init, headers: { cookie: team.designer.cookie, ...init.headers } });
const json = { 'content-type': 'application/json' };

describe('problem details', () => {
  test.each<[string, string, RequestInit, number, string]>([
    ['no JSON', '/api/teams', { method: 'POST', headers: json, body: '{"name":' }, 400, 'request/invalid'],
    ['a bare word', '/api/teams', { method: 'POST', headers: json, body: '"name"' }, 400, 'request/invalid'],
    [
      'another type',
      '/api/teams',
      { method: 'POST', headers: { 'content-type': 'text/plain' }, body: '{}' },
      415,
      'request/not-json',
    ],
    [
      'another charset',
      '/api/teams',
      { method: 'POST', headers: { 'content-type': 'application/json; charset=koi8-r' }, body: '{}' },
      415,
      'request/not-json',
    ],
    [
      'an unknown encoding',
      '/api/teams',
      { method: 'POST', headers: { ...json, 'content-encoding': 'lzw' }, body: '{}' },
      415,
      'request/not-json',
    ],
    [
      'too much of it',
      '/api/teams',
      { method: 'POST', headers: json, body: JSON.stringify({ name: 'x'.repeat(300_000) }) },
      413,
      'request/too-large',
    ],
    ['an unknown address', '/api/nothing', {}, 404, 'thing/missing'],
    ['an unknown method', '/api/me', { method: 'PUT', headers: json, body: '{}' }, 404, 'thing/missing'],
    ['an address that does not decode', '/api/teams/%E0%A4%A', {}, 400, 'request/invalid'],
    ['a query given twice', '/api/mail?to=a&to=b', {}, 400, 'request/invalid'],
  ])('%s', async (_, path, init, status, code) => {
    const response = await raw(path, init);
    expect(response.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
    const problem = (await response.json()) as Record<string, unknown>;
    expect(problem).toMatchObject({ status, code, type: `urn:gapwright:${code}` });
    expect(response.status).toBe(status);
    expect(problem['instance']).toBe(response.headers.get('x-request-id'));
    expect(String(problem['title'])).toMatch(/\.$/);
  });

  test('a field that is wrong is named; one that is not known does not get in', async () => {
    const answer = await call(server, team.designer, createTeam, { body: { name: 7 } });
    expect(problemOf(answer).faults).toMatchObject([{ path: 'name' }]);
    const sneaky = await call(server, team.designer, createTeam, {
      body: { name: 'T', role: 'x', id: 'y', __proto__: { a: 1 } },
    });
    expect(Object.keys(sneaky.body).sort()).toEqual(['createdAt', 'id', 'name', 'role']);
  });

  test('13 MB of scene are too much; what is too much for others is not for a scene', async () => {
    const project = await makeProject(server, team.designer, team.id);
    const sceneId = await makeScene(server, team.designer, project.id);
    const put = (bytes: number) =>
      call(server, team.designer, saveDocument, { params: { sceneId }, body: { document: 'x'.repeat(bytes) } });
    expect((await put(13_000_000)).status).toBe(413);
    expect((await put(1_000_000)).status).toBe(400);
  });

  test('somebody without a right is refused before his body is read', async () => {
    const response = await raw(`/api/teams/${team.id}/projects`, {
      method: 'POST',
      headers: { ...json, cookie: team.guest.cookie },
      body: '{"name":',
    });
    expect(response.status).toBe(403);
  });
});

test('HEAD and OPTIONS are answered, and another site is given nothing to read', async () => {
  const head = await raw('/api/me', { method: 'HEAD' });
  expect([head.status, await head.text()]).toEqual([200, '']);
  const options = await raw('/api/me', {
    method: 'OPTIONS',
    headers: { origin: 'https://elsewhere.example', 'access-control-request-method': 'PATCH' },
  });
  expect(options.headers.get('access-control-allow-origin')).toBeNull();
  expect(
    (await raw('/api/me', { headers: { origin: 'https://elsewhere.example' } })).headers.get(
      'access-control-allow-origin',
    ),
  ).toBeNull();
});

test('it says that it lives, and whether it takes requests', async () => {
  expect(await (await raw('/api/health')).json()).toEqual({ alive: true });
  expect((await raw('/api/ready')).status).toBe(200);
  const draining = await startTestServer({ services: () => ({ ready: () => false }) });
  expect((await fetch(`${draining.url}/api/ready`)).status).toBe(503);
  expect((await fetch(`${draining.url}/api/health`)).status).toBe(200);
  await draining.close();
});

test('answers are not kept by caches, run nothing of others, and do not name the server’s parts', async () => {
  const { headers } = await call(server, team.designer, readMe);
  expect(headers.get('cache-control')).toBe('private, no-cache');
  expect(headers.get('x-powered-by')).toBeNull();
  expect(headers.get('content-security-policy')).toMatch(/script-src 'self' 'wasm-unsafe-eval';/);
  expect(headers.get('strict-transport-security')).toBeNull();
});

test('a fault of the server is told by its number alone, and logged without what was typed', async () => {
  const { rows } = await server.pool.query<{ name: string }>(
    `select tablename as name from pg_tables where tablename = 'project'`,
  );
  expect(rows).toHaveLength(1);
  await server.pool.query('alter table project rename to project_away');
  const search = 'a word that nobody may read';
  const answer = await call(server, team.owner, listProjects, { params: { teamId: team.id }, query: { search } });
  await server.pool.query('alter table project_away rename to project');
  expect([answer.status, answer.code, answer.detail]).toEqual([500, 'server/failed', undefined]);
  const log = server.logged();
  const line = log.split('\n').find((l) => l.includes(problemOf(answer).instance!) && l.includes('a request failed'));
  expect(line).toContain('does not exist');
  expect(log).not.toContain('nobody may read');
  expect(log).not.toContain('nobody%20may');
});

test.each([
  ['/s/SECRET', '/s/…'],
  ['/api/shared/SECRET/picture', '/api/shared/…/picture'],
  ['/invitation/SECRET', '/invitation/…'],
  ['/api/teams/t/invitations/SECRET/resend', '/api/teams/t/invitations/…/resend'],
  ['/api/auth/reset-password/SECRET?callbackURL=SECRET', '/api/auth/reset-password/…?callbackURL=…'],
  ['/api/auth/verify-email?token=SECRET&x=SECRET', '/api/auth/verify-email?token=…&x=…'],
])('%s is logged as %s', (url, shown) => {
  expect(withoutSecrets(url)).toBe(shown);
});

test('whatever is thrown can be logged', () => {
  expect(describeError('a word')).toEqual({ type: 'string', message: 'something that is no error was thrown' });
  expect(describeError(new Error('plain'))).toMatchObject({ type: 'Error', message: 'plain' });
});

test('limits count together over servers, and say when they end', async () => {
  const [one, other] = [createLimits(server.pool), createLimits(server.pool)];
  for (let i = 0; i < 10; i += 1) await (i % 2 === 0 ? one : other).use('mailTo', 'x@shop.example');
  const over = await one.use('mailTo', 'x@shop.example').catch((error: unknown) => error);
  expect(over).toBeInstanceOf(ApiError);
  expect((over as ApiError).code).toBe('rate/limited');
  await one.use('mailTo', 'y@shop.example');
  const { rows } = await server.pool.query('select key from limit_points');
  expect(JSON.stringify(rows)).not.toContain('shop.example');
});

test('the server says of itself what the sign-in page needs, and in production no more', async () => {
  expect((await call(server, null, readServerFacts)).body).toEqual({
    mode: 'local',
    mailShelf: true,
    demoAccounts: [],
  });
});
