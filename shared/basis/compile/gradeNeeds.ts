import { compare } from '../condition/compare.ts';
import type { Comparison, Condition, Edition, Grade } from '../schema/index.ts';
import type { ReadCheck, ReadClause } from './plan.ts';
import { symbolsOfOutcome } from './read.ts';
import { formulasOfCheck } from './usage.ts';

/** Beyond this many steps the grades are no longer told apart; then every grade may need everything. */
const mostSteps = 2_000_000;

/** Which properties the checks come to need for a grade, going only through cases that the grade allows. */
export class GradeNeeds {
  readonly #edition: Edition;
  readonly #checks: readonly ReadCheck[];
  readonly #clauses: ReadonlyMap<string, ReadClause>;
  readonly #bands: ReadonlyMap<string, readonly string[]>;
  readonly #apart: boolean;
  readonly #namesGrades: boolean;
  /** By what is known of a grade: what each check needs, in the order of the checks. */
  readonly #needs = new Map<string, ReadonlySet<string>[]>();

  constructor(
    edition: Edition,
    checks: readonly ReadCheck[],
    clauses: readonly ReadClause[],
    bands: ReadonlyMap<string, readonly string[]>,
  ) {
    this.#edition = edition;
    this.#checks = checks;
    this.#clauses = new Map(clauses.map((clause) => [clause.clause.symbol, clause]));
    this.#bands = bands;
    this.#apart = edition.grades.rows.length * checks.length * clauses.length <= mostSteps;
    this.#namesGrades = clauses.some(({ looksAt }) => looksAt.includes('grade'));
  }

  /** Titles of the checks that may need a property of a grade. */
  checksNeeding(grade: Grade, column: string): string[] {
    const known = this.#knownOf(grade);
    const key = JSON.stringify([...known]);
    const sets =
      this.#needs.get(key) ??
      this.#checks.map((check) => new Search(this.#clauses, this.#bands, known).of(this.#edition, check));
    this.#needs.set(key, sets);
    return this.#checks.flatMap(({ index }, i) =>
      sets[i]?.has(column) ? [this.#edition.checks[index]?.title ?? ''] : [],
    );
  }

  #knownOf(grade: Grade): Map<string, string> {
    const known = new Map<string, string>();
    if (!this.#apart) return known;
    for (const { symbol, scope, default: standard } of this.#edition.choices) {
      const option = scope === 'grade' ? (grade.choices[symbol] ?? standard) : undefined;
      if (option !== undefined) known.set(symbol, option);
    }
    if (this.#namesGrades) known.set('grade', grade.id);
    return known;
  }
}

/** A walk from a check through the clauses, with some words known. */
class Search {
  readonly #clauses: ReadonlyMap<string, ReadClause>;
  readonly #bands: ReadonlyMap<string, readonly string[]>;
  readonly #words: Map<string, string | null>;

  constructor(
    clauses: ReadonlyMap<string, ReadClause>,
    bands: ReadonlyMap<string, readonly string[]>,
    known: ReadonlyMap<string, string>,
  ) {
    this.#clauses = clauses;
    this.#bands = bands;
    this.#words = new Map(known);
  }

  of({ checks }: Edition, read: ReadCheck): ReadonlySet<string> {
    const found = new Set<string>();
    const applies = checks[read.index]?.applies;
    if (applies && this.#trial(applies) === false) return found;
    const open = [...formulasOfCheck(read), ...(applies ? this.#openFacts(applies) : [])];
    for (let symbol = open.pop(); symbol !== undefined; symbol = open.pop()) {
      if (found.has(symbol)) continue;
      found.add(symbol);
      open.push(...(this.#bands.get(symbol) ?? []), ...this.#next(symbol));
    }
    return found;
  }

  /** What a clause may look at, up to the first case that is certain to apply. */
  #next(symbol: string): string[] {
    const next: string[] = [];
    for (const { when, gives } of this.#clauses.get(symbol)?.cases ?? []) {
      const trial = when ? this.#trial(when) : true;
      if (trial === false) continue;
      if (when && trial === null) next.push(...this.#openFacts(when));
      next.push(...symbolsOfOutcome(gives));
      if (trial) break;
    }
    return next;
  }

  /** The word that a symbol is certain to have, or null. */
  #word(symbol: string): string | null {
    const known = this.#words.get(symbol);
    if (known !== undefined) return known;
    // Set first: a clause that comes back to itself has no certain word.
    this.#words.set(symbol, null);
    const word = this.#wordOfClause(symbol);
    this.#words.set(symbol, word);
    return word;
  }

  #wordOfClause(symbol: string): string | null {
    const clause = this.#clauses.get(symbol);
    if (clause?.clause.kind !== 'class') return null;
    for (const { when, gives } of clause.cases) {
      const trial = when ? this.#trial(when) : true;
      if (trial === false) continue;
      return trial && gives.kind === 'word' ? gives.value : null;
    }
    return null;
  }

  /** Whether a condition holds; null where that is not certain. */
  #trial(condition: Condition): boolean | null {
    if ('not' in condition) {
      const trial = this.#trial(condition.not);
      return trial === null ? null : !trial;
    }
    if ('all' in condition) return this.#group(condition.all, false);
    if ('any' in condition) return this.#group(condition.any, true);
    return this.#comparison(condition);
  }

  #group(conditions: readonly Condition[], settledBy: boolean): boolean | null {
    const trials = conditions.map((each) => this.#trial(each));
    if (trials.includes(settledBy)) return settledBy;
    return trials.includes(null) ? null : !settledBy;
  }

  #comparison({ fact, operator, value }: Comparison): boolean | null {
    const actual = this.#word(fact);
    if (actual === null) return null;
    if (typeof value === 'object' && 'fact' in value) {
      const other = this.#word(value.fact);
      return other === null ? null : compare(operator, actual, other);
    }
    return compare(operator, actual, value);
  }

  /** Facts that leave a condition open. */
  #openFacts(condition: Condition): string[] {
    if (this.#trial(condition) !== null) return [];
    if ('not' in condition) return this.#openFacts(condition.not);
    const group = 'all' in condition ? condition.all : 'any' in condition ? condition.any : null;
    if (group) return group.flatMap((each) => this.#openFacts(each));
    const { fact, value } = condition as Comparison;
    return typeof value === 'object' && 'fact' in value ? [fact, value.fact] : [fact];
  }
}
