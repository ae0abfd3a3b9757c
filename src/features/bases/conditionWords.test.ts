import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { conditionInWords } from './conditionWords.ts';

const edition = {
  choices: [
    { symbol: 'use', title: 'Use', scope: 'member', options: [{ id: 'floor', title: 'Floor joist' }] },
  ],
  inputs: [],
  grades: { columns: [], rows: [] },
  clauses: [],
  durations: [{ id: 'long', title: 'Long term' }],
  actions: [],
} as Partial<Edition> as Edition;

describe('conditions in words', () => {
  it('names facts and options by their titles', () => {
    const words = conditionInWords(edition, {
      all: [
        { fact: 'h', operator: 'lessThanInclusive', value: 72 },
        {
          any: [
            { fact: 'use', operator: 'equal', value: 'floor' },
            { not: { fact: 'duration', operator: 'in', value: ['long'] } },
          ],
        },
      ],
    });
    expect(words).toBe(
      'depth h at most 72, and (use is floor joist, or (not duration of the combination is one of long term))',
    );
  });

  it('compares two facts', () => {
    expect(conditionInWords(edition, { fact: 'h', operator: 'greaterThan', value: { fact: 'b' } })).toBe(
      'depth h above breadth, all pieces b',
    );
  });
});
