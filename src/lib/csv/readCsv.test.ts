import { describe, expect, it } from 'vitest';
import { bounds, readCsv, type CsvTable } from './readCsv.ts';

function table(text: string): CsvTable {
  const outcome = readCsv(text);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.table;
}
function refusal(text: string): string {
  const outcome = readCsv(text);
  if (outcome.ok) throw new Error('was read');
  return outcome.message;
}

describe('reading a CSV file', () => {
  it('finds the delimiter and decimal commas by itself', () => {
    const read = table('Grade;Bending;E\nA;7,5;10 800\nB;5,8;9 100\n');
    expect(read.delimiter).toBe(';');
    expect(read.decimal).toBe(',');
    expect(read.rows[1]).toEqual(['B', '5,8', '9 100']);
  });

  it('takes a point for the decimal sign in a comma-separated file', () => {
    expect(table('Grade,Bending\nA,7.5\n').decimal).toBe('.');
  });

  it('reads quoted decimal commas in a comma-separated file', () => {
    const read = table('Grade,Bending\nA,"7,5"\nB,"5,8"\n');
    expect(read.decimal).toBe(',');
    expect(read.rows[0]).toEqual(['A', '7,5']);
  });

  it('drops a byte-order mark and says so', () => {
    const read = table('\uFEFFGrade,f_m\nA,7\n');
    expect(read.header[0]).toBe('Grade');
    expect(read.notes[0]).toMatch(/byte-order mark/);
  });

  it('joins merged headers over two rows', () => {
    const read = table('Grade,Strength,,Stiffness\n,bending,shear,mean\nA,7.5,0.7,10800\n');
    expect(read.header).toEqual(['Grade', 'Strength bending', 'Strength shear', 'Stiffness mean']);
    expect(read.rows).toHaveLength(1);
  });

  it('names empty and repeated headers apart', () => {
    expect(table('a,a,\n1,2,3\n').header).toEqual(['a', 'a (2)', 'Column 3']);
  });

  it('reads 20,000 rows', () => {
    const lines = Array.from({ length: 20_000 }, (_, i) => `G${i},${i}.5`);
    expect(table(['Grade,f_m', ...lines].join('\n')).rows).toHaveLength(20_000);
  });

  it.each([
    ['Grade,f_m', /header row and at least one row/],
    ['a\u0000b,c\n1,2', /not a text file/],
    ['a,b\n"open,2\n3,4', /quotation mark/],
    ['x,'.repeat(bounds.columns + 5) + '\n1\n', /columns/],
    [`a,b\n${'1,2\n'.repeat(bounds.rows + 1)}`, /at most 25000/],
    ['x'.repeat(bounds.characters + 1), /larger than/],
  ])('refuses what it cannot read, with the reason (%#)', (text, reason) => {
    expect(refusal(text)).toMatch(reason);
  });

  it('says when only one column was found', () => {
    expect(table('Grade\nA\nB\n').notes.join(' ')).toMatch(/Only one column/);
  });
});
