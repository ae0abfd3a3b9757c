import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Comparison, Condition } from '#shared/basis/schema/index.ts';
import { compileCondition, FAILS, HOLDS, UNKNOWN } from '#shared/engine/decide/compileCondition.ts';
import { evidenceOf } from '#shared/engine/decide/evidence.ts';
import { replay } from '#shared/engine/decide/replay.ts';
import { Env } from '#shared/engine/run/env.ts';

const numbers = ['h', 'b', 'spacing'] as const;
const words = ['exposure', 'family'] as const;
const symbols: readonly string[] = [...numbers, ...words];
const isNumber = (symbol: string) => numbers.some((each) => each === symbol);

const number = fc.oneof(
  fc.constantFrom(0, -0, 1, 72, 300, 0.1 + 0.2, 0.3),
  fc.double({ noNaN: true, noDefaultInfinity: true }),
);
const word = fc.constantFrom('dry', 'wet', 'softwood', '1', '');

const comparison: fc.Arbitrary<Comparison> = fc.oneof(
  fc.record({
    fact: fc.constantFrom(...numbers),
    operator: fc.constantFrom(
      'equal',
      'notEqual',
      'lessThan',
      'lessThanInclusive',
      'greaterThan',
      'greaterThanInclusive',
    ),
    value: fc.oneof(number, fc.record({ fact: fc.constantFrom(...numbers) })),
  }),
  fc.record({
    fact: fc.constantFrom(...words),
    operator: fc.constantFrom('equal', 'notEqual'),
    value: fc.oneof(word, fc.record({ fact: fc.constantFrom(...words) })),
  }),
  fc.record({
    fact: fc.constantFrom(...numbers),
    operator: fc.constantFrom('in', 'notIn'),
    value: fc.array(number, { minLength: 1, maxLength: 4 }),
  }),
  fc.record({
    fact: fc.constantFrom(...words),
    operator: fc.constantFrom('in', 'notIn'),
    value: fc.array(word, { minLength: 1, maxLength: 4 }),
  }),
);

const { condition } = fc.letrec<{ condition: Condition }>((tie) => ({
  condition: fc.oneof(
    { maxDepth: 4, withCrossShrink: true },
    comparison,
    fc.record({ all: fc.array(tie('condition'), { minLength: 1, maxLength: 4 }) }),
    fc.record({ any: fc.array(tie('condition'), { minLength: 1, maxLength: 4 }) }),
    fc.record({ not: tie('condition') }),
  ),
}));

const whole = fc.record({ h: number, b: number, spacing: number, exposure: word, family: word });
const gaps = fc.subarray([...symbols]);

type Facts = Record<string, number | string>;

function trial(when: Condition, facts: Facts, missing: readonly string[]) {
  const env = new Env(
    symbols.map((symbol, slot) => (e: Env) => {
      const value = facts[symbol];
      if (missing.includes(symbol) || value === undefined) {
        e.setProblem(slot, { kind: 'missing', symbol, message: 'not given' });
      } else if (typeof value === 'number') e.setNumber(slot, value);
      else e.setWord(slot, value);
    }),
  );
  return compileCondition(when, (symbol) => symbols.indexOf(symbol))(env);
}

const asTrial = (holds: boolean | null) => (holds === null ? UNKNOWN : holds ? HOLDS : FAILS);

describe('decisions', () => {
  it('come out the same compiled, in the ledger and in json-rules-engine', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(condition, { minLength: 1, maxLength: 4 }), whole, async (cases, facts) => {
        const told = cases.map((when, i) => {
          const evidence = evidenceOf(when, (symbol) => (facts as Facts)[symbol] ?? null);
          expect(trial(when, facts, [])).toBe(asTrial(evidence.holds));
          return { case: `case ${String(i)}`, when, holds: evidence.holds, evidence };
        });
        expect(await replay(told, (symbol) => (facts as Facts)[symbol] ?? null, isNumber)).toEqual([]);
      }),
      { numRuns: 3000 },
    );
  });

  it('that are settled without a missing fact are the same whatever that fact is', async () => {
    await fc.assert(
      fc.asyncProperty(condition, whole, whole, gaps, async (when, facts, others, missing) => {
        const read = (symbol: string) =>
          missing.includes(symbol) ? null : ((facts as Facts)[symbol] ?? null);
        const evidence = evidenceOf(when, read);
        expect(trial(when, facts, missing)).toBe(asTrial(evidence.holds));
        const told = [{ case: 'only', when, holds: evidence.holds, evidence }];
        expect(await replay(told, read, isNumber)).toEqual([]);
        if (evidence.holds === null) return;
        const mixed = { ...facts, ...Object.fromEntries(missing.map((s) => [s, (others as Facts)[s] ?? 0])) };
        expect(trial(when, mixed, [])).toBe(asTrial(evidence.holds));
      }),
      { numRuns: 2000 },
    );
  });

  it('that were falsified in the ledger are noticed', async () => {
    const when: Condition = { all: [{ fact: 'h', operator: 'lessThan', value: 100 }] };
    const evidence = evidenceOf(when, () => 150);
    const told = { case: 'shallow', when, evidence };
    expect(await replay([{ ...told, holds: true }], () => 150, isNumber)).toEqual([
      'Case “shallow” does not hold for the rules engine.',
    ]);
    expect(await replay([{ ...told, holds: false }], () => 90, isNumber)).toEqual([
      'Case “shallow”: the rules engine saw 90 for h, the ledger 150.',
      'Case “shallow” holds for the rules engine.',
    ]);
  });
});
