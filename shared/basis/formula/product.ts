import type { Ast } from './ast.ts';

/** A part of a product and whether it multiplies or divides. */
export interface ProductPart {
  part: Ast;
  role: 'times' | 'over';
}

/** The parts of a product or quotient in the order written; a formula that is neither is its only part. */
export function flattenProduct(ast: Ast): ProductPart[] {
  const parts: ProductPart[] = [];
  const visit = (node: Ast, role: ProductPart['role']): void => {
    if (node.kind === 'arithmetic' && (node.operator === '*' || node.operator === '/')) {
      visit(node.left, role);
      const turned = role === 'times' ? 'over' : 'times';
      visit(node.right, node.operator === '*' ? role : turned);
    } else parts.push({ part: node, role });
  };
  visit(ast, 'times');
  return parts;
}
