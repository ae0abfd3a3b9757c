import type { Edition, SizeBands } from '../schema/index.ts';
import type { Findings } from './findings.ts';
import type { GradeNeeds } from './gradeNeeds.ts';
import type { SymbolInfo } from './plan.ts';

const isBands = (value: number | SizeBands): value is SizeBands => typeof value === 'object';

function checkBands(
  bands: SizeBands,
  pointer: string,
  symbols: ReadonlyMap<string, SymbolInfo>,
  findings: Findings,
): void {
  const by = symbols.get(bands.by);
  if (!by?.dimension || by.origin === 'gradeColumn' || (by.level !== 'member' && by.level !== 'edition')) {
    findings.error(
      'bad-bands',
      `${pointer}/by`,
      `“${bands.by}” is not a size that a grade value can depend on.`,
    );
  }
  if (bands.edges.length !== bands.values.length + 1) {
    findings.error('bad-bands', pointer, 'Size bands need one edge more than they have values.');
  }
  if (bands.values.some((value) => value < 0)) {
    findings.error('negative-value', `${pointer}/values`, 'A value of the size bands is below 0.');
  }
  const numbers = bands.edges.filter((edge) => edge !== null);
  if (
    numbers.some((edge, i) => i > 0 && edge <= (numbers[i - 1] as number)) ||
    bands.edges.slice(1, -1).includes(null)
  ) {
    findings.error(
      'bad-bands',
      `${pointer}/edges`,
      'The edges of size bands have to rise; only the outermost can be open.',
    );
  }
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? NaN;
  return sorted.length % 2 ? upper : ((sorted[middle - 1] ?? NaN) + upper) / 2;
}

/** Values ten times, or a tenth of, what is usual in their column: mostly a slipped decimal sign. */
function outliers(edition: Edition, findings: Findings): void {
  edition.grades.columns.forEach(({ symbol, title, unit }) => {
    const numbers = edition.grades.rows.flatMap((row, index) => {
      const value = row.values[symbol];
      return typeof value === 'number' && value > 0 ? [{ index, value, name: row.title }] : [];
    });
    if (numbers.length < 4) return;
    const usual = median(numbers.map(({ value }) => value));
    for (const { index, value, name } of numbers) {
      const ratio = value / usual;
      if (ratio < 8 && ratio > 1 / 8) continue;
      const size = ratio >= 8 ? 'large' : 'small';
      const message = `${name}: ${title} ${value} ${unit} looks about ${ratio >= 8 ? 'ten times too' : 'a tenth, too'} ${size}; half of the grades have ${usual} or more.`;
      findings.warning('unusual-value', `/grades/rows/${index}/values/${symbol}`, message);
    }
  });
}

/** Grades without a property that checks come to need for them, said once a column. */
function missingProperties(edition: Edition, needs: GradeNeeds, findings: Findings): void {
  const { columns, rows } = edition.grades;
  columns.forEach(({ symbol, title }, index) => {
    const checks = new Set<string>();
    const without = rows.filter((row) => {
      if (row.values[symbol] !== undefined) return false;
      const needing = needs.checksNeeding(row, symbol);
      for (const check of needing) checks.add(check);
      return needing.length > 0;
    });
    if (without.length === 0) return;
    const names = without.map((row) => row.title);
    const named =
      names.length > 4 ? `${names.slice(0, 3).join(', ')} and ${names.length - 3} more` : names.join(', ');
    const have = names.length === 1 ? 'has' : 'have';
    const message = `${named} ${have} no ${title.toLowerCase()}. ${[...checks].join(', ')} may need it; a member that does gets no verdict.`;
    findings.warning('missing-property', `/grades/columns/${index}`, message);
  });
}

/** Checks the grade table: columns, options, bands, missing and unusual values. */
export function checkGrades(
  edition: Edition,
  symbols: ReadonlyMap<string, SymbolInfo>,
  needs: GradeNeeds,
  findings: Findings,
): void {
  const { columns, rows } = edition.grades;
  const choices = edition.choices.filter(({ scope }) => scope === 'grade');
  rows.forEach((row, index) => {
    const pointer = `/grades/rows/${index}`;
    for (const [symbol, value] of Object.entries(row.values)) {
      const at = `${pointer}/values/${symbol}`;
      if (!columns.some((column) => column.symbol === symbol)) {
        findings.error(
          'unknown-column',
          at,
          `${row.title} has a value for “${symbol}”, and there is no such column.`,
        );
      } else if (isBands(value)) checkBands(value, at, symbols, findings);
      else if (value < 0) findings.error('negative-value', at, `${row.title}: ${symbol} is below 0.`);
    }
    for (const [symbol, option] of Object.entries(row.choices)) {
      const choice = choices.find((each) => each.symbol === symbol);
      if (!choice)
        findings.error(
          'unknown-choice',
          `${pointer}/choices/${symbol}`,
          `“${symbol}” is not a choice that grades have.`,
        );
      else if (!choice.options.some(({ id }) => id === option)) {
        findings.error(
          'unknown-option',
          `${pointer}/choices/${symbol}`,
          `“${choice.title}” has no option “${option}”.`,
        );
      }
    }
    for (const choice of choices) {
      if (row.choices[choice.symbol] === undefined && choice.default === undefined) {
        findings.error(
          'missing-choice',
          `${pointer}/choices`,
          `${row.title} has no ${choice.title.toLowerCase()}.`,
        );
      }
    }
    for (const symbol of Object.keys(row.cells ?? {})) {
      if (!columns.some((column) => column.symbol === symbol)) {
        findings.error(
          'unknown-column',
          `${pointer}/cells/${symbol}`,
          `${row.title} has a source for “${symbol}”, and there is no such column.`,
        );
      }
    }
  });
  missingProperties(edition, needs, findings);
  outliers(edition, findings);
}
