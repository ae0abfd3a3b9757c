import { describe, expect, it } from 'vitest';
import { brief, newFindings } from '#tests/factories/findings.ts';
import { testMember } from '#tests/factories/edition.ts';
import type { Edition } from '../schema/index.ts';

const invented = { source: 'made-up', standing: 'invented' } as const;
const twice = <T>(list: T[]) => {
  if (list[0]) list.push(list[0]);
};

describe('names that point at nothing', () => {
  it.each<[string, (edition: Edition) => void, string]>([
    [
      'source',
      (e) => Object.assign(e.actions[0]?.provenance ?? {}, { source: 'lost' }),
      'error unknown-source /actions/0/provenance/source',
    ],
    [
      'duration of an action',
      (e) => Object.assign(e.actions[0] ?? {}, { duration: 'eternal' }),
      'error unknown-duration /actions/0/duration',
    ],
    [
      'excluded action',
      (e) => Object.assign(e.actions[3] ?? {}, { excludes: ['snow', 'hail'] }),
      'error unknown-action /actions/3/excludes/1',
    ],
    [
      'value of an action',
      (e) => Object.assign(e.actions[0]?.values ?? {}, { chi: 1 }),
      'error unknown-symbol /actions/0/values/chi',
    ],
    [
      'missing value of an action',
      (e) => Object.assign(e.actions[0] ?? {}, { values: {} }),
      'warning missing-action-value /actions/0/values',
    ],
    [
      'duration of a combination',
      (e) => Object.assign(e.combinations[0] ?? {}, { duration: 'eternal' }),
      'error unknown-duration /combinations/0/duration',
    ],
    [
      'needed action',
      (e) => Object.assign(e.combinations[0] ?? {}, { needs: ['hail'] }),
      'error unknown-action /combinations/0/needs/0',
    ],
    [
      'action of a term',
      (e) => Object.assign(e.combinations[1]?.terms[1] ?? {}, { of: ['wind', 'hail'] }),
      'error unknown-action /combinations/1/terms/1/of',
    ],
    [
      'state of a check',
      (e) => Object.assign(e.checks[0] ?? {}, { state: 'fire' }),
      'error unknown-state /checks/0/state',
    ],
    ['missing state', (e) => delete e.checks[0]?.state, 'error missing-state /checks/0'],
    [
      'default of a choice',
      (e) => Object.assign(e.choices[1] ?? {}, { default: 'moist' }),
      'error unknown-option /choices/1/default',
    ],
    [
      'bounds of an input',
      (e) => Object.assign(e.inputs[0] ?? {}, { minimum: 300 }),
      'error bad-bounds /inputs/0',
    ],
    [
      'default of an input',
      (e) => Object.assign(e.inputs[0] ?? {}, { default: 201 }),
      'error bad-bounds /inputs/0/default',
    ],
    [
      'action of the self-weight',
      (e) => Object.assign(e.analysis.selfWeight ?? {}, { action: 'hail' }),
      'error unknown-action /analysis/selfWeight/action',
    ],
    [
      'stiffness',
      (e) => Object.assign(e.analysis, { bendingStiffness: 'EJ' }),
      'error unknown-symbol /analysis/bendingStiffness',
    ],
    [
      'shear stiffness',
      (e) => Object.assign(e.analysis, { shearStiffness: 'h' }),
      'error unknown-symbol /analysis/shearStiffness',
    ],
    [
      'stiffness of another dimension',
      (e) => Object.assign(e.analysis, { bendingStiffness: 'I' }),
      'error wrong-dimension /analysis/bendingStiffness',
    ],
    [
      'stiffness that is a word',
      (e) => Object.assign(e.analysis, { bendingStiffness: 'slenderness' }),
      'error wrong-dimension /analysis/bendingStiffness',
    ],
    [
      'distance for shear',
      (e) => Object.assign(e.analysis.shear, { distance: 'w_lim' }),
      'error fact-not-here /analysis/shear/distance',
    ],
    [
      'allowance',
      (e) => Object.assign(e.analysis, { span: { rule: 'clearPlus', allowance: 'K_e', reference: '2' } }),
      'error wrong-dimension /analysis/span/allowance',
    ],
  ])('%s', (_, change, wanted) => {
    expect(brief(newFindings(change))).toContain(wanted);
  });

  it('stand twice in no list', () => {
    const found = newFindings((edition) => {
      const { sources, durations, actions, combinations, tables, clauses, checks, grades, choices } = edition;
      for (const list of [sources, durations, actions, combinations, tables, clauses, checks, grades.rows]) {
        twice<unknown>(list);
      }
      twice(choices[0]?.options ?? []);
      twice(clauses[3]?.cases ?? []);
    }).filter(({ code }) => code === 'duplicate-id');
    expect(found.map(({ pointer }) => pointer)).toEqual([
      '/sources/1/id',
      '/durations/3/id',
      '/actions/4/id',
      '/combinations/4/id',
      '/tables/3/id',
      '/clauses/23/id',
      '/checks/8/id',
      '/grades/rows/3/id',
      '/choices/0/options/2/id',
      '/clauses/3/cases/2/id',
    ]);
  });

  it('of a proof are found', () => {
    const found = newFindings((edition) => {
      edition.proofs.push({
        id: 'p',
        title: 'Joist',
        member: testMember({ grade: 'Q99' }),
        expect: [{ check: 'fire', of: { symbol: 'zeta' }, value: 1, unit: 'ell', tolerance: 0.1 }],
        provenance: invented,
      });
    });
    expect(brief(found)).toEqual([
      'error unknown-grade /proofs/0/member/grade',
      'error unknown-unit /proofs/0/expect/0/unit',
      'error unknown-check /proofs/0/expect/0/check',
      'note unknown-symbol /proofs/0/expect/0/of/symbol',
      expect.stringContaining('note unverified'),
    ]);
  });
});

