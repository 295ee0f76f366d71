// The diary of a project: one line for each thing that somebody did.
import { and, eq, gt, sql } from 'drizzle-orm';
import { tables, type Queryable } from '../db/client';

/** Writes a line; inside the transaction of the deed itself. `what` reads on from the person's name. */
export async function noteActivity(db: Queryable, projectId: string, personId: string, what: string): Promise<void> {
  // not the transaction's time, which several lines of one transaction would share
  await db
    .insert(tables.activity)
    .values({ projectId, personId, what: what.slice(0, 400), at: sql`clock_timestamp()` });
}

/** As noteActivity, but a line that says the same as one of the last half hour is left out. */
export async function noteActivityOnce(
  db: Queryable,
  projectId: string,
  personId: string,
  what: string,
): Promise<void> {
  const { activity } = tables;
  const [recent] = await db
    .select({ id: activity.id })
    .from(activity)
    .where(
      and(
        eq(activity.projectId, projectId),
        eq(activity.personId, personId),
        eq(activity.what, what),
        gt(activity.at, new Date(Date.now() - 30 * 60 * 1000)),
      ),
    )
    .limit(1);
  if (recent === undefined) await noteActivity(db, projectId, personId, what);
}

/** Moves a project to the front of lists sorted by last change. */
export async function touchProject(db: Queryable, projectId: string): Promise<void> {
  await db.update(tables.project).set({ updatedAt: new Date() }).where(eq(tables.project.id, projectId));
}
