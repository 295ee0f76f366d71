// What is kept about meshes, for other resources too.
import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { MESH_UNITS, type MeshLine, type MeshUnit } from '#shared/api';
import { tables, type Queryable } from '../db/client';
import { createQueue } from '../jobs/queue';
import { runThread } from '../jobs/thread';
import type { FileStore } from '../storage/file-store';
import type { MeshAnswer, MeshFacts } from './worker';

const { mesh, project, scene, user } = tables;

export const meshKey = (teamId: string, sha256: string): string => `meshes/${teamId}/${sha256}.stl`;
export const displayKey = (teamId: string, sha256: string): string => `displays/${teamId}/${sha256}.gwdm`;

/** A part of a firewall zone measures something between these, mm; what a unit makes of a file is held against it. */
const LIKELY = { least: 60, most: 2500 };

/** The unit that makes the mesh about as large as a part of a car; millimetres where it is a toss-up. */
export function guessUnit(facts: Pick<MeshFacts, 'low' | 'high'>): MeshUnit {
  const largest = Math.max(...facts.high.map((x, k) => x - facts.low[k]!));
  const order: readonly MeshUnit[] = ['mm', 'in', 'm', 'cm', 'ft'];
  const fits = (unit: MeshUnit): boolean => {
    const size = largest * MESH_UNITS[unit];
    return size >= LIKELY.least && size <= LIKELY.most;
  };
  return order.find(fits) ?? 'mm';
}

export type Judged =
  | { readonly ok: true; readonly facts: MeshFacts; readonly sha256: string }
  | { readonly ok: false; readonly reason: string };

/** A mesh on the bench takes hundreds of megabytes: more than this many at a time wait for one another. */
const oneOfFew = createQueue(2);

/** Reads and judges a file in a thread. */
export async function judgeFile(file: string, signal?: AbortSignal): Promise<Judged> {
  const answer = (await oneOfFew(
    () => runThread('mesh-worker', { data: { kind: 'judge', file }, memory: 2048, signal }),
    signal,
  )) as MeshAnswer;
  if (answer.kind === 'judged') return { ok: true, facts: answer.facts, sha256: answer.sha256 };
  return { ok: false, reason: answer.kind === 'refused' ? answer.reason : 'the file could not be read' };
}

/** The display mesh of a team's mesh; made at the first call and kept. Null if there is no such mesh. */
export async function displayMesh(store: FileStore, teamId: string, sha256: string): Promise<Uint8Array | null> {
  const key = displayKey(teamId, sha256);
  const kept = await store.readBytes(key);
  if (kept !== null) return kept;
  const answer = await oneOfFew(async () => {
    const bytes = await store.readBytes(meshKey(teamId, sha256));
    if (bytes === null) return null;
    return (await runThread('mesh-worker', { data: { kind: 'display', bytes }, memory: 2048 })) as MeshAnswer;
  });
  if (answer?.kind !== 'display') return null;
  await store.putBytes(key, answer.bytes);
  return answer.bytes;
}

type MeshRow = typeof mesh.$inferSelect;

function describe(row: MeshRow, uploadedBy: string | null): MeshLine {
  return {
    ...row,
    low: row.low as [number, number, number],
    high: row.high as [number, number, number],
    unit: row.unit as MeshUnit | null,
    guess: row.guess as MeshUnit,
    uploadedBy: uploadedBy ?? 'somebody who has left',
    createdAt: row.createdAt.toISOString(),
  };
}

export async function listMeshLines(
  db: Queryable,
  teamId: string,
  query: {
    readonly search?: string | undefined;
    readonly sort: 'created' | 'name' | 'triangles';
    readonly sha256?: string;
  },
): Promise<MeshLine[]> {
  const order = {
    created: sql`${mesh.createdAt} desc`,
    name: sql`lower(${mesh.name})`,
    triangles: sql`${mesh.triangles} desc`,
  }[query.sort];
  const pattern = `%${(query.search ?? '').replace(/[\\%_]/g, '\\$&')}%`;
  const rows = await db
    .select({ mesh, by: user.name })
    .from(mesh)
    .leftJoin(user, eq(user.id, mesh.uploadedBy))
    .where(
      and(
        eq(mesh.teamId, teamId),
        query.sha256 === undefined ? undefined : eq(mesh.sha256, query.sha256),
        query.search === undefined || query.search === '' ? undefined : sql`${mesh.name} ilike ${pattern}`,
      ),
    )
    .orderBy(order, mesh.sha256)
    .limit(1000);
  return rows.map((r) => describe(r.mesh, r.by));
}

/** The meshes that a project's scenes use, with the names of those scenes. */
export async function meshesOfProject(db: Queryable, projectId: string) {
  const rows = await db
    .select({
      sha256: mesh.sha256,
      name: mesh.name,
      unit: mesh.unit,
      kind: mesh.kind,
      scenes: sql<string[]>`array_agg(${scene.name} order by lower(${scene.name}))`,
    })
    .from(scene)
    .innerJoin(project, eq(project.id, scene.projectId))
    .innerJoin(mesh, and(eq(mesh.teamId, project.teamId), sql`${mesh.sha256} = any(${scene.meshes})`))
    .where(and(eq(scene.projectId, projectId), isNull(scene.deletedAt)))
    .groupBy(mesh.teamId, mesh.sha256)
    .orderBy(asc(sql`lower(${mesh.name})`), mesh.sha256);
  return rows.map((row) => ({ ...row, unit: row.unit as MeshUnit | null }));
}
