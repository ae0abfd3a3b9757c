import { describe, expect, it } from 'vitest';
import { clauseOf, newFindings } from '#tests/factories/findings.ts';
import type { Condition, Edition, Outcome } from '../schema/index.ts';

type Given = readonly [when: Condition | null, value: number | Outcome];

/** Findings about the exposure factor with these cases, called a, b, c ... */
function found(
  given: readonly Given[],
  more: Partial<Edition['clauses'][number]> = {},
  change?: (edition: Edition) => void,
) {
  return newFindings((edition) => {
    change?.(edition);
    Object.assign(clauseOf(edition, 'K_e'), more, {
      cases: given.map(([when, value], i) => ({
        id: String.fromCharCode(97 + i),
        ...(when ? { when } : {}),
        gives: typeof value === 'number' ? { kind: 'constant', value } : value,
        provenance: { source: 'made-up', standing: 'invented' },
      })),
    });
  })
    .filter(({ code }) => code !== 'unused' && code !== 'unverified')
    .map(({ severity, code, case: id }) => `${severity} ${code}${id === undefined ? '' : ` ${id}`}`);
}
const messages = (given: readonly Given[]) =>
  newFindings((edition) => {
    clauseOf(edition, 'K_e').cases = given.map(([when, value], i) => ({
      id: String(i),
      ...(when ? { when } : {}),
      gives: typeof value === 'number' ? { kind: 'constant', value } : value,
      provenance: { source: 'made-up', standing: 'invented' },
    }));
  }).map(({ message }) => message);

const is = (fact: string, value: string): Condition => ({ fact, operator: 'equal', value });
const over = (value: number, fact = 'h'): Condition => ({ fact, operator: 'greaterThan', value });
const from = (value: number, fact = 'h'): Condition => ({ fact, operator: 'greaterThanInclusive', value });
const under = (value: number, fact = 'h'): Condition => ({ fact, operator: 'lessThan', value });
const upTo = (value: number, fact = 'h'): Condition => ({ fact, operator: 'lessThanInclusive', value });
const all = (...conditions: Condition[]): Condition => ({ all: conditions });
const any = (...conditions: Condition[]): Condition => ({ any: conditions });
const not = (condition: Condition): Condition => ({ not: condition });

describe('missing cases', () => {
  it('are found over words, with a situation', () => {
    expect(found([[is('exposure', 'wet'), 1]])).toEqual(['error missing-otherwise']);
    expect(messages([[is('exposure', 'wet'), 1]]).join(' ')).toContain('no case for exposure = dry');
  });

  it('are found at a single point between two intervals', () => {
    expect(
      messages([
        [under(72), 1],
        [over(72), 2],
      ]).join(' '),
    ).toContain('no case for h = 72');
  });

  it('are not seen where the cases cover everything', () => {
    expect(
      found([
        [is('exposure', 'wet'), 1],
        [is('exposure', 'dry'), 2],
      ]),
    ).toEqual([]);
    expect(
      found([
        [upTo(72), 1],
        [over(72), 2],
      ]),
    ).toEqual([]);
    expect(
      found([
        [any(upTo(72), from(300)), 1],
        [all(over(72), under(300)), 2],
      ]),
    ).toEqual([]);
  });

  it('know that lengths are above 0 and pieces are counted', () => {
    expect(found([[over(0), 1]])).toEqual([]);
    expect(
      found([
        [{ fact: 'pieces', operator: 'in', value: [1, 2] }, 1],
        [from(3, 'pieces'), 2],
      ]),
    ).toEqual([]);
    expect(
      found([
        [upTo(1, 'pieces'), 1],
        [from(3, 'pieces'), 2],
      ]),
    ).toEqual(['error missing-otherwise']);
  });

  it('know the bounds of inputs, in coherent units', () => {
    const inCentimetres = (edition: Edition) => {
      Object.assign(edition.inputs[2] ?? {}, { unit: 'cm', maximum: 5 });
    };
    const bounded: Given[] = [[all(from(0, 'camber'), upTo(50, 'camber')), 1]];
    expect(found(bounded)).toEqual([]);
    expect(found(bounded, {}, inCentimetres)).toEqual([]);
    expect(found([[upTo(49, 'camber'), 1]])).toEqual(['error missing-otherwise']);
  });

  it('are asked for where there is too much to search', () => {
    const wide = all(
      ...['h', 'b', 'spacing', 'pieces', 'slope'].map((fact) => ({
        fact,
        operator: 'in' as const,
        value: [1, 2, 3, 4, 5, 6, 7, 8],
      })),
    );
    expect(found([[wide, 1]])).toEqual(['error missing-otherwise']);
    expect(
      found([
        [wide, 1],
        [null, 2],
      ]),
    ).toEqual([]);
    expect(
      found([
        [wide, 1],
        [is('exposure', 'wet'), 3],
        [null, 2],
      ]),
    ).toEqual(['note cases-not-searched']);
  });
});

