import { describe, expect, it } from 'vitest';
import { testEdition } from '#tests/factories/edition.ts';
import { brief, clauseAt, clauseOf, newFindings } from '#tests/factories/findings.ts';
import { editionHash } from '../hash.ts';
import type { Edition } from '../schema/index.ts';
import { compileEdition } from './compile.ts';
import type { CompiledEdition } from './plan.ts';

function compiled(edition: Edition = testEdition()): CompiledEdition {
  const outcome = compileEdition(edition);
  if (!outcome.ok) throw new Error(brief(outcome.findings).join('\n'));
  return outcome.compiled;
}
const symbolOf = (symbol: string) => compiled().symbols.get(symbol);

describe('the plan of an edition', () => {
  it('has nothing to say of a sound edition but that its values are unverified', () => {
    expect(brief(compileEdition(testEdition()).findings)).toEqual(['note unverified ']);
  });

  it('carries the edition and its hash', () => {
    const edition = testEdition();
    expect(compiled(edition).edition).toBe(edition);
    expect(compiled(edition).hash).toBe(editionHash(edition));
  });

  it('puts each clause after those it looks at', () => {
    const { clauses } = compiled();
    const place = new Map(clauses.map(({ clause }, i) => [clause.symbol, i]));
    expect(clauses).toHaveLength(testEdition().clauses.length);
    clauses.forEach(({ looksAt }, i) => {
      for (const symbol of looksAt) expect(place.get(symbol) ?? -1).toBeLessThan(i);
    });
  });

  it.each([
    ['R_hold', 'edition', undefined],
    ['W', 'member', undefined],
    ['K_d', 'combination', undefined],
    ['K_b', 'place', ['support']],
    ['K_n', 'place', ['shear', 'support']],
    ['K_v', 'place', ['moment']],
    ['w_lim', 'place', ['moment', 'shear', 'support', 'deflection']],
    ['psi', 'term', undefined],
    ['exposure', 'member', undefined],
    ['restraint_length', 'place', ['moment', 'shear', 'support', 'deflection']],
  ])('knows %s at the level of %s', (symbol, level, at) => {
    expect(symbolOf(symbol)).toMatchObject({ level, ...(at ? { at } : {}) });
    expect(symbolOf(symbol)?.at).toEqual(at);
  });

  it('knows units, words and bounds of symbols', () => {
    expect(symbolOf('M')).toMatchObject({ origin: 'builtIn', unit: 'N mm', range: { from: 0 } });
    expect(symbolOf('duration')).toMatchObject({ unit: 'word', words: ['long', 'medium', 'short'] });
    expect(symbolOf('grade')).toMatchObject({ words: ['T16', 'T24', 'H40'] });
    expect(symbolOf('notch_depth')).toMatchObject({ unit: 'mm', range: { from: 0, to: 200 } });
    expect(symbolOf('slenderness')).toMatchObject({ words: ['stocky', 'slender'] });
  });

  it('knows inputs and grade values in coherent units, whatever they are entered in', () => {
    const edition = testEdition();
    const camber = edition.inputs.find(({ symbol }) => symbol === 'camber');
    if (camber) Object.assign(camber, { unit: 'in', minimum: 0, maximum: 2 });
    Object.assign(edition.grades.columns[3] ?? {}, { unit: 'GPa' });
    const { symbols } = compiled(edition);
    expect(symbols.get('camber')).toMatchObject({ unit: 'mm', range: { from: 0, to: 50.8 } });
    expect(symbols.get('E_mean')).toMatchObject({ unit: 'N/mm2' });
  });
});

