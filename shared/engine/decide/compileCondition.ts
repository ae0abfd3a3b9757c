import type { Comparison, Condition } from '#shared/basis/schema/index.ts';
import { type Env, NUMBER, PROBLEM, WORD } from '../run/env.ts';
import { compare, type FactValue } from '#shared/basis/condition/compare.ts';

/** How a condition comes out. `UNKNOWN`: a fact that decides it has no value. */
export const HOLDS = 1;
export const FAILS = 0;
export const UNKNOWN = -1;
export type Trial = typeof HOLDS | typeof FAILS | typeof UNKNOWN;

/** A condition as a closure over slots: the hot path's stand-in for json-rules-engine. */
export type ConditionTest = (env: Env) => Trial;

/**
 * Compiles a condition. Groups stop at the first member that settles them; a fact without a value leaves
 * the group open unless another member settles it, so the outcome never depends on a missing fact.
 */
export function compileCondition(condition: Condition, slotOf: (symbol: string) => number): ConditionTest {
  if ('all' in condition) {
    return group(
      condition.all.map((each) => compileCondition(each, slotOf)),
      FAILS,
    );
  }
  if ('any' in condition) {
    return group(
      condition.any.map((each) => compileCondition(each, slotOf)),
      HOLDS,
    );
  }
  if ('not' in condition) {
    const test = compileCondition(condition.not, slotOf);
    return (env) => {
      const trial = test(env);
      return trial === UNKNOWN ? UNKNOWN : trial === HOLDS ? FAILS : HOLDS;
    };
  }
  return comparison(condition, slotOf);
}

/** The facts that a condition names, each once, in order of appearance. */
export function factsOf(condition: Condition, into: string[] = []): string[] {
  if ('all' in condition) for (const each of condition.all) factsOf(each, into);
  else if ('any' in condition) for (const each of condition.any) factsOf(each, into);
  else if ('not' in condition) factsOf(condition.not, into);
  else {
    if (!into.includes(condition.fact)) into.push(condition.fact);
    const { value } = condition;
    if (typeof value === 'object' && 'fact' in value && !into.includes(value.fact)) into.push(value.fact);
  }
  return into;
}

/** `all` is settled by a member that fails, `any` by one that holds. */
function group(tests: readonly ConditionTest[], settledBy: typeof HOLDS | typeof FAILS): ConditionTest {
  const otherwise = settledBy === HOLDS ? FAILS : HOLDS;
  if (tests.length === 1) return tests[0] as ConditionTest;
  return (env) => {
    let open = false;
    for (let i = 0; i < tests.length; i += 1) {
      const trial = (tests[i] as ConditionTest)(env);
      if (trial === settledBy) return settledBy;
      if (trial === UNKNOWN) open = true;
    }
    return open ? UNKNOWN : otherwise;
  };
}

function comparison(
  { fact, operator, value }: Comparison,
  slotOf: (symbol: string) => number,
): ConditionTest {
  const slot = slotOf(fact);
  if (typeof value === 'object' && 'fact' in value) {
    const other = slotOf(value.fact);
    return (env) => {
      const a = env.value(slot);
      const b = env.value(other);
      return a === null || b === null ? UNKNOWN : compare(operator, a, b) ? HOLDS : FAILS;
    };
  }
  if (typeof value === 'number') return numberTest(slot, operator, value);
  if (typeof value === 'string') {
    const same = operator === 'equal' ? HOLDS : FAILS;
    const different = operator === 'notEqual' ? HOLDS : FAILS;
    return (env) => {
      const state = env.fill(slot);
      if (state === PROBLEM) return UNKNOWN;
      return state === WORD && env.words[slot] === value ? same : different;
    };
  }
  const list: readonly FactValue[] = value;
  return (env) => {
    const actual = env.value(slot);
    return actual === null ? UNKNOWN : compare(operator, actual, list) ? HOLDS : FAILS;
  };
}

function numberTest(slot: number, operator: Comparison['operator'], value: number): ConditionTest {
  const test = (holds: (actual: number) => boolean): ConditionTest => {
    return (env) => {
      const state = env.fill(slot);
      if (state === PROBLEM) return UNKNOWN;
      if (state !== NUMBER) return operator === 'notEqual' ? HOLDS : FAILS;
      return holds(env.numbers[slot] as number) ? HOLDS : FAILS;
    };
  };
  switch (operator) {
    case 'lessThan':
      return test((actual) => actual < value);
    case 'lessThanInclusive':
      return test((actual) => actual <= value);
    case 'greaterThan':
      return test((actual) => actual > value);
    case 'greaterThanInclusive':
      return test((actual) => actual >= value);
    case 'equal':
      return test((actual) => actual === value);
    case 'notEqual':
      return test((actual) => actual !== value);
    default:
      return () => FAILS;
  }
}
