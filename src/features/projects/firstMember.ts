import type { Edition, LoadInput, Member } from '#shared/basis/schema/index.ts';
import type { Section } from '#shared/contracts/stock.ts';

/** The next mark that nobody has: the letter of the last one, counted on. */
export function nextMark(taken: readonly string[]): string {
  const last = taken.at(-1) ?? 'B0';
  const [, letters = 'B', digits = '0'] = /^(\D*)(\d*)$/.exec(last) ?? [];
  const used = new Set(taken.map((mark) => mark.toLowerCase()));
  for (let number = Number(digits || '0') + 1; ; number += 1) {
    const mark = `${letters || 'B'}${number}`;
    if (!used.has(mark.toLowerCase())) return mark;
  }
}

/**
 * A member to begin from: one span, the first section of the stock, a permanent and a variable load whose
 * titles ask for them to be set. Nothing in it is meant to be kept.
 */
export function firstMember(
  edition: Edition,
  stock: readonly Section[],
  mark: string,
  title: string,
): Member {
  const metric = edition.unitSystem === 'metric';
  const permanent = edition.actions.find(({ nature }) => nature === 'permanent');
  const variable = edition.actions.find(({ nature }) => nature === 'variable');
  const section = [...stock].sort((a, b) => a.actual.h - b.actual.h)[Math.floor(stock.length / 2)];
  const load = (action: Edition['actions'][number], intensity: number): LoadInput => ({
    id: action.id.toLowerCase(),
    action: action.id,
    kind: 'area',
    title: `${action.title}: set this`,
    intensity,
  });
  const bearing = metric ? 50 : 1.5;
  return {
    schema: 'member/1',
    mark,
    ...(title ? { title } : {}),
    units: edition.unitSystem,
    choices: Object.fromEntries(
      edition.choices.flatMap(({ symbol, scope, default: usual, options }) =>
        scope === 'member' && usual === undefined && options[0] ? [[symbol, options[0].id]] : [],
      ),
    ),
    grade: edition.grades.rows[0]?.id ?? 'grade',
    section: section
      ? { ...section.actual, pieces: 1, nominal: section.nominal, stock: section.id }
      : { b: metric ? 47 : 1.5, h: metric ? 195 : 9.25, pieces: 1 },
    spanMeasured: 'centres',
    spans: [{ length: metric ? 3600 : 144 }],
    supports: [
      { restraint: 'pin', bearing },
      { restraint: 'pin', bearing },
    ],
    carries: { by: 'spacing', width: metric ? 400 : 16 },
    loads: [
      ...(permanent ? [load(permanent, metric ? 0.5 : 10)] : []),
      ...(variable ? [load(variable, metric ? 1.5 : 40)] : []),
    ],
    inputs: {},
    departures: [],
  };
}
