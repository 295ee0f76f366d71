// Reading projects: lists come in one query, however long they are.
import { and, eq, ilike, isNotNull, isNull, sql, type SQL } from 'drizzle-orm';
import type { Role } from '#shared/access';
import type { Project, ProjectLine } from '#shared/api';
import { tables, type Queryable } from '../db/client';

const { project, projectGuest } = tables;

type Row = typeof project.$inferSelect;

export function describeProject(row: Row, role: Role): Project {
  return {
    id: row.id,
    teamId: row.teamId,
    name: row.name,
    car: row.car,
    display: row.display,
    notes: row.notes,
    notOnThisCar: row.notOnThisCar as Project['notOnThisCar'],
    archived: row.archived,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    role,
  };
}

interface ListOptions {
  readonly teamId: string;
  readonly personId: string;
  readonly role: Role;
  readonly search?: string | undefined;
  readonly sort: 'updated' | 'name' | 'created';
  readonly state: 'open' | 'archived' | 'deleted';
  readonly limit: number;
  /** How many to pass over: the cursor. */
  readonly offset: number;
}

/** % and _ in a search are letters like others. */
export const containing = (text: string): string => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

/** Written out: in a query of one table the builder leaves the table's name away, and a subquery would read its own id. */
const OUTER_ID = sql.raw('"project"."id"');

const ORDERS: Readonly<Record<ListOptions['sort'], SQL>> = {
  updated: sql`${project.updatedAt} desc, ${project.id}`,
  created: sql`${project.createdAt} desc, ${project.id}`,
  name: sql`lower(${project.name}), ${project.id}`,
};

function stateFilter(state: ListOptions['state']): SQL | undefined {
  if (state === 'deleted') return isNotNull(project.deletedAt);
  return and(isNull(project.deletedAt), eq(project.archived, state === 'archived'));
}

/** One line a project, with counts, its latest finished dry fit and its latest picture. */
export async function listProjectLines(db: Queryable, o: ListOptions): Promise<ProjectLine[]> {
  const rows = await db
    .select({
      project,
      scenes: sql<number>`(select count(*)::int from scene where scene.project_id = ${OUTER_ID} and scene.deleted_at is null)`,
      latest: sql<{ totals: Record<string, number>; at: string } | null>`(
        select json_build_object('totals', d.totals, 'at', d.ended_at)
        from dry_fit d join scene s on s.id = d.scene_id
        where s.project_id = ${OUTER_ID} and s.deleted_at is null and d.state = 'done'
        order by d.created_at desc limit 1)`,
      pictureId: sql<string | null>`(
        select p.id from picture p join revision r on r.id = p.revision_id join scene s on s.id = r.scene_id
        where s.project_id = ${OUTER_ID} and s.deleted_at is null and p.kind = 'view'
        order by p.created_at desc limit 1)`,
    })
    .from(project)
    .where(
      and(
        eq(project.teamId, o.teamId),
        stateFilter(o.state),
        o.search === undefined || o.search === ''
          ? undefined
          : sql`(${ilike(project.name, containing(o.search))} or ${ilike(project.car, containing(o.search))})`,
        o.role === 'guest'
          ? sql`exists (select 1 from ${projectGuest} where ${projectGuest.projectId} = ${project.id} and ${projectGuest.personId} = ${o.personId})`
          : undefined,
      ),
    )
    .orderBy(ORDERS[o.sort])
    .limit(o.limit)
    .offset(o.offset);
  return rows.map((row) => ({
    ...describeProject(row.project, o.role),
    scenes: row.scenes,
    latest:
      row.latest === null
        ? null
        : {
            hits: row.latest.totals['hits'] ?? 0,
            tight: row.latest.totals['tight'] ?? 0,
            loose: row.latest.totals['loose'] ?? 0,
            at: new Date(row.latest.at).toISOString(),
          },
    pictureId: row.pictureId,
    deletedAt: row.project.deletedAt?.toISOString() ?? null,
  }));
}
