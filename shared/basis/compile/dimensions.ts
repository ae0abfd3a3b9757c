import { dimensionInWords, pure, sameDimension, type Dimension } from '#shared/units/units.ts';
import type { Ast } from '../formula/ast.ts';
import { printFormula } from '../formula/print.ts';
import type { SymbolInfo } from './plan.ts';

class Mismatch extends Error {}

/** `any`: a zero, which fits every dimension. */
type Inferred = Dimension | 'any';

const scaled = ({ length, force, density }: Dimension, by: number): Dimension => ({
  length: length * by,
  force: force * by,
  density: density * by,
});
const joined = (a: Inferred, b: Inferred, sign: 1 | -1): Inferred => {
  if (a === 'any' || b === 'any') return sign === 1 || a === 'any' ? 'any' : a;
  return {
    length: a.length + sign * b.length,
    force: a.force + sign * b.force,
    density: a.density + sign * b.density,
  };
};

/** Value of a formula without symbols, for exponents; undefined when it has any. */
function constantOf(ast: Ast): number | undefined {
  if (ast.kind === 'number') return ast.value;
  if (ast.kind === 'negate') {
    const value = constantOf(ast.of);
    return value === undefined ? undefined : -value;
  }
  if (ast.kind !== 'arithmetic') return undefined;
  const left = constantOf(ast.left);
  const right = constantOf(ast.right);
  if (left === undefined || right === undefined) return undefined;
  return { '+': left + right, '-': left - right, '*': left * right, '/': left / right, '^': left ** right }[
    ast.operator
  ];
}

function infer(ast: Ast, symbols: ReadonlyMap<string, SymbolInfo>): Inferred {
  const of = (inner: Ast) => infer(inner, symbols);
  const alike = (parts: readonly Ast[], where: string): Inferred => {
    let first: { dimension: Dimension; part: Ast } | undefined;
    for (const part of parts) {
      const dimension = of(part);
      if (dimension === 'any') continue;
      if (first && !sameDimension(first.dimension, dimension)) {
        const [a, b] = [printFormula(first.part), printFormula(part)];
        throw new Mismatch(
          `${where}: ${a} is ${dimensionInWords(first.dimension)} and ${b} is ${dimensionInWords(dimension)}.`,
        );
      }
      first ??= { dimension, part };
    }
    return first?.dimension ?? 'any';
  };
  const plain = (part: Ast, where: string): Inferred => {
    const dimension = of(part);
    if (dimension !== 'any' && !sameDimension(dimension, pure)) {
      throw new Mismatch(
        `${where} needs a pure number: ${printFormula(part)} is ${dimensionInWords(dimension)}.`,
      );
    }
    return pure;
  };
  switch (ast.kind) {
    case 'number':
      return ast.value === 0 ? 'any' : pure;
    case 'symbol':
      return symbols.get(ast.name)?.dimension ?? pure;
    case 'negate':
      return of(ast.of);
    case 'not':
      of(ast.of);
      return pure;
    case 'and':
    case 'or':
      of(ast.left);
      of(ast.right);
      return pure;
    case 'relation':
      alike([ast.left, ast.right], `Comparing with ${ast.operator}`);
      return pure;
    case 'conditional':
      of(ast.test);
      return alike([ast.yes, ast.no], 'The two outcomes');
    case 'arithmetic': {
      if (ast.operator === '+' || ast.operator === '-') {
        return alike([ast.left, ast.right], ast.operator === '+' ? 'Adding' : 'Subtracting');
      }
      if (ast.operator === '*') return joined(of(ast.left), of(ast.right), 1);
      if (ast.operator === '/') return joined(of(ast.left), of(ast.right), -1);
      plain(ast.right, 'An exponent');
      const base = of(ast.left);
      if (base === 'any' || sameDimension(base, pure)) return base === 'any' ? 'any' : pure;
      const power = constantOf(ast.right);
      if (power === undefined) {
        throw new Mismatch(
          `${printFormula(ast.left)} is ${dimensionInWords(base)} and has an exponent that is not a number.`,
        );
      }
      return scaled(base, power);
    }
    case 'call': {
      if (ast.name === 'min' || ast.name === 'max') return alike(ast.args, `Choosing with ${ast.name}`);
      const [arg] = ast.args;
      if (!arg) return pure;
      if (ast.name === 'sqrt') {
        const dimension = of(arg);
        return dimension === 'any' ? 'any' : scaled(dimension, 0.5);
      }
      return ast.name === 'abs' ? of(arg) : plain(arg, ast.name);
    }
  }
}

/**
 * Compares the dimension of a formula with the one declared.
 *
 * @returns A sentence on what is wrong, or null.
 */
export function dimensionProblem(
  ast: Ast,
  declared: Dimension,
  symbols: ReadonlyMap<string, SymbolInfo>,
): string | null {
  try {
    const inferred = infer(ast, symbols);
    if (inferred === 'any' || sameDimension(inferred, declared)) return null;
    return `The formula gives ${dimensionInWords(inferred)}, and ${dimensionInWords(declared)} is declared.`;
  } catch (error) {
    if (error instanceof Mismatch) return error.message;
    throw error;
  }
}
