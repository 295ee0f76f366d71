// Scenes and their documents.
import { z } from 'zod';
import { differenceSchema } from '#shared/scene';
import { defineEndpoint, displayField, may, nameField, rowId, when } from './endpoint';

const sceneParams = z.object({ sceneId: rowId });
const projectParams = z.object({ projectId: rowId });

export const sceneLine = z.object({
  id: rowId,
  projectId: rowId,
  name: z.string(),
  archived: z.boolean(),
  saveNumber: z.number().int(),
  parts: z.number().int(),
  createdAt: when,
  updatedAt: when,
  updatedBy: z.string(),
  deletedAt: when.nullable(),
  latest: z
    .object({
      revisionId: rowId,
      number: z.number().int(),
      hits: z.number(),
      tight: z.number(),
      loose: z.number(),
      at: when,
      /** Whether the scene still is what was checked. */
      current: z.boolean(),
    })
    .nullable(),
  pictureId: rowId.nullable(),
});
export type SceneLine = z.infer<typeof sceneLine>;

export const SCENE_STATES = ['open', 'archived', 'deleted'] as const;
export const SCENE_SORTS = ['updated', 'name', 'created'] as const;

export const listScenes = defineEndpoint({
  method: 'GET',
  path: '/projects/:projectId/scenes',
  who: may('project.read', 'project', 'projectId'),
  params: projectParams,
  query: z.object({
    search: z.string().trim().max(120).optional(),
    sort: z.enum(SCENE_SORTS).default('updated'),
    state: z.enum(SCENE_STATES).default('open'),
  }),
  response: z.array(sceneLine),
});
export const createScene = defineEndpoint({
  method: 'POST',
  path: '/projects/:projectId/scenes',
  who: may('scene.create', 'project', 'projectId'),
  params: projectParams,
  body: z.object({ name: nameField }),
  response: sceneLine,
  status: 201,
});
export const duplicateScene = defineEndpoint({
  method: 'POST',
  path: '/scenes/:sceneId/duplicate',
  who: may('scene.change', 'scene', 'sceneId'),
  params: sceneParams,
  body: z.object({ name: nameField }),
  response: sceneLine,
  status: 201,
});
/** Renaming changes the document's name and so counts as a save. */
export const changeScene = defineEndpoint({
  method: 'PATCH',
  path: '/scenes/:sceneId',
  who: may('scene.change', 'scene', 'sceneId'),
  params: sceneParams,
  body: z.object({ name: nameField.optional(), archived: z.boolean().optional() }),
  response: sceneLine,
  errors: ['scene/deleted'],
});
export const deleteScene = defineEndpoint({
  method: 'DELETE',
  path: '/scenes/:sceneId',
  who: may('scene.delete', 'scene', 'sceneId'),
  params: sceneParams,
});
export const restoreScene = defineEndpoint({
  method: 'POST',
  path: '/scenes/:sceneId/restore',
  who: may('scene.delete', 'scene', 'sceneId'),
  params: sceneParams,
  response: sceneLine,
});

export const openDocument = z.object({
  sceneId: rowId,
  teamId: rowId,
  projectId: rowId,
  projectName: z.string(),
  projectDisplay: displayField,
  saveNumber: z.number().int(),
  /** The saveId of the save that made this number, so that a client knows its own. */
  saveId: z.uuid().nullable(),
  canEdit: z.boolean(),
  /** Read through loadScene on both sides. */
  document: z.unknown(),
});
export const readDocument = defineEndpoint({
  method: 'GET',
  path: '/scenes/:sceneId/document',
  who: may('scene.read', 'scene', 'sceneId'),
  params: sceneParams,
  response: openDocument,
  errors: ['scene/deleted'],
});
/**
 * Saves on top of save number `base`. A repeated saveId answers as the first time did. 409 `scene/newer` carries the newer
 * document as `data: { saveNumber, saveId, document }`.
 */
export const saveDocument = defineEndpoint({
  method: 'PUT',
  path: '/scenes/:sceneId/document',
  who: may('scene.change', 'scene', 'sceneId'),
  params: sceneParams,
  body: z
    .object({
      base: z.number().int().min(0),
      saveId: z.uuid(),
      difference: differenceSchema.optional(),
      document: z.unknown().optional(),
    })
    .refine((b) => (b.difference === undefined) !== (b.document === undefined), 'needs one of difference and document'),
  takesDocument: true,
  response: z.object({ saveNumber: z.number().int() }),
  errors: ['scene/newer', 'scene/refused', 'scene/deleted', 'scene/mesh-missing'],
});
