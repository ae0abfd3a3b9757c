import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  createProject,
  listProjects,
  pinEdition,
  readMember,
  readProject,
  readTrail,
  saveMember,
  updateProject,
  type MemberRecord,
  type Output,
  type Problem,
  type Project,
} from '#shared/contracts/index.ts';
import type { App } from '#server/app.ts';
import { makeApp, signInAs, type Client } from '#tests/factories/client.ts';
import { asOwner } from '#tests/factories/database.ts';
import { testEdition } from '#tests/factories/edition.ts';
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
let engineer: Client;
let reader: Client;

beforeAll(async () => {
  app = makeApp();
  firm = await makeFirm(owner);
  [engineer, reader] = [await signInAs(app, firm, 'engineer'), await signInAs(app, firm, 'reader')];
});
afterAll(async () => {
  await app.close();
  await owner.close();
});

const problem = (answer: { body: unknown }) => answer.body as Problem;
const missing = '11111111-1111-4111-8111-111111111111';

/** A stricter edition of the test basis: a tenth of the grade stress. */
function stricterEdition() {
  const edition = testEdition({ title: 'Stricter' });
  const rows = edition.grades.rows.map((row) =>
    row.id === 'T24' ? { ...row, values: { ...row.values, f_m: 0.7 } } : row,
  );
  return { ...edition, grades: { ...edition.grades, rows } };
}

describe('a project', () => {
  it('is opened, changed and read', async () => {
    const stockListId = await makeStock(firm);
    const opened = await engineer.call(createProject, { body: { title: 'Lock-keeper’s loft', stockListId } });
    expect(opened.status).toBe(201);
    const { id, version, edition, counts } = opened.body as Project;
    expect([version, edition, counts]).toEqual([1, null, { passes: 0, close: 0, fails: 0, none: 0 }]);
    const changed = await engineer.call(updateProject, {
      params: { id },
      body: { version: 1, site: 'Lower lock', stockListId: null },
    });
    expect(changed.body).toMatchObject({ version: 2, site: 'Lower lock', stockListId: null });
    const read = (await reader.call(readProject, { params: { id } })).body as Project;
    expect(read).toEqual({ ...(changed.body as Project), abilities: ['projects.read'] });
  });

  it('that was changed meanwhile is not overwritten', async () => {
    const { id } = await makeProject(firm, { edition: null });
    await engineer.call(updateProject, { params: { id }, body: { version: 1, title: 'Mine' } });
    const body = { version: 1, title: 'Theirs' };
    const answer = await engineer.call(updateProject, { params: { id }, body });
    expect(answer.status).toBe(409);
    expect(problem(answer)).toMatchObject({
      code: 'stale-version',
      stored: { version: 2, title: 'Mine' },
      sent: body,
    });
  });

  it('once closed takes no pin and no member, and can be opened again', async () => {
    const project = await makeProject(firm, { state: 'closed' });
    const params = { id: project.id };
    const { abilities } = (await engineer.call(readProject, { params })).body as Project;
    expect(abilities).toEqual(['projects.read', 'projects.update']);
    const body = { editionId: project.editionId, version: 1, reason: 'x' };
    const answer = await engineer.call(pinEdition, { params, body });
    expect([answer.status, problem(answer).code]).toEqual([409, 'not-in-this-state']);
    const opened = await engineer.call(updateProject, { params, body: { version: 1, state: 'live' } });
    expect((opened.body as Project).abilities).toContain('projects.pin');
  });

  it.each([
    ['a blank title', { title: '   ' }, '/title'],
    ['a stock list of nobody', { title: 'x', stockListId: missing }, '/stockListId'],
    ['a stock list that is no identifier', { title: 'x', stockListId: 'yard' }, '/stockListId'],
    ['a choice that is no option', { title: 'x', choices: { exposure: 7 } }, '/choices/exposure'],
    ['a title without end', { title: 'x'.repeat(201) }, '/title'],
  ])('is refused with %s', async (_name, body, pointer) => {
    const answer = await engineer.call(createProject, { body });
    expect([answer.status, problem(answer).errors?.[0]?.pointer]).toEqual([422, pointer]);
  });

  it('takes only options that its edition has', async () => {
    const { id } = await makeProject(firm);
    const answer = await engineer.call(updateProject, {
      params: { id },
      body: { version: 1, choices: { exposure: 'lunar' } },
    });
    expect(answer.status).toBe(422);
    expect(problem(answer).errors).toEqual([
      { pointer: '/choices/exposure', message: '“Exposure” has to be one of: dry, wet.' },
    ]);
  });

  it.each(['nonsense', missing])('is not found under %s', async (id) => {
    const answer = await engineer.call(readProject, { params: { id } });
    expect([answer.status, problem(answer).code]).toEqual([404, 'not-found']);
  });
});

