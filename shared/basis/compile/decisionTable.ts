import { canonical } from '../hash.ts';
import type { Case, Clause } from '../schema/index.ts';
import { Bits } from './bits.ts';
import type { Findings } from './findings.ts';
import { partition, type Partition } from './partition.ts';
import type { SymbolInfo } from './plan.ts';

/*
 * The checks that the literature on decision tables asks for: identical, equivalent and subsumed cases,
 * contradictory outcomes, overlaps, cases that could be joined, and missing cases.
 */

/** Situations looked at for one clause; beyond that the clause is too wide to be searched. */
const mostSituations = 20_000;

/** Comparisons made for a whole edition, so that compiling never holds up anyone. */
export class SearchBudget {
  #left = 30_000_000;

  /** Whether there is enough left; takes it. */
  take(work: number): boolean {
    if (work > this.#left) return false;
    this.#left -= work;
    return true;
  }
}

/** What each case takes of all situations. */
interface Survey {
  total: number;
  /** Where the condition of a case holds. */
  holds: readonly Bits[];
  /** How many situations come to a case first. */
  first: readonly number[];
  /** Whether something would come out otherwise if the case were left out. */
  needed: readonly boolean[];
  /** A situation that no case takes, in words. */
  uncovered: string | null;
}

function survey(cases: readonly Case[], outcomes: readonly string[], space: Partition): Survey {
  const tests = cases.map(({ when }) => (when ? space.testOf(when) : () => true));
  const holds = cases.map(() => new Bits(space.count));
  const first = cases.map(() => 0);
  const needed = cases.map(() => false);
  let uncovered: string | null = null;
  let total = 0;
  for (const situation of space.situations()) {
    let taker = -1;
    let next = -1;
    tests.forEach((test, i) => {
      if (!test(situation)) return;
      holds[i]?.add(total);
      if (taker < 0) taker = i;
      else if (next < 0) next = i;
    });
    if (taker < 0) uncovered ??= space.say(situation);
    else {
      first[taker] = (first[taker] as number) + 1;
      if (next < 0 || outcomes[next] !== outcomes[taker]) needed[taker] = true;
    }
    total += 1;
  }
  return { total, holds, first, needed, uncovered };
}

/** Runs the checks on one clause and writes what it finds. */
export function checkCases(
  clause: Clause,
  index: number,
  symbols: ReadonlyMap<string, SymbolInfo>,
  findings: Findings,
  budget: SearchBudget,
): void {
  const pointer = `/clauses/${index}`;
  const { cases, title, id } = clause;
  const where = { clause: id };
  const hasOtherwise = cases[cases.length - 1]?.when === undefined;
  const space = partition(
    cases.flatMap(({ when }) => (when ? [when] : [])),
    symbols,
  );
  const work = space.count * (space.comparisons + cases.length) + (space.count * cases.length ** 2) / 32;
  if (space.count > mostSituations || !budget.take(work)) {
    if (!hasOtherwise) {
      const message = `“${title}” has no last case without a condition, and it looks at too many facts to tell whether its cases cover everything. Add such a case.`;
      findings.error('missing-otherwise', `${pointer}/cases`, message, where);
    } else if (cases.length > 2) {
      const message = `The cases of “${title}” were not compared with each other: they look at too many facts at once.`;
      findings.note('cases-not-searched', pointer, message, where);
    }
    return;
  }
  const outcomes = cases.map(({ gives }) => canonical(gives));
  const found = survey(cases, outcomes, space);
  if (found.uncovered !== null) {
    const situation = found.uncovered || 'anything';
    const message = `“${title}” has no case for ${situation}. Add one, or a last case without a condition.`;
    findings.error('missing-otherwise', `${pointer}/cases`, message, where);
  }
  new Comparing(clause, pointer, outcomes, space.related, found, findings).run();
}

/** Compares the cases of one clause with each other. */
class Comparing {
  readonly #clause: Clause;
  readonly #pointer: string;
  readonly #outcomes: readonly string[];
  readonly #related: boolean;
  readonly #found: Survey;
  readonly #findings: Findings;

  constructor(
    clause: Clause,
    pointer: string,
    outcomes: readonly string[],
    related: boolean,
    found: Survey,
    findings: Findings,
  ) {
    this.#clause = clause;
    this.#pointer = pointer;
    this.#outcomes = outcomes;
    this.#related = related;
    this.#found = found;
    this.#findings = findings;
  }

