import { canBePinned } from '#shared/basis/lifecycle.ts';
import type { Body, pinEdition as contract } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { invalid, Refusal } from '#server/http/problem.ts';
import { judgeProject } from '#server/judge/keep.ts';
import type { Judge } from '#server/judge/judge.ts';
import type { EditionRow, ProjectRow } from '#server/models/rows.ts';
import { refuseUnknownOptions } from './changeProject.ts';

/** Pins a released edition, on purpose: every member is checked against it, in the same transaction. */
export async function pinEdition(
  door: Door,
  judge: Judge,
  project: ProjectRow,
  { editionId, version, reason }: Body<typeof contract>,
): Promise<void> {
  const edition = await pinnable(door, judge, editionId);
  refuseUnknownOptions(project.choices, edition);
  const from = project.editionId;
  await door.projects.change(project, { editionId, version: version + 1, changedAt: new Date() });
  const rechecked = await judgeProject(door, judge, edition, project);
  const basis = await door.bases.one({ id: edition.basisId });
  await door.record(
    {
      kind: 'project.edition-pinned',
      v: 1,
      detail: {
        from,
        to: editionId,
        edition: `${basis?.title ?? ''}, edition ${edition.number}`,
        reason,
        rechecked,
      },
    },
    { type: 'project', id: project.id, label: project.title },
  );
}

/** The edition, held so that it can't be withdrawn meanwhile. */
async function pinnable(door: Door, judge: Judge, id: string): Promise<EditionRow> {
  const edition = await door.editions.one({ id }, { lock: 'share' });
  if (!edition) throw invalid([{ pointer: '/editionId', message: 'The firm has no such edition.' }]);
  if (!canBePinned(edition.state)) {
    throw new Refusal('not-in-this-state', 'Only a released edition can be pinned. Choose a released one.');
  }
  if (!judge.compiles(edition)) {
    throw new Refusal(
      'not-in-this-state',
      'This edition has errors that this version of the engine finds, so members can’t be checked with it.',
    );
  }
  return edition;
}
