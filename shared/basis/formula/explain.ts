import type { Ast } from './ast.ts';
import { compileFormula } from './evaluate.ts';
import { printFormula } from './print.ts';

type ValueOf = (symbol: string) => number;

function valueOf(ast: Ast, read: ValueOf): number {
  const names: string[] = [];
  const slot = (symbol: string) => (names.includes(symbol) ? names.indexOf(symbol) : names.push(symbol) - 1);
  const run = compileFormula(ast, slot);
  return run(Float64Array.from(names, read));
}

/** Parts that were worked out: of a choice between two, only the one taken. */
function workedOut(ast: Ast, read: ValueOf): readonly Ast[] {
  switch (ast.kind) {
    case 'number':
    case 'symbol':
      return [];
    case 'negate':
    case 'not':
      return [ast.of];
    case 'call':
      return ast.args;
    case 'conditional': {
      const truth = valueOf(ast.test, read);
      return Number.isNaN(truth) ? [ast.test] : [truth ? ast.yes : ast.no];
    }
    default:
      return [ast.left, ast.right];
  }
}

/**
 * Why a formula has no finite value: the innermost part that has none, in words such as "b / (h - 200)
 * divides by 0". Null where it has one.
 *
 * @param read Value of a symbol.
 */
export function whyNotFinite(ast: Ast, read: ValueOf): string | null {
  if (Number.isFinite(valueOf(ast, read))) return null;
  for (const part of workedOut(ast, read)) {
    const inner = whyNotFinite(part, read);
    if (inner !== null) return inner;
  }
  return `${printFormula(ast)} ${reasonOf(ast, read)}`;
}

function reasonOf(ast: Ast, read: ValueOf): string {
  const tooLarge = 'is too large to be calculated with';
  if (ast.kind === 'arithmetic') {
    const [left, right] = [valueOf(ast.left, read), valueOf(ast.right, read)];
    if (ast.operator === '/' && right === 0) return 'divides by 0';
    if (ast.operator !== '^') return tooLarge;
    if (left === 0 && right < 0) return 'divides by 0';
    return left < 0 && !Number.isInteger(right) ? `takes a root of ${String(left)}` : tooLarge;
  }
  if (ast.kind === 'call' && ast.args[0]) {
    const value = valueOf(ast.args[0], read);
    if (ast.name === 'sqrt' && value < 0) return `takes the square root of ${String(value)}`;
    if (ast.name.startsWith('log') && value <= 0) return `takes the logarithm of ${String(value)}`;
  }
  return ast.kind === 'symbol' ? 'has no value' : tooLarge;
}
