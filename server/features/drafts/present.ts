import { abilities } from '#shared/access/index.ts';
import type { Draft } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { editionSummaryColumns, editionSummaryJoins, instant, personJson } from '#server/db/summaries.ts';
import type { Person } from '#server/http/person.ts';
import type { Judge } from '#server/judge/judge.ts';
import { blockersFor } from './moves.ts';

/** An edition as it is worked on. */
export async function presentDraft(door: Door, judge: Judge, person: Person, id: string): Promise<Draft> {
  const edition = await door.editions.one({ id });
  const [summary] = await door.select<Draft['summary']>(
    `SELECT ${editionSummaryColumns} ${editionSummaryJoins} WHERE e.firm_id = :firmId AND e.id = :id`,
    { id },
  );
  if (!edition || !summary) throw new Error('An edition that was just at hand is gone.');
  const [last] = await door.select<Pick<Draft, 'changedBy' | 'changedAt'>>(
    `SELECT ${personJson('p')} AS "changedBy", ${instant('v.changed_at')} AS "changedAt"
     FROM edition_versions v JOIN people p ON p.id = v.changed_by
     WHERE v.firm_id = :firmId AND v.edition_id = :id ORDER BY v.version DESC LIMIT 1`,
    { id },
  );
  const remarks = await door.select<Draft['remarks'][number]>(
    `SELECT r.pointer, r.text, ${personJson('p')} AS by, ${instant('r.remarked_at')} AS at
     FROM edition_remarks r JOIN people p ON p.id = r.remarked_by
     WHERE r.firm_id = :firmId AND r.edition_id = :id ORDER BY r.remarked_at DESC, r.id`,
    { id },
  );
  return {
    summary,
    version: edition.version,
    document: edition.document,
    changedBy: last?.changedBy ?? summary.draftedBy,
    changedAt: last?.changedAt ?? summary.draftedAt,
    remarks,
    blockers: await blockersFor(door, judge, person, edition),
    proofs: judge.proofs(edition),
    abilities: abilities(
      person,
      [
        'editions.read',
        'editions.edit',
        'editions.submit',
        'editions.return',
        'editions.release',
        'editions.withdraw',
      ],
      { editionState: edition.state },
    ),
  };
}
