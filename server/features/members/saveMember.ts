import { UniqueConstraintError } from 'sequelize';
import { hashOf } from '#shared/basis/hash.ts';
import type { Member } from '#shared/basis/schema/index.ts';
import type { VerdictWord } from '#shared/engine/types.ts';
import type { StoredMember } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { invalid, Refusal } from '#server/http/problem.ts';
import type { Person } from '#server/http/person.ts';
import { judgeAndKeep } from '#server/judge/keep.ts';
import type { Judge } from '#server/judge/judge.ts';
import type { MemberRow, ProjectRow } from '#server/models/rows.ts';

/** Adds a member to a project as its first version, checks it and stores the result. */
export async function addMember(
  door: Door,
  judge: Judge,
  person: Person,
  project: ProjectRow,
  document: Member,
): Promise<MemberRow> {
  refuseBlankMark(document);
  const hash = hashOf(document);
  const values = {
    projectId: project.id,
    mark: document.mark,
    document,
    hash,
    version: 1,
    savedBy: person.id,
  };
  const member = await orMarkTaken(document.mark, () => door.members.add({ ...values, savedAt: new Date() }));
  const verdict = await keepVersion(door, judge, project, member);
  await door.record(
    { kind: 'member.added', v: 1, detail: { mark: member.mark, project: project.id, verdict } },
    subjectOf(member),
  );
  return member;
}

/** Saves a member over the version it was made from, checks it and stores the result. */
export async function saveMember(
  door: Door,
  judge: Judge,
  person: Person,
  { project, member }: { project: ProjectRow; member: MemberRow },
  sent: { version: number; document: Member },
): Promise<void> {
  await refuseStale(door, member, sent);
  refuseBlankMark(sent.document);
  const { document, version } = sent;
  await orMarkTaken(document.mark, () =>
    door.members.change(member, {
      document,
      mark: document.mark,
      hash: hashOf(document),
      version: version + 1,
      savedBy: person.id,
      savedAt: new Date(),
    }),
  );
  const verdict = await keepVersion(door, judge, project, member);
  await door.record(
    {
      kind: 'member.saved',
      v: 1,
      detail: { mark: member.mark, project: project.id, version: member.version, verdict },
    },
    subjectOf(member),
  );
}

/** Takes a member out of its project. Its versions and results stay. */
export async function removeMember(
  door: Door,
  { project, member }: { project: ProjectRow; member: MemberRow },
  sent: { version: number },
): Promise<void> {
  await refuseStale(door, member, sent);
  await door.members.change(member, { state: 'removed' });
  await door.record(
    {
      kind: 'member.removed',
      v: 1,
      detail: { mark: member.mark, project: project.id, version: member.version },
    },
    subjectOf(member),
  );
}

async function keepVersion(
  door: Door,
  judge: Judge,
  project: ProjectRow,
  member: MemberRow,
): Promise<VerdictWord> {
  const { id: memberId, version, document, hash, savedBy, savedAt } = member;
  await door.memberVersions.add({ memberId, version, document, hash, savedBy, savedAt });
  const edition = project.editionId === null ? null : await door.editions.one({ id: project.editionId });
  return edition ? judgeAndKeep(door, judge, edition, project, member) : 'none';
}

/** Neither document is lost: the answer carries the stored one and the one that was sent. */
async function refuseStale(door: Door, member: MemberRow, sent: { version: number }): Promise<void> {
  if (member.version === sent.version) return;
  const [savedBy] = await door.select<{ id: string; name: string }>(
    'SELECT id, name FROM people WHERE id = :id',
    {
      id: member.savedBy,
    },
  );
  const stored: StoredMember = {
    document: member.document,
    version: member.version,
    savedBy: savedBy ?? { id: member.savedBy, name: '' },
    savedAt: member.savedAt.toISOString(),
  };
  throw new Refusal(
    'stale-version',
    `${stored.savedBy.name} saved ${member.mark} meanwhile: it is at version ${member.version}, yours was made from ${sent.version}. Nothing was saved or lost; compare the two and save again.`,
    { stored, sent },
  );
}

function refuseBlankMark({ mark }: Member): void {
  if (mark.trim() === mark && mark !== '') return;
  const message = 'A mark can’t be blank, and can’t begin or end with a space.';
  throw invalid([{ pointer: '/document/mark', message }]);
}

async function orMarkTaken<T>(mark: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    throw new Refusal('mark-taken', `The project already has a member ${mark}. Give this one another mark.`, {
      errors: [{ pointer: '/document/mark', message: `${mark} is taken in this project.` }],
    });
  }
}

function subjectOf(member: MemberRow) {
  return { type: 'member' as const, id: member.id, label: member.mark };
}
