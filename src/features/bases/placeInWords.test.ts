import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { placeInWords } from './placeInWords.ts';

const edition = {
  grades: {
    columns: [{ symbol: 'f_v', title: 'Shear', unit: 'N/mm2' }],
    rows: [{ id: 'l1', title: 'Larch L1' }],
  },
  clauses: [{ id: 'depth', title: 'Depth factor' }],
} as Partial<Edition> as Edition;

describe('the place of a finding', () => {
  it('is said in words, with the part of the page to go to', () => {
    expect(placeInWords(edition, '/grades/rows/0/values/f_v')).toEqual({
      words: 'Grades, Larch L1, Shear',
      anchor: 'grades',
    });
    expect(placeInWords(edition, '/grades/columns/0/unit')?.words).toBe('Grades, Shear');
    expect(placeInWords(edition, '/clauses/0/cases/1/when')).toEqual({
      words: 'Clause “Depth factor”, case 2',
      anchor: 'clauses',
    });
    expect(placeInWords(edition, '/clauses/7')?.words).toBe('Clause');
  });

  it('is nothing for the edition as a whole', () => {
    expect(placeInWords(edition, '')).toBeNull();
    expect(placeInWords(edition, '/method')).toBeNull();
  });
});
