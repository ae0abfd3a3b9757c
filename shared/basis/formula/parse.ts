import { parseDependencies, create, type MathNode } from 'mathjs/number';
import {
  functions,
  type Arithmetic,
  type Ast,
  type FunctionName,
  type ParseOutcome,
  type Relation,
} from './ast.ts';

// Only the parser is taken, not mathjs' functions: nothing of theirs can be reached from a formula.
const { parse } = create(parseDependencies ?? {});

/** Bounds on one formula. */
export const formulaBounds = { characters: 500, nodes: 400, depth: 40 };

class Refused extends Error {}

/** What mathjs' nodes hold, as far as it is read here. */
interface RawNode {
  type: string;
  value?: unknown;
  name?: unknown;
  fn?: unknown;
  op?: unknown;
  implicit?: unknown;
  args?: readonly RawNode[];
  content?: RawNode;
  condition?: RawNode;
  trueExpr?: RawNode;
  falseExpr?: RawNode;
  conditionals?: readonly unknown[];
  params?: readonly RawNode[];
}

const arithmetic: Record<string, Arithmetic> = {
  add: '+',
  subtract: '-',
  multiply: '*',
  divide: '/',
  pow: '^',
};
const relations: Record<string, Relation> = {
  smaller: '<',
  smallerEq: '<=',
  larger: '>',
  largerEq: '>=',
  equal: '==',
  unequal: '!=',
};
const refusals: Record<string, string> = {
  AssignmentNode: 'A formula can’t assign a value with "=". Write "==" to compare.',
  FunctionAssignmentNode: 'A formula can’t define a function.',
  BlockNode: 'A formula is a single expression, without ";".',
  AccessorNode: 'A formula can’t reach into a value with "." or "[ ]".',
  IndexNode: 'A formula can’t reach into a value with "[ ]".',
  ArrayNode: 'A formula gives one number, not a list.',
  ObjectNode: 'A formula gives one number, not an object.',
  RangeNode: 'A formula can’t use a range with ":".',
};

/**
 * Parses a formula with mathjs and narrows it to the few kinds of node that editions may use. Anything else
 * is refused with a sentence that says what and why.
 */
export function parseFormula(text: string): ParseOutcome {
  if (text.trim() === '') return { ok: false, message: 'The formula is empty.' };
  if (text.length > formulaBounds.characters) {
    return { ok: false, message: `The formula is longer than ${formulaBounds.characters} characters.` };
  }
  let raw: RawNode;
  try {
    raw = parse(text) as MathNode as RawNode;
  } catch (error) {
    return { ok: false, message: `The formula can’t be read: ${plainReason(error)}` };
  }
  try {
    return { ok: true, ast: new Narrowing().narrow(raw, 0) };
  } catch (error) {
    if (error instanceof Refused) return { ok: false, message: error.message };
    throw error;
  }
}

function plainReason(error: unknown): string {
  const text = error instanceof Error ? error.message : 'it is not complete';
  return `${text.replace(/^(SyntaxError: )/, '').replace(/\.$/, '')}.`;
}

class Narrowing {
  #nodes = 0;

  narrow(node: RawNode, depth: number): Ast {
    this.#nodes += 1;
    if (depth > formulaBounds.depth)
      throw new Refused(`The formula is nested more than ${formulaBounds.depth} deep.`);
    if (this.#nodes > formulaBounds.nodes)
      throw new Refused(`The formula has more than ${formulaBounds.nodes} parts.`);
    const child = (inner: RawNode | undefined): Ast => {
      if (!inner) throw new Refused('The formula is not complete.');
      return this.narrow(inner, depth + 1);
    };
    switch (node.type) {
      case 'ParenthesisNode':
        return child(node.content);
      case 'ConstantNode':
        return constant(node.value);
      case 'SymbolNode':
        return symbol(node.name);
      case 'ConditionalNode':
        return {
          kind: 'conditional',
          test: child(node.condition),
          yes: child(node.trueExpr),
          no: child(node.falseExpr),
        };
      case 'OperatorNode':
        return operation(node, child);
      case 'RelationalNode':
        return chained(node, child);
      case 'FunctionNode':
        return call(node, child);
      default:
        throw new Refused(refusals[node.type] ?? 'The formula uses something that formulas here don’t have.');
    }
  }
}

function constant(value: unknown): Ast {
  if (typeof value !== 'number') throw new Refused('A formula holds numbers and symbols, not texts.');
  if (!Number.isFinite(value)) throw new Refused('A number in the formula is too large.');
  return { kind: 'number', value };
}

function symbol(name: unknown): Ast {
  if (typeof name !== 'string' || !/^[A-Za-z][A-Za-z0-9_]{0,39}$/.test(name)) {
    throw new Refused(`"${String(name).slice(0, 40)}" is not a symbol.`);
  }
  return { kind: 'symbol', name };
}

function operation(node: RawNode, child: (inner: RawNode | undefined) => Ast): Ast {
  const name = String(node.fn);
  const [left, right] = node.args ?? [];
  if (node.implicit === true) throw new Refused('Write the multiplication sign: "2 * b", not "2 b".');
  if (name === 'unaryMinus') return { kind: 'negate', of: child(left) };
  if (name === 'unaryPlus') return child(left);
  if (name === 'not') return { kind: 'not', of: child(left) };
  if (name === 'and' || name === 'or') return { kind: name, left: child(left), right: child(right) };
  const operator = arithmetic[name];
  if (operator) return { kind: 'arithmetic', operator, left: child(left), right: child(right) };
  const relation = relations[name];
  if (relation) return { kind: 'relation', operator: relation, left: child(left), right: child(right) };
  throw new Refused(`"${String(node.op)}" is not an operation that formulas here have.`);
}

/** "a < b < c" as two comparisons. */
function chained(node: RawNode, child: (inner: RawNode | undefined) => Ast): Ast {
  const sides = node.params ?? [];
  const comparisons = (node.conditionals ?? []).map((name, i): Ast => {
    const operator = relations[String(name)];
    if (!operator) throw new Refused(`"${String(name)}" is not a comparison.`);
    return { kind: 'relation', operator, left: child(sides[i]), right: child(sides[i + 1]) };
  });
  return comparisons.reduce((left, right) => ({ kind: 'and', left, right }));
}

function call(node: RawNode, child: (inner: RawNode | undefined) => Ast): Ast {
  const fn = node.fn as RawNode | string | undefined;
  const name = typeof fn === 'string' ? fn : String(fn?.name);
  if (!Object.hasOwn(functions, name)) {
    throw new Refused(
      `"${name.slice(0, 40)}" is not a function here. There are ${Object.keys(functions).join(', ')}.`,
    );
  }
  const { least, most } = functions[name as FunctionName];
  const args = node.args ?? [];
  if (args.length < least || args.length > most) {
    const wanted = least === most ? String(least) : `${least} to ${most}`;
    throw new Refused(`${name} takes ${wanted} value${most === 1 ? '' : 's'}, not ${args.length}.`);
  }
  return { kind: 'call', name: name as FunctionName, args: args.map(child) };
}
