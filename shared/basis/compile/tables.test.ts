import { describe, expect, it } from 'vitest';
import { brief, clauseOf, newFindings } from '#tests/factories/findings.ts';
import type { Edition, Table, TableKey } from '../schema/index.ts';

const tableOf = (edition: Edition, id: string) => edition.tables.find((table) => table.id === id) as Table;
const keyOf = (edition: Edition, id: string, index = 0) => tableOf(edition, id).keys[index] as TableKey;
const bearing = (key: Partial<TableKey>, values?: Table['values']) => (edition: Edition) => {
  Object.assign(keyOf(edition, 'bearing-factor'), key);
  if (values) tableOf(edition, 'bearing-factor').values = values;
};

describe('tables', () => {
  it.each<[string, (edition: Edition) => void, string]>([
    ['too few values', bearing({}, [1, 2, 3]), 'error table-shape /tables/1/values'],
    ['a gap', bearing({}, [1.7, null, 1.1, 1]), 'warning table-gap /tables/1/values'],
    ['words among numbers', bearing({}, [1.7, 'x', 1.1, 1]), 'error table-mixed /tables/1/values'],
    ['words to interpolate', bearing({}, ['a', 'b', 'c', 'd']), 'error table-mixed /tables/1/values'],
    ['falling points', bearing({ points: [10, 50, 40, 150] }), 'error table-order /tables/1/keys/0/points'],
    ['a point twice', bearing({ points: [10, 50, 50, 150] }), 'error table-order /tables/1/keys/0/points'],
    ['an empty point', bearing({ points: [10, null, 100, 150] }), 'error table-key /tables/1/keys/0/points'],
    [
      'a word as a point',
      bearing({ points: [10, 'x', 100, 150] }),
      'error table-key /tables/1/keys/0/points',
    ],
    [
      'the logarithm of nothing',
      bearing({ match: 'log', points: [0, 50, 100, 150] }),
      'error table-key /tables/1/keys/0/points',
    ],
    ['one point to interpolate', bearing({ points: [10] }, [1]), 'error table-key /tables/1/keys/0/points'],
    [
      'an edge without owner',
      bearing({ match: 'band', points: [null, 10, 50, 100, null] }),
      'error table-edge /tables/1/keys/0',
    ],
    [
      'an open inner edge',
      bearing({ match: 'band', edge: 'below', points: [0, 10, null, 100, 150] }),
      'error table-key /tables/1/keys/0/points',
    ],
    ['an unknown unit of a key', bearing({ unit: 'ell' }), 'error unknown-unit /tables/1/keys/0/unit'],
    [
      'an unknown unit',
      (e) => Object.assign(tableOf(e, 'creep'), { unit: 'ell' }),
      'error unknown-unit /tables/2/unit',
    ],
    [
      'a word twice',
      (e) => Object.assign(keyOf(e, 'creep'), { points: ['softwood', 'softwood'] }),
      'error table-duplicate-key /tables/2/keys/0/points',
    ],
    [
      'words and numbers as points',
      (e) => Object.assign(keyOf(e, 'creep'), { points: ['softwood', 5] }),
      'error table-key /tables/2/keys/0/points',
    ],
  ])('with %s', (_, change, wanted) => {
    expect(brief(newFindings(change))).toContain(wanted);
  });

  it('with sound bands are taken', () => {
    expect(newFindings(bearing({ match: 'band', edge: 'below', points: [null, 10, 50, 100, null] }))).toEqual(
      [],
    );
  });
});

const creep = (edition: Edition) => {
  const gives = clauseOf(edition, 'k_creep').cases[0]?.gives;
  if (gives?.kind !== 'table') throw new Error('The creep clause looks up a table.');
  return gives;
};
const lookUp = (edition: Edition) => {
  const gives = clauseOf(edition, 'K_b').cases[1]?.gives;
  if (gives?.kind !== 'table') throw new Error('The bearing clause looks up a table.');
  return gives;
};

