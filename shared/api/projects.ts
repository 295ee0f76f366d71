// Projects: one car each.
import { z } from 'zod';
import { ROLES } from '#shared/access';
import { ROLL_CALL_KEYS } from '#shared/review';
import { defineEndpoint, displayField, may, nameField, pageQuery, personId, rowId, textField, when } from './endpoint';

const projectParams = z.object({ projectId: rowId });
const teamParams = z.object({ teamId: rowId });

export const project = z.object({
  id: rowId,
  teamId: rowId,
  name: z.string(),
  /** The car in the team's own words. */
  car: z.string(),
  display: displayField,
  notes: z.string(),
  /** Roll-call entries that are not on this car. */
  notOnThisCar: z.array(z.enum(ROLL_CALL_KEYS)),
  archived: z.boolean(),
  createdAt: when,
  updatedAt: when,
  /** The reader's own role in the team. */
  role: z.enum(ROLES),
});
export type Project = z.infer<typeof project>;

export const projectLine = project.extend({
  scenes: z.number().int(),
  /** Worst figures of the latest finished dry fit of any scene; null if there is none. */
  latest: z.object({ hits: z.number(), tight: z.number(), loose: z.number(), at: when }).nullable(),
  /** The latest picture of any scene. */
  pictureId: rowId.nullable(),
  deletedAt: when.nullable(),
});
export type ProjectLine = z.infer<typeof projectLine>;

export const PROJECT_SORTS = ['updated', 'name', 'created'] as const;
export const PROJECT_STATES = ['open', 'archived', 'deleted'] as const;

export const listProjects = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/projects',
  who: may('project.list', 'team', 'teamId'),
  params: teamParams,
  query: pageQuery.extend({
    search: z.string().trim().max(120).optional(),
    sort: z.enum(PROJECT_SORTS).default('updated'),
    state: z.enum(PROJECT_STATES).default('open'),
  }),
  response: z.object({ projects: z.array(projectLine), after: z.string().nullable() }),
});

const facts = z.object({
  name: nameField,
  car: textField(200),
  display: displayField,
  notes: textField(5000),
});
export const createProject = defineEndpoint({
  method: 'POST',
  path: '/teams/:teamId/projects',
  who: may('project.create', 'team', 'teamId'),
  params: teamParams,
  body: facts.partial({ car: true, display: true, notes: true }),
  response: project,
  status: 201,
});
export const readProject = defineEndpoint({
  method: 'GET',
  path: '/projects/:projectId',
  who: may('project.read', 'project', 'projectId'),
  params: projectParams,
  response: project,
  errors: ['project/deleted'],
});
export const changeProject = defineEndpoint({
  method: 'PATCH',
  path: '/projects/:projectId',
  who: may('project.change', 'project', 'projectId'),
  params: projectParams,
  body: facts.partial().extend({
    notOnThisCar: z.array(z.enum(ROLL_CALL_KEYS)).max(ROLL_CALL_KEYS.length).optional(),
    archived: z.boolean().optional(),
  }),
  response: project,
  errors: ['project/deleted'],
});
export const deleteProject = defineEndpoint({
  method: 'DELETE',
  path: '/projects/:projectId',
  who: may('project.delete', 'project', 'projectId'),
  params: projectParams,
});
export const restoreProject = defineEndpoint({
  method: 'POST',
  path: '/projects/:projectId/restore',
  who: may('project.delete', 'project', 'projectId'),
  params: projectParams,
  response: project,
});

export const listGuests = defineEndpoint({
  method: 'GET',
  path: '/projects/:projectId/guests',
  who: may('guests.read', 'project', 'projectId'),
  params: projectParams,
  /** All guests of the team, and whether each is added to this project. */
  response: z.array(z.object({ id: personId, name: z.string(), email: z.string(), added: z.boolean() })),
});
export const setGuest = defineEndpoint({
  method: 'PUT',
  path: '/projects/:projectId/guests/:personId',
  who: may('guests.change', 'project', 'projectId'),
  params: z.object({ projectId: rowId, personId }),
  body: z.object({ added: z.boolean() }),
  errors: ['person/not-guest'],
});

export const listActivity = defineEndpoint({
  method: 'GET',
  path: '/projects/:projectId/activity',
  who: may('project.read', 'project', 'projectId'),
  params: projectParams,
  query: pageQuery,
  response: z.object({
    entries: z.array(z.object({ id: z.string(), who: z.string(), what: z.string(), at: when })),
    after: z.string().nullable(),
  }),
});
