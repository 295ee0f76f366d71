// Reading scenes for lists.
import { and, eq, ilike, isNotNull, isNull, sql, type SQL } from 'drizzle-orm';
import type { SceneLine } from '#shared/api';
import { tables, type Queryable } from '../db/client';

const { scene, user } = tables;

interface Latest {
  readonly revisionId: string;
  readonly number: number;
  readonly totals: Readonly<Record<string, number>>;
  readonly at: string;
  readonly saveNumber: number;
}

const latestOf = sql<Latest | null>`(
  select json_build_object('revisionId', r.id, 'number', r.number, 'totals', d.totals, 'at', d.ended_at, 'saveNumber', r.save_number)
  from dry_fit d join revision r on r.id = d.revision_id
  where d.scene_id = ${scene.id} and d.state = 'done' order by d.created_at desc limit 1)`;

const pictureOf = sql<string | null>`(
  select p.id from picture p join revision r on r.id = p.revision_id
  where r.scene_id = ${scene.id} and p.kind = 'view' order by p.created_at desc limit 1)`;

const ORDERS: Readonly<Record<'updated' | 'name' | 'created', SQL>> = {
  updated: sql`${scene.updatedAt} desc, ${scene.id}`,
  created: sql`${scene.createdAt} desc, ${scene.id}`,
  name: sql`lower(${scene.name}), ${scene.id}`,
};

function stateFilter(state: 'open' | 'archived' | 'deleted'): SQL | undefined {
  if (state === 'deleted') return isNotNull(scene.deletedAt);
  return and(isNull(scene.deletedAt), eq(scene.archived, state === 'archived'));
}

async function selectLines(db: Queryable, where: SQL | undefined, order: SQL): Promise<SceneLine[]> {
  const rows = await db
    .select({
      id: scene.id,
      projectId: scene.projectId,
      name: scene.name,
      archived: scene.archived,
      saveNumber: scene.saveNumber,
      parts: scene.parts,
      createdAt: scene.createdAt,
      updatedAt: scene.updatedAt,
      updatedBy: user.name,
      deletedAt: scene.deletedAt,
      latest: latestOf,
      pictureId: pictureOf,
    })
    .from(scene)
    .leftJoin(user, eq(user.id, scene.updatedBy))
    .where(where)
    .orderBy(order)
    .limit(500);
  return rows.map(({ latest, ...row }) => ({
    ...row,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    updatedBy: row.updatedBy ?? 'somebody who has left',
    deletedAt: row.deletedAt?.toISOString() ?? null,
    latest:
      latest === null
        ? null
        : {
            revisionId: latest.revisionId,
            number: latest.number,
            hits: latest.totals['hits'] ?? 0,
            tight: latest.totals['tight'] ?? 0,
            loose: latest.totals['loose'] ?? 0,
            at: new Date(latest.at).toISOString(),
            current: latest.saveNumber === row.saveNumber,
          },
  }));
}

export function listSceneLines(
  db: Queryable,
  projectId: string,
  query: { search?: string | undefined; sort: 'updated' | 'name' | 'created'; state: 'open' | 'archived' | 'deleted' },
): Promise<SceneLine[]> {
  const pattern =
    query.search === undefined || query.search === '' ? null : `%${query.search.replace(/[\\%_]/g, '\\$&')}%`;
  return selectLines(
    db,
    and(
      eq(scene.projectId, projectId),
      stateFilter(query.state),
      pattern === null ? undefined : ilike(scene.name, pattern),
    ),
    ORDERS[query.sort],
  );
}

export async function findSceneLine(db: Queryable, id: string): Promise<SceneLine | undefined> {
  return (await selectLines(db, eq(scene.id, id), ORDERS.updated))[0];
}
