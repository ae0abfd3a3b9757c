import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  patchDraft,
  readDraft,
  readEdition,
  readTrail,
  releaseEdition,
  returnEdition,
  startDraft,
  submitEdition,
  withdrawEdition,
  type Draft,
  type StoredDraft,
} from '#shared/contracts/index.ts';
import type { App } from '#server/app.ts';
import type { Database } from '#server/db/connection.ts';
import { makeApp, signInAs, type Client } from '#tests/factories/client.ts';
import { asOwner } from '#tests/factories/database.ts';
import { makeEdition, makeFirm, type TestFirm } from '#tests/factories/firm.ts';

let app: App;
let owner: Database;
beforeAll(() => {
  app = makeApp();
  owner = asOwner();
});
afterAll(async () => {
  await app.close();
  await owner.close();
});

interface Scene {
  firm: TestFirm;
  keeper: Client;
  checker: Client;
  id: string;
  draft: Draft;
}

/** A firm with a released first edition and a draft of the second. */
async function scene(given: { solePractitioner?: boolean } = {}): Promise<Scene> {
  const firm = await makeFirm(owner, given);
  const first = await makeEdition(firm);
  const keeper = await signInAs(app, firm, 'keeper');
  const checker = await signInAs(app, firm, 'checker');
  const answer = await keeper.call(startDraft, {
    params: { id: first.basisId },
    body: { from: first.id, reason: 'A circular on grading' },
  });
  expect(answer.status).toBe(201);
  const draft = answer.body as Draft;
  return { firm, keeper, checker, id: draft.summary.id, draft };
}

const change = (path: string, value: unknown) => ({ op: 'replace' as const, path, value });
const patch = (client: Client, id: string, version: number, ...operations: object[]) =>
  client.call(patchDraft, { params: { id }, body: { version, patch: operations } });

