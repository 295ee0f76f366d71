// A server process that takes a job and never ends it, to be killed in the middle: `tsx stuck-worker.ts DATABASE_URL`.
import { openDatabase } from '../../../server/db/client';
import { createLog } from '../../../server/http/log';
import { startJobs } from '../../../server/jobs/jobs';

const { db, pool } = openDatabase(process.argv[2]!, 4, () => undefined);
await startJobs({
  db,
  pool,
  log: createLog('silent'),
  concurrency: 1,
  handlers: {
    'dry-fit': async () => {
      process.stdout.write('taken\n');
      await new Promise(() => undefined);
    },
    sweep: () => Promise.resolve(),
  },
});
setInterval(() => undefined, 60_000);
