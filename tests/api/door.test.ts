import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { hashOf } from '#shared/basis/hash.ts';
import { connect, type Database } from '#server/db/connection.ts';
import { firmsOf, withFirm } from '#server/db/door.ts';
import { migrate } from '#server/db/migrate.ts';
import { prepareDatabase } from '#server/db/prepare.ts';
import { address, asApp, asOwner } from '#tests/factories/database.ts';
import {
  makeEdition,
  makeFirm,
  makeMember,
  makeProject,
  makeStock,
  type TestFirm,
} from '#tests/factories/firm.ts';

const owner = asOwner();
const app = asApp();
let firm: TestFirm;
let other: TestFirm;
let who: { firmId: string; personId: string };

beforeAll(async () => {
  [firm, other] = [await makeFirm(owner), await makeFirm(owner)];
  who = { firmId: firm.firmId, personId: firm.people.engineer.id };
  for (const each of [firm, other]) {
    await makeMember(each);
    await makeStock(each);
  }
  for (const each of [firm, other]) {
    await each.as('keeper', async (door) => {
      const [edition] = await door.editions.all({}, { limit: 1 });
      const editionId = edition?.id ?? '';
      await door.editionVersions.add({ editionId, version: 2, undo: [], changedBy: door.personId });
      await door.editionRemarks.add({ editionId, pointer: '', text: 'Seen.', remarkedBy: door.personId });
      const detail = { edition: 'Test', version: 2, places: 1 };
      await door.record(
        { kind: 'edition.changed', v: 1, detail },
        { type: 'edition', id: editionId, label: 'Test' },
      );
    });
  }
});
afterAll(async () => {
  await Promise.all([app.close(), owner.close()]);
});

const firmTables = [
  'firms',
  'memberships',
  'bases',
  'edition_remarks',
  'edition_versions',
  'editions',
  'stock_lists',
  'sections',
  'projects',
  'members',
  'member_versions',
  'results',
  'trail',
];

/** Runs SQL as the application's role, inside a firm or in none. */
async function sql<T extends object>(database: Database, text: string, firmId?: string): Promise<T[]> {
  return database.sequelize.transaction(async (transaction) => {
    if (firmId !== undefined) {
      await database.sequelize.query(`SELECT set_config('app.firm_id', $1, true)`, {
        bind: [firmId],
        transaction,
      });
    }
    return database.sequelize.query<T>(text, { transaction, type: QueryTypes.SELECT });
  });
}

