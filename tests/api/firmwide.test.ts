import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  createBasis,
  createProject,
  listBases,
  listStarters,
  listStock,
  readDesk,
  readEdition,
  readFirm,
  readStock,
  readTrail,
  type Basis,
  type EditionRecord,
  type Output,
  type Problem,
} from '#shared/contracts/index.ts';
import { hashOf } from '#shared/basis/hash.ts';
import { say } from '#shared/trail/index.ts';
import type { App } from '#server/app.ts';
import { makeApp, signInAs, type Client } from '#tests/factories/client.ts';
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

const owner = asOwner();
let app: App;
let firm: TestFirm;
let keeper: Client;
let engineer: Client;
let reader: Client;

beforeAll(async () => {
  app = makeApp();
  firm = await makeFirm(owner);
  keeper = await signInAs(app, firm, 'keeper');
  engineer = await signInAs(app, firm, 'engineer');
  reader = await signInAs(app, firm, 'reader');
});
afterAll(async () => {
  await app.close();
  await owner.close();
});

const problem = (answer: { body: unknown }) => answer.body as Problem;

describe('bases', () => {
  it('can be set up from each starter, as a draft that says how much is unverified', async () => {
    const { items } = (await keeper.call(listStarters)).body as Output<typeof listStarters>;
    expect(items.length).toBeGreaterThan(3);
    for (const { slug, unverified, title } of items) {
      const answer = await keeper.call(createBasis, { body: { title: `From ${slug}`, starter: slug } });
      expect(answer.status).toBe(201);
      const [edition] = (answer.body as Basis).editions;
      expect(edition).toMatchObject({
        number: 1,
        state: 'draft',
        title,
        unverified,
        releasedBy: null,
        projects: 0,
      });
      const record = (await reader.call(readEdition, { params: { id: edition?.id ?? '' } }))
        .body as EditionRecord;
      expect(record.findings.errors).toBe(0);
      expect(hashOf(record.document)).toBe(record.hash);
    }
  });

  it('refuse a starter that does not exist, however it is spelt', async () => {
    for (const starter of ['none', '../server', '']) {
      const answer = await keeper.call(createBasis, { body: { title: 'x', starter } });
      expect([answer.status, problem(answer).errors?.[0]?.pointer]).toEqual([422, '/starter']);
    }
  });

  it('say how many live projects pin an edition', async () => {
    const edition = await makeEdition(firm, { basisTitle: 'Pinned twice' });
    await makeProject(firm, { edition });
    await makeProject(firm, { edition });
    await makeProject(firm, { edition, state: 'closed' });
    const { items } = (await reader.call(listBases)).body as Output<typeof listBases>;
    const basis = items.find(({ title }) => title === 'Pinned twice');
    expect(basis?.editions[0]).toMatchObject({ projects: 2, state: 'released' });
    expect(basis?.editions[0]?.releasedBy?.id).toBe(firm.people.principal.id);
  });
});

describe('stock', () => {
  it('gives ordered and finished sizes', async () => {
    const id = await makeStock(firm);
    const { items } = (await reader.call(listStock)).body as Output<typeof listStock>;
    expect(items.find((list) => list.id === id)).toMatchObject({ sectionCount: 1, invented: true });
    const { sections } = (await reader.call(readStock, { params: { id } })).body as Output<typeof readStock>;
    expect(sections).toEqual([
      {
        id: '50x200',
        nominal: { b: 50, h: 200 },
        actual: { b: 47, h: 195 },
        lengths: [3600, 4800],
        grades: ['T16'],
        pricePerMetre: null,
      },
    ]);
  });
});

describe('the desk', () => {
  it('shows failing and close members of live projects, what is in check, what changed last', async () => {
    const own = await makeFirm(owner);
    const client = await signInAs(app, own, 'checker');
    const edition = await makeEdition(own);
    const inCheck = await makeEdition(own, { state: 'in_check' });
    const project = await makeProject(own, { edition, title: 'Live' });
    const closed = await makeProject(own, { edition, state: 'closed' });
    const long = (mark: string, length: number) => testMember({ mark, spans: [{ length }] });
    await makeMember(own, { project, document: long('F1', 6000) });
    await makeMember(own, { project, document: long('F2', 9000) });
    await makeMember(own, { project, document: long('P1', 2000) });
    await makeMember(own, { project: closed, document: long('F3', 9000) });
    const desk = (await client.call(readDesk)).body as Output<typeof readDesk>;
    expect(desk.failing.map(({ mark, project: of }) => [mark, of.title])).toEqual([
      ['F2', 'Live'],
      ['F1', 'Live'],
    ]);
    expect([desk.failingTotal, desk.closeTotal]).toEqual([2, 0]);
    expect(desk.inCheck.map(({ id }) => id)).toEqual([inCheck.id]);
    expect(desk.recent.map(({ mark }) => mark)).toEqual(['P1', 'F2', 'F1']);
  });
});

describe('the firm', () => {
  it('names its people with roles, and their emails to all but Readers', async () => {
    const seen = (await engineer.call(readFirm)).body as Output<typeof readFirm>;
    expect(seen.people).toHaveLength(5);
    expect(seen.people.find(({ id }) => id === firm.people.keeper.id)).toMatchObject({
      email: firm.people.keeper.email,
      roles: ['keeper'],
    });
    const { people } = (await reader.call(readFirm)).body as Output<typeof readFirm>;
    expect(people.map(({ email }) => email)).toEqual([null, null, null, null, null]);
  });
});

describe('the trail', () => {
  it('is read newest first, page by page, without a gap or a double, and in words', async () => {
    for (const title of ['One', 'Two', 'Three']) await engineer.call(createProject, { body: { title } });
    const read = async (query: Record<string, string | number>) =>
      (await engineer.call(readTrail, { query })).body as Output<typeof readTrail>;
    const all = await read({ limit: 200 });
    expect(all.older).toBeNull();
    const first = await read({ limit: 2 });
    const rest = await read({ limit: 200, before: first.older ?? 0 });
    expect([...first.items, ...rest.items]).toEqual(all.items);
    const opened = await read({ kind: 'project.opened', person: firm.people.engineer.id, limit: 1 });
    expect(opened.items.map(({ event }) => say(event))).toEqual(['opened the project Three']);
  });
});
