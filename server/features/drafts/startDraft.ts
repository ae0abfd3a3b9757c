import type { Body, startDraft } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { invalid, Refusal } from '#server/http/problem.ts';
import type { Person } from '#server/http/person.ts';
import type { BasisRow, EditionRow } from '#server/models/rows.ts';
import { nameOf } from './names.ts';

/** Drafts the next edition of a basis from one of its editions. A basis has one open edition at a time. */
export async function draftNext(
  door: Door,
  person: Person,
  basis: BasisRow,
  { from, reason }: Body<typeof startDraft>,
): Promise<EditionRow> {
  const editions = await door.editions.all({ basisId: basis.id });
  const open = editions.find(({ state }) => state === 'draft' || state === 'in_check');
  if (open) {
    throw new Refusal(
      'not-in-this-state',
      `Edition ${open.number} is still ${open.state === 'draft' ? 'a draft' : 'in check'}. Release it, or go on with it, before drafting the next.`,
    );
  }
  const source = editions.find(({ id }) => id === from);
  if (!source) throw invalid([{ pointer: '/from', message: 'Has to be an edition of this basis.' }]);
  const edition = await door.editions.add({
    basisId: basis.id,
    number: Math.max(...editions.map(({ number }) => number)) + 1,
    document: source.document,
    hash: source.hash,
    unverified: source.unverified,
    draftedBy: person.id,
    reason,
  });
  const name = nameOf(basis.title, edition.number);
  await door.record(
    { kind: 'edition.drafted', v: 1, detail: { edition: name, reason } },
    { type: 'edition', id: edition.id, label: name },
  );
  return edition;
}
