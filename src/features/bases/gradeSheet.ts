import type { Edition, Grade, GradeColumn, Provenance } from '#shared/basis/schema/index.ts';
import { unitForReading } from '#shared/units/format.ts';
import type { CellMark, GridColumn, GridRow } from '#src/components/grid/index.ts';
import { factTitle, factUnit } from './conditionWords.ts';

type Value = Grade['values'][string];
type Write = (value: number, decimals: number) => string;

const standings: Readonly<Record<Provenance['standing'], string>> = {
  seen: 'seen in the source',
  memory: 'from memory',
  decision: 'decided by the firm',
  invented: 'invented',
};
const each = (value: Value): readonly number[] => (typeof value === 'number' ? [value] : value.values);
const decimalsOf = (value: number) => String(value).split('.')[1]?.length ?? 0;

/** Decimals that every value of a column is written with, so that they align at the decimal point. */
export function columnDecimals({ grades }: Edition, symbol: string): number {
  return Math.max(
    0,
    ...grades.rows.flatMap(({ values }) => {
      const value = values[symbol];
      return value === undefined ? [] : each(value).map(decimalsOf);
    }),
  );
}

/** Columns and rows for the grid; a value by size shows its values, smallest size first. */
export function gradeSheet(edition: Edition, write: Write): { columns: GridColumn[]; rows: GridRow[] } {
  const { columns, rows } = edition.grades;
  const decimals = new Map(columns.map(({ symbol }) => [symbol, columnDecimals(edition, symbol)]));
  const text = (row: Grade, symbol: string) => {
    const value = row.values[symbol];
    return value === undefined
      ? null
      : each(value)
          .map((one) => write(one, decimals.get(symbol) ?? 0))
          .join(' / ');
  };
  const width = ({ symbol }: GradeColumn) =>
    Math.max(6.5, 2.5 + 0.55 * Math.max(0, ...rows.map((row) => text(row, symbol)?.length ?? 0)));
  const titles = Math.min(18, Math.max(9, ...rows.map(({ title }) => 1.5 + 0.47 * title.length)));
  return {
    columns: [
      { key: 'grade', title: 'Grade', kind: 'text', width: titles },
      ...columns.map((column) => ({
        key: column.symbol,
        title: column.title,
        symbol: column.symbol,
        unit: unitForReading(column.unit),
        kind: 'number' as const,
        width: width(column),
      })),
    ],
    rows: rows.map((row) => ({
      key: row.id,
      cells: {
        grade: row.title,
        ...Object.fromEntries(columns.map(({ symbol }) => [symbol, text(row, symbol)])),
      },
    })),
  };
}

/** Where a value comes from and who verified it. */
function origin(edition: Edition, { source, place, standing, verified }: Provenance): string {
  const title = edition.sources.find(({ id }) => id === source)?.title ?? source;
  return `${title}${place ? `, ${place}` : ''}; ${standings[standing]}; ${
    verified ? `verified by ${verified.by}` : 'not verified by a second person'
  }`;
}

function bySize(edition: Edition, value: Exclude<Value, number>, said: (value: number) => string): string {
  const unit = factUnit(edition, value.by);
  const bands = value.values.map((one, i) => {
    const [low, high] = [value.edges[i] ?? null, value.edges[i + 1] ?? null];
    const [from, to] = value.edge === 'above' ? ['from', 'below'] : ['above', 'up to'];
    const range = [
      ...(low === null ? [] : [`${from} ${low} ${unit}`]),
      ...(high === null ? [] : [`${to} ${high} ${unit}`]),
    ];
    return `${said(one)} ${range.join(' ') || 'for all'}`;
  });
  return `by ${factTitle(edition, value.by)}: ${bands.join('; ')}`;
}

/** Everything about one cell in a sentence. */
export function cellInWords(edition: Edition, rowId: string, symbol: string, write: Write): string {
  const row = edition.grades.rows.find(({ id }) => id === rowId);
  if (!row) return '';
  const column = edition.grades.columns.find((one) => one.symbol === symbol);
  if (!column) return `${row.title}: ${origin(edition, row.provenance)}.`;
  const value = row.values[symbol];
  const name = `${row.title}, ${column.title.toLowerCase()}`;
  if (value === undefined) return `${name}: no value. A check that needs it gives no verdict.`;
  const decimals = columnDecimals(edition, symbol);
  const measure = (one: number) => `${write(one, decimals)} ${unitForReading(column.unit)}`.trim();
  const said = typeof value === 'number' ? measure(value) : bySize(edition, value, measure);
  const from = origin(edition, row.cells?.[symbol] ?? row.provenance);
  return `${name}: ${said}. ${from}.`;
}

/** The mark of a value that no second person verified; from memory is a mark of its own. */
export function cellMark(edition: Edition, rowId: string, symbol: string): CellMark | undefined {
  const row = edition.grades.rows.find(({ id }) => id === rowId);
  if (row?.values[symbol] === undefined) return undefined;
  const own = row.cells?.[symbol] ?? row.provenance;
  if (own.verified) return undefined;
  return { tone: own.standing === 'memory' ? 'memory' : 'unverified', message: origin(edition, own) };
}
