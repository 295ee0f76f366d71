import { randomUUID } from 'node:crypto';
import { readFile, rm } from 'node:fs/promises';
import { and, eq, sql } from 'drizzle-orm';
import type { Router } from 'express';
import { deletePicture, readPicture, storePicture } from '#shared/api';
import { tables, type Transaction } from '../db/client';
import { describePicture, findPicture } from '../dry-fits/rules';
import { ApiError } from '../http/api-error';
import { mount, SENT } from '../http/mount';
import { sendFile } from '../http/send-file';
import type { Services } from '../http/services';
import { incomingOf, readUpload } from '../http/upload';
import { pngSize } from './png';

const { picture } = tables;

const MAX_BYTES = 16 * 1024 * 1024;

export function pictureRoutes(router: Router, services: Services): void {
  const { db, store, config } = services;

  mount(
    router,
    services,
    storePicture,
    async ({ params, query, person, req }) => {
      const incoming = incomingOf(req);
      if (incoming === null) throw new ApiError('picture/refused');
      try {
        const bytes = await readFile(incoming.file);
        const size = pngSize(bytes);
        if (size === null) throw new ApiError('picture/refused');
        const isFinding = query.kind === 'finding';
        if (isFinding !== (query.findingKey !== undefined)) {
          throw new ApiError('request/invalid', {
            faults: [{ path: 'findingKey', reason: 'goes with the kind “finding”' }],
          });
        }
        const storageKey = `pictures/${params.revisionId}/${randomUUID()}.png`;
        await store.putBytes(storageKey, bytes);
        const insertRow = async (tx: Transaction) => {
          // two pictures of one finding at once come one after the other
          await tx.execute(sql`select 1 from revision where id = ${params.revisionId} for no key update`);
          // a finding has one picture: a newer one takes its place
          const old = isFinding
            ? await tx
                .delete(picture)
                .where(and(eq(picture.revisionId, params.revisionId), eq(picture.findingKey, query.findingKey ?? '')))
                .returning({ key: picture.storageKey })
            : [];
          const [made] = await tx
            .insert(picture)
            .values({
              revisionId: params.revisionId,
              kind: query.kind,
              findingKey: query.findingKey ?? null,
              standpoint: query.standpoint,
              ...size,
              storageKey,
              takenBy: person.id,
            })
            .returning();
          return { made: made!, old };
        };
        const row = await db.transaction(insertRow).catch(async (error: unknown) => {
          await store.remove(storageKey);
          throw error;
        });
        for (const { key } of row.old) await store.remove(key);
        return describePicture(row.made, person.name);
      } finally {
        await rm(incoming.file, { force: true });
      }
    },
    {
      limit: 'picture',
      reader: readUpload(config.files, MAX_BYTES, { noFile: 'picture/refused', tooLarge: 'picture/refused' }),
    },
  );

  mount(router, services, readPicture, async ({ params, req, res }) => {
    const found = await findPicture(db, params.pictureId);
    await sendFile(req, res, store, found.storageKey, { type: 'image/png', tag: found.id });
    return SENT;
  });

  mount(router, services, deletePicture, async ({ params }) => {
    const [gone] = await db.delete(picture).where(eq(picture.id, params.pictureId)).returning();
    if (gone !== undefined) await store.remove(gone.storageKey);
    return null;
  });
}
