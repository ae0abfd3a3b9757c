/*
 * Pieces of SQL that give the shapes of shared/contracts as JSON, so that every list says the same of an
 * edition, a result or a person. Aliases are fixed by whoever uses them; nothing of a request comes in here.
 */

/** `PersonName` of a joined row of people. */
export const personJson = (person: string) =>
  `jsonb_build_object('id', ${person}.id, 'name', ${person}.name)`;

/** An instant as ISO 8601 text. */
export const instant = (column: string) => `to_json(${column})`;

/** `EditionReference` of joined rows of editions and bases. */
export const editionJson = (edition: string, basis: string) =>
  `jsonb_build_object('id', ${edition}.id, 'basisId', ${basis}.id, 'basisTitle', ${basis}.title,
     'number', ${edition}.number, 'state', ${edition}.state, 'hash', ${edition}.hash,
     'unverified', ${edition}.unverified)`;

/** `ResultSummary` of joined rows of results, its edition and basis; null where there is no result. */
export const resultJson = (result: string, edition: string, basis: string) =>
  `CASE WHEN ${result}.id IS NULL THEN NULL ELSE jsonb_build_object(
     'id', ${result}.id, 'word', ${result}.verdict, 'check', ${result}.governing_check,
     'checkTitle', ${result}.check_title, 'utilisation', ${result}.utilisation,
     'because', ${result}.because, 'unverified', ${result}.unverified, 'departures', ${result}.departures,
     'memberVersion', ${result}.member_version, 'edition', ${editionJson(edition, basis)},
     'engine', ${result}.engine, 'hash', ${result}.result_hash, 'at', ${result}.at) END`;

/** Joins `r`, `re`, `rb`: the newest result of member `m` as it is, against the edition pinned by project `p`. */
export const currentResult = `
  LEFT JOIN LATERAL (
    SELECT * FROM results WHERE member_id = m.id AND member_version = m.version AND edition_id = p.edition_id
    ORDER BY seq DESC LIMIT 1) r ON true
  LEFT JOIN editions re ON re.id = r.edition_id
  LEFT JOIN bases rb ON rb.id = re.basis_id`;

/** Columns of `EditionSummary`, from `editionSummaryJoins`. */
export const editionSummaryColumns = `
  e.id, b.id AS "basisId", b.title AS "basisTitle", e.number, e.state, e.hash, e.unverified,
  e.document ->> 'title' AS title, e.document ->> 'purpose' AS purpose, e.document ->> 'method' AS method,
  e.document ->> 'unitSystem' AS "unitSystem", e.reason,
  ${personJson('dp')} AS "draftedBy", ${instant('e.drafted_at')} AS "draftedAt",
  CASE WHEN rp.id IS NULL THEN NULL ELSE ${personJson('rp')} END AS "releasedBy",
  ${instant('e.released_at')} AS "releasedAt",
  (SELECT count(*)::int FROM projects WHERE edition_id = e.id AND state = 'live') AS projects`;
export const editionSummaryJoins = `
  FROM editions e JOIN bases b ON b.id = e.basis_id JOIN people dp ON dp.id = e.drafted_by
  LEFT JOIN people rp ON rp.id = e.released_by`;
