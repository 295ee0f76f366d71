// What a team must keep: at least one owner, each person once.
import { and, eq, sql } from 'drizzle-orm';
import type { Role } from '#shared/access';
import { tables, type Database, type Transaction } from '../db/client';
import { ApiError } from '../http/api-error';

const { membership, project, projectGuest } = tables;

/**
 * Runs a change of a team's people with the team's row locked, so that two owners who leave at the same moment come one after
 * the other; refuses a change that leaves no owner.
 */
export async function changePeople<T>(
  db: Database,
  teamId: string,
  change: (tx: Transaction) => Promise<T>,
): Promise<T> {
  return db.transaction(async (tx) => {
    await tx.execute(sql`select 1 from team where id = ${teamId} for update`);
    const result = await change(tx);
    const owners = await tx
      .select({ id: membership.personId })
      .from(membership)
      .where(and(eq(membership.teamId, teamId), eq(membership.role, 'owner')))
      .limit(1);
    if (owners.length === 0) throw new ApiError('team/last-owner');
    return result;
  });
}

/** Takes a person out of a team, with what he was added to as a guest. */
export async function removeMember(tx: Transaction, teamId: string, personId: string): Promise<boolean> {
  const gone = await tx
    .delete(membership)
    .where(and(eq(membership.teamId, teamId), eq(membership.personId, personId)))
    .returning({ id: membership.personId });
  await removeGuest(tx, teamId, personId);
  return gone.length > 0;
}

/** Takes a person out of all projects of a team that he was added to as a guest. */
export async function removeGuest(tx: Transaction, teamId: string, personId: string): Promise<void> {
  await tx
    .delete(projectGuest)
    .where(
      and(
        eq(projectGuest.personId, personId),
        sql`${projectGuest.projectId} in (select ${project.id} from ${project} where ${project.teamId} = ${teamId})`,
      ),
    );
}

/** Adds a person; one who is there already keeps his role. */
export async function addMember(tx: Transaction, teamId: string, personId: string, role: Role): Promise<void> {
  await tx.insert(membership).values({ teamId, personId, role }).onConflictDoNothing();
}
