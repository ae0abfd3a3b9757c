import { compileFormula } from '#shared/basis/formula/evaluate.ts';
import type {
  CompiledEdition,
  ReadCase,
  ReadCheck,
  ReadClause,
  ReadFormula,
  ReadKey,
  ReadOutcome,
} from '#shared/basis/compile/plan.ts';
import type { Condition } from '#shared/basis/schema/index.ts';
import { pure } from '#shared/units/units.ts';
import { ExpansionMemo } from '../combine/memo.ts';
import { compileCondition, factsOf } from '../decide/compileCondition.ts';
import { inputAt } from '../member/inputs.ts';
import { factorOf } from '../member/units.ts';
import { fillBuiltIn } from './builtIns.ts';
import { fillClause, type RunCase, type RunClause, type RunKey, type RunOutcome } from './clause.ts';
import type { Context } from './context.ts';
import { Env, type Filler } from './env.ts';
import type { FormulaRun } from './formula.ts';
import { fillGradeValue } from './grade.ts';
import type { RunCheck, Runtime, RunSymbol } from './runtime.ts';
import { readTable } from './tables.ts';

/** Makes a compiled edition ready to run: closures over slots. */
export function buildRuntime(plan: CompiledEdition): Runtime {
  const { edition } = plan;
  const symbols = [...plan.symbols.values()].map((info, slot): RunSymbol => {
    const { symbol, title, unit, origin, index, level } = info;
    return { slot, symbol, title, unit, origin, index, level };
  });
  const slots = new Map(symbols.map(({ symbol, slot }) => [symbol, slot]));
  const dimensions = [...plan.symbols.values()].map(({ dimension }) => dimension ?? pure);
  const ready = new Preparing((symbol) => {
    const slot = slots.get(symbol);
    if (slot === undefined) throw new RangeError(`The edition has no symbol ${symbol}.`);
    return slot;
  });
  const clauses = plan.clauses.map((clause) => ready.clause(clause));
  const checks = plan.checks.map((check) => ready.check(check, edition.checks[check.index]));
  const context: Runtime['context'] = { current: null };
  const runtime: Omit<Runtime, 'env'> = {
    edition,
    symbols,
    slotOf: slots,
    clauses,
    clauseAt: new Map(clauses.map((run) => [run.slot, run])),
    checks,
    checksAt: byStateAndKind(checks),
    expansions: new ExpansionMemo(),
    factors: plan.factors.map((terms) => terms.map((factor) => ready.formula(factor))),
    belowMember: slotsAt(symbols, ['combination', 'term', 'place']),
    atPlace: slotsAt(symbols, ['place']),
    atTerm: slotsAt(symbols, ['term']),
    context,
    powersOf: (slot) => dimensions[slot] ?? pure,
    columnFactors: edition.grades.columns.map(({ unit }) => factorOf(unit, edition.unitSystem)),
    inputFactors: edition.inputs.map(({ unit }) => factorOf(unit, edition.unitSystem)),
    byPattern: looksAt(plan, 'combination'),
  };
  const fillers = symbols.map((symbol) => fillerOf(symbol, () => whole, context));
  const whole: Runtime = { ...runtime, env: new Env(fillers) };
  return whole;
}

function byStateAndKind(checks: readonly RunCheck[]): Map<string, number[]> {
  const found = new Map<string, number[]>();
  checks.forEach(({ kind, state }, i) => {
    const key = `${state ?? ''}@${kind}`;
    const known = found.get(key);
    if (known) known.push(i);
    else found.set(key, [i]);
  });
  return found;
}

function slotsAt(symbols: readonly RunSymbol[], levels: readonly RunSymbol['level'][]): Int32Array {
  return Int32Array.from(symbols.filter(({ level }) => levels.includes(level)).map(({ slot }) => slot));
}

/** Whether a clause or check anywhere looks at a symbol. */
function looksAt({ clauses, checks, edition }: CompiledEdition, symbol: string): boolean {
  return (
    clauses.some((clause) => clause.looksAt.includes(symbol)) ||
    edition.checks.some(({ applies }) => applies !== undefined && factsOf(applies).includes(symbol)) ||
    checks.some((check) =>
      [check.demand, check.limit, check.utilisation].some((formula) => formula?.symbols.includes(symbol)),
    )
  );
}

/** Turns the parts of an edition into closures over slots. */
class Preparing {
  readonly #slotOf: (symbol: string) => number;

  constructor(slotOf: (symbol: string) => number) {
    this.#slotOf = slotOf;
  }

