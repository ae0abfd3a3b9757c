import { Type, type Static } from '@sinclair/typebox';
import { Action, ActionValue, CombinationPattern, Duration } from './actions.ts';
import { AnalysisRules, Check } from './checks.ts';
import { Clause } from './clause.ts';
import { closed, Id, oneOf, Provenance, Source, Symbol, Text, Title, Unit } from './common.ts';
import { ConditionDefinition } from './condition.ts';
import { Choice, Grades, Input } from './materials.ts';
import { Member } from './member.ts';
import { Table } from './table.ts';

/** A known answer which the edition must reproduce before it can be released. */
export const Proof = closed({
  id: Id,
  title: Title,
  member: Member,
  expect: Type.Array(
    closed({
      check: Id,
      /** What is compared: the governing utilisation, demand or limit of the check, or a clause's value
       *  behind it, by symbol. */
      of: Type.Union([oneOf('utilisation', 'demand', 'limit'), closed({ symbol: Symbol })]),
      value: Type.Number(),
      unit: Unit,
      /** Largest allowed absolute difference. */
      tolerance: Type.Number({ exclusiveMinimum: 0 }),
      why: Type.Optional(Text),
    }),
    { minItems: 1, maxItems: 40 },
  ),
  verdict: Type.Optional(oneOf('passes', 'close', 'fails')),
  provenance: Provenance,
  note: Type.Optional(Text),
});
export type Proof = Static<typeof Proof>;

/** One numbered state of a basis, as data. */
export const Edition = Type.Object(
  {
    schema: Type.Literal('edition/1'),
    title: Title,
    /** What it is for, in a sentence or two. */
    purpose: Text,
    /** Allowable or permissible stress, limit state. */
    method: Title,
    /** Shown with each result beside the usual caution. */
    caution: Text,
    /** Coherent units of formulas: metric mm, N, N/mm2, kg/m3; inch-pound in, lbf, psi, lb/ft3. */
    unitSystem: oneOf('metric', 'inch-pound'),
    sources: Type.Array(Source, { minItems: 1, maxItems: 200 }),
    durations: Type.Array(Duration, { minItems: 1, maxItems: 20 }),
    choices: Type.Array(Choice, { maxItems: 60 }),
    inputs: Type.Array(Input, { maxItems: 60 }),
    actionValues: Type.Array(ActionValue, { maxItems: 20 }),
    actions: Type.Array(Action, { minItems: 1, maxItems: 40 }),
    combinations: Type.Array(CombinationPattern, { minItems: 1, maxItems: 60 }),
    grades: Grades,
    tables: Type.Array(Table, { maxItems: 200 }),
    clauses: Type.Array(Clause, { maxItems: 400 }),
    analysis: AnalysisRules,
    checks: Type.Array(Check, { minItems: 1, maxItems: 60 }),
    proofs: Type.Array(Proof, { maxItems: 200 }),
  },
  {
    additionalProperties: false,
    $schema: 'https://json-schema.org/draft/2020-12/schema',
    title: 'Ledgerbeam edition',
    $defs: { Condition: ConditionDefinition },
  },
);
export type Edition = Static<typeof Edition>;
