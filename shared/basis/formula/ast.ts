/** Functions a formula may call, with how many arguments they take. */
export const functions = {
  min: { least: 1, most: 20 },
  max: { least: 1, most: 20 },
  sqrt: { least: 1, most: 1 },
  abs: { least: 1, most: 1 },
  round: { least: 1, most: 1 },
  ceil: { least: 1, most: 1 },
  floor: { least: 1, most: 1 },
  exp: { least: 1, most: 1 },
  log: { least: 1, most: 1 },
  log10: { least: 1, most: 1 },
} as const;
export type FunctionName = keyof typeof functions;

export type Arithmetic = '+' | '-' | '*' | '/' | '^';
export type Relation = '<' | '<=' | '>' | '>=' | '==' | '!=';

/** A formula. Truth values are 1 and 0. */
export type Ast =
  | { kind: 'number'; value: number }
  | { kind: 'symbol'; name: string }
  | { kind: 'negate'; of: Ast }
  | { kind: 'arithmetic'; operator: Arithmetic; left: Ast; right: Ast }
  | { kind: 'relation'; operator: Relation; left: Ast; right: Ast }
  | { kind: 'and'; left: Ast; right: Ast }
  | { kind: 'or'; left: Ast; right: Ast }
  | { kind: 'not'; of: Ast }
  | { kind: 'conditional'; test: Ast; yes: Ast; no: Ast }
  | { kind: 'call'; name: FunctionName; args: readonly Ast[] };

export type ParseOutcome = { ok: true; ast: Ast } | { ok: false; message: string };

/** Children of a node, left to right. */
export function childrenOf(ast: Ast): readonly Ast[] {
  switch (ast.kind) {
    case 'number':
    case 'symbol':
      return [];
    case 'negate':
    case 'not':
      return [ast.of];
    case 'arithmetic':
    case 'relation':
    case 'and':
    case 'or':
      return [ast.left, ast.right];
    case 'conditional':
      return [ast.test, ast.yes, ast.no];
    case 'call':
      return ast.args;
  }
}

/** Symbols that a formula names, each once, in order of first use. */
export function symbolsOf(ast: Ast): string[] {
  const found = new Set<string>();
  const visit = (node: Ast): void => {
    if (node.kind === 'symbol') found.add(node.name);
    childrenOf(node).forEach(visit);
  };
  visit(ast);
  return [...found];
}
