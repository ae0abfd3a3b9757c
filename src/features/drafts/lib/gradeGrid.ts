import type { Edition, Grade } from '#shared/basis/schema/index.ts';
import type { CellContent, GridColumn, GridRow, GridStep } from '#src/components/grid/types.ts';
import { unitForReading } from '#shared/units/format.ts';

type Provenance = Grade['provenance'];
const choicePrefix = 'choice.';

/** The grade table as columns of a grid: name, the choices that grades have, properties. */
export function gradeColumns(edition: Edition): GridColumn[] {
  return [
    { key: 'title', title: 'Grade', kind: 'text', width: 13 },
    ...edition.choices
      .filter(({ scope }) => scope === 'grade')
      .map(({ symbol, title, options }): GridColumn => ({
        key: `${choicePrefix}${symbol}`,
        title,
        kind: 'choice',
        options,
        width: 9,
      })),
    ...edition.grades.columns.map(({ symbol, title, unit }): GridColumn => ({
      key: symbol,
      title,
      symbol,
      unit: unitForReading(unit),
      kind: 'number',
      width: 7.5,
    })),
  ];
}

/** The grade table as rows of a grid. Values by size are shown as text; they are changed elsewhere. */
export function gradeRows(edition: Edition): GridRow[] {
  return edition.grades.rows.map((row) => {
    const cells: Record<string, CellContent> = { title: row.title };
    for (const [symbol, option] of Object.entries(row.choices)) cells[`${choicePrefix}${symbol}`] = option;
    for (const [symbol, value] of Object.entries(row.values)) {
      cells[symbol] = typeof value === 'number' ? value : value.values.join(' / ');
    }
    return { key: row.id, cells };
  });
}

/** A value changed by hand is the firm's own from then on, and nobody has verified it yet. */
function changedByHand(provenance: Provenance): Provenance {
  return {
    source: provenance.source,
    standing: 'decision',
    ...(provenance.place === undefined ? {} : { place: provenance.place }),
    note: 'Changed by hand in this edition.',
  };
}

const without = <T>(record: Readonly<Record<string, T>>, key: string): Record<string, T> =>
  Object.fromEntries(Object.entries(record).filter(([name]) => name !== key));

function withCell(row: Grade, column: string, value: CellContent): Grade {
  if (column === 'title') return { ...row, title: typeof value === 'string' && value ? value : row.title };
  if (column.startsWith(choicePrefix)) {
    const symbol = column.slice(choicePrefix.length);
    return {
      ...row,
      choices:
        typeof value === 'string' && value
          ? { ...row.choices, [symbol]: value }
          : without(row.choices, symbol),
    };
  }
  if (typeof value !== 'number') {
    const cells = without(row.cells ?? {}, column);
    return { ...row, values: without(row.values, column), ...(row.cells ? { cells } : {}) };
  }
  const own = row.cells?.[column] ?? row.provenance;
  return {
    ...row,
    values: { ...row.values, [column]: value },
    cells: { ...row.cells, [column]: changedByHand(own) },
  };
}

/** An id for a new grade, made of its name, that no other grade has. */
export function gradeId(title: string, taken: readonly string[]): string {
  const base =
    title
      .normalize('NFKD')
      .replace(/[^A-Za-z0-9]+/g, '-')
      .replace(/^[^A-Za-z]+|-+$/g, '')
      .slice(0, 40) || 'grade';
  for (let number = 1; ; number += 1) {
    const id = number === 1 ? base : `${base}-${number}`;
    if (!taken.includes(id)) return id;
  }
}

/** The edition after one step in the grid: changed cells and new rows, together. */
export function afterStep(edition: Edition, step: Pick<GridStep, 'changes' | 'newRows'>): Edition {
  const byRow = new Map<string, GridStep['changes'][number][]>();
  for (const change of step.changes) byRow.set(change.row, [...(byRow.get(change.row) ?? []), change]);
  const rows = edition.grades.rows.map((row) =>
    (byRow.get(row.id) ?? []).reduce((changed, { column, after }) => withCell(changed, column, after), row),
  );
  for (const cells of step.newRows) rows.push(newGrade(edition, rows, cells));
  return { ...edition, grades: { ...edition.grades, rows } };
}

/** A new grade; a choice nobody made takes its first option, so that the row has the shape of a grade. */
export function newGrade(
  edition: Edition,
  rows: readonly Grade[],
  cells: Readonly<Record<string, CellContent>>,
): Grade {
  const given = cells['title'];
  const title = typeof given === 'string' && given ? given : `New grade ${rows.length + 1}`;
  const choices = Object.fromEntries(
    edition.choices
      .filter(({ scope }) => scope === 'grade')
      .map(({ symbol, options }) => [symbol, options[0]?.id ?? '']),
  );
  const source = edition.sources.find(({ kind }) => kind === 'decision') ?? edition.sources[0];
  const bare: Grade = {
    id: gradeId(
      title,
      rows.map(({ id }) => id),
    ),
    title,
    choices,
    values: {},
    provenance: { source: source?.id ?? '', standing: 'decision' },
  };
  return Object.entries(cells).reduce(
    (row, [column, value]) => (value === null ? row : withCell(row, column, value)),
    bare,
  );
}
