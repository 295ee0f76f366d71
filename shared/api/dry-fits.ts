// Revisions, dry fits and their reports, and pictures.
import { z } from 'zod';
import { ROLL_CALL_KEYS } from '#shared/review';
import { defineEndpoint, displayField, may, rowId, sha256, textField, when } from './endpoint';

const sceneParams = z.object({ sceneId: rowId });
const dryFitParams = z.object({ dryFitId: rowId });
const revisionParams = z.object({ revisionId: rowId });

export const DRY_FIT_STATES = ['queued', 'running', 'done', 'failed', 'cancelled'] as const;

const totals = z.object({
  hits: z.number(),
  tight: z.number(),
  loose: z.number(),
  seated: z.number(),
  clears: z.number(),
});

export const dryFit = z.object({
  id: rowId,
  sceneId: rowId,
  revisionId: rowId,
  number: z.number().int(),
  state: z.enum(DRY_FIT_STATES),
  /** Findings worked out, and how many there are to be; 0 while it waits. */
  done: z.number().int(),
  total: z.number().int(),
  /** Why it failed, for the person. */
  problem: z.string().nullable(),
  totals: totals.nullable(),
  startedBy: z.string(),
  createdAt: when,
  endedAt: when.nullable(),
});
export type DryFit = z.infer<typeof dryFit>;

/** Freezes what the scene is at `saveNumber` and checks it. */
export const runDryFit = defineEndpoint({
  method: 'POST',
  path: '/scenes/:sceneId/dry-fits',
  who: may('dry-fit.run', 'scene', 'sceneId'),
  params: sceneParams,
  body: z.object({ saveNumber: z.number().int().min(0) }),
  response: dryFit,
  status: 202,
  errors: ['scene/newer', 'scene/empty', 'scene/deleted', 'scene/mesh-missing'],
});
export const listDryFits = defineEndpoint({
  method: 'GET',
  path: '/scenes/:sceneId/dry-fits',
  who: may('report.read', 'scene', 'sceneId'),
  params: sceneParams,
  response: z.array(dryFit),
});
export const readDryFit = defineEndpoint({
  method: 'GET',
  path: '/dry-fits/:dryFitId',
  who: may('report.read', 'dry-fit', 'dryFitId'),
  params: dryFitParams,
  response: dryFit,
});
export const cancelDryFit = defineEndpoint({
  method: 'POST',
  path: '/dry-fits/:dryFitId/cancel',
  who: may('dry-fit.run', 'dry-fit', 'dryFitId'),
  params: dryFitParams,
  response: dryFit,
  errors: ['dry-fit/ended'],
});

export const picture = z.object({
  id: rowId,
  revisionId: rowId,
  kind: z.enum(['view', 'finding']),
  /** For a finding's picture: which finding. */
  findingKey: z.string().nullable(),
  standpoint: z.string(),
  width: z.number().int(),
  height: z.number().int(),
  takenBy: z.string(),
  createdAt: when,
});
export type Picture = z.infer<typeof picture>;

export const revision = z.object({
  id: rowId,
  sceneId: rowId,
  projectId: rowId,
  teamId: rowId,
  projectName: z.string(),
  projectDisplay: displayField,
  number: z.number().int(),
  saveNumber: z.number().int(),
  sha256,
  madeBy: z.string(),
  createdAt: when,
  notOnThisCar: z.array(z.enum(ROLL_CALL_KEYS)),
  document: z.unknown(),
  /** The stored report of its latest finished dry fit. */
  report: z.unknown().nullable(),
  dryFit: dryFit.nullable(),
  pictures: z.array(picture),
});
export const readRevision = defineEndpoint({
  method: 'GET',
  path: '/revisions/:revisionId',
  who: may('report.read', 'revision', 'revisionId'),
  params: revisionParams,
  response: revision,
});
/** Freezes what the scene is at `saveNumber`, or answers with the revision that already holds it. */
export const freezeRevision = defineEndpoint({
  method: 'POST',
  path: '/scenes/:sceneId/revisions',
  who: may('picture.take', 'scene', 'sceneId'),
  params: sceneParams,
  body: z.object({ saveNumber: z.number().int().min(0) }),
  response: z.object({ revisionId: rowId, number: z.number().int() }),
  status: 201,
  errors: ['scene/newer', 'scene/deleted', 'scene/mesh-missing'],
});

/** A PNG in the field `file`, with the facts beside it as fields. */
export const storePicture = defineEndpoint({
  method: 'POST',
  path: '/revisions/:revisionId/pictures',
  who: may('picture.take', 'revision', 'revisionId'),
  params: revisionParams,
  query: z.object({
    kind: z.enum(['view', 'finding']),
    findingKey: z.string().max(600).optional(),
    standpoint: textField(80),
  }),
  takes: 'multipart',
  response: picture,
  status: 201,
  errors: ['picture/refused'],
});
export const readPicture = defineEndpoint({
  method: 'GET',
  path: '/pictures/:pictureId',
  who: may('report.read', 'picture', 'pictureId'),
  params: z.object({ pictureId: rowId }),
  gives: 'file',
});
export const deletePicture = defineEndpoint({
  method: 'DELETE',
  path: '/pictures/:pictureId',
  who: may('picture.take', 'picture', 'pictureId'),
  params: z.object({ pictureId: rowId }),
});
