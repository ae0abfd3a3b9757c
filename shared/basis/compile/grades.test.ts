import { describe, expect, it } from 'vitest';
import { brief, clauseOf, newFindings } from '#tests/factories/findings.ts';
import type { Condition, Edition, Grade, SizeBands } from '../schema/index.ts';

const provenance = { source: 'made-up', standing: 'invented' } as const;
const grade = (edition: Edition, index = 0) => edition.grades.rows[index] as Grade;
const bands = (change: Partial<SizeBands>) => (edition: Edition) => {
  Object.assign(grade(edition, 1).values['f_m'] as SizeBands, change);
};

describe('grades', () => {
  it.each<[string, (edition: Edition) => void, string]>([
    [
      'a value without a column',
      (e) => Object.assign(grade(e).values, { f_t: 3 }),
      'error unknown-column /grades/rows/0/values/f_t',
    ],
    [
      'a source without a column',
      (e) => Object.assign(grade(e), { cells: { f_t: provenance } }),
      'error unknown-column /grades/rows/0/cells/f_t',
    ],
    [
      'a value below 0',
      (e) => Object.assign(grade(e).values, { f_m: -5.3 }),
      'error negative-value /grades/rows/0/values/f_m',
    ],
    [
      'a band value below 0',
      bands({ values: [7.5, -7.1] }),
      'error negative-value /grades/rows/1/values/f_m/values',
    ],
    [
      'a choice that is none',
      (e) => Object.assign(grade(e).choices, { colour: 'red' }),
      'error unknown-choice /grades/rows/0/choices/colour',
    ],
    [
      'a choice of the member',
      (e) => Object.assign(grade(e).choices, { sharing: 'shared' }),
      'error unknown-choice /grades/rows/0/choices/sharing',
    ],
    [
      'an option that is none',
      (e) => Object.assign(grade(e).choices, { family: 'bamboo' }),
      'error unknown-option /grades/rows/0/choices/family',
    ],
    [
      'a choice left open',
      (e) => Object.assign(grade(e), { choices: {} }),
      'error missing-choice /grades/rows/0/choices',
    ],
    ['bands by a word', bands({ by: 'grade' }), 'error bad-bands /grades/rows/1/values/f_m/by'],
    ['bands by nothing known', bands({ by: 'zeta' }), 'error bad-bands /grades/rows/1/values/f_m/by'],
    ['bands by a place', bands({ by: 'L' }), 'error bad-bands /grades/rows/1/values/f_m/by'],
    ['bands by the combination', bands({ by: 'K_d' }), 'error bad-bands /grades/rows/1/values/f_m/by'],
    ['bands by another grade value', bands({ by: 'rho' }), 'error bad-bands /grades/rows/1/values/f_m/by'],
    ['an edge too few', bands({ edges: [null, null] }), 'error bad-bands /grades/rows/1/values/f_m'],
    ['falling edges', bands({ edges: [300, 200, 400] }), 'error bad-bands /grades/rows/1/values/f_m/edges'],
    [
      'an open inner edge',
      bands({ edges: [0, null, 400] }),
      'error bad-bands /grades/rows/1/values/f_m/edges',
    ],
  ])('can’t have %s', (_, change, wanted) => {
    expect(brief(newFindings(change))).toContain(wanted);
  });

  it('may depend on a size that a clause gives', () => {
    expect(newFindings(bands({ by: 'ratio', edges: [null, 4, null] }))).toEqual([]);
  });
});

describe('values ten times too large or small', () => {
  const withGrades = (values: readonly number[]) => (edition: Edition) => {
    edition.grades.rows = values.map((f_m, i) => ({
      id: `g${i}`,
      title: `Grade ${i}`,
      choices: { family: 'softwood' },
      values: { f_m, f_v: 1, f_p: 2, E_mean: 10_000, E_min: 7000, rho: 400 },
      provenance,
    }));
  };
  const unusual = (values: readonly number[]) =>
    newFindings(withGrades(values)).filter(({ code }) => code === 'unusual-value');

  it('are pointed at', () => {
    expect(brief(unusual([5, 6, 7, 75]))).toEqual(['warning unusual-value /grades/rows/3/values/f_m']);
    expect(unusual([5, 6, 7, 0.65])[0]?.message).toContain('Grade 3: Bending 0.65 N/mm2 looks about a tenth');
  });

  it('are not seen among usual ones, nor among too few to say', () => {
    expect(unusual([5, 6, 7, 16])).toEqual([]);
    expect(unusual([5, 6, 75])).toEqual([]);
  });
});

