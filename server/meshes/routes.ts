import { rm } from 'node:fs/promises';
import { and, arrayContains, eq, sql } from 'drizzle-orm';
import type { Response, Router } from 'express';
import {
  changeMesh,
  deleteMesh,
  listMeshes,
  listProjectMeshes,
  readDisplayMesh,
  readMesh,
  readMeshFile,
  uploadMesh,
  type MeshLine,
} from '#shared/api';
import { tables, type Transaction } from '../db/client';
import { ApiError } from '../http/api-error';
import { mount, SENT } from '../http/mount';
import { sendBytes, sendFile } from '../http/send-file';
import type { Services } from '../http/services';
import { displayKey, displayMesh, guessUnit, judgeFile, listMeshLines, meshesOfProject, meshKey } from './rules';
import { incomingOf, readUpload, type Incoming } from '../http/upload';

const { mesh, project, revision, scene } = tables;

/** Aborts when the client goes away before the answer. */
function goneSignal(res: Response): AbortSignal {
  const controller = new AbortController();
  res.once('close', () => {
    if (!res.writableEnded) controller.abort();
  });
  return controller.signal;
}

export function meshRoutes(router: Router, services: Services): void {
  const { db, store, config } = services;
  const find = async (teamId: string, sha256: string): Promise<MeshLine> => {
    const [found] = await listMeshLines(db, teamId, { sort: 'name', sha256 });
    if (found === undefined) throw new ApiError('thing/missing');
    return found;
  };

  mount(router, services, listMeshes, ({ params, query }) => listMeshLines(db, params.teamId, query));

  mount(router, services, listProjectMeshes, ({ params }) => meshesOfProject(db, params.projectId));

  // the name by which an upload and a deletion of one mesh wait for one another
  const lockMesh = (tx: Transaction, key: string) =>
    tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${key}, 0))`);

  const keep = async (incoming: Incoming, teamId: string, personId: string, signal: AbortSignal) => {
    const judged = await judgeFile(incoming.file, signal);
    if (!judged.ok) throw new ApiError('mesh/refused', { detail: `${incoming.name} was not taken: ${judged.reason}.` });
    const { sha256, facts } = judged;
    const key = meshKey(teamId, sha256);
    // the file first: a row must never name a file that is not there
    const wasThere = await store.has(key);
    if (!wasThere) await store.takeFile(key, incoming.file);
    const row = { teamId, sha256, name: incoming.name, bytes: incoming.bytes, ...facts, guess: guessUnit(facts) };
    try {
      const made = await db.transaction(async (tx) => {
        await lockMesh(tx, key);
        const rows = await tx
          .insert(mesh)
          .values({ ...row, uploadedBy: personId })
          .onConflictDoNothing()
          .returning({ sha256: mesh.sha256 });
        // somebody deleted the mesh since the look at the storage
        if (wasThere && !(await store.has(key))) await store.takeFile(key, incoming.file);
        return rows;
      });
      return { mesh: await find(teamId, sha256), isNew: made.length > 0 };
    } catch (error) {
      // the team is gone, say: a file that no row names would lie there for ever
      if ((await listMeshLines(db, teamId, { sort: 'name', sha256 })).length === 0) await store.remove(key);
      throw error;
    }
  };

  mount(
    router,
    services,
    uploadMesh,
    async ({ params, req, res, person }) => {
      const incoming = incomingOf(req);
      if (incoming === null) throw new ApiError('mesh/no-file');
      try {
        return await keep(incoming, params.teamId, person.id, goneSignal(res));
      } finally {
        await rm(incoming.file, { force: true });
      }
    },
    {
      limit: 'upload',
      reader: readUpload(config.files, config.maxMeshBytes, { noFile: 'mesh/no-file', tooLarge: 'mesh/too-large' }),
    },
  );

  mount(router, services, readMesh, ({ params }) => find(params.teamId, params.sha256));

  mount(router, services, changeMesh, async ({ params, body }) => {
    // an empty change has no columns to set
    if (body.name !== undefined || body.unit !== undefined) {
      await db
        .update(mesh)
        .set(body)
        .where(and(eq(mesh.teamId, params.teamId), eq(mesh.sha256, params.sha256)));
    }
    return find(params.teamId, params.sha256);
  });

  mount(router, services, deleteMesh, async ({ params }) => {
    await db.transaction(async (tx) => {
      await lockMesh(tx, meshKey(params.teamId, params.sha256));
      // a scene that is just being saved with this mesh must wait, or be seen
      await tx.execute(
        sql`select 1 from mesh where team_id = ${params.teamId} and sha256 = ${params.sha256} for update`,
      );
      const inScenes = await tx
        .select({ name: scene.name, project: project.name })
        .from(scene)
        .innerJoin(project, eq(project.id, scene.projectId))
        .where(and(eq(project.teamId, params.teamId), arrayContains(scene.meshes, [params.sha256])))
        .limit(3);
      const inRevisions = await tx
        .select({ name: scene.name, project: project.name })
        .from(revision)
        .innerJoin(scene, eq(scene.id, revision.sceneId))
        .innerJoin(project, eq(project.id, scene.projectId))
        .where(and(eq(project.teamId, params.teamId), arrayContains(revision.meshes, [params.sha256])))
        .limit(3);
      const users = [...inScenes, ...inRevisions].map((u) => `“${u.name}” (${u.project})`);
      if (users.length > 0) {
        throw new ApiError('mesh/in-use', {
          detail: `It is used by ${[...new Set(users)].join(', ')} or a revision of it.`,
        });
      }
      await tx.delete(mesh).where(and(eq(mesh.teamId, params.teamId), eq(mesh.sha256, params.sha256)));
      await store.remove(meshKey(params.teamId, params.sha256));
      await store.remove(displayKey(params.teamId, params.sha256));
    });
    return null;
  });

  mount(router, services, readMeshFile, async ({ params, req, res }) => {
    const found = await find(params.teamId, params.sha256);
    await sendFile(req, res, store, meshKey(params.teamId, params.sha256), {
      type: 'model/stl',
      tag: params.sha256,
      download: `${found.name.replace(/\.stl$/i, '')}.stl`,
    });
    return SENT;
  });

  mount(router, services, readDisplayMesh, async ({ params, req, res }) => {
    const bytes = await displayMesh(store, params.teamId, params.sha256);
    if (bytes === null) throw new ApiError('thing/missing');
    sendBytes(req, res, bytes, { type: 'application/octet-stream', tag: `d-${params.sha256}` });
    return SENT;
  });
}
