import type { Condition } from '#shared/basis/schema/index.ts';
import type { Evidence } from '../types.ts';
import { compare, type FactValue } from '#shared/basis/condition/compare.ts';

/** Reads a fact for the record; null where it has no value. */
export type ReadFact = (symbol: string) => FactValue | null;

/**
 * How a condition comes out, every comparison looked at, as json-rules-engine does it within a group of
 * one priority. `holds` is null where a fact that decides has no value.
 */
export function evidenceOf(condition: Condition, read: ReadFact): Evidence {
  if ('all' in condition) {
    const of = condition.all.map((each) => evidenceOf(each, read));
    return { group: 'all', holds: every(of), of };
  }
  if ('any' in condition) {
    const of = condition.any.map((each) => evidenceOf(each, read));
    return { group: 'any', holds: some(of), of };
  }
  if ('not' in condition) {
    const inner = evidenceOf(condition.not, read);
    return { group: 'not', holds: inner.holds === null ? null : !inner.holds, of: [inner] };
  }
  const { fact, operator, value } = condition;
  const actual = read(fact);
  if (typeof value === 'object' && 'fact' in value) {
    const other = read(value.fact);
    const holds = actual === null || other === null ? null : compare(operator, actual, other);
    return { fact, operator, value, comparedWith: other, actual, holds };
  }
  return { fact, operator, value, actual, holds: actual === null ? null : compare(operator, actual, value) };
}

function every(of: readonly Evidence[]): boolean | null {
  if (of.some((each) => each.holds === false)) return false;
  return of.some((each) => each.holds === null) ? null : true;
}

function some(of: readonly Evidence[]): boolean | null {
  if (of.some((each) => each.holds === true)) return true;
  return of.some((each) => each.holds === null) ? null : false;
}