describe('the list of projects', () => {
  it('is searched as typed, paged, and counts verdicts of live members', async () => {
    const own = await makeFirm(owner);
    const client = await signInAs(app, own, 'checker');
    const edition = await makeEdition(own);
    const project = await makeProject(own, { edition, title: '100% oak_house' });
    await makeProject(own, { edition, title: 'Other', state: 'closed' });
    await makeMember(own, { project });
    await makeMember(own, { project, document: testMember({ mark: 'J2', spans: [{ length: 9000 }] }) });
    const list = async (query: Record<string, string | number>) =>
      (await client.call(listProjects, { query })).body as Output<typeof listProjects>;
    expect((await list({ search: '% oak_' })).items[0]?.counts).toEqual({
      passes: 1,
      close: 0,
      fails: 1,
      none: 0,
    });
    expect((await list({ search: '_' })).total).toBe(1);
    expect((await list({ search: '\\' })).total).toBe(0);
    expect((await list({ state: 'closed' })).items.map(({ title }) => title)).toEqual(['Other']);
    const second = await list({ page: 2, size: 1 });
    expect([second.items.length, second.total, second.page]).toEqual([1, 2, 2]);
    expect((await list({ page: 9 })).items).toEqual([]);
  });

  it.each([
    ['page', 0],
    ['page', 'two'],
    ['size', 100_000],
    ['state', 'gone'],
    ['sort', 'title'],
  ])('refuses %s=%s at its name', async (name, value) => {
    const answer = await engineer.call(listProjects, { query: { [name]: value } });
    expect([answer.status, problem(answer).errors?.[0]?.pointer]).toEqual([422, `?${name}`]);
  });
});

describe('pinning an edition', () => {
  it('checks every member against it, and the trail tells who, what and why', async () => {
    const project = await makeProject(firm);
    const member = await makeMember(firm, { project });
    const next = await makeEdition(firm, { document: stricterEdition(), basisTitle: 'Stricter basis' });
    const answer = await engineer.call(pinEdition, {
      params: { id: project.id },
      body: { editionId: next.id, version: 1, reason: 'The timber came weaker.' },
    });
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({
      version: 2,
      edition: { id: next.id },
      counts: { passes: 0, fails: 1 },
    });
    const after = (await reader.call(readMember, { params: { id: member.id } })).body as MemberRecord;
    expect([after.version, after.result?.word, after.result?.edition.id]).toEqual([1, 'fails', next.id]);
    const { items } = (await engineer.call(readTrail, { query: { subject: project.id } })).body as Output<
      typeof readTrail
    >;
    expect(items[0]).toMatchObject({
      person: { id: firm.people.engineer.id },
      event: {
        kind: 'project.edition-pinned',
        detail: {
          from: project.editionId,
          to: next.id,
          edition: 'Stricter basis, edition 1',
          reason: 'The timber came weaker.',
          rechecked: 1,
        },
      },
    });
  });

  it.each(['draft', 'in_check', 'superseded', 'withdrawn'] as const)(
    'refuses one that is %s',
    async (state) => {
      const project = await makeProject(firm);
      const edition = await makeEdition(firm, { state });
      const answer = await engineer.call(pinEdition, {
        params: { id: project.id },
        body: { editionId: edition.id, version: 1, reason: 'x' },
      });
      expect([answer.status, problem(answer).code]).toEqual([409, 'not-in-this-state']);
    },
  );

  it('refuses one that does not exist, one of another firm, one with errors, and a pin without a reason', async () => {
    const { id } = await makeProject(firm);
    const pin = (editionId: string, reason = 'x') =>
      engineer.call(pinEdition, { params: { id }, body: { editionId, version: 1, reason } });
    const foreign = await makeEdition(await makeFirm(owner));
    for (const editionId of [missing, foreign.id]) {
      const answer = await pin(editionId);
      expect([answer.status, problem(answer).errors?.[0]?.pointer]).toEqual([422, '/editionId']);
    }
    const broken = {
      ...testEdition(),
      clauses: testEdition().clauses.filter(({ symbol }) => symbol !== 'EI'),
    };
    expect((await pin((await makeEdition(firm, { document: broken })).id)).status).toBe(409);
    const edition = await makeEdition(firm);
    expect(problem(await pin(edition.id, '  ')).errors?.[0]?.pointer).toBe('/reason');
  });

  it('and saving at the same moment leave no member with the old edition’s verdict', async () => {
    const project = await makeProject(firm);
    const members = await Promise.all(
      ['A1', 'A2', 'A3'].map((mark) => makeMember(firm, { project, document: testMember({ mark }) })),
    );
    const next = await makeEdition(firm, { document: stricterEdition() });
    await Promise.all([
      engineer.call(pinEdition, {
        params: { id: project.id },
        body: { editionId: next.id, version: 1, reason: 'x' },
      }),
      ...members.map(({ id, document }) =>
        engineer.call(saveMember, { params: { id }, body: { version: 1, document } }),
      ),
    ]);
    for (const { id } of members) {
      const after = (await engineer.call(readMember, { params: { id } })).body as MemberRecord;
      expect([after.version, after.result?.memberVersion, after.result?.edition.id]).toEqual([2, 2, next.id]);
    }
  });
});
