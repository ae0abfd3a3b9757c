import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import {
  createMember,
  listMemberVersions,
  listProjectMembers,
  readMember,
  readMemberResult,
  removeMember,
  saveMember,
  updateProject,
  verifyMember,
  type MemberRecord,
  type Output,
  type Problem,
} from '#shared/contracts/index.ts';
import { hashOf } from '#shared/basis/hash.ts';
import type { Member } from '#shared/basis/schema/index.ts';
import type { App } from '#server/app.ts';
import { makeApp, signInAs, type Client } from '#tests/factories/client.ts';
import { asOwner } from '#tests/factories/database.ts';
import { makeFirm, makeMember, makeProject, type TestFirm } from '#tests/factories/firm.ts';
import { testMember } from '#tests/factories/member.ts';

const owner = asOwner();
let app: App;
let firm: TestFirm;
let engineer: Client;
let reader: Client;
let project: { id: string };

beforeAll(async () => {
  app = makeApp();
  firm = await makeFirm(owner);
  [engineer, reader] = [await signInAs(app, firm, 'engineer'), await signInAs(app, firm, 'reader')];
});
beforeEach(async () => {
  project = await makeProject(firm);
});
afterAll(async () => {
  await app.close();
  await owner.close();
});

const create = (document: unknown) =>
  engineer.call(createMember, { params: { id: project.id }, body: { document } });
const problem = (answer: { body: unknown }) => answer.body as Problem;

async function created(document = testMember()): Promise<MemberRecord> {
  const answer = await create(document);
  expect(answer.status).toBe(201);
  return answer.body as MemberRecord;
}

describe('a member', () => {
  it('is checked when it is added, and the result stands with its edition', async () => {
    const member = await created();
    expect(member.document).toEqual(testMember());
    expect(member.version).toBe(1);
    expect(member.savedBy.id).toBe(firm.people.engineer.id);
    expect(member.result?.word).toBe('passes');
    expect(member.result?.utilisation).toBeGreaterThan(0.2);
    expect(member.result?.edition).toEqual(member.edition);
    expect(member.edition?.unverified).toBeGreaterThan(0);
    expect(member.abilities).toContain('members.save');
  });

  it('is saved as the next version, and the answer changes with the span', async () => {
    const { id } = await created();
    const longer = testMember({ spans: [{ length: 6000 }] });
    const answer = await engineer.call(saveMember, {
      params: { id },
      body: { version: 1, document: longer },
    });
    const saved = answer.body as MemberRecord;
    expect([answer.status, saved.version, saved.result?.word]).toEqual([200, 2, 'fails']);
    const again = (await engineer.call(readMember, { params: { id } })).body as MemberRecord;
    expect(again).toEqual(saved);
    const versions = (await engineer.call(listMemberVersions, { params: { id } })).body as Output<
      typeof listMemberVersions
    >;
    expect(versions.items.map(({ version, result }) => [version, result?.word])).toEqual([
      [2, 'fails'],
      [1, 'passes'],
    ]);
    expect(versions.items[1]?.hash).toBe(hashOf(testMember()));
  });

  it('gives its whole result, whose ledger stands up to the hash stored with it', async () => {
    const { id } = await created();
    const result = (await reader.call(readMemberResult, { params: { id } })).body as Output<
      typeof readMemberResult
    >;
    expect(result.document.ledger.length).toBeGreaterThan(10);
    expect(hashOf(result.document)).toBe(result.summary.hash);
    expect(hashOf(result.inputs)).toBe(result.document.member.hash);
    const verified = (await reader.call(verifyMember, { params: { id } })).body as Output<
      typeof verifyMember
    >;
    expect(verified).toMatchObject({ same: true, differences: [], storedHash: result.summary.hash });
    expect(verified.recomputedHash).toBe(verified.storedHash);
  });

  it('inherits the choices of its project, and is checked again when they change', async () => {
    const { id, result } = await created();
    const answer = await engineer.call(updateProject, {
      params: { id: project.id },
      body: { version: 1, choices: { exposure: 'wet' } },
    });
    expect(answer.status).toBe(200);
    const after = (await engineer.call(readMemberResult, { params: { id } })).body as Output<
      typeof readMemberResult
    >;
    expect(after.inputs.choices).toEqual({ exposure: 'wet', sharing: 'shared' });
    expect(after.summary.hash).not.toBe(result?.hash);
    expect((await engineer.call(verifyMember, { params: { id } })).body).toMatchObject({ same: true });
  });

  it('has no result while the project pins no edition', async () => {
    project = await makeProject(firm, { edition: null });
    const member = await created();
    expect([member.result, member.edition]).toEqual([null, null]);
    const answer = await engineer.call(readMemberResult, { params: { id: member.id } });
    expect([answer.status, problem(answer).code]).toEqual([409, 'not-in-this-state']);
  });

  it('with something the edition does not know is kept, without a verdict, and says why', async () => {
    const member = await created(testMember({ grade: 'X99' }));
    expect(member.result?.word).toBe('none');
    expect(member.result?.because).toBeTruthy();
    const { document } = (await engineer.call(readMemberResult, { params: { id: member.id } }))
      .body as Output<typeof readMemberResult>;
    expect(document.findings.map(({ pointer }) => pointer)).toContain('/grade');
  });

  it('leaves the table when it is taken out, and its mark is free again', async () => {
    const { id } = await created();
    const stale = await engineer.call(removeMember, { params: { id }, query: { version: 7 } });
    expect(problem(stale).code).toBe('stale-version');
    expect((await engineer.call(removeMember, { params: { id }, query: { version: 1 } })).status).toBe(204);
    const rows = await engineer.call(listProjectMembers, { params: { id: project.id } });
    expect(rows.body).toEqual({ items: [] });
    const save = await engineer.call(saveMember, {
      params: { id },
      body: { version: 1, document: testMember() },
    });
    expect([save.status, problem(save).code]).toEqual([409, 'not-in-this-state']);
    expect((await engineer.call(readMember, { params: { id } })).body).toMatchObject({ state: 'removed' });
    await created();
  });

  it('comes in the order of marks as people count', async () => {
    for (const mark of ['J10', 'J2', 'B1'])
      await makeMember(firm, { project: await row(), document: testMember({ mark }) });
    const { items } = (await reader.call(listProjectMembers, { params: { id: project.id } })).body as Output<
      typeof listProjectMembers
    >;
    expect(items.map(({ mark }) => mark)).toEqual(['B1', 'J2', 'J10']);
    expect(items[0]).toMatchObject({ spans: [3000], section: { b: 47, h: 195, pieces: 1 }, grade: 'T24' });
    expect(items[0]?.result?.checkTitle).toBeTruthy();
  });
});

