// What a stored scene must keep: it loads, its meshes are the team's, saves build on one another, revisions never change.
import { createHash } from 'node:crypto';
import { and, eq, inArray, max, sql } from 'drizzle-orm';
import { meshNames } from '#shared/check';
import { canonicalSceneText, loadScene, MAX_DOCUMENT_BYTES, type Scene } from '#shared/scene';
import { tables, type Queryable, type Transaction } from '../db/client';
import { ApiError } from '../http/api-error';

const { mesh, project, revision, scene, sceneSave } = tables;

export type SceneRow = typeof scene.$inferSelect & { readonly teamId: string; readonly projectName: string };

/** The scene's row with its team, locked for the rest of the transaction. */
export async function lockScene(tx: Transaction, id: string): Promise<SceneRow> {
  await tx.execute(sql`select 1 from scene where id = ${id} for update`);
  return readScene(tx, id);
}

export async function readScene(db: Queryable, id: string): Promise<SceneRow> {
  const [row] = await db
    .select({ scene, teamId: project.teamId, projectName: project.name, projectDeleted: project.deletedAt })
    .from(scene)
    .innerJoin(project, eq(project.id, scene.projectId))
    .where(eq(scene.id, id));
  if (row === undefined) throw new ApiError('thing/missing');
  if (row.projectDeleted !== null) throw new ApiError('project/deleted');
  if (row.scene.deletedAt !== null) throw new ApiError('scene/deleted');
  return { ...row.scene, teamId: row.teamId, projectName: row.projectName };
}

/** A stored or sent document as a scene; refused with the faults if it is none. */
export function sceneOf(document: unknown): Scene {
  const loaded = loadScene(document);
  if (loaded.ok) return loaded.scene;
  throw new ApiError('scene/refused', { faults: loaded.refusals.slice(0, 50) });
}

/** A document that no file could hold is not stored either. */
function assertSize(next: Scene): void {
  const bytes = Buffer.byteLength(canonicalSceneText(next));
  if (bytes <= MAX_DOCUMENT_BYTES) return;
  const reason = `the document has ${bytes} bytes, more than the ${MAX_DOCUMENT_BYTES} allowed`;
  throw new ApiError('scene/refused', { faults: [{ path: '', reason }] });
}

/** Refuses a scene that names meshes which the team does not have; holds those it has until the transaction ends. */
export async function assertMeshes(tx: Transaction, teamId: string, wanted: Scene): Promise<string[]> {
  const names = meshNames(wanted);
  if (names.length === 0) return [];
  const there = await tx
    .select({ sha256: mesh.sha256 })
    .from(mesh)
    .where(and(eq(mesh.teamId, teamId), inArray(mesh.sha256, names)))
    .orderBy(mesh.sha256)
    // whoever deletes one at the same moment waits, and then finds the scene
    .for('share');
  const known = new Set(there.map((m) => m.sha256));
  const missing = names.filter((name) => !known.has(name));
  if (missing.length > 0) {
    throw new ApiError('scene/mesh-missing', {
      detail: `The team does not have ${missing.length === 1 ? 'the mesh' : 'the meshes'} ${missing.map((m) => m.slice(0, 12)).join(', ')}. Upload first.`,
    });
  }
  return names;
}

/** Stores a document as the scene's next save. */
export async function storeSave(
  tx: Transaction,
  row: SceneRow,
  next: Scene,
  personId: string,
  saveId: string,
): Promise<number> {
  assertSize(next);
  const meshes = await assertMeshes(tx, row.teamId, next);
  const saveNumber = row.saveNumber + 1;
  await tx
    .update(scene)
    .set({
      document: next,
      name: next.name,
      parts: next.components.length,
      meshes,
      saveNumber,
      saveId,
      updatedAt: new Date(),
      updatedBy: personId,
    })
    .where(eq(scene.id, row.id));
  await tx.insert(sceneSave).values({ sceneId: row.id, saveId, saveNumber, savedBy: personId });
  return saveNumber;
}

/** The number that a save with this id got, if it was carried out before. */
export async function findSave(db: Queryable, sceneId: string, saveId: string): Promise<number | null> {
  const [save] = await db
    .select({ saveNumber: sceneSave.saveNumber })
    .from(sceneSave)
    .where(and(eq(sceneSave.sceneId, sceneId), eq(sceneSave.saveId, saveId)));
  return save?.saveNumber ?? null;
}

/** What a caller needs who built on an older save. */
export function newerThan(row: SceneRow): ApiError {
  return new ApiError('scene/newer', {
    data: { saveNumber: row.saveNumber, saveId: row.saveId, document: row.document },
  });
}

/**
 * Freezes a scene at the save number that the caller has seen. A revision of the same document and roll-call is given again
 * instead of a second one.
 */
export async function freeze(
  tx: Transaction,
  sceneId: string,
  saveNumber: number,
  personId: string,
): Promise<{ revisionId: string; number: number; scene: Scene; row: SceneRow }> {
  const row = await lockScene(tx, sceneId);
  if (row.saveNumber !== saveNumber) throw newerThan(row);
  const frozen = sceneOf(row.document);
  const meshes = await assertMeshes(tx, row.teamId, frozen);
  const documentText = canonicalSceneText(frozen);
  const sha256 = createHash('sha256').update(documentText).digest('hex');
  const [home] = await tx
    .select({ notOnThisCar: project.notOnThisCar })
    .from(project)
    .where(eq(project.id, row.projectId));
  const notOnThisCar = [...(home?.notOnThisCar ?? [])].sort();
  const [same] = await tx
    .select({ id: revision.id, number: revision.number, notOnThisCar: revision.notOnThisCar })
    .from(revision)
    .where(and(eq(revision.sceneId, sceneId), eq(revision.sha256, sha256)))
    .orderBy(sql`${revision.number} desc`)
    .limit(1);
  if (same !== undefined && same.notOnThisCar.join() === notOnThisCar.join()) {
    // the scene stands again as it stood then: what was checked then is current now
    await tx.update(revision).set({ saveNumber }).where(eq(revision.id, same.id));
    return { revisionId: same.id, number: same.number, scene: frozen, row };
  }
  const [last] = await tx
    .select({ number: max(revision.number) })
    .from(revision)
    .where(eq(revision.sceneId, sceneId));
  const number = (last?.number ?? 0) + 1;
  const [made] = await tx
    .insert(revision)
    .values({ sceneId, number, saveNumber, documentText, sha256, meshes, notOnThisCar, madeBy: personId })
    .returning({ id: revision.id });
  return { revisionId: made!.id, number, scene: frozen, row };
}
