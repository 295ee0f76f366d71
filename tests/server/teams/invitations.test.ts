// Invitations: the address they went to, and nobody else, for so long.
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import {
  acceptInvitation,
  declineInvitation,
  invite,
  listInvitations,
  listProjects,
  readInvitation,
  readMe,
  resendInvitation,
  withdrawInvitation,
  type Invitation,
} from '#shared/api';
import { tables } from '../../../server/db/client';
import { linkIn, mailsTo } from '../support/accounts';
import { call, must } from '../support/call';
import { makeTeam, signInAs, type TestPerson, type TestTeam } from '../support/people';
import { startTestServer, type TestServer } from '../support/server';
import { makeProject } from '../support/things';

let server: TestServer;
let team: TestTeam;
let invited: TestPerson;
let isMailBroken = false;
beforeAll(async () => {
  server = await startTestServer({
    services: ({ mailer }) => ({
      mailer: {
        ...mailer,
        sendInvitation: (...facts) =>
          isMailBroken ? Promise.reject(new Error('the mail server is away')) : mailer.sendInvitation(...facts),
      },
    }),
  });
});
beforeEach(async () => {
  team = await makeTeam(server, 'Row, Bench & Co');
  invited = await signInAs(server, 'Ines Invited');
});
afterAll(() => server.close());

const at = (i: Invitation) => ({ params: { teamId: team.id, invitationId: i.id } });
const send = (more: object = {}) =>
  must(server, team.owner, invite, {
    params: { teamId: team.id },
    body: { email: invited.email.toUpperCase(), role: 'reviewer', ...more },
  });
const accept = (i: Invitation, person = invited) => call(server, person, acceptInvitation, { ...at(i), body: {} });

test('a mail brings the link; the invited accepts and is in, in the role he was invited to', async () => {
  const sent = await send();
  expect(sent.email).toBe(invited.email);
  expect(await linkIn(server, invited.email)).toBe(`/invitation/${sent.id}`);
  expect((await mailsTo(server, invited.email))[0]!.subject).toContain('Row, Bench & Co');
  expect((await must(server, invited, readMe)).invitations).toMatchObject([{ id: sent.id, role: 'reviewer' }]);
  expect(await must(server, invited, readInvitation, at(sent))).toMatchObject({ team: 'Row, Bench & Co' });
  expect((await accept(sent)).body).toEqual({ teamId: team.id });
  expect((await must(server, invited, readMe)).teams).toMatchObject([{ id: team.id, role: 'reviewer' }]);
  expect((await accept(sent)).code).toBe('invitation/ended');
});

test('a leaked link is of no use to another, nor to one whose address is not confirmed', async () => {
  const sent = await send();
  for (const person of [
    await signInAs(server, 'Finder'),
    await signInAs(server, 'Pretender', { email: `x${invited.email}`, emailVerified: false }),
  ]) {
    for (const endpoint of [readInvitation, acceptInvitation, declineInvitation]) {
      const answer = await call(server, person, endpoint, at(sent));
      expect([answer.status, answer.code]).toEqual([403, 'invitation/other-address']);
    }
  }
  await server.db.update(tables.user).set({ emailVerified: false }).where(eq(tables.user.id, invited.id));
  expect((await accept(sent)).code).toBe('invitation/other-address');
  expect((await must(server, invited, readMe)).invitations).toEqual([]);
});

test('one that is too old, withdrawn or declined has ended', async () => {
  const old = await send();
  await server.db.update(tables.invitation).set({ expiresAt: new Date(Date.now() - 1000) });
  expect((await accept(old)).code).toBe('invitation/ended');
  expect(await must(server, team.owner, listInvitations, { params: { teamId: team.id } })).toEqual([]);
  const second = await send();
  await must(server, team.owner, withdrawInvitation, at(second));
  expect((await accept(second)).code).toBe('invitation/ended');
  expect((await call(server, team.owner, resendInvitation, at(second))).code).toBe('invitation/ended');
  const third = await send();
  await must(server, invited, declineInvitation, at(third));
  expect((await accept(third)).code).toBe('invitation/ended');
  expect((await must(server, invited, readMe)).teams).toEqual([]);
});

test('sending again renews it and mails once more', async () => {
  const sent = await send();
  await server.db.update(tables.invitation).set({ expiresAt: new Date(Date.now() + 1000) });
  const again = await must(server, team.owner, resendInvitation, at(sent));
  expect(Date.parse(again.expiresAt)).toBeGreaterThan(Date.now() + 13 * 24 * 60 * 60 * 1000);
  expect(await mailsTo(server, invited.email)).toHaveLength(2);
});

test('one address is invited once, even by two clicks at the same moment, and a member not at all', async () => {
  const twice = [0, 1].map(() =>
    call(server, team.owner, invite, { params: { teamId: team.id }, body: { email: invited.email, role: 'guest' } }),
  );
  const answers = await Promise.all(twice);
  expect(answers.map((a) => a.code ?? a.status).sort()).toEqual([201, 'invitation/pending']);
  const member = { email: team.reviewer.email.toUpperCase(), role: 'guest' };
  const answer = await call(server, team.owner, invite, { params: { teamId: team.id }, body: member });
  expect(answer.code).toBe('person/already-member');
});

test('an invitation whose mail did not go out does not stand in the way of the next', async () => {
  isMailBroken = true;
  const failed = await call(server, team.owner, invite, {
    params: { teamId: team.id },
    body: { email: invited.email, role: 'guest' },
  });
  isMailBroken = false;
  expect(failed.status).toBe(500);
  await send();
});

test('a guest is added to the projects of his invitation, as far as they are the team’s', async () => {
  const own = await makeProject(server, team.owner, team.id, 'Coupe');
  const other = await makeTeam(server, 'Others');
  const theirs = await makeProject(server, other.owner, other.id, 'Wagon');
  const sent = await send({ role: 'guest', projects: [own.id, theirs.id] });
  expect(sent.projects).toEqual([own.id]);
  await accept(sent);
  const { projects } = await must(server, invited, listProjects, { params: { teamId: team.id } });
  expect(projects.map((p) => p.name)).toEqual(['Coupe']);
});

test('what a person is called cannot write a mail of its own', async () => {
  await server.db
    .update(tables.user)
    .set({ name: 'Olga\r\nBcc: all@shop.example' })
    .where(eq(tables.user.id, team.owner.id));
  await send();
  const [mail] = await mailsTo(server, invited.email);
  expect(mail!.subject).not.toMatch(/[\r\n]/);
  expect(await mailsTo(server, 'all@shop.example')).toEqual([]);
});
