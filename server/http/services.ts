import type { Logger } from 'pino';
import type { Database } from '#server/db/connection.ts';
import type { Judge } from '#server/judge/judge.ts';
import type { Limits } from './limits.ts';
import type { Sessions } from './session.ts';

/** What handlers are given, made once when the application is built. */
export interface Services {
  database: Database;
  judge: Judge;
  limits: Limits;
  sessions: Sessions;
  log: Logger;
}
