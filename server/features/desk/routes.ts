import { readDesk, type DeskMember, type EditionSummary } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import {
  currentResult,
  editionSummaryColumns,
  editionSummaryJoins,
  instant,
  personJson,
  resultJson,
} from '#server/db/summaries.ts';
import { route, type Route } from '#server/http/route.ts';

const MOST = 50;
const RECENT = 10;

const joins = `
  FROM members m JOIN projects p ON p.id = m.project_id JOIN people sp ON sp.id = m.saved_by
  ${currentResult}
  WHERE m.firm_id = :firmId AND m.state = 'live' AND p.state = 'live'`;
const columns = `
  m.id, m.mark, coalesce(m.document ->> 'title', '') AS title,
  jsonb_build_object('id', p.id, 'title', p.title) AS project,
  ${resultJson('r', 're', 'rb')} AS result, ${personJson('sp')} AS "savedBy",
  ${instant('m.saved_at')} AS "savedAt"`;

/** Members with this verdict, the highest utilisation first; a refused one, which has none, before all. */
async function withVerdict(door: Door, verdict: 'fails' | 'close') {
  const items = await door.select<DeskMember>(
    `SELECT ${columns} ${joins} AND r.verdict = :verdict
     ORDER BY r.utilisation DESC NULLS FIRST, m.mark, m.id LIMIT ${MOST}`,
    { verdict },
  );
  if (items.length < MOST) return { items, total: items.length };
  const [all] = await door.select<{ total: number }>(
    `SELECT count(*)::int AS total ${joins} AND r.verdict = :verdict`,
    { verdict },
  );
  return { items, total: all?.total ?? items.length };
}

export const deskRoutes: readonly Route[] = [
  route(readDesk, async ({ door }) => {
    const failing = await withVerdict(door, 'fails');
    const close = await withVerdict(door, 'close');
    return {
      failing: failing.items,
      failingTotal: failing.total,
      close: close.items,
      closeTotal: close.total,
      inCheck: await door.select<EditionSummary>(
        `SELECT ${editionSummaryColumns} ${editionSummaryJoins}
         WHERE e.firm_id = :firmId AND e.state = 'in_check' ORDER BY e.drafted_at`,
      ),
      recent: await door.select<DeskMember>(
        `SELECT ${columns} ${joins} ORDER BY m.saved_at DESC, m.id LIMIT ${RECENT}`,
      ),
    };
  }),
];
