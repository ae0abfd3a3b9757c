import type { Operation } from 'fast-json-patch';
import { Op } from 'sequelize';
import { clashesOf } from '#shared/basis/draft/clash.ts';
import { patchBetween, patched } from '#shared/basis/draft/patch.ts';
import { hashOf } from '#shared/basis/hash.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import { validateEdition } from '#shared/basis/validate.ts';
import type { Body, Output, patchDraft, StoredDraft } from '#shared/contracts/index.ts';
import { unverifiedIn } from '#server/basis/unverified.ts';
import type { Door } from '#server/db/door.ts';
import { invalid, Refusal } from '#server/http/problem.ts';
import type { Person } from '#server/http/person.ts';
import type { EditionRow } from '#server/models/rows.ts';
import { subjectOf } from './names.ts';

type Sent = Body<typeof patchDraft>;

/**
 * Changes a draft by a patch made on some version of it. What others changed since is merged where it is
 * elsewhere; where both changed one place, nothing is saved and both values come back.
 */
export async function changeDraft(
  door: Door,
  person: Person,
  edition: EditionRow,
  { version, patch }: Sent,
): Promise<Output<typeof patchDraft>> {
  const operations = patch as Operation[];
  const merged = edition.version !== version;
  if (merged) await refuseClash(door, edition, version, operations);
  const document = applied(edition.document, operations);
  const valid = validateEdition(document);
  if (!valid.ok) {
    throw invalid(valid.findings.slice(0, 50).map(({ pointer, message }) => ({ pointer, message })));
  }
  const hash = hashOf(document);
  const next = edition.version + 1;
  const undo = patchBetween(document, edition.document);
  await door.editionVersions.add({ editionId: edition.id, version: next, undo, changedBy: person.id });
  await door.editions.change(edition, { document, hash, version: next, unverified: unverifiedIn(document) });
  const subject = await subjectOf(door, edition);
  await door.record(
    {
      kind: 'edition.changed',
      v: 1,
      detail: { edition: subject.label, version: next, places: operations.length },
    },
    subject,
  );
  return { version: next, hash, merged, document: merged ? document : null };
}

function applied(document: Edition, operations: readonly Operation[]): Edition {
  const outcome = patched(document, operations);
  if (!outcome.ok) throw invalid([{ pointer: '/patch', message: outcome.message }]);
  return outcome.document;
}

/** The draft as it was at a version: the later changes undone, newest first. */
async function documentAt(door: Door, edition: EditionRow, version: number): Promise<Edition> {
  const later = await door.editionVersions.all(
    { editionId: edition.id, version: { [Op.gt]: version } },
    { order: [['version', 'DESC']] },
  );
  return later.reduce((document, { undo }) => applied(document, undo), edition.document);
}

async function refuseClash(
  door: Door,
  edition: EditionRow,
  version: number,
  operations: Operation[],
): Promise<void> {
  if (version > edition.version) {
    throw invalid([{ pointer: '/version', message: `The draft is at version ${edition.version}.` }]);
  }
  const base = await documentAt(door, edition, version);
  const clashes = clashesOf(base, edition.document, operations, applied(base, operations));
  if (clashes.length === 0) return;
  const last = await door.editionVersions.one({ editionId: edition.id, version: edition.version });
  const [changedBy] = await door.select<{ id: string; name: string }>(
    'SELECT id, name FROM people WHERE id = :id',
    {
      id: last?.changedBy ?? edition.draftedBy,
    },
  );
  const stored: StoredDraft = {
    version: edition.version,
    document: edition.document,
    clashes: clashes.map(({ pointer, mine, theirs }) => ({
      pointer,
      mine: mine ?? null,
      theirs: theirs ?? null,
    })),
    changedBy: changedBy ?? { id: edition.draftedBy, name: '' },
  };
  throw new Refusal(
    'stale-version',
    `${stored.changedBy.name} changed the same ${clashes.length === 1 ? 'place' : 'places'} meanwhile. Nothing was saved or lost; choose between the two values and save again.`,
    { stored },
  );
}
