import { decimalLogarithm, exponential, naturalLogarithm, power } from '#shared/numbers/arithmetic.ts';
import type { Ast, FunctionName, Relation } from './ast.ts';

type Binary = Extract<Ast, { kind: 'arithmetic' | 'relation' | 'and' | 'or' }>;

/** A formula as a function of numbers in slots. Not finite where the arithmetic has no answer. */
export type Run = (numbers: Float64Array) => number;

/** JavaScript rounds halves up; mathjs, like most people with pencils, away from zero. */
const roundHalfAway = (value: number) => (value < 0 ? -Math.round(-value) : Math.round(value));

const one: Record<Exclude<FunctionName, 'min' | 'max'>, (value: number) => number> = {
  sqrt: Math.sqrt,
  abs: Math.abs,
  round: roundHalfAway,
  ceil: Math.ceil,
  floor: Math.floor,
  exp: exponential,
  log: naturalLogarithm,
  log10: decimalLogarithm,
};

/**
 * Turns a formula into a closure over numeric slots.
 *
 * @param slotOf Slot of a symbol.
 */
export function compileFormula(ast: Ast, slotOf: (symbol: string) => number): Run {
  switch (ast.kind) {
    case 'number': {
      const { value } = ast;
      return () => value;
    }
    case 'symbol': {
      const slot = slotOf(ast.name);
      return (numbers) => numbers[slot] as number;
    }
    case 'negate': {
      const of = compileFormula(ast.of, slotOf);
      return (numbers) => -of(numbers);
    }
    case 'not': {
      const of = compileFormula(ast.of, slotOf);
      return (numbers) => {
        const truth = of(numbers);
        return truth !== truth ? NaN : truth ? 0 : 1;
      };
    }
    case 'conditional': {
      const test = compileFormula(ast.test, slotOf);
      const yes = compileFormula(ast.yes, slotOf);
      const no = compileFormula(ast.no, slotOf);
      return (numbers) => {
        const truth = test(numbers);
        return Number.isNaN(truth) ? NaN : truth ? yes(numbers) : no(numbers);
      };
    }
    case 'call':
      return compileCall(ast.name, ast.args, slotOf);
    default:
      return compileBinary(ast, slotOf);
  }
}

function compileBinary(ast: Binary, slotOf: (symbol: string) => number): Run {
  const left = compileFormula(ast.left, slotOf);
  const right = compileFormula(ast.right, slotOf);
  if (ast.kind === 'and' || ast.kind === 'or') {
    const settledBy = ast.kind === 'or';
    return (n) => {
      const truth = left(n);
      if (truth !== truth) return NaN;
      if (Boolean(truth) === settledBy) return settledBy ? 1 : 0;
      const other = right(n);
      return other !== other ? NaN : other ? 1 : 0;
    };
  }
  switch (ast.operator) {
    case '+':
      return (n) => left(n) + right(n);
    case '-':
      return (n) => left(n) - right(n);
    case '*':
      return (n) => left(n) * right(n);
    case '/':
      return (n) => left(n) / right(n);
    case '^':
      return (n) => power(left(n), right(n));
    default:
      return compileRelation(ast.operator, left, right);
  }
}

/** What is compared with something that has no value has no truth either: an error never picks a branch. */
function compileRelation(operator: Relation, left: Run, right: Run): Run {
  const truth = (holds: boolean, a: number, b: number) => (holds ? 1 : a === a && b === b ? 0 : NaN);
  const made = (holds: (a: number, b: number) => boolean): Run => {
    return (n) => {
      const a = left(n);
      const b = right(n);
      return truth(holds(a, b), a, b);
    };
  };
  switch (operator) {
    case '<':
      return made((a, b) => a < b);
    case '<=':
      return made((a, b) => a <= b);
    case '>':
      return made((a, b) => a > b);
    case '>=':
      return made((a, b) => a >= b);
    case '==':
      return made((a, b) => a === b);
    case '!=':
      return made((a, b) => a < b || a > b);
  }
}

function compileCall(name: FunctionName, args: readonly Ast[], slotOf: (symbol: string) => number): Run {
  const runs = args.map((arg) => compileFormula(arg, slotOf));
  const [first, second] = runs as [Run, Run?];
  if (name === 'min' || name === 'max') {
    const pick = name === 'min' ? Math.min : Math.max;
    if (runs.length === 2 && second) return (n) => pick(first(n), second(n));
    return (n) => {
      let value = first(n);
      for (let i = 1; i < runs.length; i += 1) value = pick(value, (runs[i] as Run)(n));
      return value;
    };
  }
  const apply = one[name];
  return (n) => apply(first(n));
}
