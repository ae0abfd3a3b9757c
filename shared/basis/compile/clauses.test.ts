import { describe, expect, it } from 'vitest';
import { brief, clauseOf, newFindings } from '#tests/factories/findings.ts';
import type { Case, Condition, Edition, Outcome } from '../schema/index.ts';

const provenance = { source: 'made-up', standing: 'invented' } as const;
const cases =
  (symbol: string, ...given: readonly Omit<Case, 'provenance'>[]) =>
  (edition: Edition) => {
    clauseOf(edition, symbol).cases = given.map((each) => ({ ...each, provenance }));
  };
const gives = (symbol: string, outcome: Outcome) => cases(symbol, { id: 'all', gives: outcome });
const formula = (symbol: string, text: string) => gives(symbol, { kind: 'formula', formula: text });
const one: Outcome = { kind: 'constant', value: 1 };

describe('what a case gives', () => {
  it.each<[string, (edition: Edition) => void, string]>([
    [
      'an unknown symbol',
      formula('ratio', 'h / c'),
      'error unknown-symbol /clauses/16/cases/0/gives/formula',
    ],
    [
      'a word in a formula',
      formula('ratio', 'h / grade'),
      'error word-in-formula /clauses/16/cases/0/gives/formula',
    ],
    ['a broken formula', formula('ratio', 'h / '), 'error bad-formula /clauses/16/cases/0/gives/formula'],
    [
      'a hostile formula',
      formula('ratio', 'h.constructor("x")'),
      'error bad-formula /clauses/16/cases/0/gives/formula',
    ],
    [
      'another dimension',
      formula('ratio', 'h * b'),
      'error wrong-dimension /clauses/16/cases/0/gives/formula',
    ],
    [
      'a word for a number',
      gives('ratio', { kind: 'word', value: 'slim' }),
      'error wrong-outcome /clauses/16/cases/0/gives',
    ],
    ['a number for a word', gives('slenderness', one), 'error wrong-outcome /clauses/15/cases/0/gives'],
    [
      'a word that is not listed',
      gives('slenderness', { kind: 'word', value: 'slim' }),
      'error unknown-word /clauses/15/cases/0/gives',
    ],
    [
      'a span limit for a factor',
      gives('K_e', { kind: 'spanLimit', divisor: 250 }),
      'error wrong-dimension /clauses/10/cases/0/gives',
    ],
    [
      'a span limit without a ratio',
      gives('w_lim', { kind: 'spanLimit', cap: 14 }),
      'error bad-span-limit /clauses/22/cases/0/gives',
    ],
    [
      'a span limit with two',
      gives('w_lim', { kind: 'spanLimit', divisor: 250, fraction: 0.004 }),
      'error bad-span-limit /clauses/22/cases/0/gives',
    ],
  ])('can’t be %s', (_, change, wanted) => {
    expect(brief(newFindings(change))).toContain(wanted);
  });

  it('may be empirical: then dimensions are not looked at', () => {
    const found = newFindings((edition) => {
      formula('ratio', 'h * b + 3')(edition);
      clauseOf(edition, 'ratio').empirical = true;
    });
    expect(found).toEqual([]);
  });

  it('names its clause and case', () => {
    const [found] = newFindings(formula('ratio', 'h / c'));
    expect(found).toMatchObject({ in: 'edition', clause: 'ratio', case: 'all' });
    expect(found?.message).toBe('There is no symbol “c” in this edition.');
  });
});

describe('the order of cases', () => {
  it('ends with the one without a condition', () => {
    const found = newFindings(
      cases(
        'K_e',
        { id: 'any', gives: one },
        { id: 'never', when: { fact: 'exposure', operator: 'equal', value: 'wet' }, gives: one },
      ),
    );
    expect(brief(found)).toContain('error otherwise-not-last /clauses/10/cases/0');
  });

  it('asks classes for their words', () => {
    const found = newFindings((edition) => {
      delete clauseOf(edition, 'slenderness').words;
    });
    expect(brief(found)).toContain('warning no-words /clauses/15');
  });
});

