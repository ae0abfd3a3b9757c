import type { Door, Subject } from '#server/db/door.ts';
import type { EditionRow } from '#server/models/rows.ts';

/** An edition as people call it. */
export const nameOf = (basis: string, number: number): string => `${basis}, edition ${number}`;

/** An edition as the subject of an event. */
export async function subjectOf(door: Door, edition: EditionRow): Promise<Subject> {
  const basis = await door.bases.one({ id: edition.basisId });
  return { type: 'edition', id: edition.id, label: nameOf(basis?.title ?? '', edition.number) };
}
