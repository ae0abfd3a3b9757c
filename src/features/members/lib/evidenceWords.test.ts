import { describe, expect, it } from 'vitest';
import type { Choosing } from '#shared/engine/types.ts';
import { choosingInWords, type Wording } from './evidenceWords.ts';

const wording: Wording = {
  title: (fact) => ({ duration: 'Duration', use: 'Use' })[fact] ?? fact,
  option: (_fact, id) => ({ medium: 'medium term', floor: 'floor joist' })[id] ?? id,
  number: (value) => String(value),
};

describe('choosing in words', () => {
  it('joins the failed bound before and the bound that held into one range', () => {
    const choosing: Choosing = {
      case: 'middle',
      tried: [
        {
          case: 'small',
          holds: false,
          evidence: { fact: 'h', operator: 'lessThanInclusive', value: 72, actual: 245, holds: false },
        },
        {
          case: 'middle',
          holds: true,
          evidence: { fact: 'h', operator: 'lessThanInclusive', value: 300, actual: 245, holds: true },
        },
      ],
    };
    expect(choosingInWords(choosing, wording)).toBe('72 < h = 245 ≤ 300');
  });

  it('names a word by its titles', () => {
    const choosing: Choosing = {
      case: 'medium',
      tried: [
        {
          case: 'long',
          holds: false,
          evidence: { fact: 'duration', operator: 'equal', value: 'long', actual: 'medium', holds: false },
        },
        {
          case: 'medium',
          holds: true,
          evidence: { fact: 'duration', operator: 'equal', value: 'medium', actual: 'medium', holds: true },
        },
      ],
    };
    expect(choosingInWords(choosing, wording)).toBe('Duration is medium term');
  });

  it('says what was looked at when the otherwise case was taken', () => {
    const choosing: Choosing = {
      case: 'otherwise',
      tried: [
        {
          case: 'shared',
          holds: false,
          evidence: {
            group: 'all',
            holds: false,
            of: [
              { fact: 'use', operator: 'equal', value: 'lintel', actual: 'floor', holds: false },
              { fact: 'spacing', operator: 'lessThanInclusive', value: 610, actual: 400, holds: true },
            ],
          },
        },
      ],
    };
    expect(choosingInWords(choosing, wording)).toBe('Use is floor joist');
  });

  it('leaves out members of an any-group that did not decide', () => {
    const choosing: Choosing = {
      case: 'one',
      tried: [
        {
          case: 'one',
          holds: true,
          evidence: {
            group: 'any',
            holds: true,
            of: [
              { fact: 'h', operator: 'greaterThan', value: 300, actual: 245, holds: false },
              { fact: 'use', operator: 'in', value: ['floor', 'roof'], actual: 'floor', holds: true },
            ],
          },
        },
      ],
    };
    expect(choosingInWords(choosing, wording)).toBe('Use is floor joist');
  });

  it('says that a fact is missing', () => {
    const choosing: Choosing = {
      case: 'otherwise',
      tried: [
        {
          case: 'one',
          holds: false,
          evidence: { fact: 'use', operator: 'equal', value: 'x', actual: undefined, holds: false },
        },
      ],
    };
    expect(choosingInWords(choosing, wording)).toBe('Use is not given');
  });
});
