import { QueryTypes, type Transaction } from 'sequelize';
import { roleTitles } from '#shared/access/index.ts';
import { hashOf } from '#shared/basis/hash.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { starterNamed } from '#server/basis/starters.ts';
import { unverifiedIn } from '#server/basis/unverified.ts';
import { createPasswords, type Passwords } from '#server/http/passwords.ts';
import { judgeAndKeep } from '#server/judge/keep.ts';
import { Judge } from '#server/judge/judge.ts';
import type { EditionRow } from '#server/models/rows.ts';
import { connect, type Database } from './connection.ts';
import { barn, barnMembers } from './demo/barn.ts';
import { demoFirm, demoPassword, demoPeople } from './demo/firm.ts';
import { houseEdition, houseFirst, houseNext } from './demo/houseEdition.ts';
import { readingRoom, readingRoomMembers } from './demo/readingRoom.ts';
import { demoStock } from './demo/stock.ts';
import { openDoor, type Door } from './door.ts';
import { setUpFirm } from './setUpFirm.ts';

const STARTER = 'permissible-stress-softwood';
/** Any number, the same in every process. */
const LOCK = 7_246_020;

export { demoPassword };

/** A sign-in of the demo firm; all have the demo password. */
export interface DemoSignIn {
  role: string;
  name: string;
  email: string;
}

/**
 * Sets up the demo firm once; the next time it is left as people made it. Takes the owner's address, gives
 * the sign-ins.
 */
export async function seed(
  ownerUrl: string,
  passwords: Passwords = createPasswords(),
): Promise<DemoSignIn[]> {
  const owner = connect(ownerUrl, { most: 2 });
  try {
    const passwordHash = await passwords.hash(demoPassword);
    await owner.sequelize.transaction(async (transaction) => {
      // Two starts at once: the second waits here, and then finds the firm.
      await owner.sequelize.query(`SELECT pg_advisory_xact_lock(${LOCK})`, { transaction });
      const found = await owner.sequelize.query('SELECT 1 FROM people WHERE email = $1', {
        bind: [demoPeople[0]?.email],
        transaction,
        type: QueryTypes.SELECT,
      });
      if (found.length === 0) await setUpDemo(owner, transaction, passwordHash);
    });
    return demoPeople.map(({ role, name, email }) => ({ role: roleTitles[role], name, email }));
  } finally {
    await owner.close();
  }
}

/** All of it or nothing: one transaction, through the door of whoever does each step. */
async function setUpDemo(owner: Database, transaction: Transaction, passwordHash: string): Promise<void> {
  const starter = starterNamed(STARTER);
  if (!starter) throw new Error(`The starter edition ${STARTER} is missing from rules/.`);
  const people = demoPeople.map(({ role, name, email }) => ({ name, email, passwordHash, roles: [role] }));
  const { firmId, people: ids } = await setUpFirm(owner, transaction, demoFirm, people);
  const [principalId = '', keeperId = '', engineerId = ''] = ids;
  const judge = new Judge();

  let door = await openDoor(owner, transaction, { firmId, personId: keeperId });
  const softwood = await setUpBasis(door, 'Permissible stress, softwood', starter, STARTER);
  const barns = houseEdition(starter, houseFirst);
  const house = await setUpBasis(door, 'House basis: barns (invented)', barns, STARTER);
  const stockListId = await setUpStock(door);
  await submit(door, softwood);
  await submit(door, house);

  // A second person releases what the keeper drafted.
  door = await openDoor(owner, transaction, { firmId, personId: principalId });
  await release(door, softwood);
  await release(door, house);

  door = await openDoor(owner, transaction, { firmId, personId: keeperId });
  await submit(door, await addEdition(door, house.basisId, 2, houseEdition(starter, houseNext)));

  door = await openDoor(owner, transaction, { firmId, personId: engineerId });
  await setUpProject(door, judge, barn, stockListId, house, barnMembers);
  await setUpProject(door, judge, readingRoom, stockListId, softwood, readingRoomMembers);
}

