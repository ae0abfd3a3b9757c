import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { conditionInWords } from './conditionWords.ts';

const edition = {
  unitSystem: 'metric',
  choices: [
    { symbol: 'use', title: 'Use', scope: 'member', options: [{ id: 'floor', title: 'Floor joist' }] },
  ],
  inputs: [],
  grades: { columns: [], rows: [] },
  clauses: [],
  durations: [{ id: 'long', title: 'Long term' }],
  actions: [],
  actionValues: [],
  combinations: [],
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
      'depth h at most 72 mm, and (use is floor joist, or (not duration of the combination is one of long term))',
    );
  });

  it('writes each number with the unit of its fact, as the person reads it', () => {
    const comma = (value: number) => String(value).replace('.', ',');
    const of = (system: Edition['unitSystem'], fact: string, value: number) =>
      conditionInWords({ ...edition, unitSystem: system }, { fact, operator: 'greaterThan', value }, comma);
    expect(of('inch-pound', 'h', 11.25)).toBe('depth h above 11,25 in');
    expect(of('metric', 'M', 2.5)).toBe('bending moment M above 2,5 N mm');
    expect(of('metric', 'pieces', 2)).toBe('pieces acting together above 2');
  });

  it('compares two facts', () => {
    expect(conditionInWords(edition, { fact: 'h', operator: 'greaterThan', value: { fact: 'b' } })).toBe(
      'depth h above breadth, all pieces b',
    );
  });
});
