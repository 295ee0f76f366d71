// A team's meshes, stored once by the SHA-256 of their file.
import { z } from 'zod';
import { defineEndpoint, may, nameField, rowId, sha256, when } from './endpoint';

const teamParams = z.object({ teamId: rowId });
const meshParams = z.object({ teamId: rowId, sha256 });

/** mm per file unit that a person can choose by name. */
export const MESH_UNITS = { mm: 1, cm: 10, m: 1000, in: 25.4, ft: 304.8 } as const;
export type MeshUnit = keyof typeof MESH_UNITS;
export const meshUnits = Object.keys(MESH_UNITS) as [MeshUnit, ...MeshUnit[]];

export const mesh = z.object({
  teamId: rowId,
  sha256,
  name: z.string(),
  bytes: z.number().int(),
  form: z.enum(['binary', 'text']),
  triangles: z.number().int(),
  /** Extent in file units. */
  low: z.tuple([z.number(), z.number(), z.number()]),
  high: z.tuple([z.number(), z.number(), z.number()]),
  /** `body` is a closed shape, `sheet` an open surface. */
  kind: z.enum(['body', 'sheet']),
  badEdges: z.number().int(),
  shells: z.number().int(),
  dropped: z.number().int(),
  /** Null until a person has said it. */
  unit: z.enum(meshUnits).nullable(),
  guess: z.enum(meshUnits),
  uploadedBy: z.string(),
  createdAt: when,
});
export type MeshLine = z.infer<typeof mesh>;

export const listMeshes = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/meshes',
  who: may('mesh.list', 'team', 'teamId'),
  params: teamParams,
  query: z.object({
    search: z.string().trim().max(120).optional(),
    sort: z.enum(['created', 'name', 'triangles']).default('created'),
  }),
  response: z.array(mesh),
});
/** The meshes that the open scenes of a project use, and in which. */
export const listProjectMeshes = defineEndpoint({
  method: 'GET',
  path: '/projects/:projectId/meshes',
  who: may('project.read', 'project', 'projectId'),
  params: z.object({ projectId: rowId }),
  response: z.array(
    mesh.pick({ sha256: true, name: true, unit: true, kind: true }).extend({ scenes: z.array(z.string()) }),
  ),
});
/** One file in the field `file`. If the team has the file already, the answer is what is there, and `isNew` is false. */
export const uploadMesh = defineEndpoint({
  method: 'POST',
  path: '/teams/:teamId/meshes',
  who: may('mesh.upload', 'team', 'teamId'),
  params: teamParams,
  takes: 'multipart',
  response: z.object({ mesh, isNew: z.boolean() }),
  status: 201,
  errors: ['mesh/refused', 'mesh/too-large', 'mesh/no-file'],
});
export const readMesh = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/meshes/:sha256',
  who: may('mesh.read', 'mesh', 'sha256'),
  params: meshParams,
  response: mesh,
});
export const changeMesh = defineEndpoint({
  method: 'PATCH',
  path: '/teams/:teamId/meshes/:sha256',
  who: may('mesh.change', 'mesh', 'sha256'),
  params: meshParams,
  body: z.object({ name: nameField.optional(), unit: z.enum(meshUnits).optional() }),
  response: mesh,
});
export const deleteMesh = defineEndpoint({
  method: 'DELETE',
  path: '/teams/:teamId/meshes/:sha256',
  who: may('mesh.change', 'mesh', 'sha256'),
  params: meshParams,
  errors: ['mesh/in-use'],
});
/** The file as it was uploaded, for the check in the page. */
export const readMeshFile = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/meshes/:sha256/file',
  who: may('mesh.read', 'mesh', 'sha256'),
  params: meshParams,
  gives: 'file',
});
/** A thinned-out copy for drawing; see display-mesh.ts for its form. */
export const readDisplayMesh = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/meshes/:sha256/display',
  who: may('mesh.read', 'mesh', 'sha256'),
  params: meshParams,
  gives: 'file',
});