  formula({ text, ast, symbols }: ReadFormula): FormulaRun {
    return {
      text,
      symbols,
      slots: Int32Array.from(symbols, this.#slotOf),
      run: compileFormula(ast, this.#slotOf),
    };
  }

  condition(condition: Condition) {
    const symbols = factsOf(condition);
    return {
      test: compileCondition(condition, this.#slotOf),
      symbols,
      slots: symbols.map(this.#slotOf),
    };
  }

  clause({ clause, index, cases }: ReadClause): RunClause {
    return { index, clause, slot: this.#slotOf(clause.symbol), cases: cases.map((each) => this.#case(each)) };
  }

  #case({ when, gives }: ReadCase): RunCase {
    const made = this.#outcome(gives);
    if (!when) return { test: null, symbols: [], slots: [], gives: made };
    return { ...this.condition(when), gives: made };
  }

  check({ index, demand, limit, utilisation }: ReadCheck, check: RunCheck['check'] | undefined): RunCheck {
    if (!check) throw new RangeError(`The edition has no check ${index}.`);
    return {
      index,
      check,
      kind: check.at,
      state: check.state,
      applies: check.applies ? this.condition(check.applies) : null,
      demand: demand ? this.formula(demand) : null,
      limit: limit ? this.formula(limit) : null,
      utilisation: utilisation ? this.formula(utilisation) : null,
    };
  }

  #outcome(gives: ReadOutcome): RunOutcome {
    switch (gives.kind) {
      case 'constant':
      case 'word':
      case 'refuse':
        return gives;
      case 'formula':
        return { kind: 'formula', formula: this.formula(gives.formula) };
      case 'spanLimit':
        return { kind: 'spanLimit', length: this.#slotOf('L'), ...spanLimit(gives) };
      default: {
        const keys = gives.keys.map((key) => this.#key(key));
        return { kind: 'table', keys, at: keys.map(() => 0), ...readTable(gives.table) };
      }
    }
  }

  #key(key: ReadKey): RunKey {
    if (key.kind === 'formula') return { kind: 'formula', formula: this.formula(key.formula) };
    return key.kind === 'fact' ? { ...key, slot: this.#slotOf(key.symbol) } : key;
  }
}

/** A limit from the span, as formula and as function. */
function spanLimit({ fraction, divisor, cap }: Extract<ReadOutcome, { kind: 'spanLimit' }>) {
  const share = (length: number) =>
    fraction === undefined ? length / (divisor ?? Number.NaN) : length * fraction;
  const text = fraction === undefined ? `L / ${String(divisor)}` : `L * ${String(fraction)}`;
  return cap === undefined
    ? { formula: text, of: share }
    : { formula: `min(${text}, ${String(cap)})`, of: (length: number) => Math.min(share(length), cap) };
}

function fillerOf(symbol: RunSymbol, runtime: () => Runtime, context: Runtime['context']): Filler {
  const { slot, symbol: name, title, origin, index } = symbol;
  const at = () => context.current as Context;
  switch (origin) {
    case 'builtIn':
      return (env) => {
        fillBuiltIn(env, slot, name, title, at());
      };
    case 'choice':
      return (env) => {
        const option = at().given.choices[name] ?? null;
        if (option === null) {
          env.setProblem(slot, { kind: 'missing', symbol: name, message: `${title} has not been chosen.` });
        } else env.setWord(slot, option);
      };
    case 'input':
      return (env) => {
        const { given, place } = at();
        const value = inputAt(runtime(), given, index, place);
        if (value === null) {
          env.setProblem(slot, { kind: 'missing', symbol: name, message: `${title} has not been entered.` });
        } else env.setNumber(slot, value);
      };
    case 'gradeColumn':
      return (env) => {
        const { columnFactors, slotOf } = runtime();
        const factor = columnFactors[index] ?? 1;
        fillGradeValue(env, slot, name, title, at().given.grade, factor, (by) => slotOf.get(by) ?? -1);
      };
    case 'actionValue':
      return (env) => {
        const { action, edition } = at();
        const value = edition.actions[action]?.values[name];
        if (value !== undefined) env.setNumber(slot, value);
        else {
          env.setProblem(slot, {
            kind: 'missing',
            symbol: name,
            message: `${edition.actions[action]?.title ?? 'An action'} has no ${title.toLowerCase()} (${name}).`,
          });
        }
      };
    default:
      return (env) => {
        const { overrides } = at();
        const override = overrides?.get(slot);
        if (override !== undefined) env.setNumber(slot, override);
        else fillClause(runtime().clauseAt.get(slot) as RunClause, env);
      };
  }
}
