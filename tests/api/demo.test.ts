import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  listBases,
  listProjectMembers,
  listProjects,
  readEdition,
  readSession,
  verifyMember,
  type EditionRecord,
  type Output,
  type Session,
} from '#shared/contracts/index.ts';
import { compile, runProofs } from '#shared/engine/index.ts';
import type { App } from '#server/app.ts';
import { demoPassword, seed } from '#server/db/seed.ts';
import { createPasswords } from '#server/http/passwords.ts';
import { makeApp, signIn, type Client } from '#tests/factories/client.ts';
import { address } from '#tests/factories/database.ts';

let app: App;
let engineer: Client;
let signIns: Awaited<ReturnType<typeof seed>>;

beforeAll(async () => {
  // Other tests of this run may have seeded the same database with the usual, slower hashes.
  signIns = await seed(address('DATABASE_OWNER_URL'), createPasswords({ fast: true }));
  app = makeApp();
  engineer = await signIn(app, 'engineer@wrenlock.example', demoPassword);
});
afterAll(() => app.close());

type Rows = Output<typeof listProjectMembers>['items'];

async function rowsByProject(): Promise<Map<string, Rows>> {
  const { items } = (await engineer.call(listProjects)).body as Output<typeof listProjects>;
  const rows = new Map<string, Rows>();
  for (const { id, title } of items) {
    const answer = await engineer.call(listProjectMembers, { params: { id } });
    rows.set(title, (answer.body as Output<typeof listProjectMembers>).items);
  }
  return rows;
}

describe('the demo firm', () => {
  it('has one sign-in for each role, all with the printed password', async () => {
    expect(signIns.map(({ role }) => role)).toEqual([
      'Principal',
      'Basis keeper',
      'Engineer',
      'Checker',
      'Reader',
    ]);
    for (const { email, name } of signIns) {
      const client = await signIn(app, email, demoPassword);
      const { signedIn } = (await client.call(readSession)).body as Session;
      expect([signedIn?.person.name, signedIn?.firm.invented]).toEqual([name, true]);
    }
  });

  it('is set up once, and the next start leaves it as people made it', async () => {
    const before = (await engineer.call(listProjects)).body as Output<typeof listProjects>;
    expect(await seed(address('DATABASE_OWNER_URL'))).toEqual(signIns);
    expect((await engineer.call(listProjects)).body).toEqual(before);
  });

  it('says of itself everywhere that it is invented', async () => {
    for (const title of (await rowsByProject()).keys()) expect(title).toContain('invented');
  });

  it('has passing, close and failing members on the starter edition', async () => {
    const rows = (await rowsByProject()).get('Kestrel Row reading room (invented)') ?? [];
    expect(Object.fromEntries(rows.map(({ mark, result }) => [mark, result?.word]))).toEqual({
      B1: 'passes',
      C1: 'passes',
      J1: 'passes',
      J2: 'fails',
      J3: 'passes',
      L1: 'passes',
      R1: 'passes',
      T1: 'close',
    });
  });

  it('has a departure on the house basis, and says so', async () => {
    const rows = (await rowsByProject()).get('Furrow End barn (invented)') ?? [];
    expect(rows.map(({ mark, result }) => [mark, result?.word, result?.departures])).toEqual([
      ['B1', 'close', 0],
      ['J1', 'passes', 0],
      ['J2', 'passes', 0],
      ['L1', 'passes', 1],
    ]);
  });

  it('has results that come out the same, byte for byte, when they are computed again', async () => {
    for (const rows of (await rowsByProject()).values()) {
      for (const { id, mark } of rows) {
        const answer = await engineer.call(verifyMember, { params: { id } });
        expect([mark, answer.body]).toEqual([mark, expect.objectContaining({ same: true })]);
      }
    }
  });

  it('has editions without errors whose proofs hold, one of them still in check', async () => {
    const { items } = (await engineer.call(listBases)).body as Output<typeof listBases>;
    const editions = items.flatMap((basis) => basis.editions);
    expect(editions.map(({ state }) => state).sort()).toEqual(['in_check', 'released', 'released']);
    for (const { id } of editions) {
      const { document } = (await engineer.call(readEdition, { params: { id } })).body as EditionRecord;
      const outcome = compile(document);
      if (!outcome.ok) throw new Error(outcome.findings.map(({ message }) => message).join(' '));
      expect(runProofs(outcome.plan).filter(({ holds }) => !holds)).toEqual([]);
    }
  });
});
