import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { testEdition } from '#tests/factories/edition.ts';
import { expandCombinations, MOST_COMBINATIONS } from './expand.ts';

const edition = testEdition();
const [DEAD, IMPOSED, SNOW, WIND] = [0, 1, 2, 3];
const provenance = { source: 'made-up', standing: 'invented' } as const;

/** Factors as numbers, by pattern and term, whatever the action. */
const one = () => 1;

function patterns(...combinations: Partial<Edition['combinations'][number]>[]): Edition {
  return {
    ...edition,
    combinations: combinations.map((each, i) => ({
      id: `p${String(i)}`,
      title: 'Pattern',
      reference: '1',
      state: 'strength',
      terms: [{ of: 'permanent', factor: '1' }],
      provenance,
      ...each,
    })),
  };
}

function expand(from: Edition, carried: number[], factorOf: Parameters<typeof expandCombinations>[2] = one) {
  const outcome = expandCombinations(from, carried, factorOf, false);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.combinations;
}

const leading = [
  { of: 'permanent', factor: '1' },
  { of: 'leading', factor: '1' },
  { of: 'accompanying', factor: '1' },
] as const satisfies Edition['combinations'][number]['terms'];

describe('expandCombinations', () => {
  it('lets each variable action lead in turn', () => {
    const role = (_: number, term: number) => [1.35, 1.5, 0.7][term] ?? 0;
    const found = expand(patterns({ terms: [...leading] }), [DEAD, IMPOSED, SNOW], role);
    expect(found.map(({ id, title, duration }) => [id, title, duration])).toEqual([
      ['p0/imposed+snow', '1.35 G + 1.5 Q + 0.7 S', 2],
      ['p0/snow+imposed', '1.35 G + 0.7 Q + 1.5 S', 2],
    ]);
  });

  it('keeps excluding actions apart, in each largest set', () => {
    const found = expand(patterns({ terms: [...leading] }), [DEAD, IMPOSED, SNOW, WIND], one);
    expect(found.map(({ title }) => title).sort()).toEqual(['G + Q + S', 'G + Q + W']);
  });

  it('writes out every smaller set where asked, with its own duration', () => {
    const found = expand(patterns({ terms: [...leading], subsets: true }), [DEAD, IMPOSED, SNOW]);
    expect(found.map(({ title, duration }) => [title, duration])).toEqual([
      ['G + Q + S', 2],
      ['G + Q', 1],
      ['G + S', 2],
      ['G', 0],
    ]);
  });

  it('leaves no member without a combination: nothing leads where nothing varies', () => {
    expect(expand(patterns({ terms: [...leading] }), [DEAD]).map(({ title }) => title)).toEqual(['G']);
  });

  it('leaves out actions with the factor 0, for the duration too', () => {
    const role = (_: number, term: number, action: number) => (action === SNOW ? 0 : term + 1);
    const [found] = expand(patterns({ terms: [...leading] }), [DEAD, IMPOSED, SNOW], role);
    expect(found?.terms.map(({ action }) => action)).toEqual([DEAD, IMPOSED]);
    expect(found?.duration).toBe(1);
  });

  it('takes an action by name before its kind, and only if the pattern’s needs are met', () => {
    const terms: Edition['combinations'][number]['terms'] = [
      { of: 'permanent', factor: '0.9' },
      { of: ['wind'], factor: '1.2' },
    ];
    const uplift = patterns({ terms, needs: ['wind'] });
    expect(expand(uplift, [DEAD, IMPOSED])).toEqual([]);
    const [found] = expand(uplift, [DEAD, IMPOSED, WIND], (_, term) => [0.9, 1.2][term] ?? 0);
    expect(found?.title).toBe('0.9 G + 1.2 W');
  });

  it('fixes the duration where the pattern does', () => {
    const [found] = expand(patterns({ terms: [...leading], duration: 'long' }), [DEAD, IMPOSED]);
    expect(found?.duration).toBe(0);
  });

  it('writes like combinations once, unless the pattern matters', () => {
    const twice = patterns({ terms: [...leading] }, { terms: [...leading] });
    expect(expand(twice, [DEAD, IMPOSED])).toHaveLength(1);
    const kept = expandCombinations(twice, [DEAD, IMPOSED], one, true);
    expect(kept.ok && kept.combinations).toHaveLength(2);
  });

  it('carries the reason where a factor has no value', () => {
    const problem = { kind: 'missing', symbol: 'psi', message: 'Snow has no psi.' } as const;
    const [found] = expand(patterns({ terms: [...leading] }), [DEAD, SNOW], (_, term) =>
      term === 1 ? problem : 1,
    );
    expect(found?.problem).toBe(problem);
  });

  it('refuses more combinations than anyone could read', () => {
    const action = edition.actions[IMPOSED ?? 1] as Edition['actions'][number];
    const actions = Array.from({ length: 12 }, (_, i) => ({
      ...action,
      id: `a${String(i)}`,
      symbol: `A${String(i)}`,
    }));
    const many = { ...patterns({ terms: [...leading], subsets: true }), actions };
    const factor = (pattern: number, term: number, index: number) => pattern + term + index / 100 + 1;
    const outcome = expandCombinations(
      many,
      actions.map((_, i) => i),
      factor,
      false,
    );
    expect(outcome.ok).toBe(false);
    expect(!outcome.ok && outcome.message).toContain(String(MOST_COMBINATIONS));
  });
});
