import { type Static, type TSchema, Type } from '@sinclair/typebox';
import { closed, Departure, oneOf, operators, Provenance } from '#shared/basis/schema/index.ts';
import type { Evidence, Result } from './types.ts';

/*
 * The published JSON Schema of the result document. `types.ts` has the same shapes for programs; the
 * assignment at the end and the test beside hold the two together.
 */

const Text = Type.String();
const Optional = Type.Optional;
const nullable = <T extends TSchema>(type: T) => Type.Union([type, Type.Null()]);
const list = <T extends TSchema>(type: T) => Type.Array(type);
const NumberOrWord = Type.Union([Type.Number(), Type.String()]);
const word = oneOf('passes', 'close', 'fails', 'none');
const document = oneOf('edition', 'member');
const utilisation = nullable(Type.Number());
const measured = closed({ value: Type.Number(), unit: Text, title: Text });

const EvidenceReference = Type.Unsafe<Evidence>({ $ref: '#/$defs/Evidence' });
const EvidenceDefinition = Type.Union([
  closed({
    group: oneOf('all', 'any', 'not'),
    holds: nullable(Type.Boolean()),
    of: list(EvidenceReference),
  }),
  closed({
    fact: Text,
    operator: oneOf(...operators),
    value: Type.Union([NumberOrWord, list(NumberOrWord), closed({ fact: Text })]),
    comparedWith: Optional(nullable(NumberOrWord)),
    actual: nullable(NumberOrWord),
    holds: nullable(Type.Boolean()),
  }),
]);

const Finding = closed({
  severity: oneOf('error', 'warning', 'note'),
  code: Text,
  message: Text,
  pointer: Text,
  in: document,
  clause: Optional(Text),
  case: Optional(Text),
});

const Standing = closed({
  source: Text,
  sourceTitle: Text,
  standing: Provenance.properties.standing,
  place: Optional(Text),
  note: Optional(Text),
  verified: Optional(closed({ by: Text, on: Text })),
});

const Choosing = closed({
  case: Text,
  title: Optional(Text),
  tried: list(closed({ case: Text, holds: nullable(Type.Boolean()), evidence: EvidenceReference })),
});

const LedgerEntry = closed({
  n: Type.Integer({ minimum: 0 }),
  kind: oneOf(
    'input',
    'grade',
    'action',
    'effect',
    'combination',
    'factor',
    'limit',
    'quantity',
    'class',
    'check',
  ),
  symbol: Text,
  title: Text,
  value: nullable(NumberOrWord),
  unit: Text,
  reference: Optional(Text),
  clause: Optional(Text),
  choosing: Optional(Choosing),
  formula: Optional(Text),
  substituted: Optional(Text),
  lookup: Optional(closed({ table: Text, keys: list(NumberOrWord), found: Text })),
  uses: Type.Record(Text, Type.Integer({ minimum: 0 })),
  standing: Optional(Standing),
  departure: Optional(closed({ stored: nullable(Type.Number()), reason: Text, approvedBy: Optional(Text) })),
  refused: Optional(Text),
  in: document,
  pointer: Text,
});

const Instance = closed({
  combination: Optional(Text),
  place: Optional(Text),
  x: Optional(Type.Number()),
  utilisation,
});

const CheckResult = closed({
  id: Text,
  title: Text,
  reference: Text,
  at: oneOf('moment', 'shear', 'support', 'deflection', 'member'),
  state: Optional(Text),
  word,
  utilisation,
  demand: Optional(measured),
  limit: Optional(measured),
  governing: Instance,
  instances: list(Instance),
  entry: Type.Integer({ minimum: 0 }),
  refused: Optional(Text),
});

const Combination = closed({
  id: Text,
  title: Text,
  reference: Text,
  pattern: Text,
  state: Text,
  duration: Text,
  leading: Optional(Text),
  terms: list(closed({ action: Text, factor: Type.Number(), formula: Text })),
});

const reaction = closed({ value: Type.Number(), combination: Text });
const SupportReaction = closed({
  support: Type.Integer({ minimum: 0 }),
  x: Type.Number(),
  most: reaction,
  least: reaction,
  byAction: Type.Record(Text, Type.Number()),
  uplift: Type.Boolean(),
});

/** JSON Schema of the result document. */
export const ResultSchema = Type.Object(
  {
    schema: Type.Literal('result/1'),
    engine: Text,
    edition: closed({ title: Text, hash: Text }),
    member: closed({ mark: Text, hash: Text }),
    unitSystem: oneOf('metric', 'inch-pound'),
    verdict: closed({ word, check: nullable(Text), utilisation, because: Optional(Text) }),
    checks: list(CheckResult),
    combinations: list(Combination),
    reactions: list(SupportReaction),
    ledger: list(LedgerEntry),
    marks: closed({ unverified: Type.Integer({ minimum: 0 }), departures: list(Departure) }),
    findings: list(Finding),
    caution: Text,
  },
  {
    additionalProperties: false,
    $schema: 'https://json-schema.org/draft/2020-12/schema',
    title: 'Ledgerbeam result',
    $defs: { Evidence: EvidenceDefinition },
  },
);

/** A document of the schema is a result: what is read from storage can be used as one. */
export const asResult = (document: Static<typeof ResultSchema>): Result => document;
