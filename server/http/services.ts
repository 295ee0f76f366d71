// What the routes work with; built once in main.ts, and by tests.
import type { Logger } from 'pino';
import type { Auth } from '../auth/auth';
import type { Config } from '../config';
import type { Database } from '../db/client';
import type { Jobs } from '../jobs/jobs';
import type { Limits } from './limits';
import type { Mailer } from '../mail/mailer';
import type { FileStore } from '../storage/file-store';

export interface Services {
  readonly config: Config;
  readonly db: Database;
  readonly auth: Auth;
  readonly mailer: Mailer;
  readonly store: FileStore;
  readonly jobs: Jobs;
  readonly limits: Limits;
  readonly log: Logger;
  /** False while the server drains. */
  readonly ready: () => boolean;
}
