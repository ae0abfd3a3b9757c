import { Type, type Static } from '@sinclair/typebox';
import { closed, Formula, Id, oneOf, Provenance, Symbol, Text, Title, Unit } from './common.ts';
import { Condition } from './condition.ts';

/** A key handed to a table: a symbol's value, a formula, or a fixed word. */
export const KeyArgument = Type.Union([
  closed({ formula: Formula }),
  closed({ fact: Symbol }),
  closed({ word: Type.String({ maxLength: 64 }) }),
]);
export type KeyArgument = Static<typeof KeyArgument>;

/** What a case gives. */
export const Outcome = Type.Union([
  closed({ kind: Type.Literal('constant'), value: Type.Number() }),
  /** A word, for clauses of kind `class` (a computed key such as a size class). */
  closed({ kind: Type.Literal('word'), value: Type.String({ minLength: 1, maxLength: 64 }) }),
  closed({ kind: Type.Literal('formula'), formula: Formula }),
  closed({
    kind: Type.Literal('table'),
    table: Id,
    keys: Type.Array(KeyArgument, { minItems: 1, maxItems: 3 }),
  }),
  /** A deflection limit: span × fraction or span / divisor, with an absolute cap where there is one. */
  closed({
    kind: Type.Literal('spanLimit'),
    fraction: Type.Optional(Type.Number({ exclusiveMinimum: 0 })),
    divisor: Type.Optional(Type.Number({ exclusiveMinimum: 0 })),
    cap: Type.Optional(Type.Number({ exclusiveMinimum: 0 })),
  }),
  /** A guard: the member is not allowed; the check that needs this fails with the reason. */
  closed({ kind: Type.Literal('refuse'), reason: Text }),
]);
export type Outcome = Static<typeof Outcome>;

/** One way a clause can come out. Cases are tried in order; the last has no `when`. */
export const Case = closed({
  id: Id,
  title: Type.Optional(Title),
  when: Type.Optional(Condition),
  gives: Outcome,
  provenance: Provenance,
  note: Type.Optional(Text),
});
export type Case = Static<typeof Case>;

/** A named rule: symbol, reference, ordered cases. */
export const Clause = closed({
  id: Id,
  symbol: Symbol,
  title: Title,
  /** Number in the source, such as "2.10.6"; the firm's own number for its own clauses. */
  reference: Type.String({ maxLength: 80 }),
  kind: oneOf('factor', 'limit', 'quantity', 'class'),
  /** Coherent unit of the edition's system, "1" for pure numbers; "word" for kind `class`. */
  unit: Unit,
  /** The formula is published as printed in the edition's units and its dimensions are not checked. */
  empirical: Type.Optional(Type.Boolean()),
  /** The author holds that no two cases can apply at once; overlaps are then findings. */
  exclusive: Type.Optional(Type.Boolean()),
  /** For kind `class`: the words it can give. */
  words: Type.Optional(
    Type.Array(Type.String({ minLength: 1, maxLength: 64 }), { minItems: 1, maxItems: 50 }),
  ),
  cases: Type.Array(Case, { minItems: 1, maxItems: 60 }),
  note: Type.Optional(Text),
});
export type Clause = Static<typeof Clause>;
