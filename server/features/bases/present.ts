import { abilities } from '#shared/access/index.ts';
import type { Basis, EditionSummary } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { editionSummaryColumns, editionSummaryJoins, instant, personJson } from '#server/db/summaries.ts';
import type { Person } from '#server/http/person.ts';

type Bare = Omit<Basis, 'editions' | 'abilities'>;

/** Bases of the firm, or the one asked for, with their editions, newest first. */
export async function presentBases(door: Door, person: Person, id: string | null = null): Promise<Basis[]> {
  const bases = await door.select<Bare>(
    `SELECT b.id, b.title, b.purpose, ${personJson('c')} AS "createdBy", ${instant('b.created_at')} AS "createdAt"
     FROM bases b JOIN people c ON c.id = b.created_by
     WHERE b.firm_id = :firmId AND (:id::uuid IS NULL OR b.id = :id) ORDER BY b.title, b.id`,
    { id },
  );
  const editions = await door.select<EditionSummary>(
    `SELECT ${editionSummaryColumns} ${editionSummaryJoins}
     WHERE e.firm_id = :firmId AND (:id::uuid IS NULL OR e.basis_id = :id) ORDER BY e.number DESC`,
    { id },
  );
  return bases.map((basis) => ({
    ...basis,
    editions: editions.filter(({ basisId }) => basisId === basis.id),
    abilities: abilities(person, ['bases.read', 'editions.draft']),
  }));
}

/** One edition without its document. */
export async function presentEdition(door: Door, id: string): Promise<EditionSummary> {
  const [edition] = await door.select<EditionSummary>(
    `SELECT ${editionSummaryColumns} ${editionSummaryJoins} WHERE e.firm_id = :firmId AND e.id = :id`,
    { id },
  );
  if (!edition) throw new Error('An edition that was just at hand is gone.');
  return edition;
}
