import type { Body, Project, updateProject } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { invalid, Refusal } from '#server/http/problem.ts';
import { judgeProject } from '#server/judge/keep.ts';
import type { Judge } from '#server/judge/judge.ts';
import type { EditionRow, ProjectRow } from '#server/models/rows.ts';

type Change = Body<typeof updateProject>;

/** Refuses a change that was made from an older version, with what is stored and what was sent. */
export function refuseStale(row: ProjectRow, sent: { version: number }, stored: Project): void {
  if (row.version === sent.version) return;
  throw new Refusal(
    'stale-version',
    `The project was changed meanwhile: it is at version ${row.version}, yours was made from ${sent.version}. Nothing was saved or lost; compare the two and save again.`,
    { stored, sent },
  );
}

/** The options of project choices have to exist in the pinned edition. */
export function refuseUnknownOptions(
  choices: Readonly<Record<string, string>>,
  edition: EditionRow | null,
): void {
  const problems = Object.entries(choices).flatMap(([symbol, option]) => {
    const choice = edition?.document.choices.find((each) => each.symbol === symbol);
    if (!choice || choice.options.some(({ id }) => id === option)) return [];
    const known = choice.options.map(({ id }) => id).join(', ');
    return [{ pointer: `/choices/${symbol}`, message: `“${choice.title}” has to be one of: ${known}.` }];
  });
  if (problems.length > 0) throw invalid(problems);
}

export async function refuseUnknownStock(door: Door, stockListId: string | null | undefined): Promise<void> {
  if (!stockListId || (await door.stockLists.one({ id: stockListId }))) return;
  throw invalid([{ pointer: '/stockListId', message: 'The firm has no such stock list.' }]);
}

/** Changes what a project says of itself; other choices mean that its members are checked again. */
export async function changeProject(
  door: Door,
  judge: Judge,
  project: ProjectRow,
  change: Change,
): Promise<void> {
  const { version, ...given } = change;
  const edition = project.editionId === null ? null : await door.editions.one({ id: project.editionId });
  if (given.choices) refuseUnknownOptions(given.choices, edition);
  await refuseUnknownStock(door, given.stockListId);
  const values = Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined));
  await door.projects.change(project, { ...values, version: version + 1, changedAt: new Date() });
  const rechecked = given.choices && edition ? await judgeProject(door, judge, edition, project) : 0;
  await door.record(
    { kind: 'project.changed', v: 1, detail: { fields: Object.keys(values), rechecked } },
    { type: 'project', id: project.id, label: project.title },
  );
}
