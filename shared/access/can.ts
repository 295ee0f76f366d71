// Who may do what. The server decides with this table, in one place; the client only hides what it denies.

export const ROLES = ['owner', 'designer', 'reviewer', 'guest'] as const;
export type Role = (typeof ROLES)[number];

/** What somebody is to the thing at hand. */
export interface Standing {
  /** The person's role in the team that owns the thing; null for a stranger to it. */
  readonly role: Role | null;
  /** For a guest: whether he was added to the project that the thing belongs to. */
  readonly addedToProject: boolean;
}

export type Verdict = 'yes' | 'no' | 'stranger';

const everyone: readonly Role[] = ['owner', 'designer', 'reviewer', 'guest'];
const members: readonly Role[] = ['owner', 'designer', 'reviewer'];
const makers: readonly Role[] = ['owner', 'designer'];
const owners: readonly Role[] = ['owner'];

const TABLE = {
  'team.read': everyone,
  'team.leave': everyone,
  'team.change': owners,
  'team.delete': owners,
  'people.read': members,
  'people.change': owners,
  'project.list': everyone,
  'project.create': makers,
  'project.read': everyone,
  'project.change': makers,
  'project.delete': makers,
  'guests.read': members,
  'guests.change': makers,
  'scene.read': everyone,
  'scene.create': makers,
  'scene.change': makers,
  'scene.delete': makers,
  'mesh.list': members,
  'mesh.read': everyone,
  'mesh.upload': makers,
  'mesh.change': makers,
  'dry-fit.run': makers,
  'report.read': everyone,
  'picture.take': makers,
  'share.read': members,
  'share.make': makers,
} as const satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof TABLE;
export const ACTIONS = Object.keys(TABLE) as readonly Action[];

/** Actions on the team itself. All others are on a project or on something in it, and to a guest who was not added to that
 * project there is no such thing. */
const ON_TEAM: ReadonlySet<Action> = new Set<Action>([
  'team.read',
  'team.leave',
  'team.change',
  'team.delete',
  'people.read',
  'people.change',
  'project.list',
  'project.create',
  'mesh.list',
  'mesh.upload',
]);

/**
 * Decides: `yes`; `no` for a member without the right; `stranger` for anyone outside the team, and for a guest outside the
 * projects he was added to: they are not told that the thing exists.
 */
export function can(standing: Standing, action: Action): Verdict {
  const { role } = standing;
  if (role === null) return 'stranger';
  if (role === 'guest' && !ON_TEAM.has(action) && !standing.addedToProject) return 'stranger';
  const roles: readonly Role[] = TABLE[action];
  return roles.includes(role) ? 'yes' : 'no';
}

/** For the client: whether to show a control at all. */
export function mayShow(role: Role | null, action: Action): boolean {
  return role !== null && TABLE[action].includes(role);
}

/** What a role may do, in a line for the people page. */
export const ROLE_MEANING: Readonly<Record<Role, string>> = {
  owner: 'everything, the team and its members included',
  designer: 'creates and edits projects and scenes, uploads meshes, runs dry fits, makes share links',
  reviewer: 'reads all, comments, decides findings, signs or refuses a revision',
  guest: 'reads the projects he was added to',
};
