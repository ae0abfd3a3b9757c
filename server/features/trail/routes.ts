import { readTrail, type TrailEntry } from '#shared/contracts/index.ts';
import { instant, personJson } from '#server/db/summaries.ts';
import { route, type Route } from '#server/http/route.ts';

export const trailRoutes: readonly Route[] = [
  route(readTrail, async ({ door, query }) => {
    const limit = query.limit ?? 50;
    const rows = await door.select<TrailEntry>(
      `SELECT t.id::float8 AS id, ${instant('t.at')} AS at, ${personJson('p')} AS person,
         jsonb_build_object('type', t.subject_type, 'id', t.subject_id, 'label', t.subject_label) AS subject,
         t.event
       FROM trail t JOIN people p ON p.id = t.person_id
       WHERE t.firm_id = :firmId
         AND (:before::bigint IS NULL OR t.id < :before)
         AND (:kind::text IS NULL OR t.kind = :kind)
         AND (:subject::uuid IS NULL OR t.subject_id = :subject)
         AND (:person::uuid IS NULL OR t.person_id = :person)
       ORDER BY t.id DESC LIMIT :limit`,
      {
        before: query.before ?? null,
        kind: query.kind ?? null,
        subject: query.subject ?? null,
        person: query.person ?? null,
        limit: limit + 1,
      },
    );
    const items = rows.slice(0, limit);
    return { items, older: rows.length > limit ? (items.at(-1)?.id ?? null) : null };
  }),
];
