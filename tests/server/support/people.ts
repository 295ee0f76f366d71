// People who are signed in already: put into the database with a session, without the detour over mails and passwords.
import { createHmac, randomBytes, randomUUID } from 'node:crypto';
import type { Role } from '#shared/access';
import { tables } from '../../../server/db/client';
import type { TestServer } from './server';

export interface TestPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly cookie: string;
}

/** As the auth library signs its cookies: the token, a dot, its HMAC-SHA256 in base64. */
function signed(token: string, secret: string): string {
  return encodeURIComponent(`${token}.${createHmac('sha256', secret).update(token).digest('base64')}`);
}

export async function signInAs(
  server: TestServer,
  name: string,
  more: { readonly email?: string; readonly emailVerified?: boolean } = {},
): Promise<TestPerson> {
  const id = randomUUID();
  const email = more.email ?? `${name.toLowerCase().replace(/[^a-z]/g, '')}-${id.slice(0, 8)}@shop.example`;
  const token = randomBytes(24).toString('hex');
  await server.db.insert(tables.user).values({ id, name, email, emailVerified: more.emailVerified ?? true });
  const expiresAt = new Date(Date.now() + 60 * 60 * 1000);
  await server.db.insert(tables.session).values({ id: randomUUID(), token, userId: id, expiresAt });
  return { id, name, email, cookie: `gapwright.session_token=${signed(token, server.config.secret)}` };
}

export async function join(server: TestServer, teamId: string, person: TestPerson, role: Role): Promise<void> {
  await server.db.insert(tables.membership).values({ teamId, personId: person.id, role });
}

export interface TestTeam {
  readonly id: string;
  readonly owner: TestPerson;
  readonly designer: TestPerson;
  readonly reviewer: TestPerson;
  readonly guest: TestPerson;
}

/** A team with a person in each role; the guest is in no project yet. */
export async function makeTeam(server: TestServer, name = 'Tin Lizard Garage'): Promise<TestTeam> {
  const [made] = await server.db.insert(tables.team).values({ name }).returning({ id: tables.team.id });
  const id = made!.id;
  const people = {
    owner: await signInAs(server, 'Olga Owner'),
    designer: await signInAs(server, 'Dieter Designer'),
    reviewer: await signInAs(server, 'Rita Reviewer'),
    guest: await signInAs(server, 'Gil Guest'),
  };
  for (const [role, person] of Object.entries(people)) await join(server, id, person, role as Role);
  return { id, ...people };
}
