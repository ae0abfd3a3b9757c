import type { CompiledEdition } from '#shared/basis/compile/plan.ts';
import type {
  ComparisonValue,
  Condition,
  Departure,
  Edition,
  Member,
  Operator,
  Provenance,
} from '#shared/basis/schema/index.ts';

/** Raised whenever a change of the engine alters any number of any result. */
export type EngineVersion = string;

/** Something wrong or doubtful, said for people and placed by JSON pointer. */
export interface Finding {
  severity: 'error' | 'warning' | 'note';
  /** Stable kebab-case code, such as `unknown-symbol`. */
  code: string;
  message: string;
  /** RFC 6901 pointer into the edition, or into the member where `in` says so. */
  pointer: string;
  in: 'edition' | 'member';
  /** Clause and case concerned, by id. */
  clause?: string;
  case?: string;
}

/**
 * How a condition came out, with what each comparison saw: the content of json-rules-engine's rule result,
 * with the verdicts of groups restored. `holds` is null where a fact without a value left it open;
 * `actual` is null where the fact has no value. `comparedWith`: what the fact named as `value` was.
 */
export type Evidence =
  | { group: 'all' | 'any' | 'not'; holds: boolean | null; of: readonly Evidence[] }
  | {
      fact: string;
      operator: Operator;
      value: ComparisonValue;
      comparedWith?: number | string | null;
      actual: number | string | null;
      holds: boolean | null;
    };

/** Why this case: the evidence of the cases before it (all false) and its own. */
export interface Choosing {
  case: string;
  title?: string;
  /** One per tried case in order; the otherwise case has none. */
  tried: readonly { case: string; holds: boolean | null; evidence: Evidence }[];
}

/** Where an entry's stored value stands: its source and whether a second person verified it. */
export interface Standing {
  source: string;
  sourceTitle: string;
  standing: Provenance['standing'];
  place?: string;
  note?: string;
  verified?: { by: string; on: string };
}

export type EntryKind =
  | 'input' // typed for the member: geometry, loads, choices, inputs
  | 'grade' // a value of the grade table
  | 'action' // a number an action carries
  | 'effect' // from the analysis: M, V, R, w and their parts
  | 'combination' // a factor on an action, or a fact of the combination such as its duration
  | 'factor'
  | 'limit'
  | 'quantity'
  | 'class'
  | 'check';

/** One line of the ledger. Everything a value was worked out from is another entry. */
export interface LedgerEntry {
  /** Position in the ledger, from 0; entries only use earlier ones. */
  n: number;
  kind: EntryKind;
  symbol: string;
  title: string;
  /** Exact value in `unit`; a word for classes and choices; null where refused. */
  value: number | string | null;
  unit: string;
  /** Clause number in its source. */
  reference?: string;
  clause?: string;
  choosing?: Choosing;
  /** The formula as written, in symbols. */
  formula?: string;
  /** The same with the numbers in it. */
  substituted?: string;
  /** For table look-ups: table, the keys used and how the value was found. */
  lookup?: { table: string; keys: readonly (number | string)[]; found: string };
  /** Symbol to entry: what the formula, the table keys or the condition looked at. */
  uses: Record<string, number>;
  standing?: Standing;
  departure?: { stored: number | null; reason: string; approvedBy?: string };
  /** Why there is no value. */
  refused?: string;
  /** Document in which `pointer` stands. */
  in: 'edition' | 'member';
  /** JSON pointer of the value's place; empty for what the analysis gives. */
  pointer: string;
}

export type VerdictWord = 'passes' | 'close' | 'fails' | 'none';

/** Where and under which combination a check was evaluated. */
export interface Instance {
  combination?: string;
  /** Label such as "span 1", "support 2, right side". */
  place?: string;
  x?: number;
  utilisation: number | null;
}

export interface CheckResult {
  id: string;
  title: string;
  reference: string;
  at: Edition['checks'][number]['at'];
  state?: string;
  word: VerdictWord;
  /** Of the governing instance; null where refused or not assessable. */
  utilisation: number | null;
  demand?: { value: number; unit: string; title: string };
  limit?: { value: number; unit: string; title: string };
  governing: Instance;
  /** Every combination's worst instance. */
  instances: readonly Instance[];
  /** Ledger position of this check's own entry (governing instance). */
  entry: number;
  refused?: string;
}

