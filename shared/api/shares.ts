// Share links: one revision, open to whoever has the link, until it is revoked.
import { z } from 'zod';
import { anyone, defineEndpoint, displayField, may, rowId, when } from './endpoint';

export const share = z.object({
  id: rowId,
  revisionId: rowId,
  revisionNumber: z.number().int(),
  sceneName: z.string(),
  /** The whole address to copy. */
  url: z.string(),
  pictureId: rowId.nullable(),
  /** The picture's public address, for pasting into a build thread. */
  pictureUrl: z.string().nullable(),
  madeBy: z.string(),
  createdAt: when,
  revokedAt: when.nullable(),
});
export type Share = z.infer<typeof share>;

export const makeShare = defineEndpoint({
  method: 'POST',
  path: '/revisions/:revisionId/shares',
  who: may('share.make', 'revision', 'revisionId'),
  params: z.object({ revisionId: rowId }),
  body: z.object({ pictureId: rowId.nullable().default(null) }),
  response: share,
  status: 201,
  errors: ['dry-fit/not-done'],
});
export const listShares = defineEndpoint({
  method: 'GET',
  path: '/projects/:projectId/shares',
  who: may('share.read', 'project', 'projectId'),
  params: z.object({ projectId: rowId }),
  response: z.array(share),
});
export const revokeShare = defineEndpoint({
  method: 'DELETE',
  path: '/shares/:shareId',
  who: may('share.make', 'share', 'shareId'),
  params: z.object({ shareId: rowId }),
});

const token = z.string().regex(/^[A-Za-z0-9_-]{20,64}$/);
const tokenParams = z.object({ token });

/** What the public sees, and nothing else: no names of people, no other revisions, no supplier's files. */
export const sharedRevision = z.object({
  projectName: z.string(),
  sceneName: z.string(),
  number: z.number().int(),
  createdAt: when,
  display: displayField,
  /** The opening sentence's parts. */
  sentence: z.unknown(),
  verdict: z.string().nullable(),
  totals: z.record(z.string(), z.number()),
  missing: z.array(z.string()),
  /** Shapes, poses and motions for drawing; meshes by their place in `meshes`. */
  document: z.unknown(),
  /** Worst findings for the list, with their witness marks. */
  findings: z.array(z.unknown()),
  meshes: z.array(z.string()),
  hasPicture: z.boolean(),
});
export const readShared = defineEndpoint({
  method: 'GET',
  path: '/shared/:token',
  who: anyone,
  params: tokenParams,
  response: sharedRevision,
  errors: ['share/revoked'],
});
export const readSharedPicture = defineEndpoint({
  method: 'GET',
  path: '/shared/:token/picture',
  who: anyone,
  params: tokenParams,
  gives: 'file',
  errors: ['share/revoked'],
});
export const readSharedMesh = defineEndpoint({
  method: 'GET',
  path: '/shared/:token/meshes/:index',
  who: anyone,
  params: tokenParams.extend({ index: z.coerce.number().int().min(0).max(2000) }),
  gives: 'file',
  errors: ['share/revoked'],
});
