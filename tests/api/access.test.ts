import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { can, couldEver, roles } from '#shared/access/index.ts';
import type { Contract, Problem } from '#shared/contracts/index.ts';
import { contracts } from '#shared/contracts/registry.ts';
import type { App } from '#server/app.ts';
import { makeApp, signInAs, visitor, type Client } from '#tests/factories/client.ts';
import { asOwner } from '#tests/factories/database.ts';
import {
  makeEdition,
  makeFirm,
  makeMember,
  makeProject,
  makeStock,
  type TestFirm,
} from '#tests/factories/firm.ts';
import { testMember } from '#tests/factories/member.ts';

/*
 * Generated from the contracts: whoever adds an endpoint has it covered here the same day. What the tests
 * look for in answers is a word that stands in every record of the first firm.
 */
const SECRET = 'Hushwood';
const owner = asOwner();
let app: App;
let firm: TestFirm;
let ids: Record<string, string>;
const clients = new Map<string, Client>();

const guarded = contracts.map(({ contract }) => contract).filter(({ action }) => !can(null, action));
const named = guarded.map((contract) => [`${contract.method} ${contract.path}`, contract] as const);

beforeAll(async () => {
  app = makeApp();
  firm = await makeFirm(owner);
  const other = await makeFirm(owner);
  const edition = await makeEdition(firm, { basisTitle: `${SECRET} basis` });
  const project = await makeProject(firm, { title: `${SECRET} hall`, edition });
  const member = await makeMember(firm, { project, document: testMember({ title: `${SECRET} joist` }) });
  ids = {
    projects: project.id,
    members: member.id,
    editions: edition.id,
    bases: edition.basisId,
    stock: await makeStock(firm),
  };
  for (const role of roles) {
    clients.set(role, await signInAs(app, firm, role));
    clients.set(`other ${role}`, await signInAs(app, other, role));
  }
});
afterAll(async () => {
  await app.close();
  await owner.close();
});

function client(name: string): Client {
  const found = clients.get(name);
  if (!found) throw new Error(`Nobody is signed in as ${name}.`);
  return found;
}

/** A request that the endpoint takes, on the first firm's record. */
function sentTo(contract: Contract) {
  const resource = contract.path.split('/')[1] ?? '';
  const needsId = contract.path.includes(':');
  const id = ids[resource];
  if (needsId && id === undefined) throw new Error(`Make a record for ${contract.path} in this test.`);
  const query = 'version' in contract.query.properties ? { version: 1 } : {};
  return {
    params: needsId && id !== undefined ? { id } : {},
    query,
    ...(contract.body ? { body: contract.example } : {}),
  };
}

describe.each(named)('%s', (_name, contract) => {
  it('gives a signed-out visitor nothing', async () => {
    const answer = await visitor(app).call(contract, sentTo(contract));
    expect([answer.status, (answer.body as Problem).code]).toEqual([401, 'signed-out']);
    expect(answer.text).not.toContain(SECRET);
  });

  it('gives people of a second firm nothing of the first', async () => {
    for (const role of roles) {
      const answer = await client(`other ${role}`).call(contract, sentTo(contract));
      expect(answer.text).not.toContain(SECRET);
      for (const id of Object.values(ids)) expect(answer.text).not.toContain(id);
      // On a record of the first firm nothing exists for them, whatever they may do in their own.
      if (contract.path.includes(':')) expect([role, answer.status]).toEqual([role, 404]);
    }
  });

  const refused = roles.filter((role) => !couldEver({ roles: [role] }, contract.action));
  if (refused.length > 0)
    it(`gives ${refused.join(', ')} of the firm itself nothing`, async () => {
      for (const role of refused) {
        const answer = await client(role).call(contract, sentTo(contract));
        expect([role, answer.status]).toEqual([role, contract.method === 'GET' ? 404 : 403]);
        expect(answer.text).not.toContain(SECRET);
      }
    });

  const reading = contract.method === 'GET' ? roles.filter((role) => !refused.includes(role)) : [];
  if (reading.length > 0)
    it('answers everyone who may read it', async () => {
      for (const role of reading) {
        const answer = await client(role).call(contract, sentTo(contract));
        expect([role, answer.status]).toEqual([role, contract.status]);
      }
    });
});

describe('the tests above', () => {
  it('looked for a word that the first firm does see', async () => {
    const seen: string[] = [];
    for (const [name, contract] of named) {
      if (contract.method !== 'GET') continue;
      const answer = await client('engineer').call(contract, sentTo(contract));
      if (answer.text.includes(SECRET)) seen.push(name);
    }
    expect(seen.length).toBeGreaterThan(8);
  });

  it('left the first firm’s records as they were', async () => {
    const [project, member] = await firm.as('engineer', async (door) => [
      await door.projects.one({ id: ids['projects'] ?? '' }),
      await door.members.one({ id: ids['members'] ?? '' }),
    ]);
    expect([project?.version, member?.version, member?.state]).toEqual([1, 1, 'live']);
  });
});
