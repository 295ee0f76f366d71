import { afterEach, describe, expect, it, vi } from 'vitest';
import { createTeam, listProjects, readPicture, readTeam } from '#shared/api';
import { addressOf, callApi } from '../../../src/lib/api';
import { ApiProblem, isProblem, problemFrom, sayProblem, tell } from '../../../src/lib/api-problem';

afterEach(() => vi.unstubAllGlobals());

const ID = '0b8e7c36-6f2c-4c58-9d0c-1f3c2f1f7a11';
const answer = (status: number, body: unknown): Response =>
  new Response(typeof body === 'string' ? body : JSON.stringify(body), { status });
const stub = (...answers: readonly (Response | Error)[]) => {
  const calls = vi.fn<(address: string, init: RequestInit) => Promise<Response>>();
  for (const each of answers) {
    if (each instanceof Error) calls.mockRejectedValueOnce(each);
    else calls.mockResolvedValueOnce(each);
  }
  vi.stubGlobal('fetch', calls);
  return calls;
};

const team = { id: ID, name: 'Tide Street', role: 'owner', createdAt: '2026-12-01T10:00:00.000Z' };
const read = () => callApi(readTeam, { params: { teamId: ID } });

describe('addresses', () => {
  it('fill in parameters and leave out what is not asked', () => {
    expect(addressOf(readPicture, { pictureId: ID })).toBe(`/api/pictures/${ID}`);
    expect(addressOf(listProjects, { teamId: ID }, { search: 'a & b', after: undefined, limit: 4 })).toBe(
      `/api/teams/${ID}/projects?search=a+%26+b&limit=4`,
    );
  });

  it('cannot be broken out of by a parameter', () => {
    expect(addressOf(readTeam, { teamId: '../me?x=1' })).toBe('/api/teams/..%2Fme%3Fx%3D1');
  });

  it('refuse a missing parameter', () => {
    expect(() => addressOf(readTeam, {})).toThrow(/teamId/);
  });
});

describe('a call', () => {
  it('gives the parsed answer', async () => {
    stub(answer(200, { ...team, more: 'that nobody declared' }));
    expect(await read()).toEqual(team);
  });

  it('sends a body as JSON', async () => {
    const calls = stub(answer(201, team));
    await callApi(createTeam, { body: { name: 'Tide Street' } });
    const [address, init] = calls.mock.calls[0]!;
    expect(address).toBe('/api/teams');
    expect(init.method).toBe('POST');
    expect(init.body).toBe('{"name":"Tide Street"}');
  });

  it('turns problem details into their code and sentence', async () => {
    stub(
      answer(409, {
        type: 'urn:gapwright:team/last-owner',
        title: 'A team keeps at least one owner. Make somebody else an owner first.',
        status: 409,
        code: 'team/last-owner',
      }),
    );
    const problem = await read().catch((error: unknown) => error);
    expect(problem).toBeInstanceOf(ApiProblem);
    expect(isProblem(problem, 'team/last-owner')).toBe(true);
    expect(sayProblem(problem)).toMatch(/at least one owner/);
  });

  it.each([
    ['an answer that is no JSON', answer(200, '<html>'), 'answer/unreadable'],
    ['an answer of another shape', answer(200, { id: 1 }), 'answer/unreadable'],
    ['a proxy’s own page while the server is away', answer(502, '<h1>Bad Gateway</h1>'), 'network/unreachable'],
    ['no answer', new TypeError('failed to fetch'), 'network/unreachable'],
  ] as const)('says so for %s', async (_, given, code) => {
    stub(given);
    const problem = await read().catch((error: unknown) => error);
    expect(problem).toMatchObject({ code });
  });

  it('lets an abort through as it is, so that nobody is told of it', async () => {
    stub(new DOMException('stopped', 'AbortError'));
    await expect(read()).rejects.toThrow(DOMException);
  });
});

describe('telling', () => {
  it('gives the request number only where the server failed', () => {
    const about = { title: 'x', type: 'x', instance: 'abc' };
    expect(tell(problemFrom(500, { ...about, status: 500, code: 'server/failed' })).requestNumber).toBe('abc');
    expect(tell(problemFrom(409, { ...about, status: 409, code: 'mesh/in-use' })).requestNumber).toBeNull();
  });

  it('says when something works again', () => {
    const limited = (seconds: number) =>
      tell(problemFrom(429, { type: 'x', title: 'Too often.', status: 429, code: 'rate/limited', data: { seconds } }));
    expect(limited(30).detail).toBe('It works again in 30 seconds.');
    expect(limited(600).detail).toBe('It works again in 10 minutes.');
  });
});
