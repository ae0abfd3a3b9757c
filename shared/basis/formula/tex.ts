import type { Ast, Relation } from './ast.ts';

const greek = new Set(
  'alpha beta gamma delta epsilon zeta eta theta kappa lambda mu nu xi rho sigma tau phi chi psi omega Gamma Delta Theta Lambda Sigma Phi Psi Omega'.split(
    ' ',
  ),
);
const relations: Record<Relation, string> = {
  '<': '<',
  '<=': '\\le',
  '>': '>',
  '>=': '\\ge',
  '==': '=',
  '!=': '\\ne',
};

const word = (text: string) =>
  greek.has(text) ? `\\${text}` : text.length === 1 ? text : `\\mathrm{${text}}`;

/** A symbol set as mathematics: what follows the first underscore is the index. */
export function symbolTex(symbol: string): string {
  const [base = '', ...index] = symbol.split('_');
  const letters = /^([A-Za-z]+)(\d+)$/.exec(base);
  const under = [...(letters?.[2] ? [letters[2]] : []), ...index].filter((part) => part !== '');
  const main = word(letters?.[1] ?? base);
  return under.length ? `${main}_{${under.map(word).join(',')}}` : main;
}

const binds = (ast: Ast): number => {
  if (ast.kind === 'arithmetic') return { '+': 1, '-': 1, '*': 2, '/': 3, '^': 3 }[ast.operator];
  if (ast.kind === 'negate') return 1;
  return ast.kind === 'number' || ast.kind === 'symbol' || ast.kind === 'call' ? 4 : 0;
};

/** A formula in TeX, for KaTeX. */
export function toTex(ast: Ast, shown: (symbol: string) => string = symbolTex): string {
  const tex = (inner: Ast) => toTex(inner, shown);
  const child = (inner: Ast, least: number) =>
    binds(inner) < least ? `\\left(${tex(inner)}\\right)` : tex(inner);
  switch (ast.kind) {
    case 'number':
      return String(ast.value).replace(/e\+?(-?\d+)$/, '\\cdot 10^{$1}');
    case 'symbol':
      return shown(ast.name);
    case 'negate':
      return `-${child(ast.of, 2)}`;
    case 'not':
      return `\\lnot ${child(ast.of, 4)}`;
    case 'and':
      return `${tex(ast.left)} \\land ${tex(ast.right)}`;
    case 'or':
      return `${tex(ast.left)} \\lor ${tex(ast.right)}`;
    case 'relation':
      return `${tex(ast.left)} ${relations[ast.operator]} ${tex(ast.right)}`;
    case 'arithmetic':
      return arithmeticTex(ast, tex, child);
    case 'conditional':
      return `\\begin{cases}${tex(ast.yes)} & ${tex(ast.test)}\\\\ ${tex(ast.no)} & \\text{otherwise}\\end{cases}`;
    case 'call':
      return callTex(ast, tex);
  }
}

function arithmeticTex(
  ast: Extract<Ast, { kind: 'arithmetic' }>,
  tex: (inner: Ast) => string,
  child: (inner: Ast, least: number) => string,
): string {
  const { operator, left, right } = ast;
  if (operator === '/') return `\\frac{${tex(left)}}{${tex(right)}}`;
  if (operator === '^') return `${child(left, 4)}^{${tex(right)}}`;
  if (operator === '*') return `${child(left, 2)} \\cdot ${child(right, 2)}`;
  return `${tex(left)} ${operator} ${operator === '-' ? child(right, 2) : tex(right)}`;
}

function callTex({ name, args }: Extract<Ast, { kind: 'call' }>, tex: (inner: Ast) => string): string {
  const [first] = args;
  const inner = args.map(tex).join(', ');
  if (name === 'sqrt' && first) return `\\sqrt{${tex(first)}}`;
  if (name === 'abs') return `\\left|${inner}\\right|`;
  if (name === 'ceil') return `\\left\\lceil ${inner}\\right\\rceil`;
  if (name === 'floor') return `\\left\\lfloor ${inner}\\right\\rfloor`;
  const named = {
    min: '\\min',
    max: '\\max',
    exp: '\\exp',
    log: '\\ln',
    log10: '\\log_{10}',
    round: '\\operatorname{round}',
  };
  return `${named[name as keyof typeof named]}\\left(${inner}\\right)`;
}
