import { whyNotFinite } from '#shared/basis/formula/explain.ts';
import { parseFormula } from '#shared/basis/formula/parse.ts';
import { type Env, NUMBER, PROBLEM, type Problem } from './env.ts';

/** A formula ready to run over slots. */
export interface FormulaRun {
  /** As written. */
  text: string;
  /** Symbols it names, each once, and their slots in the same order. */
  symbols: readonly string[];
  slots: Int32Array;
  /** Works on the numbers of the slots; not finite where the arithmetic has no answer. */
  run: (numbers: Float64Array) => number;
}

/** Not a number, with the reason beside it. */
export const NO_VALUE = Number.NaN;

/**
 * Value of a formula. A formula needs every symbol that it names, also in the branch not taken. Gives
 * `NO_VALUE` where one has no value or the arithmetic no answer; `whyNot` then says why.
 */
export function evaluate(formula: FormulaRun, env: Env): number {
  const { slots } = formula;
  for (let i = 0; i < slots.length; i += 1) {
    if (env.fill(slots[i] as number) !== NUMBER) return NO_VALUE;
  }
  const value = formula.run(env.numbers);
  return value - value === 0 ? value : NO_VALUE;
}

/** Why a formula has no value, with the root cause. */
export function whyNot(formula: FormulaRun, env: Env, symbol: string, what: string): Problem {
  for (let i = 0; i < formula.slots.length; i += 1) {
    const slot = formula.slots[i] as number;
    const state = env.fill(slot);
    if (state === PROBLEM) return env.problems[slot] as Problem;
    if (state !== NUMBER) {
      const name = formula.symbols[i] as string;
      return { kind: 'failed', symbol: name, message: `${what}: ${name} is a word, and a number is needed.` };
    }
  }
  const valueOf = (name: string) =>
    env.numbers[formula.slots[formula.symbols.indexOf(name)] as number] as number;
  const numbers = formula.symbols.map((name) => `${name} = ${String(valueOf(name))}`).join(', ');
  const read = parseFormula(formula.text);
  const reason = read.ok ? whyNotFinite(read.ast, valueOf) : null;
  return {
    kind: 'failed',
    symbol,
    message: `${what}: the formula ${formula.text} has no finite value with ${numbers || 'its numbers'}${reason === null ? '' : `: ${reason}`}.`,
  };
}