describe('symbols', () => {
  it('stand for one thing each, also against the facts that every member has', () => {
    const found = newFindings((edition) => {
      clauseOf(edition, 'ratio').symbol = 'h';
      clauseOf(edition, 'K_e').symbol = 'exposure';
      edition.grades.columns.push({ symbol: 'camber', title: 'Crookedness', unit: 'mm' });
    }).filter(({ code }) => code === 'duplicate-symbol');
    expect(brief(found)).toEqual([
      'error duplicate-symbol /grades/columns/6/symbol',
      'error duplicate-symbol /clauses/10/symbol',
      'error duplicate-symbol /clauses/16/symbol',
    ]);
    expect(found[2]?.message).toContain('a fact that every member has');
  });

  it.each(['min', 'log10', 'and', 'mod', 'true', 'Infinity'])('are not named %s', (symbol) => {
    const found = newFindings((edition) => {
      edition.inputs.push({ symbol, title: 'Slip', scope: 'member', unit: 'mm' });
    });
    expect(brief(found)).toContain('error reserved-symbol /inputs/3/symbol');
  });

  it('have units that are known and, for clauses, coherent', () => {
    const found = newFindings((edition) => {
      clauseOf(edition, 'd_v').unit = 'cm';
      clauseOf(edition, 'R_hold').unit = 'stone';
      Object.assign(edition.inputs[0] ?? {}, { unit: 'cubit' });
    });
    expect(brief(found)).toEqual(
      expect.arrayContaining([
        'error unit-not-coherent /clauses/20/unit',
        'error unknown-unit /clauses/19/unit',
        'error unknown-unit /inputs/0/unit',
      ]),
    );
    expect(found.find(({ code }) => code === 'unit-not-coherent')?.message).toContain('has to be in mm');
  });

  it('of the other unit system are not coherent', () => {
    const found = newFindings((edition) => {
      clauseOf(edition, 'd_v').unit = 'in';
    });
    expect(brief(found)).toContain('error unit-not-coherent /clauses/20/unit');
  });
});

describe('circles', () => {
  const through = (formulas: Record<string, string>) => (edition: Edition) => {
    for (const [symbol, formula] of Object.entries(formulas)) {
      clauseOf(edition, symbol).cases = [
        {
          id: 'all',
          gives: { kind: 'formula', formula },
          provenance: { source: 'made-up', standing: 'invented' },
        },
      ];
    }
  };

  it('are named in order', () => {
    const found = newFindings(through({ A: 'I / h^2', I: 'W * h', W: 'A * h' }));
    expect(brief(found)).toEqual(['error cycle /clauses/0']);
    expect(found[0]?.message).toContain('A → I → W → A');
  });

  it('of one clause with itself are found', () => {
    expect(newFindings(through({ A: 'A' }))[0]?.message).toContain('A → A');
  });

  it('through a condition are found', () => {
    const found = newFindings((edition) => {
      const [shallow] = clauseOf(edition, 'K_h').cases;
      if (shallow) shallow.when = { fact: 'K_h', operator: 'lessThan', value: 1 };
    });
    expect(found.map(({ code }) => code)).toContain('cycle');
  });

  it('through the sizes that grade values depend on are found', () => {
    const found = newFindings((edition) => {
      through({ ratio: 'f_m / 10 * h / h' })(edition);
      clauseOf(edition, 'ratio').empirical = true;
      Object.assign(edition.grades.rows[1]?.values ?? {}, {
        f_m: { by: 'ratio', edge: 'below', edges: [null, 2, null], values: [7, 8] },
      });
    });
    expect(found.find(({ code }) => code === 'cycle')?.message).toContain('ratio → ratio');
  });

  it('are not seen where two clauses share a third', () => {
    expect(newFindings(through({ ratio: 'A / (b * b)', d_v: 'A / b' }))).toEqual([]);
  });
});

describe('clauses that mix levels', () => {
  it('can’t look at one action and at a place', () => {
    const found = newFindings((edition) => {
      clauseOf(edition, 'K_v').cases = [
        {
          id: 'all',
          gives: { kind: 'formula', formula: 'psi * M_variable / M' },
          provenance: { source: 'made-up', standing: 'invented' },
        },
      ];
    });
    expect(brief(found)).toContain('error term-and-place /clauses/18');
    expect(found.find(({ code }) => code === 'term-and-place')).toMatchObject({ clause: 'volume' });
  });

  it('can’t look at facts that exist at different kinds of place', () => {
    const found = newFindings((edition) => {
      clauseOf(edition, 'r_m').cases = [
        {
          id: 'all',
          gives: { kind: 'formula', formula: 'M / (R * L)' },
          provenance: { source: 'made-up', standing: 'invented' },
        },
      ];
    });
    expect(brief(found)).toContain(`error no-common-place /clauses/${clauseAt(testEdition(), 'r_m')}`);
  });
});

describe('documents that are no edition', () => {
  it.each(['null', '{}', '[]', '"edition"', '{"schema":"edition/1","clauses":5}'])(
    'are said to be unreadable: %s',
    (text) => {
      const outcome = compileEdition(JSON.parse(text) as Edition);
      expect(outcome.ok).toBe(false);
      expect(outcome.findings.map(({ code }) => code)).toContain('unreadable');
    },
  );
});
