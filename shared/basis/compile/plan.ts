import type { Dimension } from '#shared/units/units.ts';
import type { FactRange, Level, PlaceKind } from '../facts.ts';
import type { Ast } from '../formula/ast.ts';
import type { Clause, Condition, Edition } from '../schema/index.ts';
import type { PreparedTable } from '../table/lookUp.ts';

export type Origin = 'builtIn' | 'choice' | 'input' | 'gradeColumn' | 'actionValue' | 'clause';

/** A symbol of the edition: what it is and where it is known. */
export interface SymbolInfo {
  symbol: string;
  title: string;
  origin: Origin;
  /** Position in the edition's list of that origin, or among the built-in facts. */
  index: number;
  /** Coherent unit; "word" for words. */
  unit: string;
  /** Of a number; absent for a word. */
  dimension?: Dimension;
  /** What a word can be, where that is known. */
  words?: readonly string[];
  /** What a number can be, in the unit above, where it has bounds. */
  range?: FactRange;
  /** Widest level at which it is constant. */
  level: Level;
  /** Kinds of check where it exists, for the level `place`. */
  at?: readonly PlaceKind[];
  /** JSON pointer of where it is declared; empty for built-in facts. */
  pointer: string;
}

/** A formula read and ready to be compiled to slots. */
export interface ReadFormula {
  text: string;
  ast: Ast;
  symbols: readonly string[];
}

export type ReadKey =
  | { kind: 'formula'; formula: ReadFormula }
  | { kind: 'fact'; symbol: string }
  | { kind: 'word'; value: string };

export type ReadOutcome =
  | { kind: 'constant'; value: number }
  | { kind: 'word'; value: string }
  | { kind: 'formula'; formula: ReadFormula }
  | { kind: 'table'; table: PreparedTable; keys: readonly ReadKey[] }
  | { kind: 'spanLimit'; fraction?: number; divisor?: number; cap?: number }
  | { kind: 'refuse'; reason: string };

export interface ReadCase {
  when?: Condition;
  /** Facts the condition names. */
  facts: readonly string[];
  gives: ReadOutcome;
}

export interface ReadClause {
  clause: Clause;
  /** Position in `edition.clauses`. */
  index: number;
  level: Level;
  cases: readonly ReadCase[];
  /** Every symbol that its cases look at. */
  looksAt: readonly string[];
}

export interface ReadCheck {
  index: number;
  demand?: ReadFormula;
  limit?: ReadFormula;
  utilisation?: ReadFormula;
}

/** An edition that was read without errors. */
export interface CompiledEdition {
  edition: Edition;
  /** SHA-256 over the RFC 8785 form. */
  hash: string;
  symbols: ReadonlyMap<string, SymbolInfo>;
  /** In an order in which each clause only looks at earlier ones. */
  clauses: readonly ReadClause[];
  checks: readonly ReadCheck[];
  /** Factors of combination patterns, by pattern and term. */
  factors: readonly (readonly ReadFormula[])[];
  tables: ReadonlyMap<string, PreparedTable>;
}