const when = (condition: Condition) => (edition: Edition) => {
  const [first] = clauseOf(edition, 'K_e').cases;
  if (first) first.when = condition;
};
const at = '/clauses/10/cases/0/when';

describe('conditions', () => {
  it.each<[string, Condition, string]>([
    ['on nothing known', { fact: 'zeta', operator: 'equal', value: 1 }, `error unknown-fact ${at}`],
    [
      'against nothing known',
      { fact: 'h', operator: 'equal', value: { fact: 'zeta' } },
      `error unknown-fact ${at}`,
    ],
    [
      'by size on a word',
      { fact: 'exposure', operator: 'lessThan', value: 'wet' },
      `error word-against-number ${at}`,
    ],
    [
      'of a word with a number',
      { fact: 'exposure', operator: 'equal', value: 3 },
      `error wrong-value-type ${at}`,
    ],
    [
      'of a number with a word',
      { fact: 'h', operator: 'greaterThan', value: '200' },
      `error wrong-value-type ${at}`,
    ],
    [
      'of a number with a word fact',
      { fact: 'h', operator: 'equal', value: { fact: 'grade' } },
      `error wrong-value-type ${at}`,
    ],
    [
      '“in” with one value',
      { fact: 'exposure', operator: 'in', value: 'wet' },
      `error wrong-value-type ${at}`,
    ],
    [
      '“in” with a fact',
      { fact: 'exposure', operator: 'in', value: { fact: 'grade' } },
      `error wrong-value-type ${at}`,
    ],
    [
      '“equal” with a list',
      { fact: 'exposure', operator: 'equal', value: ['wet'] },
      `error wrong-value-type ${at}`,
    ],
    ['with a list of both', { fact: 'h', operator: 'in', value: [1, '2'] }, `error wrong-value-type ${at}`],
    [
      'with an option that is none',
      { fact: 'exposure', operator: 'equal', value: 'damp' },
      `error unknown-option ${at}`,
    ],
    [
      'with a grade that is none',
      { fact: 'grade', operator: 'notIn', value: ['T16', 'C99'] },
      `error unknown-option ${at}`,
    ],
    [
      'with a duration that is none',
      { fact: 'duration', operator: 'equal', value: 'eternal' },
      `error unknown-option ${at}`,
    ],
    [
      'with a word no class gives',
      { fact: 'slenderness', operator: 'equal', value: 'slim' },
      `error unknown-option ${at}`,
    ],
    ['in an empty group', { all: [] }, `error empty-group ${at}`],
    ['in an empty group inside', { any: [{ not: { all: [] } }] }, `error empty-group ${at}/any/0/not`],
    [
      'nested too deeply',
      Array.from({ length: 9 }).reduce<Condition>((not) => ({ not }), {
        fact: 'h',
        operator: 'equal',
        value: 1,
      }),
      `error condition-too-deep ${at}`,
    ],
    [
      'too many',
      {
        all: Array.from({ length: 5 }, () => ({
          any: Array.from({ length: 50 }, (_, i): Condition => ({ fact: 'h', operator: 'equal', value: i })),
        })),
      },
      `error condition-too-long ${at}`,
    ],
  ])('%s', (_, condition, wanted) => {
    expect(brief(newFindings(when(condition)))).toContain(wanted);
  });

  it('inside groups are placed by pointer', () => {
    const found = newFindings(
      when({
        all: [
          { fact: 'h', operator: 'lessThan', value: 9 },
          { not: { any: [{ fact: 'g_x', operator: 'equal', value: 1 }] } },
        ],
      }),
    );
    expect(brief(found)).toEqual([`error unknown-fact ${at}/all/1/not/any/0`]);
  });

  it('of checks are looked at too', () => {
    const found = newFindings((edition) => {
      Object.assign(edition.checks[4] ?? {}, {
        applies: { fact: 'notch_depth', operator: 'greaterThan', value: 'deep' },
      });
    });
    expect(brief(found)).toEqual(['error wrong-value-type /checks/4/applies']);
  });

  it('that are wrong stop the comparing of cases, which would only repeat it', () => {
    const found = newFindings(when({ fact: 'exposure', operator: 'equal', value: 'damp' }));
    expect(found.map(({ code }) => code)).toEqual(['unknown-option']);
  });
});

