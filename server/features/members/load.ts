import type { Door } from '#server/db/door.ts';
import type { EditionRow, MemberRow, ProjectRow, ResultRow } from '#server/models/rows.ts';

export interface LoadedMember {
  access: { projectState: ProjectRow['state']; memberState: MemberRow['state'] };
  project: ProjectRow;
  member: MemberRow;
}

interface Asked {
  door: Door;
  params: { id: string };
}

/** A member with its project, to look at. */
export async function loadMember({ door, params }: Asked): Promise<LoadedMember | null> {
  const member = await door.members.one({ id: params.id });
  const project = member && (await door.projects.one({ id: member.projectId }));
  return member && project && loaded(project, member);
}

/**
 * A member to be changed. The project is held first, so that the edition it pins stays the same until the
 * result is stored, then the member, read again now that nobody else can save it.
 */
export async function loadMemberToChange({ door, params }: Asked): Promise<LoadedMember | null> {
  const seen = await door.members.one({ id: params.id });
  const project = seen && (await door.projects.one({ id: seen.projectId }, { lock: 'share' }));
  const member = project && (await door.members.one({ id: params.id }, { lock: 'update' }));
  return member && loaded(project, member);
}

function loaded(project: ProjectRow, member: MemberRow): LoadedMember {
  return { access: { projectState: project.state, memberState: member.state }, project, member };
}

/** The newest stored result of the member as it is, against the edition that its project pins. */
export async function currentResultOf(
  door: Door,
  { project, member }: LoadedMember,
): Promise<{ result: ResultRow; edition: EditionRow } | null> {
  if (project.editionId === null) return null;
  const [newest] = await door.select<{ id: string }>(
    `SELECT id FROM results WHERE firm_id = :firmId AND member_id = :member AND member_version = :version
       AND edition_id = :edition ORDER BY seq DESC LIMIT 1`,
    { member: member.id, version: member.version, edition: project.editionId },
  );
  const result = newest ? await door.results.one({ id: newest.id }) : null;
  const edition = await door.editions.one({ id: project.editionId });
  return result && edition ? { result, edition } : null;
}
