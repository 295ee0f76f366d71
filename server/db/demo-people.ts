// The people of the demo team, one in each role. Made up; their addresses cannot receive mail.
import type { Role } from '#shared/access';

export const DEMO_PASSWORD = 'gapwright-demo';

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
}

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: 'Odile Marchetti', email: 'owner@demo.example', role: 'owner' },
  { name: 'Dag Tollefsen', email: 'designer@demo.example', role: 'designer' },
  { name: 'Renske Abara', email: 'reviewer@demo.example', role: 'reviewer' },
  { name: 'Gus Whitlow', email: 'guest@demo.example', role: 'guest' },
];