describe('look-ups', () => {
  it.each<[string, (edition: Edition) => void, string]>([
    [
      'in no table',
      (e) => Object.assign(creep(e), { table: 'lost' }),
      'error unknown-table /clauses/14/cases/0/gives/table',
    ],
    ['with too few keys', (e) => creep(e).keys.pop(), 'error key-count /clauses/14/cases/0/gives/keys'],
    [
      'by an unknown fact',
      (e) => Object.assign(creep(e).keys[0] ?? {}, { fact: 'zeta' }),
      'error unknown-symbol /clauses/14/cases/0/gives/keys/0/fact',
    ],
    [
      'by a number instead of a word',
      (e) => Object.assign(creep(e).keys[0] ?? {}, { fact: 'h' }),
      'error key-type /clauses/14/cases/0/gives/keys/0/fact',
    ],
    [
      'by a word instead of a number',
      (e) => Object.assign(lookUp(e).keys[0] ?? {}, { fact: 'grade' }),
      'error key-type /clauses/11/cases/1/gives/keys/0/fact',
    ],
    [
      'by a formula instead of a word',
      (e) => creep(e).keys.splice(0, 1, { formula: 'h / b' }),
      'error key-type /clauses/14/cases/0/gives/keys/0',
    ],
    [
      'by a word that is not there',
      (e) => creep(e).keys.splice(0, 1, { word: 'bamboo' }),
      'error unknown-key /clauses/14/cases/0/gives/keys/0',
    ],
    [
      'by a fixed word for a number',
      (e) => lookUp(e).keys.splice(0, 1, { word: 'wide' }),
      'error key-type /clauses/11/cases/1/gives/keys/0',
    ],
    [
      'by a broken formula',
      (e) => lookUp(e).keys.splice(0, 1, { formula: 'l_b +' }),
      'error bad-formula /clauses/11/cases/1/gives/keys/0/formula',
    ],
    [
      'by a formula of another dimension',
      (e) => lookUp(e).keys.splice(0, 1, { formula: 'l_b / h' }),
      'error wrong-dimension /clauses/11/cases/1/gives/keys/0/formula',
    ],
    [
      'in another unit',
      (e) => Object.assign(keyOf(e, 'bearing-factor'), { unit: 'cm' }),
      'error wrong-dimension /clauses/11/cases/1/gives/keys/0/fact',
    ],
    [
      'of another quantity',
      (e) => Object.assign(tableOf(e, 'bearing-factor'), { unit: 'mm' }),
      'error wrong-dimension /clauses/11/cases/1/gives/table',
    ],
    [
      'that miss an option',
      (e) =>
        Object.assign(e.choices[1]?.options ?? [], [
          { id: 'damp', title: 'Damp' },
          { id: 'dry', title: 'Dry' },
          { id: 'wet', title: 'Wet' },
        ]),
      'warning table-option-missing /clauses/14/cases/0/gives/keys/1',
    ],
    [
      'that miss a duration',
      (e) => e.durations.push({ id: 'instant', title: 'Instantaneous' }),
      'warning table-option-missing /clauses/7/cases/0/gives/keys/0',
    ],
  ])('%s', (_, change, wanted) => {
    expect(brief(newFindings(change))).toContain(wanted);
  });

  it('by a formula of the right dimension are taken', () => {
    expect(newFindings((e) => lookUp(e).keys.splice(0, 1, { formula: 'min(l_b, h)' }))).toEqual([]);
  });

  it('can give the words of a class, and no others', () => {
    const words = (values: string[]) => (edition: Edition) => {
      tableOf(edition, 'duration-factor').values = values;
      Object.assign(clauseOf(edition, 'K_d'), { kind: 'class', unit: 'word', words: ['slow', 'quick'] });
    };
    const codes = (values: string[]) => brief(newFindings(words(values)));
    expect(codes(['slow', 'slow', 'quick'])).not.toContain(
      'error unknown-word /clauses/7/cases/0/gives/table',
    );
    expect(codes(['slow', 'brisk', 'quick'])).toContain('error unknown-word /clauses/7/cases/0/gives/table');
  });
});
