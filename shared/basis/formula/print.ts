import type { Ast } from './ast.ts';

/** How tightly a node binds; a child that binds less is put in brackets. */
function strength(ast: Ast): number {
  switch (ast.kind) {
    case 'conditional':
      return 0;
    case 'or':
      return 1;
    case 'and':
      return 2;
    case 'relation':
      return 3;
    case 'arithmetic':
      return { '+': 4, '-': 4, '*': 5, '/': 5, '^': 7 }[ast.operator];
    case 'negate':
    case 'not':
      return 6;
    case 'number':
      return ast.value < 0 ? 6 : 9;
    default:
      return 9;
  }
}

/**
 * A formula as text, with each symbol as `shown` gives it; so the same formula is printed in symbols or with
 * numbers in it. Reading the text back gives the same formula.
 */
export function printFormula(ast: Ast, shown: (symbol: string) => string = (symbol) => symbol): string {
  const child = (inner: Ast, least: number): string => {
    const text = printFormula(inner, shown);
    const negative = inner.kind === 'symbol' && text.startsWith('-') && least > 4;
    return strength(inner) < least || negative ? `(${text})` : text;
  };
  switch (ast.kind) {
    case 'number':
      return String(ast.value);
    case 'symbol':
      return shown(ast.name);
    case 'negate':
      return `-${child(ast.of, 6)}`;
    case 'not':
      return `not ${child(ast.of, 6)}`;
    case 'and':
    case 'or':
      return `${child(ast.left, strength(ast))} ${ast.kind} ${child(ast.right, strength(ast) + 1)}`;
    case 'relation':
      return `${child(ast.left, 4)} ${ast.operator} ${child(ast.right, 4)}`;
    case 'arithmetic': {
      const own = strength(ast);
      if (ast.operator === '^') return `${child(ast.left, own + 1)}^${child(ast.right, own)}`;
      return `${child(ast.left, own)} ${ast.operator} ${child(ast.right, own + 1)}`;
    }
    case 'conditional':
      return `${child(ast.test, 1)} ? ${child(ast.yes, 1)} : ${child(ast.no, 0)}`;
    case 'call':
      return `${ast.name}(${ast.args.map((arg) => printFormula(arg, shown)).join(', ')})`;
  }
}
