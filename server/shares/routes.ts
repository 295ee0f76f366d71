import { and, desc, eq, isNull } from 'drizzle-orm';
import type { Request, Router } from 'express';
import {
  listShares,
  makeShare,
  readShared,
  readSharedMesh,
  readSharedPicture,
  revokeShare,
  type Share,
} from '#shared/api';
import { tables } from '../db/client';
import { findPicture, findRevision } from '../dry-fits/rules';
import { ApiError } from '../http/api-error';
import { mount, SENT } from '../http/mount';
import { sendBytes, sendFile } from '../http/send-file';
import type { Services } from '../http/services';
import { displayMesh } from '../meshes/rules';
import { noteActivity } from '../projects/rules';
import { describeShare, newToken, openShare } from './rules';

const { picture, revision, scene, share, user } = tables;

export function shareRoutes(router: Router, services: Services): void {
  const { db, store, config, limits } = services;
  const describe = (
    row: typeof share.$inferSelect,
    more: { number: number; sceneName: string; madeBy: string | null },
  ): Share => ({
    id: row.id,
    revisionId: row.revisionId,
    revisionNumber: more.number,
    sceneName: more.sceneName,
    url: `${config.baseUrl}/s/${row.token}`,
    pictureId: row.pictureId,
    pictureUrl: row.pictureId === null ? null : `${config.baseUrl}/api/shared/${row.token}/picture`,
    madeBy: more.madeBy ?? 'somebody who has left',
    createdAt: row.createdAt.toISOString(),
    revokedAt: row.revokedAt?.toISOString() ?? null,
  });

  mount(router, services, makeShare, async ({ params, body, person }) => {
    const found = await findRevision(db, params.revisionId);
    if (found.report === null) throw new ApiError('dry-fit/not-done');
    if (body.pictureId !== null) {
      const [own] = await db
        .select({ id: picture.id })
        .from(picture)
        .where(and(eq(picture.id, body.pictureId), eq(picture.revisionId, params.revisionId)));
      if (own === undefined)
        throw new ApiError('request/invalid', {
          faults: [{ path: 'pictureId', reason: 'is no picture of this revision' }],
        });
    }
    const row = await db.transaction(async (tx) => {
      const [made] = await tx
        .insert(share)
        .values({ revisionId: params.revisionId, token: newToken(), pictureId: body.pictureId, madeBy: person.id })
        .returning();
      await noteActivity(
        tx,
        found.project.id,
        person.id,
        `shared revision ${found.revision.number} of “${found.sceneName}”`,
      );
      return made!;
    });
    return describe(row, { number: found.revision.number, sceneName: found.sceneName, madeBy: person.name });
  });

  mount(router, services, listShares, async ({ params }) => {
    const rows = await db
      .select({ share, number: revision.number, sceneName: scene.name, madeBy: user.name })
      .from(share)
      .innerJoin(revision, eq(revision.id, share.revisionId))
      .innerJoin(scene, eq(scene.id, revision.sceneId))
      .leftJoin(user, eq(user.id, share.madeBy))
      .where(eq(scene.projectId, params.projectId))
      .orderBy(desc(share.createdAt))
      .limit(500);
    return rows.map((r) => describe(r.share, r));
  });

  mount(router, services, revokeShare, async ({ params }) => {
    await db
      .update(share)
      .set({ revokedAt: new Date() })
      .where(and(eq(share.id, params.shareId), isNull(share.revokedAt)));
    return null;
  });

  const count = (req: Request): Promise<void> => limits.use('share', req.ip ?? '');

  mount(router, services, readShared, async ({ params, req }) => {
    await count(req);
    return describeShare(db, params.token);
  });

  mount(router, services, readSharedPicture, async ({ params, req, res }) => {
    await count(req);
    const { row } = await openShare(db, params.token);
    if (row.pictureId === null) throw new ApiError('thing/missing');
    const found = await findPicture(db, row.pictureId);
    await sendFile(req, res, store, found.storageKey, { type: 'image/png', tag: found.id, isPublic: true });
    return SENT;
  });

  mount(router, services, readSharedMesh, async ({ params, req, res }) => {
    await count(req);
    const { meshes, revision: found } = await openShare(db, params.token);
    const sha256 = meshes[params.index];
    const bytes = sha256 === undefined ? null : await displayMesh(store, found.project.teamId, sha256);
    if (bytes === null) throw new ApiError('thing/missing');
    sendBytes(req, res, bytes, {
      type: 'application/octet-stream',
      tag: `${found.revision.id}-${params.index}`,
      isPublic: true,
    });
    return SENT;
  });
}