  run(): void {
    this.#clause.cases.forEach((late, j) => {
      if (late.when && this.#holds(j).size === 0) {
        this.#say(
          'warning',
          'never-holds',
          j,
          `Case “${late.id}” of “${this.#clause.title}” can never hold.`,
        );
        return;
      }
      const told = this.#pairs(j);
      if (told) return;
      if (this.#found.first[j] === 0) this.#unreachable(j);
      else if (late.when && this.#found.needed[j] === false && !this.#hasTwin(j)) {
        const message = `Case “${late.id}” of “${this.#clause.title}” could be left out: the cases after it give the same.`;
        this.#say('note', 'subsumed-case', j, message);
      }
    });
  }

  #holds(i: number): Bits {
    return this.#found.holds[i] as Bits;
  }

  #say(severity: 'error' | 'warning' | 'note', code: string, j: number, message: string): void {
    const id = this.#clause.cases[j]?.id ?? '';
    this.#findings[severity](code, `${this.#pointer}/cases/${j}`, message, {
      clause: this.#clause.id,
      case: id,
    });
  }

  /** Compares a case with each before it; whether that already says why it is never reached. */
  #pairs(j: number): boolean {
    const { cases, title } = this.#clause;
    const late = cases[j] as Case;
    if (!late.when) return false;
    let told = false;
    for (let i = 0; i < j; i += 1) {
      const early = cases[i] as Case;
      if (!early.when || this.#holds(i).size === 0) continue;
      const names = `“${early.id}” and “${late.id}” of “${title}”`;
      const [own, other] = [this.#holds(j), this.#holds(i)];
      const common = own.common(other);
      const alike = this.#outcomes[i] === this.#outcomes[j];
      if (common === own.size && common === other.size) {
        this.#same(j, names, canonical(early.when) === canonical(late.when), alike);
        told = true;
      } else if (common > 0 && this.#clause.exclusive) this.#overlap(j, names);
      else if (common === own.size && alike) {
        const message = `Case “${late.id}” of “${title}” is contained in “${early.id}” and gives the same.`;
        this.#say('note', 'subsumed-case', j, message);
        told = true;
      } else if (common === 0 && alike && j === i + 1 && own.size + other.size < this.#found.total) {
        this.#say('note', 'joinable-cases', j, `Cases ${names} give the same and could be joined into one.`);
      }
    }
    return told;
  }

  #same(j: number, names: string, written: boolean, alike: boolean): void {
    if (!alike) {
      const message = written
        ? `Cases ${names} have one condition and different outcomes.`
        : `Cases ${names} hold in the same situations and give different outcomes.`;
      this.#say('error', 'contradictory-cases', j, message);
    } else if (written) this.#say('warning', 'identical-cases', j, `Cases ${names} are identical.`);
    else {
      const message = `Cases ${names} hold in the same situations and give the same.`;
      this.#say('warning', 'equivalent-cases', j, message);
    }
  }

  /** Facts that hang together may never meet in the way an overlap needs; then it is only likely. */
  #overlap(j: number, names: string): void {
    const claim = 'and the clause says that they exclude each other';
    if (this.#related) {
      const message = `Cases ${names} look as if they could hold at once, ${claim}. Check that they can’t.`;
      this.#say('warning', 'overlap', j, message);
    } else this.#say('error', 'overlap', j, `Cases ${names} can hold at once, ${claim}.`);
  }

  /** Whether a later case holds in the same situations; that is said of the later one. */
  #hasTwin(i: number): boolean {
    const own = this.#holds(i);
    return this.#clause.cases.some((late, j) => {
      if (j <= i || !late.when) return false;
      const other = this.#holds(j);
      return own.size === other.size && own.common(other) === own.size;
    });
  }

  #unreachable(j: number): void {
    const { cases, title } = this.#clause;
    const late = cases[j] as Case;
    const own = this.#holds(j);
    const before = cases.slice(0, j).find((_, i) => own.common(this.#holds(i)) === own.size);
    const by = before
      ? ` Case “${before.id}” always holds before it.`
      : ' The cases before it take everything.';
    this.#say('warning', 'unreachable-case', j, `Case “${late.id}” of “${title}” is never reached.${by}`);
  }
}
