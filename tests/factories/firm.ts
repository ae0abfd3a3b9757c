import { randomUUID } from 'node:crypto';
import { roles, type Role } from '#shared/access/index.ts';
import { hashOf } from '#shared/basis/hash.ts';
import type { EditionState } from '#shared/basis/lifecycle.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { unverifiedIn } from '#server/basis/unverified.ts';
import type { Database } from '#server/db/connection.ts';
import { withFirm, type Door } from '#server/db/door.ts';
import { setUpFirm } from '#server/db/setUpFirm.ts';
import { createPasswords } from '#server/http/passwords.ts';
import { judgeAndKeep } from '#server/judge/keep.ts';
import { Judge } from '#server/judge/judge.ts';
import type { EditionRow, MemberRow, ProjectRow } from '#server/models/rows.ts';
import { testEdition } from './edition.ts';
import { testMember } from './member.ts';

export const PASSWORD = 'correct horse battery staple';
const hashed = createPasswords({ fast: true }).hash(PASSWORD);
const judge = new Judge();

export interface TestPerson {
  id: string;
  email: string;
  name: string;
}

export interface TestFirm {
  firmId: string;
  /** One person for each role. */
  people: Record<Role, TestPerson>;
  /** Does something in the firm as one of its people. */
  as<T>(role: Role, work: (door: Door) => Promise<T>): Promise<T>;
}

/** A firm of its own for a test, with one person for each role. */
export async function makeFirm(
  owner: Database,
  given: { solePractitioner?: boolean } = {},
): Promise<TestFirm> {
  const key = randomUUID().slice(0, 8);
  const passwordHash = await hashed;
  const people = roles.map((role) => ({
    name: `Test ${role} ${key}`,
    email: `${role}.${key}@test.example`,
    passwordHash,
    roles: [role],
  }));
  const { firmId, people: ids } = await owner.sequelize.transaction((transaction) =>
    setUpFirm(owner, transaction, { name: `Test firm ${key}`, invented: true, ...given }, people),
  );
  const byRole = Object.fromEntries(
    roles.map((role, i) => [role, { id: ids[i], email: people[i]?.email, name: people[i]?.name }]),
  ) as Record<Role, TestPerson>;
  return {
    firmId,
    people: byRole,
    as: (role, work) => withFirm(owner, { firmId, personId: byRole[role].id }, work),
  };
}

interface EditionGiven {
  document?: Edition;
  state?: EditionState;
  basisTitle?: string;
}

const way: Readonly<Record<EditionState, readonly EditionState[]>> = {
  draft: [],
  in_check: ['in_check'],
  released: ['in_check', 'released'],
  superseded: ['in_check', 'released', 'superseded'],
  withdrawn: ['in_check', 'released', 'withdrawn'],
};

/** An edition in some state (released when not said), with a basis for it. */
export async function makeEdition(firm: TestFirm, given: EditionGiven = {}): Promise<EditionRow> {
  const { document = testEdition(), state = 'released', basisTitle = 'Test basis' } = given;
  return firm.as('keeper', async (door) => {
    const basis = await door.bases.add({ title: basisTitle, createdBy: door.personId });
    const edition = await door.editions.add({
      basisId: basis.id,
      number: 1,
      document,
      hash: hashOf(document),
      unverified: unverifiedIn(document),
      draftedBy: door.personId,
    });
    for (const next of way[state]) {
      await door.editions.change(edition, {
        state: next,
        ...(next === 'released' ? { releasedBy: firm.people.principal.id, releasedAt: new Date() } : {}),
      });
    }
    await door.record(
      { kind: 'basis.set-up', v: 1, detail: { title: basisTitle, starter: 'test' } },
      { type: 'basis', id: basis.id, label: basisTitle },
    );
    return edition;
  });
}

interface ProjectGiven {
  title?: string;
  /** null: pins none. Left out: a released one is made. */
  edition?: EditionRow | null;
  choices?: Record<string, string>;
  state?: 'live' | 'closed';
}

/** A project, with a released edition pinned when nothing else is said. */
export async function makeProject(firm: TestFirm, given: ProjectGiven = {}): Promise<ProjectRow> {
  const edition = given.edition === undefined ? await makeEdition(firm) : given.edition;
  const title = given.title ?? 'Test project';
  return firm.as('engineer', async (door) => {
    const project = await door.projects.add({
      title,
      createdBy: door.personId,
      editionId: edition?.id ?? null,
      choices: given.choices ?? {},
      state: given.state ?? 'live',
    });
    await door.record(
      { kind: 'project.opened', v: 1, detail: { title } },
      { type: 'project', id: project.id, label: title },
    );
    return project;
  });
}

/** A member with its first version and result, in a project made for it when none is given. */
export async function makeMember(
  firm: TestFirm,
  given: { project?: ProjectRow; document?: Member } = {},
): Promise<MemberRow> {
  const project = given.project ?? (await makeProject(firm));
  const document = given.document ?? testMember();
  return firm.as('engineer', async (door) => {
    const { id: projectId } = project;
    const hash = hashOf(document);
    const member = await door.members.add({
      projectId,
      mark: document.mark,
      document,
      hash,
      version: 1,
      savedBy: door.personId,
      savedAt: new Date(),
    });
    await door.memberVersions.add({
      memberId: member.id,
      version: 1,
      document,
      hash,
      savedBy: door.personId,
    });
    const edition = project.editionId ? await door.editions.one({ id: project.editionId }) : null;
    const verdict = edition ? await judgeAndKeep(door, judge, edition, project, member) : 'none';
    await door.record(
      { kind: 'member.added', v: 1, detail: { mark: document.mark, project: projectId, verdict } },
      { type: 'member', id: member.id, label: document.mark },
    );
    return member;
  });
}

/** A stock list with one section. */
export async function makeStock(firm: TestFirm): Promise<string> {
  return firm.as('keeper', async (door) => {
    const list = await door.stockLists.add({ title: 'Test stock', invented: true, units: 'metric' });
    await door.sections.add({
      stockListId: list.id,
      key: '50x200',
      nominalB: 50,
      nominalH: 200,
      actualB: 47,
      actualH: 195,
      lengths: [3600, 4800],
      grades: ['T16'],
    });
    await door.record(
      { kind: 'stock.set-up', v: 1, detail: { title: 'Test stock', sections: 1 } },
      { type: 'stock', id: list.id, label: 'Test stock' },
    );
    return list.id;
  });
}
