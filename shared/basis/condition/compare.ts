import type { Operator } from '../schema/index.ts';

/** A fact's value in a decision. */
export type FactValue = number | string;

/**
 * One comparison as json-rules-engine makes it. Facts are typed when an edition is compiled, so a text
 * never meets a number operator here; should it, the comparison does not hold, as there.
 */
export function compare(
  operator: Operator,
  actual: FactValue,
  expected: FactValue | readonly FactValue[],
): boolean {
  switch (operator) {
    case 'equal':
      return actual === expected;
    case 'notEqual':
      return actual !== expected;
    case 'in':
      return Array.isArray(expected) && expected.includes(actual);
    case 'notIn':
      return Array.isArray(expected) && !expected.includes(actual);
    default:
      return (
        typeof actual === 'number' && typeof expected === 'number' && inOrder(operator, actual, expected)
      );
  }
}

function inOrder(operator: Operator, actual: number, expected: number): boolean {
  switch (operator) {
    case 'lessThan':
      return actual < expected;
    case 'lessThanInclusive':
      return actual <= expected;
    case 'greaterThan':
      return actual > expected;
    default:
      return actual >= expected;
  }
}
