import * as bases from './bases.ts';
import type { Contract } from './contract.ts';
import * as desk from './desk.ts';
import * as drafts from './drafts.ts';
import * as firm from './firm.ts';
import * as health from './health.ts';
import * as members from './members.ts';
import * as openapi from './openapi.ts';
import * as projects from './projects.ts';
import * as session from './session.ts';
import * as stock from './stock.ts';
import * as trail from './trail.ts';

const files = { health, openapi, session, desk, projects, members, bases, drafts, stock, trail, firm };

function isContract(value: unknown): value is Contract {
  return typeof value === 'object' && value !== null && 'path' in value && 'action' in value;
}

/** Every endpoint there is, with the resource it belongs to. */
export const contracts: readonly { resource: string; contract: Contract }[] = Object.entries(files).flatMap(
  ([resource, file]) =>
    Object.values(file)
      .filter(isContract)
      .map((contract) => ({ resource, contract })),
);