async function setUpBasis(
  door: Door,
  title: string,
  document: Edition,
  starter: string,
): Promise<EditionRow> {
  const basis = await door.bases.add({ title, purpose: document.purpose, createdBy: door.personId });
  await door.record(
    { kind: 'basis.set-up', v: 1, detail: { title, starter } },
    { type: 'basis', id: basis.id, label: title },
  );
  return addEdition(door, basis.id, 1, document);
}

function addEdition(door: Door, basisId: string, number: number, document: Edition): Promise<EditionRow> {
  return door.editions.add({
    basisId,
    number,
    document,
    hash: hashOf(document),
    unverified: unverifiedIn(document),
    draftedBy: door.personId,
  });
}

async function submit(door: Door, edition: EditionRow): Promise<void> {
  const reason =
    edition.number === 1 ? 'First edition.' : 'Old timber and floors under stone, after the first jobs.';
  await door.editions.change(edition, { state: 'in_check', submittedBy: door.personId, reason });
  await door.record(
    { kind: 'edition.submitted', v: 1, detail: { edition: labelOf(edition), reason } },
    { type: 'edition', id: edition.id, label: labelOf(edition) },
  );
}

async function release(door: Door, edition: EditionRow): Promise<void> {
  await door.editions.change(edition, {
    state: 'released',
    releasedBy: door.personId,
    releasedAt: new Date(),
  });
  await door.record(
    { kind: 'edition.released', v: 1, detail: { edition: labelOf(edition), hash: edition.hash } },
    { type: 'edition', id: edition.id, label: labelOf(edition) },
  );
}

const labelOf = ({ document, number }: EditionRow) => `${document.title}, edition ${number}`;

async function setUpStock(door: Door): Promise<string> {
  const { sections, ...list } = demoStock;
  const { id } = await door.stockLists.add(list);
  await door.sections.addMany(
    sections.map(({ id: key, nominal, actual, lengths, grades, pricePerMetre }) => ({
      stockListId: id,
      key,
      nominalB: nominal.b,
      nominalH: nominal.h,
      actualB: actual.b,
      actualH: actual.h,
      lengths,
      grades,
      pricePerMetre,
    })),
  );
  await door.record(
    { kind: 'stock.set-up', v: 1, detail: { title: list.title, sections: sections.length } },
    { type: 'stock', id, label: list.title },
  );
  return id;
}

async function setUpProject(
  door: Door,
  judge: Judge,
  given: { title: string; site: string; client: string; choices: Record<string, string> },
  stockListId: string,
  edition: EditionRow,
  members: readonly Member[],
): Promise<void> {
  const project = await door.projects.add({
    ...given,
    stockListId,
    editionId: edition.id,
    createdBy: door.personId,
  });
  const subject = { type: 'project', id: project.id, label: project.title } as const;
  await door.record({ kind: 'project.opened', v: 1, detail: { title: project.title } }, subject);
  await door.record(
    {
      kind: 'project.edition-pinned',
      v: 1,
      detail: {
        from: null,
        to: edition.id,
        edition: labelOf(edition),
        reason: 'Agreed at the first meeting.',
        rechecked: 0,
      },
    },
    subject,
  );
  for (const document of members) {
    const hash = hashOf(document);
    const who = { savedBy: door.personId, savedAt: new Date() };
    const member = await door.members.add({
      projectId: project.id,
      mark: document.mark,
      document,
      hash,
      version: 1,
      ...who,
    });
    await door.memberVersions.add({ memberId: member.id, version: 1, document, hash, ...who });
    const verdict = await judgeAndKeep(door, judge, edition, project, member);
    await door.record(
      { kind: 'member.added', v: 1, detail: { mark: member.mark, project: project.id, verdict } },
      { type: 'member', id: member.id, label: member.mark },
    );
  }
}