describe('the database itself', () => {
  it('has a firm on every table of firm data, and this test knows them all', async () => {
    const found = await sql<{ table_name: string }>(
      owner,
      `SELECT table_name::text FROM information_schema.columns WHERE table_schema = 'public' AND column_name = 'firm_id'`,
    );
    expect(found.map(({ table_name }) => table_name).sort()).toEqual(
      firmTables.filter((table) => table !== 'firms').sort(),
    );
  });

  it('forces row-level security on each of them', async () => {
    const found = await sql<{ relname: string }>(
      owner,
      `SELECT relname::text FROM pg_class WHERE relrowsecurity AND relforcerowsecurity`,
    );
    expect(found.map(({ relname }) => relname).sort()).toEqual([...firmTables].sort());
  });

  it.each([...firmTables, 'people'])('shows no row of %s to a query without a firm', async (table) => {
    expect(await sql(app, `SELECT count(*)::int AS n FROM ${table}`)).toEqual([{ n: 0 }]);
  });

  it.each(firmTables)('shows of %s only the rows of the firm that asks', async (table) => {
    const column = table === 'firms' ? 'id' : 'firm_id';
    const rows = await sql<{ firm: string }>(
      app,
      `SELECT DISTINCT ${column} AS firm FROM ${table}`,
      firm.firmId,
    );
    expect(rows).toEqual([{ firm: firm.firmId }]);
  });

  it('shows people only to firms they belong to', async () => {
    const seen = await sql<{ id: string }>(app, 'SELECT id FROM people', firm.firmId);
    expect(seen.map(({ id }) => id).sort()).toEqual(
      Object.values(firm.people)
        .map(({ id }) => id)
        .sort(),
    );
  });

  it('refuses to write a row of another firm, or to point into one', async () => {
    const foreign = await makeProject(other);
    const personId = firm.people.engineer.id;
    const insert = `INSERT INTO projects (firm_id, title, created_by) VALUES ('${other.firmId}', 'x', '${personId}') RETURNING id`;
    await expect(sql(app, insert, firm.firmId)).rejects.toThrow(/row-level security/);
    await expect(
      withFirm(app, who, async (door) => {
        const project = await door.projects.add({ title: 'x', createdBy: personId });
        await door.projects.change(project, { editionId: foreign.editionId });
      }),
    ).rejects.toThrow(/foreign key/);
  });

  it('gives the application’s role no password hash, no deletion, no table of its own', async () => {
    await expect(sql(app, 'SELECT password_hash FROM people')).rejects.toThrow(/permission denied/);
    for (const table of firmTables) {
      await expect(sql(app, `DELETE FROM ${table}`, firm.firmId)).rejects.toThrow(/permission denied/);
    }
    await expect(sql(app, 'CREATE TABLE mine (id int)')).rejects.toThrow(/permission denied/);
    const owned = await sql(
      app,
      `SELECT 1 FROM pg_class WHERE relowner = (SELECT oid FROM pg_roles WHERE rolname = current_user)`,
    );
    expect(owned).toEqual([]);
  });

  it('lets the application ask for one sign-in only, by its email', async () => {
    const { email, id } = firm.people.checker;
    const [found] = await sql<{ person_id: string }>(app, `SELECT * FROM sign_in_lookup('${email}')`);
    expect(found?.person_id).toBe(id);
    expect(await sql(app, `SELECT * FROM sign_in_lookup('%')`)).toEqual([]);
  });
});

describe('the door', () => {
  it('closes with its transaction: the connection then shows nothing again', async () => {
    const single = connect(address('DATABASE_URL'), { most: 1 });
    await withFirm(single, who, async (door) => {
      expect(await door.projects.all({})).toHaveLength(1);
    });
    expect(await sql(single, 'SELECT count(*)::int AS n FROM projects')).toEqual([{ n: 0 }]);
    await single.close();
  });

  it('keeps nothing of a write that no event tells of', async () => {
    const title = 'Written in silence';
    await expect(
      withFirm(app, who, (door) => door.projects.add({ title, createdBy: who.personId })),
    ).rejects.toThrow(/no entry on the trail/);
    expect(await withFirm(app, who, (door) => door.projects.all({ title }))).toEqual([]);
  });

  it('does not let an event of an earlier transaction stand for a later write', async () => {
    const project = await makeProject(firm, { edition: null });
    const rename = withFirm(app, who, async (door) => {
      const row = await door.projects.one({ id: project.id });
      if (row) await door.projects.change(row, { title: 'Renamed in silence' });
    });
    await expect(rename).rejects.toThrow(/no entry on the trail/);
  });

  it('refuses every write where it was opened for reading', async () => {
    const write = withFirm(app, who, (door) => door.projects.add({ title: 'x', createdBy: who.personId }), {
      readOnly: true,
    });
    await expect(write).rejects.toThrow(/read-only/);
  });

  it('undoes everything when something throws', async () => {
    const title = 'Half done';
    await expect(
      withFirm(app, who, async (door) => {
        const { id } = await door.projects.add({ title, createdBy: who.personId });
        await door.record(
          { kind: 'project.opened', v: 1, detail: { title } },
          { type: 'project', id, label: title },
        );
        throw new Error('changed my mind');
      }),
    ).rejects.toThrow('changed my mind');
    expect(await withFirm(app, who, (door) => door.projects.all({ title }))).toEqual([]);
  });

  it('tells a person’s firms before one is chosen, and nobody else’s', async () => {
    expect(await firmsOf(app, firm.people.reader.id)).toEqual([firm.firmId]);
    expect(await firmsOf(app, '00000000-0000-4000-8000-000000000000')).toEqual([]);
  });
});

