import { abilities } from '#shared/access/index.ts';
import type { MemberRecord } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { currentResult, editionJson, instant, personJson, resultJson } from '#server/db/summaries.ts';
import type { Person } from '#server/http/person.ts';

type Bare = Omit<MemberRecord, 'abilities'>;

/** One member as the client sees it. */
export async function presentMember(door: Door, person: Person, id: string): Promise<MemberRecord> {
  const [row] = await door.select<Bare>(
    `SELECT m.id, jsonb_build_object('id', p.id, 'title', p.title, 'state', p.state, 'choices', p.choices,
         'stockListId', p.stock_list_id) AS project,
       m.mark, m.state, m.document, m.version, ${personJson('sp')} AS "savedBy",
       ${instant('m.saved_at')} AS "savedAt",
       CASE WHEN e.id IS NULL THEN NULL ELSE ${editionJson('e', 'b')} END AS edition,
       ${resultJson('r', 're', 'rb')} AS result
     FROM members m JOIN projects p ON p.id = m.project_id JOIN people sp ON sp.id = m.saved_by
     LEFT JOIN editions e ON e.id = p.edition_id LEFT JOIN bases b ON b.id = e.basis_id
     ${currentResult}
     WHERE m.firm_id = :firmId AND m.id = :id`,
    { id },
  );
  if (!row) throw new Error('A member that was just at hand is gone.');
  const asked = ['members.read', 'members.save', 'members.remove', 'members.verify'] as const;
  const access = { projectState: row.project.state, memberState: row.state };
  return { ...row, abilities: abilities(person, asked, access) };
}