describe('cases against each other', () => {
  it.each<[string, Given[], string[]]>([
    [
      'identical',
      [
        [over(9), 1],
        [over(9), 1],
        [null, 2],
      ],
      ['warning identical-cases b'],
    ],
    [
      'equivalent',
      [
        [over(9), 1],
        [not(upTo(9)), 1],
        [null, 2],
      ],
      ['warning equivalent-cases b'],
    ],
    [
      'contradictory as written',
      [
        [over(9), 1],
        [over(9), 3],
        [null, 2],
      ],
      ['error contradictory-cases b'],
    ],
    [
      'contradictory in effect',
      [
        [over(9), 1],
        [not(upTo(9)), 3],
        [null, 2],
      ],
      ['error contradictory-cases b'],
    ],
    [
      'contained, the same',
      [
        [over(9), 1],
        [over(20), 1],
        [null, 2],
      ],
      ['note subsumed-case b'],
    ],
    [
      'contained, another outcome',
      [
        [over(9), 1],
        [over(20), 3],
        [null, 2],
      ],
      ['warning unreachable-case b'],
    ],
    [
      'containing, the same',
      [
        [over(20), 1],
        [over(9), 1],
        [null, 2],
      ],
      ['note subsumed-case a'],
    ],
    [
      'containing, another outcome',
      [
        [over(20), 1],
        [over(9), 3],
        [null, 2],
      ],
      [],
    ],
    [
      'covered by two together',
      [
        [upTo(9), 1],
        [over(9), 2],
        [is('exposure', 'wet'), 3],
        [null, 4],
      ],
      ['warning unreachable-case c', 'warning unreachable-case d'],
    ],
    [
      'side by side, the same',
      [
        [upTo(9), 1],
        [over(20), 1],
        [null, 2],
      ],
      ['note joinable-cases b'],
    ],
    [
      'the same as otherwise',
      [
        [upTo(9), 1],
        [over(20), 2],
        [null, 2],
      ],
      ['note subsumed-case b'],
    ],
    [
      'impossible',
      [
        [all(over(9), under(5)), 1],
        [null, 2],
      ],
      ['warning never-holds a'],
    ],
    [
      'impossible for a length',
      [
        [under(0), 1],
        [null, 2],
      ],
      ['warning never-holds a'],
    ],
    [
      'impossible for words',
      [
        [all(is('exposure', 'wet'), is('exposure', 'dry')), 1],
        [null, 2],
      ],
      ['warning never-holds a'],
    ],
    [
      'no word left',
      [
        [{ fact: 'exposure', operator: 'in', value: ['wet', 'dry'] }, 1],
        [null, 2],
      ],
      ['warning unreachable-case b'],
    ],
    [
      'overlapping, which order settles',
      [
        [over(9), 1],
        [under(20), 3],
        [null, 2],
      ],
      ['warning unreachable-case c'],
    ],
  ])('%s', (_, given, wanted) => {
    expect(found(given)).toEqual(wanted);
  });

  it('may not overlap where the clause says that they exclude each other', () => {
    const given: Given[] = [
      [over(20), 1],
      [is('exposure', 'wet'), 3],
      [null, 2],
    ];
    expect(found(given)).toEqual([]);
    expect(found(given, { exclusive: true })).toEqual(['error overlap b']);
    expect(
      found(
        [
          [over(20), 1],
          [upTo(20), 3],
        ],
        { exclusive: true },
      ),
    ).toEqual([]);
  });

  it('may only seem to overlap where their facts hang together', () => {
    const given: Given[] = [
      [over(300), 1],
      [all(under(2, 'ratio'), under(100)), 3],
      [upTo(1, 'ratio'), 2],
      [null, 4],
    ];
    expect(found(given, { exclusive: true })).toContain('warning overlap c');
  });

  it('compare outcomes by what they say, not by the order in which it is written', () => {
    const a: Outcome = { kind: 'table', table: 'duration-factor', keys: [{ word: 'long' }] };
    const b: Outcome = { keys: [{ word: 'long' }], table: 'duration-factor', kind: 'table' };
    expect(
      found([
        [over(9), a],
        [over(9), b],
        [null, 2],
      ]),
    ).toContain('warning identical-cases b');
  });
});

describe('two facts compared with each other', () => {
  const wider: Condition = { fact: 'b', operator: 'greaterThan', value: { fact: 'h' } };
  const notWider: Condition = { fact: 'h', operator: 'greaterThanInclusive', value: { fact: 'b' } };
  const notEqual: Condition = { fact: 'h', operator: 'notEqual', value: { fact: 'b' } };

  it('are less, equal or greater, whichever is named first', () => {
    expect(
      found([
        [wider, 1],
        [notWider, 2],
      ]),
    ).toEqual([]);
    expect(
      found([
        [wider, 1],
        [not(notWider), 1],
        [null, 2],
      ]),
    ).toContain('warning equivalent-cases b');
    expect(
      found([
        [wider, 1],
        [{ fact: 'h', operator: 'equal', value: { fact: 'b' } }, 2],
      ]),
    ).toEqual(['error missing-otherwise']);
    expect(
      found([
        [notEqual, 1],
        [wider, 3],
        [null, 2],
      ]),
    ).toEqual(['warning unreachable-case b']);
  });

  it('that are one fact are equal', () => {
    expect(
      found([
        [{ fact: 'h', operator: 'notEqual', value: { fact: 'h' } }, 1],
        [null, 2],
      ]),
    ).toEqual(['warning never-holds a']);
  });
});
