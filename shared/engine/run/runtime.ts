import type { Edition } from '#shared/basis/schema/index.ts';
import type { Level } from '#shared/basis/facts.ts';
import type { ExpansionMemo } from '../combine/memo.ts';
import type { ConditionTest } from '../decide/compileCondition.ts';
import type { RunClause } from './clause.ts';
import type { Dimension } from '#shared/units/units.ts';
import type { Context } from './context.ts';
import type { Env } from './env.ts';
import type { FormulaRun } from './formula.ts';

/** Where a symbol comes from; `index` is its position in that list of the edition. */
export interface RunSymbol {
  slot: number;
  symbol: string;
  title: string;
  unit: string;
  origin: 'builtIn' | 'choice' | 'input' | 'gradeColumn' | 'actionValue' | 'clause';
  index: number;
  level: Level;
}

/** A check ready to run. */
export interface RunCheck {
  index: number;
  check: Edition['checks'][number];
  kind: Edition['checks'][number]['at'];
  state: string | undefined;
  applies: { test: ConditionTest; symbols: readonly string[]; slots: readonly number[] } | null;
  demand: FormulaRun | null;
  limit: FormulaRun | null;
  utilisation: FormulaRun | null;
}

/** A compiled edition made ready to run, once for all its members. */
export interface Runtime {
  edition: Edition;
  symbols: readonly RunSymbol[];
  slotOf: ReadonlyMap<string, number>;
  clauses: readonly RunClause[];
  clauseAt: ReadonlyMap<number, RunClause>;
  checks: readonly RunCheck[];
  /** Positions in `checks` by state and kind of place, as "strength@moment". */
  checksAt: ReadonlyMap<string, readonly number[]>;
  /** Factors of combination patterns, by pattern and term. */
  factors: readonly (readonly FormulaRun[])[];
  /** Slots to empty when the combination changes: everything narrower than the member. */
  belowMember: Int32Array;
  /** Slots to empty when the place, or the action of a term, changes. */
  atPlace: Int32Array;
  atTerm: Int32Array;
  env: Env;
  /** Combinations written out before, by the actions carried and the factors on them. */
  expansions: ExpansionMemo;
  /** Where the evaluation stands; the slots' fillers read it. */
  context: { current: Context | null };
  /** Dimension of a symbol. */
  powersOf: (slot: number) => Dimension;
  /** Multiplier from a grade column's or input's unit to the edition's coherent unit. */
  columnFactors: readonly number[];
  inputFactors: readonly number[];
  /** Whether any condition or key looks at the pattern of the combination. */
  byPattern: boolean;
}