async function row() {
  const found = await firm.as('engineer', (door) => door.projects.one({ id: project.id }));
  if (!found) throw new Error('The project of the test is missing.');
  return found;
}

describe('two people at one member', () => {
  it('lose nothing: the later one gets both documents and the version to go on from', async () => {
    const { id } = await created();
    const [first, second] = [testMember({ title: 'First' }), testMember({ title: 'Second' })];
    await engineer.call(saveMember, { params: { id }, body: { version: 1, document: first } });
    const answer = await engineer.call(saveMember, {
      params: { id },
      body: { version: 1, document: second },
    });
    expect(answer.status).toBe(409);
    expect(problem(answer)).toMatchObject({
      code: 'stale-version',
      stored: { version: 2, document: first, savedBy: { name: firm.people.engineer.name } },
      sent: { version: 1, document: second },
    });
    const again = await engineer.call(saveMember, { params: { id }, body: { version: 2, document: second } });
    expect((again.body as MemberRecord).version).toBe(3);
  });

  it('at the same moment are let in one after the other: one saves, the others are stale', async () => {
    const { id } = await created();
    const answers = await Promise.all(
      [1, 2, 3, 4].map((n) =>
        engineer.call(saveMember, {
          params: { id },
          body: { version: 1, document: testMember({ title: `Take ${n}` }) },
        }),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409]);
  });

  it('can’t give one mark to two members', async () => {
    await created();
    const answer = await create(testMember());
    expect([answer.status, problem(answer).code]).toEqual([409, 'mark-taken']);
    expect(problem(answer).errors?.[0]?.pointer).toBe('/document/mark');
  });
});