describe('the life of an edition', () => {
  it('is drafted, changed, submitted, returned with a remark, and released by a second person', async () => {
    const { firm, keeper, checker, id, draft } = await scene();
    expect(draft.summary.number).toBe(2);
    const changed = await patch(keeper, id, 1, change('/title', 'Second edition'));
    expect(changed.body).toMatchObject({ version: 2, merged: false });
    await keeper.call(submitEdition, { params: { id }, body: { version: 2, reason: 'Title and grades' } });
    const back = await checker.call(returnEdition, {
      params: { id },
      body: {
        reason: 'One thing',
        remarks: [{ pointer: '/grades/rows/0', text: 'Compare with the declaration.' }],
      },
    });
    expect((back.body as Draft).remarks[0]).toMatchObject({
      pointer: '/grades/rows/0',
      by: { id: firm.people.checker.id },
    });
    await patch(keeper, id, 2, change('/purpose', 'Floors'));
    await keeper.call(submitEdition, { params: { id }, body: { version: 3, reason: 'Put right' } });
    const released = await checker.call(releaseEdition, { params: { id } });
    expect(released.status).toBe(200);
    expect((released.body as Draft).summary).toMatchObject({
      state: 'released',
      draftedBy: { id: firm.people.keeper.id },
      releasedBy: { id: firm.people.checker.id },
    });
    const trail = await keeper.call(readTrail, { query: { limit: 20 } });
    const kinds = (trail.body as { items: { event: { kind: string }; person: { id: string } }[] }).items.map(
      ({ event, person }) => [event.kind, person.id],
    );
    expect(kinds).toEqual(
      expect.arrayContaining([
        ['edition.released', firm.people.checker.id],
        ['edition.submitted', firm.people.keeper.id],
        ['edition.superseded', firm.people.checker.id],
      ]),
    );
  });

  it('is not released by whoever wrote, changed or submitted it', async () => {
    const { keeper, id } = await scene();
    await patch(keeper, id, 1, change('/title', 'Mine'));
    await keeper.call(submitEdition, { params: { id }, body: { version: 2, reason: 'Please' } });
    const own = await keeper.call(releaseEdition, { params: { id } });
    expect(own.status).toBe(409);
    expect((own.body as { detail: string }).detail).toMatch(/second person/);
  });

  it('is released alone only in a firm that openly works alone', async () => {
    const { keeper, id } = await scene({ solePractitioner: true });
    await keeper.call(submitEdition, { params: { id }, body: { version: 1, reason: 'Alone' } });
    expect((await keeper.call(releaseEdition, { params: { id } })).status).toBe(200);
  });

  it('lets one of two releases at the same moment win and tells the other', async () => {
    const { firm, keeper, checker, id } = await scene();
    const principal = await signInAs(app, firm, 'principal');
    await keeper.call(submitEdition, { params: { id }, body: { version: 1, reason: 'Please' } });
    const answers = await Promise.all(
      [checker, principal].map((client) => client.call(releaseEdition, { params: { id } })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('is held back by an error, and by a proof that does not hold', async () => {
    const { keeper, checker, id, draft } = await scene();
    const { symbol } = draft.document.clauses[0] ?? { symbol: '' };
    await patch(keeper, id, 1, change('/analysis/bendingStiffness', 'no_such_clause'));
    await keeper.call(submitEdition, { params: { id }, body: { version: 2, reason: `Without ${symbol}` } });
    const refused = await checker.call(releaseEdition, { params: { id } });
    expect(refused.status).toBe(409);
    expect((refused.body as { detail: string }).detail).toMatch(/error/);
  });

  it('is withdrawn with a reason, and takes no change once it is released', async () => {
    const { keeper, checker, id } = await scene();
    await keeper.call(submitEdition, { params: { id }, body: { version: 1, reason: 'Please' } });
    await checker.call(releaseEdition, { params: { id } });
    expect((await patch(keeper, id, 1, change('/title', 'Other'))).status).toBe(409);
    const withdrawn = await keeper.call(withdrawEdition, {
      params: { id },
      body: { reason: 'The rule behind it is gone' },
    });
    expect((withdrawn.body as Draft).summary.state).toBe('withdrawn');
  });

  it('leaves one open edition of a basis at a time', async () => {
    const { keeper, id, draft } = await scene();
    const again = await keeper.call(startDraft, {
      params: { id: draft.summary.basisId },
      body: { from: id, reason: 'Once more' },
    });
    expect(again.status).toBe(409);
  });
});

describe('two keepers in one draft', () => {
  it('merges changes at different places', async () => {
    const { keeper, id } = await scene();
    await patch(keeper, id, 1, change('/title', 'Theirs'));
    const mine = await patch(keeper, id, 1, change('/purpose', 'Mine'));
    expect(mine.status).toBe(200);
    expect(mine.body).toMatchObject({
      version: 3,
      merged: true,
      document: { title: 'Theirs', purpose: 'Mine' },
    });
  });

  it('shows both values of a clash and loses neither', async () => {
    const { keeper, id } = await scene();
    await patch(keeper, id, 1, change('/title', 'Theirs'));
    const mine = await patch(keeper, id, 1, change('/title', 'Mine'));
    expect(mine.status).toBe(409);
    const { stored } = mine.body as { stored: StoredDraft };
    expect(stored.clashes).toEqual([{ pointer: '/title', mine: 'Mine', theirs: 'Theirs' }]);
    const kept = await keeper.call(readEdition, { params: { id } });
    expect((kept.body as { document: { title: string } }).document.title).toBe('Theirs');
  });
});

describe('bad changes', () => {
  it.each([
    ['a place that is not there', [change('/no/where', 1)]],
    ['a text for a number', [change('/grades/rows/0/values', 'many')]],
    ['an unknown key', [{ op: 'add', path: '/extra', value: 1 }]],
    ['another schema version', [change('/schema', 'edition/9')]],
    ['a way into prototypes', [{ op: 'add', path: '/__proto__/polluted', value: 1 }]],
    ['no operation at all', []],
    ['an operation that does not exist', [{ op: 'destroy', path: '/title' }]],
  ])('are refused whole: %s', async (_what, operations) => {
    const { keeper, id } = await scene();
    const answer = await patch(keeper, id, 1, change('/title', 'Changed'), ...operations);
    if (operations.length === 0) {
      expect((await patch(keeper, id, 2, ...operations)).status).toBe(422);
      return;
    }
    expect(answer.status).toBe(422);
    const after = await keeper.call(readDraft, { params: { id } });
    expect((after.body as Draft).version).toBe(1);
  });

  it('are not for engineers, checkers or readers', async () => {
    const { firm, id } = await scene();
    for (const role of ['engineer', 'checker', 'reader', 'principal'] as const) {
      const client = await signInAs(app, firm, role);
      expect((await patch(client, id, 1, change('/title', role))).status, role).toBe(403);
    }
  });

  it('are refused on a version that was never there, and on one that is submitted', async () => {
    const { keeper, id } = await scene();
    expect((await patch(keeper, id, 7, change('/title', 'x'))).status).toBe(422);
    await keeper.call(submitEdition, { params: { id }, body: { version: 1, reason: 'Please' } });
    expect((await patch(keeper, id, 1, change('/title', 'x'))).status).toBe(409);
  });
});