describe('combinations', () => {
  it('with accompanying actions have one that leads', () => {
    const found = newFindings((edition) => {
      edition.combinations[2]?.terms.splice(1, 1);
    });
    expect(brief(found)).toEqual(['warning no-leading-term /combinations/2/terms']);
  });

  it('that no check uses are said', () => {
    const found = newFindings((edition) => {
      Object.assign(edition.combinations[1] ?? {}, { state: 'fire' });
    });
    expect(brief(found)).toEqual(['warning unused /combinations/1']);
  });

  it.each([
    ['h / b * L / L', 'error fact-not-here /combinations/0/terms/0/factor', 'known at a place'],
    ['K_d', 'error fact-not-here /combinations/0/terms/0/factor', 'only once its factors are'],
    ['h', 'error wrong-dimension /combinations/0/terms/0/factor', 'a pure number is declared'],
    ['zeta', 'error unknown-symbol /combinations/0/terms/0/factor', 'no symbol “zeta”'],
    ['action', 'error word-in-formula /combinations/0/terms/0/factor', 'is a word'],
    ['1 +', 'error bad-formula /combinations/0/terms/0/factor', 'can’t be read'],
  ])('have no factor %s', (factor, wanted, words) => {
    const found = newFindings((edition) => {
      Object.assign(edition.combinations[0]?.terms[0] ?? {}, { factor });
    });
    expect(brief(found)).toContain(wanted);
    expect(found.map(({ message }) => message).join(' ')).toContain(words);
  });

  it('with a fixed duration can have factors that look at it', () => {
    const found = newFindings((edition) => {
      Object.assign(edition.combinations[0] ?? {}, { duration: 'short' });
      Object.assign(edition.combinations[0]?.terms[0] ?? {}, { factor: 'K_d' });
    });
    expect(found).toEqual([]);
  });
});

describe('what nothing uses', () => {
  it('is said: clauses, inputs, choices, columns, tables, sources', () => {
    const found = newFindings((edition) => {
      edition.inputs.push({ symbol: 'spare', title: 'Spare', scope: 'member', unit: 'mm' });
      edition.choices.push({
        symbol: 'mood',
        title: 'Mood',
        scope: 'member',
        options: [{ id: 'good', title: 'Good' }],
      });
      edition.grades.columns.push({ symbol: 'colour', title: 'Colour', unit: '1' });
      edition.sources.push({ id: 'shelf', title: 'Shelf', kind: 'memory' });
      Object.assign(edition.checks[2]?.limit ?? {}, { formula: 'f_p * K_d * K_s * K_e' });
    });
    expect(brief(found)).toEqual([
      'warning unused /choices/3',
      'warning unused /inputs/3',
      'warning unused /grades/columns/6',
      'warning unused /clauses/11',
      'note unused /sources/1',
    ]);
    expect(found[3]).toMatchObject({ clause: 'bearing' });
  });

  it('is not said of a table whose clause nothing uses', () => {
    const found = newFindings((edition) => {
      edition.tables.push({
        ...(edition.tables[0] as Edition['tables'][number]),
        id: 'spare',
        title: 'Spare',
      });
    });
    expect(brief(found)).toEqual(['warning unused /tables/3', expect.stringContaining('note unverified')]);
  });

  it('counts what was not verified', () => {
    const found = newFindings((edition) => {
      const verified = { ...invented, verified: { by: 'A. Tester', on: '2026-01-01' } };
      Object.assign(edition.actions[0] ?? {}, { provenance: verified });
    });
    expect(found.map(({ message }) => message)).toEqual([
      '45 values or groups of values were not verified by a second person.',
    ]);
  });
});
