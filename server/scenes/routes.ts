import { randomUUID } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import type { Router } from 'express';
import {
  changeScene,
  createScene,
  deleteScene,
  duplicateScene,
  listScenes,
  readDocument,
  restoreScene,
  saveDocument,
} from '#shared/api';
import { mayShow } from '#shared/access';
import { applyDifference, newScene, patchHead, type Scene } from '#shared/scene';
import { tables, type Transaction } from '../db/client';
import { ApiError } from '../http/api-error';
import { mount } from '../http/mount';
import type { Services } from '../http/services';
import { noteActivity, noteActivityOnce, touchProject } from '../projects/rules';
import { findSceneLine, listSceneLines } from './queries';
import { assertMeshes, findSave, lockScene, newerThan, readScene, sceneOf, storeSave } from './rules';

const { project, scene } = tables;

export function sceneRoutes(router: Router, services: Services): void {
  const { db } = services;
  const line = async (id: string) => {
    const found = await findSceneLine(db, id);
    if (found === undefined) throw new ApiError('thing/missing');
    return found;
  };

  const insert = async (tx: Transaction, projectId: string, document: Scene, meshes: string[], personId: string) => {
    const [made] = await tx
      .insert(scene)
      .values({
        projectId,
        name: document.name,
        document,
        parts: document.components.length,
        meshes,
        updatedBy: personId,
      })
      .returning({ id: scene.id });
    await touchProject(tx, projectId);
    return made!.id;
  };

  mount(router, services, listScenes, ({ params, query }) => listSceneLines(db, params.projectId, query));

  mount(router, services, createScene, async ({ params, body, person }) => {
    const id = await db.transaction(async (tx) => {
      const [home] = await tx.select().from(project).where(eq(project.id, params.projectId));
      if (home === undefined || home.deletedAt !== null) throw new ApiError('project/deleted');
      const made = await insert(tx, params.projectId, newScene(body.name, home.display), [], person.id);
      await noteActivity(tx, params.projectId, person.id, `made the scene “${body.name}”`);
      return made;
    });
    return line(id);
  });

  mount(router, services, duplicateScene, async ({ params, body, person }) => {
    const id = await db.transaction(async (tx) => {
      const row = await readScene(tx, params.sceneId);
      const copy = patchHead(sceneOf(row.document), { name: body.name });
      const meshes = await assertMeshes(tx, row.teamId, copy);
      const made = await insert(tx, row.projectId, copy, meshes, person.id);
      await noteActivity(tx, row.projectId, person.id, `made “${body.name}” from “${row.name}”`);
      return made;
    });
    return line(id);
  });

  mount(router, services, changeScene, async ({ params, body, person }) => {
    await db.transaction(async (tx) => {
      const row = await lockScene(tx, params.sceneId);
      if (body.name !== undefined && body.name !== row.name) {
        const renamed = patchHead(sceneOf(row.document), { name: body.name });
        await storeSave(tx, row, renamed, person.id, randomUUID());
        await noteActivity(tx, row.projectId, person.id, `renamed “${row.name}” to “${body.name}”`);
      }
      if (body.archived !== undefined && body.archived !== row.archived) {
        await tx.update(scene).set({ archived: body.archived }).where(eq(scene.id, row.id));
        const what = body.archived ? 'archived' : 'took out of the archive';
        await noteActivity(tx, row.projectId, person.id, `${what} “${row.name}”`);
      }
      await touchProject(tx, row.projectId);
    });
    return line(params.sceneId);
  });

  mount(router, services, deleteScene, async ({ params, person }) => {
    await db.transaction(async (tx) => {
      const [row] = await tx
        .update(scene)
        .set({ deletedAt: sql`coalesce(${scene.deletedAt}, now())` })
        .where(eq(scene.id, params.sceneId))
        .returning();
      if (row !== undefined) await noteActivity(tx, row.projectId, person.id, `deleted “${row.name}”`);
    });
    return null;
  });

  mount(router, services, restoreScene, async ({ params, person }) => {
    await db.transaction(async (tx) => {
      const [row] = await tx.update(scene).set({ deletedAt: null }).where(eq(scene.id, params.sceneId)).returning();
      if (row !== undefined) await noteActivity(tx, row.projectId, person.id, `brought “${row.name}” back`);
    });
    return line(params.sceneId);
  });

  mount(router, services, readDocument, async ({ params, role }) => {
    const row = await readScene(db, params.sceneId);
    const [home] = await db.select({ display: project.display }).from(project).where(eq(project.id, row.projectId));
    return {
      sceneId: row.id,
      teamId: row.teamId,
      projectId: row.projectId,
      projectName: row.projectName,
      projectDisplay: home?.display ?? 'mm',
      saveNumber: row.saveNumber,
      saveId: row.saveId,
      canEdit: mayShow(role, 'scene.change'),
      document: row.document,
    };
  });

  mount(router, services, saveDocument, async ({ params, body, person }) => {
    const saveNumber = await db.transaction(async (tx) => {
      const row = await lockScene(tx, params.sceneId);
      const before = await findSave(tx, row.id, body.saveId);
      if (before !== null) return before;
      if (row.saveNumber !== body.base) throw newerThan(row);
      const number = await storeSave(tx, row, nextDocument(row.document, body), person.id, body.saveId);
      await noteActivityOnce(tx, row.projectId, person.id, `worked on “${row.name}”`);
      await touchProject(tx, row.projectId);
      return number;
    });
    return { saveNumber };
  });
}

function nextDocument(current: unknown, body: { difference?: unknown; document?: unknown }): Scene {
  if (body.difference === undefined) return sceneOf(body.document);
  const applied = applyDifference(sceneOf(current), body.difference as Parameters<typeof applyDifference>[1]);
  if (!applied.ok) {
    throw new ApiError('scene/refused', {
      detail: 'The changes do not fit the document they name as their base.',
      faults: applied.conflicts.map((path) => ({ path, reason: 'stands otherwise than the change expects' })),
    });
  }
  return sceneOf(applied.scene);
}