describe('what never changes', () => {
  const asOwnerIn = (text: string) => sql(owner, text, firm.firmId);

  it.each(['trail', 'member_versions', 'results'])(
    '%s takes no change and no deletion, even from its owner',
    async (table) => {
      await expect(asOwnerIn(`UPDATE ${table} SET firm_id = firm_id`)).rejects.toThrow(/append-only/);
      await expect(asOwnerIn(`DELETE FROM ${table}`)).rejects.toThrow(/append-only/);
      await expect(asOwnerIn(`TRUNCATE ${table} CASCADE`)).rejects.toThrow(/append-only|never emptied/);
    },
  );

  it.each(['in_check', 'released', 'superseded', 'withdrawn'] as const)(
    'an edition that is %s keeps its document, hash, number and author',
    async (state) => {
      const { id } = await makeEdition(firm, { state });
      const changes = [
        `document = document || '{"title":"x"}'`,
        `hash = repeat('0', 64)`,
        'unverified = 0',
        'number = 9',
        `reason = 'another'`,
        `released_at = now()`,
        `drafted_by = '${firm.people.checker.id}'`,
      ];
      for (const change of changes) {
        await expect(asOwnerIn(`UPDATE editions SET ${change} WHERE id = '${id}'`)).rejects.toThrow(
          /never changes/,
        );
      }
      await expect(asOwnerIn(`DELETE FROM editions WHERE id = '${id}'`)).rejects.toThrow(/kept for good/);
    },
  );

  it('goes through the states of an edition only along the way that lifecycle.ts has', async () => {
    const forbidden = [
      ['draft', 'released'],
      ['draft', 'superseded'],
      ['released', 'draft'],
      ['released', 'in_check'],
      ['superseded', 'released'],
      ['withdrawn', 'released'],
    ] as const;
    for (const [from, to] of forbidden) {
      const { id } = await makeEdition(firm, { state: from });
      const released =
        to === 'released' ? `, released_by = '${firm.people.principal.id}', released_at = now()` : '';
      await expect(
        asOwnerIn(`UPDATE editions SET state = '${to}'${released} WHERE id = '${id}'`),
      ).rejects.toThrow(/can not go from|check constraint/);
    }
  });

  it('needs a second person for a release, unless the firm openly works alone', async () => {
    const release = (each: TestFirm, id: string) =>
      each.as('keeper', async (door) => {
        const edition = await door.editions.one({ id });
        if (!edition) return;
        const released = { state: 'released' as const, releasedBy: door.personId, releasedAt: new Date() };
        await door.editions.change(edition, released);
        await door.record(
          { kind: 'edition.released', v: 1, detail: { edition: 'x', hash: edition.hash } },
          { type: 'edition', id, label: 'x' },
        );
      });
    const own = await makeEdition(firm, { state: 'in_check' });
    await expect(release(firm, own.id)).rejects.toThrow(/second person/);
    const alone = await makeFirm(owner, { solePractitioner: true });
    const open = await makeEdition(alone, { state: 'in_check' });
    await expect(release(alone, open.id)).resolves.toBeUndefined();
  });

  it('holds the document of a draft to what was stored: the hash is still that of the document', async () => {
    const { id } = await makeEdition(firm, { state: 'draft' });
    const stored = await firm.as('keeper', (door) => door.editions.one({ id }));
    expect(hashOf(stored?.document)).toBe(stored?.hash);
  });
});

describe('setting up the database', () => {
  it('a second time changes nothing', async () => {
    expect(await migrate(address('DATABASE_OWNER_URL'), address('DATABASE_URL'))).toEqual([]);
  });

  it('refuses one role for owner and application, in plain words', async () => {
    const url = address('DATABASE_OWNER_URL');
    await expect(prepareDatabase(url, url)).rejects.toThrow(/a role of its own that owns nothing/);
  });
});