describe('input that can’t be', () => {
  const cases: [string, (member: Member) => unknown, string, RegExp][] = [
    [
      'a negative span',
      (m) => ({ ...m, spans: [{ length: -3000 }] }),
      '/document/spans/0/length',
      /more than 0/,
    ],
    ['a span of zero', (m) => ({ ...m, spans: [{ length: 0 }] }), '/document/spans/0/length', /more than 0/],
    [
      'a span beyond sense',
      (m) => ({ ...m, spans: [{ length: 1e9 }] }),
      '/document/spans/0/length',
      /at most/,
    ],
    [
      'a text where a number belongs',
      (m) => ({ ...m, spans: [{ length: '3 m' }] }),
      '/document/spans/0/length',
      /a number/,
    ],
    ['no spans', (m) => ({ ...m, spans: [] }), '/document/spans', /at least 1/],
    ['a misspelt name', (m) => ({ ...m, colour: 'red' }), '/document/colour', /not known here/],
    ['a missing grade', (m) => ({ ...m, grade: undefined }), '/document/grade', /missing/],
    [
      'no pieces',
      (m) => ({ ...m, section: { b: 47, h: 195, pieces: 0 } }),
      '/document/section/pieces',
      /at least 1/,
    ],
    [
      'half a piece',
      (m) => ({ ...m, section: { b: 47, h: 195, pieces: 1.5 } }),
      '/document/section/pieces',
      /whole number/,
    ],
    ['a blank mark', (m) => ({ ...m, mark: '  ' }), '/document/mark', /blank/],
    ['an empty mark', (m) => ({ ...m, mark: '' }), '/document/mark', /empty/],
    [
      'an unknown kind of load',
      (m) => ({ ...m, loads: [{ id: 'a', action: 'dead', kind: 'cloud' }] }),
      '/document/loads/0/kind',
      /one of: area, line, point, couple/,
    ],
    [
      'a load without its size',
      (m) => ({ ...m, loads: [{ id: 'a', action: 'dead', kind: 'point', x: 1 }] }),
      '/document/loads/0/force',
      /missing/,
    ],
    [
      'a departure without a reason',
      (m) => ({ ...m, departures: [{ clause: 'duration', value: 1, reason: '' }] }),
      '/document/departures/0/reason',
      /empty/,
    ],
    [
      'a prototype’s name',
      (m) => JSON.parse(JSON.stringify(m).replace('"inputs":{}', '"inputs":{"__proto__":1}')),
      '/document/inputs/__proto__',
      /can’t be used/,
    ],
    [
      'a name that is no symbol',
      (m) => ({ ...m, inputs: { 'a b': 1 } }),
      '/document/inputs/a b',
      /not known here/,
    ],
    ['a null character', (m) => ({ ...m, title: 'a\u0000b' }), '/document/title', /can’t be stored/],
    ['half a character', (m) => ({ ...m, title: '\ud800' }), '/document/title', /can’t be stored/],
  ];

  it.each(cases)('is refused at its place: %s', async (_name, change, pointer, message) => {
    const answer = await create(change(testMember()));
    expect([answer.status, problem(answer).code]).toEqual([422, 'invalid-input']);
    const [error, ...others] = problem(answer).errors ?? [];
    expect(others).toEqual([]);
    expect(error?.pointer).toBe(pointer);
    expect(error?.message).toMatch(message);
  });

  it('is told all at once', async () => {
    const answer = await create({ ...testMember(), spans: [{ length: -1 }], grade: 7, mark: '' });
    expect((problem(answer).errors ?? []).map(({ pointer }) => pointer).sort()).toEqual([
      '/document/grade',
      '/document/mark',
      '/document/spans/0/length',
    ]);
  });

  const post = (body: string, type = 'application/json') =>
    request(app.express)
      .post(`/api/projects/${project.id}/members`)
      .set({ Cookie: engineer.cookie, 'X-CSRF-Token': engineer.csrf, 'Content-Type': type })
      .send(body);

  it.each([
    ['what is no JSON', '{"document": ', 400, 'malformed-body'],
    ['nothing at all', '', 422, 'invalid-input'],
    ['a list', '[]', 422, 'invalid-input'],
    ['a bare word', '"member"', 422, 'invalid-input'],
    ['nesting without end', `{"document":${'['.repeat(500)}${']'.repeat(500)}}`, 422, 'invalid-input'],
  ])('is refused: %s', async (_name, body, status, code) => {
    const answer = await post(body);
    expect([answer.status, problem(answer).code]).toEqual([status, code]);
  });

  it('is refused when it is too large, or not JSON by its own word', async () => {
    const large = await post(JSON.stringify({ document: testMember({ note: 'x'.repeat(1_100_000) }) }));
    expect([large.status, problem(large).code]).toEqual([413, 'too-large']);
    const form = await post('document=1', 'application/x-www-form-urlencoded');
    expect([form.status, problem(form).code]).toEqual([415, 'wrong-media-type']);
  });

  it('leaves no trace', async () => {
    await create({ ...testMember(), mark: '' });
    const rows = await engineer.call(listProjectMembers, { params: { id: project.id } });
    expect(rows.body).toEqual({ items: [] });
  });
});
