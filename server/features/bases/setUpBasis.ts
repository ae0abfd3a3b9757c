import { hashOf } from '#shared/basis/hash.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { Body, createBasis } from '#shared/contracts/index.ts';
import { unverifiedIn } from '#server/basis/unverified.ts';
import type { Door } from '#server/db/door.ts';
import type { Person } from '#server/http/person.ts';

/** Sets up a basis whose first edition is a draft with a starter's document. Gives its id. */
export async function setUpBasis(
  door: Door,
  person: Person,
  { title, purpose, starter }: Body<typeof createBasis>,
  document: Edition,
): Promise<string> {
  const basis = await door.bases.add({ title, purpose: purpose ?? document.purpose, createdBy: person.id });
  await door.editions.add({
    basisId: basis.id,
    number: 1,
    document,
    hash: hashOf(document),
    unverified: unverifiedIn(document),
    draftedBy: person.id,
    reason: `Made from the starter “${document.title}”.`,
  });
  await door.record(
    { kind: 'basis.set-up', v: 1, detail: { title, starter } },
    { type: 'basis', id: basis.id, label: title },
  );
  return basis.id;
}
