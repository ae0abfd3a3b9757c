import { Type } from '@sinclair/typebox';
import { closed, oneOf, Symbol } from './common.ts';

/** The operators of json-rules-engine that editions may use. */
export const operators = [
  'equal',
  'notEqual',
  'in',
  'notIn',
  'lessThan',
  'lessThanInclusive',
  'greaterThan',
  'greaterThanInclusive',
] as const;
export type Operator = (typeof operators)[number];

/** What a fact is compared with: a number, a word, a list of either, or another fact. */
export type ComparisonValue = number | string | readonly (number | string)[] | { fact: string };

/** One comparison, in json-rules-engine's own format (no path, params, priority or names). */
export interface Comparison {
  fact: string;
  operator: Operator;
  value: ComparisonValue;
}

/** A condition in json-rules-engine's own format. Numbers are in the edition's coherent units. */
export type Condition =
  { all: readonly Condition[] } | { any: readonly Condition[] } | { not: Condition } | Comparison;

const Scalar = Type.Union([Type.Number(), Type.String({ maxLength: 64 })]);

/** A place where a condition may stand; resolves to `#/$defs/Condition` of the document. */
export const Condition = Type.Unsafe<Condition>({ $ref: '#/$defs/Condition' });

/** The definition behind `Condition`, put into `$defs` of each document that uses it. */
export const ConditionDefinition = Type.Union(
  [
    closed({ all: Type.Array(Condition, { minItems: 1, maxItems: 50 }) }),
    closed({ any: Type.Array(Condition, { minItems: 1, maxItems: 50 }) }),
    closed({ not: Condition }),
    closed({
      fact: Symbol,
      operator: oneOf(...operators),
      value: Type.Union([
        Scalar,
        Type.Array(Scalar, { minItems: 1, maxItems: 100 }),
        closed({ fact: Symbol }),
      ]),
    }),
  ],
  { description: 'A condition: all, any or not of conditions, or one comparison of a fact with a value.' },
);
