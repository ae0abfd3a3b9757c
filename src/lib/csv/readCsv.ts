import Papa from 'papaparse';

/** What can be read in one go; a larger file is refused with these bounds. */
export const bounds = { characters: 8_000_000, rows: 25_000, columns: 200 };

export interface CsvTable {
  delimiter: ',' | ';' | '\t' | '|';
  /** Which sign separates decimals, judged from the cells. */
  decimal: '.' | ',';
  /** Header names, made unique and never empty. */
  header: readonly string[];
  rows: readonly (readonly string[])[];
  /** What was noticed and put right, in plain sentences. */
  notes: readonly string[];
}

export type CsvOutcome = { ok: true; table: CsvTable } | { ok: false; message: string };

const delimiters = [',', ';', '\t', '|'] as const;

/** Delimiter that splits the first lines into the most even table of more than one column. */
function delimiterOf(text: string): (typeof delimiters)[number] {
  const sample = text.split(/\r?\n/, 12).join('\n');
  let best: { delimiter: (typeof delimiters)[number]; score: number } = { delimiter: ',', score: 0 };
  for (const delimiter of delimiters) {
    const widths = Papa.parse<string[]>(sample, { delimiter, skipEmptyLines: 'greedy' }).data.map(
      (r) => r.length,
    );
    const widest = Math.max(...widths, 0);
    const even = widths.filter((width) => width === widest).length / Math.max(widths.length, 1);
    const score = widest > 1 ? widest * even * even : 0;
    if (score > best.score) best = { delimiter, score };
  }
  return best.delimiter;
}

/** Decimal comma where more cells read as numbers with it than with a point; never beside a comma delimiter. */
function decimalOf(rows: readonly (readonly string[])[], delimiter: string): '.' | ',' {
  const cells = rows.slice(0, 200).flat();
  const comma = cells.filter((cell) => /^\s*-?\d{1,3}(?:[.\s ]?\d{3})*,\d+\s*$/.test(cell)).length;
  const point = cells.filter((cell) => /^\s*-?\d+\.\d+\s*$/.test(cell)).length;
  return comma > point && (delimiter !== ',' || point === 0) ? ',' : '.';
}

const isNumeric = (cell: string) => /^\s*-?[\d.,\s ]+\s*$/.test(cell) && /\d/.test(cell);

/**
 * Leading rows that hold no numbers are header rows: two of them (a merged title over its columns, or a row
 * of units under the names) are joined cell by cell, a merged title reaching over the empty cells after it.
 */
function headerOf(rows: readonly (readonly string[])[], notes: string[]): { header: string[]; skip: number } {
  const [first = [], second] = rows;
  const filled = first.filter((cell) => cell.trim() !== '').length;
  const secondIsHeader =
    second !== undefined && rows.length > 2 && !second.some(isNumeric) && (rows[2]?.some(isNumeric) ?? false);
  if (!secondIsHeader) return { header: first.map((cell) => cell.trim()), skip: 1 };
  let over = '';
  const header = second.map((cell, index) => {
    const above = (first[index] ?? '').trim();
    if (above !== '') over = above;
    const title = filled < second.length ? over : above;
    return [title, cell.trim()].filter((part) => part !== '').join(' ');
  });
  notes.push('The first two rows were read together as the header.');
  return { header, skip: 2 };
}

function uniqueNames(header: readonly string[], width: number): string[] {
  const seen = new Map<string, number>();
  return Array.from({ length: width }, (_, index) => {
    const name = header[index] || `Column ${index + 1}`;
    const count = (seen.get(name) ?? 0) + 1;
    seen.set(name, count);
    return count === 1 ? name : `${name} (${count})`;
  });
}

/**
 * Reads a CSV file as people have them: any of four delimiters, decimal commas, a byte-order mark, two header
 * rows, ragged rows. What can't be read is refused with a sentence that says why.
 */
export function readCsv(text: string): CsvOutcome {
  if (text.length > bounds.characters) {
    return {
      ok: false,
      message: `The file is larger than ${bounds.characters / 1e6} million characters. Split it.`,
    };
  }
  if (text.includes('\u0000')) {
    return { ok: false, message: 'This is not a text file. Save the sheet as CSV and choose that file.' };
  }
  const notes: string[] = [];
  let body = text;
  if (body.startsWith('\uFEFF')) {
    body = body.slice(1);
    notes.push('A byte-order mark at the start was left out.');
  }
  const delimiter = delimiterOf(body);
  const parsed = Papa.parse<string[]>(body, { delimiter, skipEmptyLines: 'greedy' });
  const broken = parsed.errors.find((error) => error.type === 'Quotes');
  if (broken) {
    return { ok: false, message: `Row ${(broken.row ?? 0) + 1} has a quotation mark that is never closed.` };
  }
  const all = parsed.data;
  if (all.length < 2)
    return { ok: false, message: 'The file needs a header row and at least one row below it.' };
  if (all.length - 1 > bounds.rows) {
    return {
      ok: false,
      message: `The file has ${all.length - 1} rows; at most ${bounds.rows} can be read at once.`,
    };
  }
  const { header, skip } = headerOf(all, notes);
  const rows = all.slice(skip);
  const width = Math.max(header.length, ...rows.slice(0, 1000).map((row) => row.length));
  if (width > bounds.columns) {
    return { ok: false, message: `The file has ${width} columns; at most ${bounds.columns} can be read.` };
  }
  if (width === 1) notes.push('Only one column was found. If there should be more, check the delimiter.');
  const ragged = rows.filter((row) => row.length !== width).length;
  if (ragged) notes.push(`${ragged} rows have fewer or more cells than the header; missing cells are empty.`);
  return {
    ok: true,
    table: {
      delimiter,
      decimal: decimalOf(rows, delimiter),
      header: uniqueNames(header, width),
      rows,
      notes,
    },
  };
}
