import { abilities } from '#shared/access/index.ts';
import type { Project } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { currentResult, editionJson, instant, personJson } from '#server/db/summaries.ts';
import type { Person } from '#server/http/person.ts';

const columns = `
  p.id, p.title, p.site, p.client, p.state, p.choices,
  CASE WHEN e.id IS NULL THEN NULL ELSE ${editionJson('e', 'b')} END AS edition,
  p.stock_list_id AS "stockListId", n.counts, p.version, ${personJson('c')} AS "createdBy",
  ${instant('p.created_at')} AS "createdAt", to_json(greatest(p.changed_at, n.saved_at)) AS "changedAt"`;
const joins = `
  FROM projects p
  LEFT JOIN editions e ON e.id = p.edition_id LEFT JOIN bases b ON b.id = e.basis_id
  JOIN people c ON c.id = p.created_by
  CROSS JOIN LATERAL (
    SELECT max(m.saved_at) AS saved_at, jsonb_build_object(
      'passes', count(*) FILTER (WHERE r.verdict = 'passes'),
      'close', count(*) FILTER (WHERE r.verdict = 'close'),
      'fails', count(*) FILTER (WHERE r.verdict = 'fails'),
      'none', count(*) FILTER (WHERE coalesce(r.verdict, 'none') = 'none')) AS counts
    FROM members m ${currentResult} WHERE m.project_id = p.id AND m.state = 'live') n`;
const filter = `
  WHERE p.firm_id = :firmId
    AND (:state = 'any' OR p.state = :state)
    AND (:search = '' OR p.title ILIKE :like OR p.site ILIKE :like OR p.client ILIKE :like)`;

type Bare = Omit<Project, 'abilities'>;

/** What the project allows this person, as `can()` sees it. */
function withAbilities(person: Person, project: Bare): Project {
  const asked = ['projects.read', 'projects.update', 'projects.pin', 'members.create'] as const;
  return { ...project, abilities: abilities(person, asked, { projectState: project.state }) };
}

export interface ProjectSearch {
  search: string;
  state: Project['state'] | 'any';
  page: number;
  size: number;
}

/** A page of the firm's projects, last changed first, with the number of all that match. */
export async function listOfProjects(door: Door, person: Person, asked: ProjectSearch) {
  const { search, state, page, size } = asked;
  const like = `%${search.trim().replaceAll(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
  const values = { search: search.trim(), like, state };
  const rows = await door.select<Bare>(
    `SELECT ${columns} ${joins} ${filter} ORDER BY greatest(p.changed_at, n.saved_at) DESC, p.id
     LIMIT :size OFFSET :offset`,
    { ...values, size, offset: (page - 1) * size },
  );
  const [all] = await door.select<{ total: number }>(
    `SELECT count(*)::int AS total FROM projects p ${filter}`,
    values,
  );
  return { items: rows.map((row) => withAbilities(person, row)), page, size, total: all?.total ?? 0 };
}

/** One project as the client sees it. */
export async function presentProject(door: Door, person: Person, id: string): Promise<Project> {
  const [row] = await door.select<Bare>(
    `SELECT ${columns} ${joins} WHERE p.firm_id = :firmId AND p.id = :id`,
    { id },
  );
  if (!row) throw new Error('A project that was just at hand is gone.');
  return withAbilities(person, row);
}
