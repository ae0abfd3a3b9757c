import type { MemberRow } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { currentResult, instant, personJson, resultJson } from '#server/db/summaries.ts';

/** Rows of a project's table of members, by mark as people count: J2 before J10. */
export async function memberRows(door: Door, projectId: string): Promise<MemberRow[]> {
  const rows = await door.select<MemberRow>(
    `SELECT m.id, m.mark, coalesce(m.document ->> 'title', '') AS title, m.state,
       m.document ->> 'units' AS units,
       coalesce(m.document #>> '{choices,use}', p.choices ->> 'use') AS use,
       (SELECT jsonb_agg(s -> 'length' ORDER BY n)
        FROM jsonb_array_elements(m.document -> 'spans') WITH ORDINALITY AS each(s, n)) AS spans,
       jsonb_build_object('b', m.document #> '{section,b}', 'h', m.document #> '{section,h}',
                          'pieces', m.document #> '{section,pieces}') AS section,
       m.document ->> 'grade' AS grade, ${resultJson('r', 're', 'rb')} AS result, m.version,
       ${personJson('sp')} AS "savedBy", ${instant('m.saved_at')} AS "savedAt"
     FROM members m JOIN projects p ON p.id = m.project_id JOIN people sp ON sp.id = m.saved_by
     ${currentResult}
     WHERE m.firm_id = :firmId AND m.project_id = :projectId AND m.state = 'live'`,
    { projectId },
  );
  const inOrder = new Intl.Collator('en', { numeric: true });
  return rows.sort((a, b) => inOrder.compare(a.mark, b.mark) || (a.id < b.id ? -1 : 1));
}
