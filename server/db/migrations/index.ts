import * as firms from './001-firms-and-people.ts';
import * as bases from './002-bases-and-stock.ts';
import * as projects from './003-projects-and-members.ts';
import * as trail from './004-trail.ts';
import * as isolation from './005-isolation-and-permanence.ts';
import * as sessions from './006-sessions-and-limits.ts';
import * as drafts from './007-drafts.ts';

/** Forward only, in order; a file that was released is never edited. */
export const migrations: readonly { name: string; up: string }[] = [
  firms,
  bases,
  projects,
  trail,
  isolation,
  sessions,
  drafts,
];