/** An expanded combination. */
export interface Combination {
  id: string;
  title: string;
  reference: string;
  pattern: string;
  state: string;
  duration: string;
  leading?: string;
  /** Action to factor, each with its ledger-ready formula. */
  terms: readonly { action: string; factor: number; formula: string }[];
}

export interface SupportReaction {
  support: number;
  x: number;
  /** Largest and smallest reaction over strength combinations, upward positive, coherent force unit. */
  most: { value: number; combination: string };
  least: { value: number; combination: string };
  /** Unfactored, by action, all spans loaded. */
  byAction: Readonly<Record<string, number>>;
  uplift: boolean;
}

/** Curves for the drawings, sampled from the exact pieces at fixed places, coherent units. */
export interface Curves {
  x: readonly number[];
  /** Per combination id and for the envelope. */
  byCombination: Readonly<
    Record<string, { V: readonly number[]; M: readonly number[]; w: readonly number[] }>
  >;
  envelope: {
    V: { most: readonly number[]; least: readonly number[] };
    M: { most: readonly number[]; least: readonly number[] };
    w: { most: readonly number[]; least: readonly number[] };
  };
  peaks: readonly { of: 'V' | 'M' | 'w'; x: number; value: number; combination: string }[];
}

export interface Driver {
  /** Ledger entry of the factor or input. */
  entry: number;
  symbol: string;
  title: string;
  kind: 'factor' | 'input';
  /** Factors: governing utilisation with the factor at 1. Inputs: d(ln U)/d(ln input). */
  effect: number;
}

/** The result document; canonicalised (RFC 8785) and hashed. */
export interface Result {
  schema: 'result/1';
  engine: EngineVersion;
  edition: { title: string; hash: string };
  member: { mark: string; hash: string };
  unitSystem: Edition['unitSystem'];
  verdict: {
    word: VerdictWord;
    check: string | null;
    utilisation: number | null;
    /** Why there is no verdict, when `none`. */
    because?: string;
  };
  checks: readonly CheckResult[];
  combinations: readonly Combination[];
  reactions: readonly SupportReaction[];
  ledger: readonly LedgerEntry[];
  /** How many stored values behind the governing ledger nobody verified, and departures. */
  marks: { unverified: number; departures: readonly Departure[] };
  findings: readonly Finding[];
  caution: string;
}

/** Least depth by each check and by all, at the member's breadth. */
export interface RequiredDepth {
  /** Per check: exact least depth, and rounded up to the whole millimetre (or 1/16 in). */
  byCheck: readonly {
    check: string;
    title: string;
    exact: number | null;
    rounded: number | null;
    why?: string;
  }[];
  all: { exact: number | null; rounded: number | null; why?: string };
  unit: string;
}

/** A section the firm can buy. */
export interface StockSection {
  id: string;
  /** Ordered and finished sizes, in the member's length unit. */
  nominal: { b: number; h: number };
  actual: { b: number; h: number };
  grades?: readonly string[];
  pricePerMetre?: number;
}

export interface FoundSection {
  section: StockSection;
  grade: string;
  pieces: number;
  word: VerdictWord;
  utilisation: number | null;
  check: string | null;
  /** Cross-section area (volume per unit length) and cost per metre where the price is known. */
  area: number;
  cost?: number;
}

/** Compiled edition. Opaque outside the engine, but for the edition itself and its hash. */
export type Plan = CompiledEdition;

export type CompileOutcome =
  { ok: true; plan: Plan; findings: readonly Finding[] } | { ok: false; findings: readonly Finding[] };

/*
 * The engine's public functions are in shared/engine/index.ts: compile, check, verdict, curves, drivers,
 * requiredDepth, nextInStock, findSections, runProofs, verify, resultHash. All pure and synchronous, none
 * throws. `attest` (json-rules-engine decides every decision again) is in shared/engine/attest.ts and
 * asynchronous.
 */
export type { Condition, Departure, Edition, Member };
