// The database: one pool a process, transactions, and nothing else.
import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import { Pool } from 'pg';
import * as accounts from './tables/accounts';
import * as dryFits from './tables/dry-fits';
import * as meshes from './tables/meshes';
import * as projects from './tables/projects';
import * as scenes from './tables/scenes';
import * as service from './tables/service';
import * as teams from './tables/teams';

export const tables = { ...accounts, ...teams, ...projects, ...scenes, ...meshes, ...dryFits, ...service };

export type Database = NodePgDatabase<typeof tables>;
/** Inside a transaction; queries take either. */
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];
export type Queryable = Database | Transaction;

export interface DatabaseHandle {
  readonly db: Database;
  readonly pool: Pool;
  readonly close: () => Promise<void>;
}

export function openDatabase(url: string, connections: number, onError: (error: Error) => void): DatabaseHandle {
  const pool = new Pool({
    connectionString: url,
    max: connections,
    application_name: 'gapwright',
    // a request that gets no connection fails instead of hanging
    connectionTimeoutMillis: 15_000,
  });
  // a connection that dies while idle must not end the process
  pool.on('error', onError);
  // nor one that dies between two queries of its holder
  pool.on('connect', (client) => client.on('error', onError));
  return { pool, db: drizzle(pool, { schema: tables }), close: () => pool.end() };
}
