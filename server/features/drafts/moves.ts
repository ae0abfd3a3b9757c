import { releaseBlockers } from '#shared/basis/lifecycle.ts';
import type { Body, returnEdition, submitEdition } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { Refusal } from '#server/http/problem.ts';
import type { Person } from '#server/http/person.ts';
import type { Judge } from '#server/judge/judge.ts';
import type { EditionRow } from '#server/models/rows.ts';
import { subjectOf } from './names.ts';

/** Everyone who wrote in an edition: whoever drafted it, changed it or submitted it. */
export async function authorsOf(door: Door, edition: EditionRow): Promise<string[]> {
  const versions = await door.editionVersions.all({ editionId: edition.id }, { attributes: ['changedBy'] });
  const authors = [edition.draftedBy, edition.submittedBy, ...versions.map(({ changedBy }) => changedBy)];
  return [...new Set(authors.filter((author): author is string => author !== null))];
}

/** What stands in the way of a release by this person. Findings and proofs are worked out anew. */
export async function blockersFor(
  door: Door,
  judge: Judge,
  person: Person,
  edition: EditionRow,
): Promise<string[]> {
  const { solePractitioner } = await door.firm();
  return releaseBlockers({
    state: edition.state,
    errors: judge.findings(edition).filter(({ severity }) => severity === 'error').length,
    proofs: judge.proofs(edition),
    authors: await authorsOf(door, edition),
    releasing: person.id,
    solePractitioner,
  });
}

export async function submitIt(
  door: Door,
  person: Person,
  edition: EditionRow,
  { version, reason }: Body<typeof submitEdition>,
): Promise<void> {
  if (version !== edition.version) {
    throw new Refusal(
      'stale-version',
      `The draft is at version ${edition.version} now. Look at it before you submit it.`,
    );
  }
  await door.editions.change(edition, { state: 'in_check', submittedBy: person.id, reason });
  const subject = await subjectOf(door, edition);
  await door.record({ kind: 'edition.submitted', v: 1, detail: { edition: subject.label, reason } }, subject);
}

export async function returnIt(
  door: Door,
  person: Person,
  edition: EditionRow,
  { reason, remarks }: Body<typeof returnEdition>,
): Promise<void> {
  await door.editions.change(edition, { state: 'draft', submittedBy: null });
  await door.editionRemarks.addMany(
    remarks.map(({ pointer, text }) => ({ editionId: edition.id, pointer, text, remarkedBy: person.id })),
  );
  const subject = await subjectOf(door, edition);
  await door.record({ kind: 'edition.returned', v: 1, detail: { edition: subject.label, reason } }, subject);
}

/** Releases an edition and supersedes the one released before it. */
export async function releaseIt(
  door: Door,
  judge: Judge,
  person: Person,
  edition: EditionRow,
): Promise<void> {
  const [first] = await blockersFor(door, judge, person, edition);
  if (first !== undefined) throw new Refusal('not-in-this-state', first);
  const before = await door.editions.all({ basisId: edition.basisId, state: 'released' }, { lock: 'update' });
  await door.editions.change(edition, { state: 'released', releasedBy: person.id, releasedAt: new Date() });
  const subject = await subjectOf(door, edition);
  await door.record(
    { kind: 'edition.released', v: 1, detail: { edition: subject.label, hash: edition.hash } },
    subject,
  );
  for (const old of before) {
    await door.editions.change(old, { state: 'superseded' });
    const oldSubject = await subjectOf(door, old);
    await door.record(
      { kind: 'edition.superseded', v: 1, detail: { edition: oldSubject.label } },
      oldSubject,
    );
  }
}

export async function withdrawIt(door: Door, edition: EditionRow, reason: string): Promise<void> {
  await door.editions.change(edition, { state: 'withdrawn', reason });
  const subject = await subjectOf(door, edition);
  await door.record({ kind: 'edition.withdrawn', v: 1, detail: { edition: subject.label, reason } }, subject);
}
