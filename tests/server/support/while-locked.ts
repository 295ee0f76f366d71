// Makes requests meet: they all run up against a lock that the test holds, and are let go together.
import { Client } from 'pg';
import type { TestServer } from './server';
import { until } from './things';

/** Holds what `lock` locks while `begin` starts requests; lets go when at least `waiting` of them stand before a lock. */
export async function whileLocked<T>(
  server: TestServer,
  lock: string,
  waiting: number,
  begin: () => readonly Promise<T>[],
): Promise<T[]> {
  const holder = new Client({ connectionString: server.databaseUrl });
  await holder.connect();
  try {
    await holder.query('begin');
    await holder.query(lock);
    const requests = begin();
    await until('the requests to meet', async () => {
      // a transaction sees one picture of the server's activity otherwise
      await holder.query('select pg_stat_clear_snapshot()');
      const { rows } = await holder.query<{ n: number }>(
        `select count(*)::int as n from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`,
      );
      return rows[0]!.n >= waiting;
    });
    await holder.query('commit');
    return await Promise.all(requests);
  } finally {
    await holder.end();
  }
}