const limit = (more: Partial<NonNullable<Edition['checks'][number]['limit']>>) => (edition: Edition) => {
  Object.assign(edition.checks[0]?.limit ?? {}, more);
};

describe('checks', () => {
  it.each<[string, (edition: Edition) => void, string]>([
    ['an unknown symbol', limit({ formula: 'f_m * K_zeta' }), 'error unknown-symbol /checks/0/limit/formula'],
    ['another dimension', limit({ formula: 'f_m * h' }), 'error wrong-dimension /checks/0/limit/formula'],
    ['a unit that is none', limit({ unit: 'stone' }), 'error unknown-unit /checks/0/limit/unit'],
    ['a unit that is not coherent', limit({ unit: 'GPa' }), 'error unit-not-coherent /checks/0/limit/unit'],
    ['two units', limit({ unit: 'MPa' }), 'error wrong-dimension /checks/0/limit/unit'],
    ['no limit', (e) => delete e.checks[0]?.limit, 'error incomplete-check /checks/0'],
    [
      'a limit and a utilisation',
      (e) => Object.assign(e.checks[0] ?? {}, { utilisation: { formula: 'h / b' } }),
      'error incomplete-check /checks/0',
    ],
    ['a fact of another place', limit({ formula: 'f_m * K_b' }), 'error fact-not-here /checks/0'],
    ['a fact of one action', limit({ formula: 'f_m * psi' }), 'error fact-not-here /checks/0'],
    [
      'a place where there is none',
      (e) => Object.assign(e.checks[7]?.demand ?? {}, { formula: 'L / b' }),
      'error fact-not-here /checks/7',
    ],
    [
      'a combination where there is none',
      (e) => Object.assign(e.checks[7]?.limit ?? {}, { formula: '7 * K_d' }),
      'error fact-not-here /checks/7',
    ],
    [
      'a utilisation with a dimension',
      (e) =>
        e.checks.push({
          id: 'sum',
          title: 'Sum',
          reference: '',
          at: 'member',
          utilisation: { formula: 'h' },
        }),
      'error wrong-dimension /checks/8/utilisation/formula',
    ],
  ])('can’t have %s', (_, change, wanted) => {
    expect(brief(newFindings(change))).toContain(wanted);
  });

  it('that are empirical can have any unit, the same on both sides', () => {
    const found = newFindings((edition) => {
      Object.assign(edition.checks[0] ?? {}, {
        empirical: true,
        demand: { title: 'Moment', formula: 'M / 1e6', unit: 'kN m' },
        limit: {
          title: 'Moment',
          formula: 'f_m * K_d * K_h * K_s * K_e * K_l * K_v * W / 1e6',
          unit: 'kN m',
        },
      });
    });
    expect(found).toEqual([]);
  });

  it('say which fact is missing where', () => {
    const found = newFindings(limit({ formula: 'f_m * K_b' })).find(({ code }) => code === 'fact-not-here');
    expect(found?.message).toContain('“Bending” comes to need');
  });
});

describe('guards', () => {
  it('may stand in every kind of clause', () => {
    for (const symbol of ['K_e', 'w_lim', 'ratio', 'slenderness'] as const) {
      const found = newFindings(gives(symbol, { kind: 'refuse', reason: 'Not here.' }));
      expect(brief(found).filter((text) => text.startsWith('error'))).toEqual([]);
    }
  });
});