/** A property that only hardwood has, and a factor that looks at it. */
function withHardness(when: Condition | null, extra?: (edition: Edition) => void) {
  return newFindings((edition) => {
    edition.grades.columns.push({ symbol: 'hardness', title: 'Hardness', unit: 'N/mm2' });
    Object.assign(grade(edition, 2).values, { hardness: 5 });
    clauseOf(edition, 'K_e').cases = [
      ...(when
        ? [{ id: 'hard', when, gives: { kind: 'formula' as const, formula: 'hardness / f_m' }, provenance }]
        : []),
      {
        id: 'other',
        gives: when
          ? { kind: 'constant' as const, value: 1 }
          : { kind: 'formula' as const, formula: 'hardness / f_m' },
        provenance,
      },
    ];
    extra?.(edition);
  }).filter(({ code }) => code === 'missing-property');
}
const hardwood: Condition = { fact: 'family', operator: 'equal', value: 'hardwood' };

describe('properties that a grade lacks', () => {
  it('are said once a column, with grades and checks', () => {
    const found = withHardness(null);
    expect(brief(found)).toEqual(['warning missing-property /grades/columns/6']);
    expect(found[0]?.message).toBe(
      'Grade T16, Grade T24 have no hardness. Bending, Shear, Bearing, Notched end may need it; a member that does gets no verdict.',
    );
  });

  it('are not missed by grades that never come to the case', () => {
    expect(withHardness(hardwood)).toEqual([]);
    expect(withHardness({ not: { fact: 'family', operator: 'equal', value: 'softwood' } })).toEqual([]);
    expect(withHardness({ all: [hardwood, { fact: 'exposure', operator: 'equal', value: 'wet' }] })).toEqual(
      [],
    );
    expect(withHardness({ fact: 'grade', operator: 'in', value: ['H40'] })).toEqual([]);
  });

  it('are missed where another fact may bring the grade to the case', () => {
    expect(
      withHardness({ any: [hardwood, { fact: 'exposure', operator: 'equal', value: 'wet' }] }),
    ).toHaveLength(1);
    expect(withHardness({ fact: 'exposure', operator: 'equal', value: 'wet' })).toHaveLength(1);
    expect(withHardness({ fact: 'grade', operator: 'in', value: ['H40', 'T16'] })[0]?.message).toMatch(
      /^Grade T16 has no hardness/,
    );
  });

  it('are seen through a class that the grade settles', () => {
    const byClass = (word: string) =>
      withHardness({ fact: 'kind', operator: 'equal', value: word }, (edition) => {
        edition.clauses.push({
          id: 'kind',
          symbol: 'kind',
          title: 'Kind',
          reference: '1',
          kind: 'class',
          unit: 'word',
          words: ['hard', 'soft'],
          cases: [
            { id: 'hard', when: hardwood, gives: { kind: 'word', value: 'hard' }, provenance },
            { id: 'soft', gives: { kind: 'word', value: 'soft' }, provenance },
          ],
        });
      });
    expect(byClass('hard')).toEqual([]);
    expect(byClass('soft')).toHaveLength(1);
  });

  it('are not missed by grades that a check leaves out', () => {
    const leaving = (condition: Condition) =>
      withHardness(null, (edition) => {
        for (const check of edition.checks) check.applies = condition;
      });
    expect(leaving(hardwood)).toEqual([]);
    expect(leaving({ fact: 'exposure', operator: 'equal', value: 'dry' })).toHaveLength(1);
  });

  it('are looked for behind a condition that only the property settles', () => {
    expect(withHardness({ fact: 'hardness', operator: 'greaterThan', value: 3 })).toHaveLength(1);
  });

  it('are looked for behind a size band', () => {
    const found = withHardness(hardwood, (edition) => {
      clauseOf(edition, 'ratio').cases = [
        { id: 'all', gives: { kind: 'formula', formula: 'h / b * hardness / hardness' }, provenance },
      ];
      bands({ by: 'ratio', edges: [null, 4, null] })(edition);
      edition.checks = edition.checks.filter(({ id }) => id === 'bending');
    });
    expect(found[0]?.message).toMatch(/^Grade T16, Grade T24 have no hardness. Bending may need it/);
  });
});
