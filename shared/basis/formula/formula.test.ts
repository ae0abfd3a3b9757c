import fc from 'fast-check';
import { all, create, type EvalFunction } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { symbolsOf, type Ast } from './ast.ts';
import { compileFormula } from './evaluate.ts';
import { whyNotFinite } from './explain.ts';
import { formulaBounds, parseFormula } from './parse.ts';
import { printFormula } from './print.ts';
import { flattenProduct } from './product.ts';
import { symbolTex, toTex } from './tex.ts';

function read(text: string): Ast {
  const outcome = parseFormula(text);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.ast;
}
function value(text: string, scope: Record<string, number> = {}): number {
  const names = Object.keys(scope);
  return compileFormula(read(text), (name) => names.indexOf(name))(Float64Array.from(Object.values(scope)));
}
function refusal(text: string): string {
  const outcome = parseFormula(text);
  if (outcome.ok) throw new Error(`"${text}" was read`);
  return outcome.message;
}

describe('formulas', () => {
  it.each([
    ['2 + 3 * 4', 14],
    ['-2^2', -4],
    ['2^3^2', 512],
    ['(300 / 245)^0.11', (300 / 245) ** 0.11],
    ['0.81 * (400^2 + 92300) / (400^2 + 56800)', (0.81 * 252300) / 216800],
    ['min(3, 1, 2) + max(4, 5)', 6],
    ['3 > 2 ? 10 : 20', 10],
    ['1 < 2 < 3 ? 1 : 0', 1],
    ['1 < 3 and not (2 == 2) or 5 != 6 ? 7 : 8', 7],
    ['round(-2.5)', -3],
    ['log10(1000) + log(exp(2))', 5],
  ])('%s', (text, wanted) => {
    expect(value(text)).toBeCloseTo(wanted, 12);
  });

  it('reads symbols from slots and lists them in order of use', () => {
    expect(value('b * h^2 / 6', { b: 50, h: 200 })).toBeCloseTo((50 * 40_000) / 6);
    expect(symbolsOf(read('h * b + h'))).toEqual(['h', 'b']);
  });

  it('gives no finite number where arithmetic has no answer', () => {
    for (const text of ['1 / 0', 'sqrt(0 - 1)', 'log(0)', '10^400', '0 / 0']) {
      expect(Number.isFinite(value(text))).toBe(false);
    }
  });

  it.each(
    [
      'a = 3',
      'f(x) = x',
      'x.constructor',
      'x["a"]',
      '[1, 2]',
      '{a: 1}',
      '1:3',
      '1; 2',
      '"text"',
      'import("x")',
      'evaluate("1")',
      '2 b',
      'x!',
      "x'",
      'a % b',
      'constructor(1)',
      'sqrt(1, 2)',
      'min()',
      '1 +',
      '',
      'x'.repeat(41),
      '1e999',
      'true',
    ].map((text) => [text]),
  )('refuses %s', (text) => {
    expect(refusal(text)).toMatch(/\.$/);
  });

  it('bounds length, depth and size', () => {
    expect(refusal('1+'.repeat(formulaBounds.characters))).toMatch(/longer/);
    expect(refusal(`${'('.repeat(60)}1${')'.repeat(60)}`)).toMatch(/nested/);
    expect(refusal(Array.from({ length: 240 }, () => '1').join('+'))).toMatch(/nested|parts/);
  });

  it('names the sign that is missing', () => {
    expect(refusal('2 b')).toMatch(/multiplication sign/);
  });
});

const names = ['a', 'b_1', 'h'];
const leaf: fc.Arbitrary<Ast> = fc.oneof(
  fc
    .double({ min: -1e3, max: 1e3, noNaN: true })
    .map((v): Ast => ({ kind: 'number', value: v === 0 ? 0 : Math.abs(v) })),
  fc.constantFrom(...names).map((name): Ast => ({ kind: 'symbol', name })),
);
const tree = fc.letrec<{ node: Ast }>((tie) => ({
  node: fc.oneof(
    { maxDepth: 5, depthSize: 'small' },
    leaf,
    fc.record({
      kind: fc.constant('arithmetic' as const),
      operator: fc.constantFrom('+' as const, '-' as const, '*' as const, '/' as const, '^' as const),
      left: tie('node'),
      right: tie('node'),
    }),
    fc.record({ kind: fc.constant('negate' as const), of: tie('node') }),
    fc.record({
      kind: fc.constant('conditional' as const),
      test: fc.record({
        kind: fc.constant('relation' as const),
        operator: fc.constantFrom('<' as const, '<=' as const, '>' as const, '>=' as const),
        left: tie('node'),
        right: tie('node'),
      }),
      yes: tie('node'),
      no: tie('node'),
    }),
    fc.record({
      kind: fc.constant('call' as const),
      name: fc.constantFrom('min' as const, 'max' as const),
      args: fc.array(tie('node'), { minLength: 1, maxLength: 3 }),
    }),
    fc.record({
      kind: fc.constant('call' as const),
      name: fc.constantFrom('sqrt' as const, 'abs' as const, 'exp' as const),
      args: fc.array(tie('node'), { minLength: 1, maxLength: 1 }),
    }),
  ),
})).node;

/** mathjs' value; where it leaves the real numbers on the way it may also throw. */
function evaluated(compiled: EvalFunction, scope: Record<string, number>): unknown {
  try {
    return compiled.evaluate({ ...scope }) as unknown;
  } catch {
    return 'not real';
  }
}

describe('properties of formulas', () => {
  it('prints what it reads back as the same formula', () => {
    fc.assert(
      fc.property(tree, (ast) => {
        const text = printFormula(ast);
        fc.pre(text.length <= formulaBounds.characters);
        expect(read(text)).toEqual(ast);
      }),
      { numRuns: 500 },
    );
  });

  it('agrees with mathjs’ own evaluation wherever that gives a real number', () => {
    // Comparison without a tolerance, as a boundary in a clause is meant.
    const math = create(all, { relTol: 1e-15, absTol: 0 });
    fc.assert(
      fc.property(
        tree,
        fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 3, maxLength: 3 }),
        (ast, values) => {
          const text = printFormula(ast);
          const scope = Object.fromEntries(names.map((name, i) => [name, values[i] ?? 0]));
          const theirs = evaluated(math.compile(text) as EvalFunction, scope);
          const ours = compileFormula(ast, (name) => names.indexOf(name))(Float64Array.from(values));
          if (typeof theirs === 'number' && Number.isFinite(theirs) && Number.isFinite(ours)) {
            expect(Math.abs(ours - theirs)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(theirs)));
          } else {
            // Complex numbers and infinities of mathjs are no value for an edition.
            expect(Number.isFinite(ours) && typeof theirs === 'number' && Number.isFinite(theirs)).toBe(
              false,
            );
          }
        },
      ),
      { numRuns: 400 },
    );
  });
});

describe('what has no value', () => {
  it.each([
    'sqrt(0 - x) < 3 ? 1 : 2',
    'sqrt(0 - x) >= 3 ? 1 : 2',
    'sqrt(0 - x) != sqrt(0 - x) ? 1 : 2',
    'not (log(0 - x) > 1) ? 1 : 2',
    'x > 0 and sqrt(0 - x) > 1 ? 1 : 2',
    'sqrt(0 - x) > 1 or x > 0 ? 1 : 2',
  ])('never picks a branch: %s', (text) => {
    expect(value(text, { x: 4 })).toBeNaN();
  });

  it('does not matter in a branch that is not taken, nor behind a settled word', () => {
    expect(value('x > 0 ? 1 / x : 0', { x: 0 })).toBe(0);
    expect(value('x > 0 and sqrt(0 - 1) > 0 ? 1 : 2', { x: 0 })).toBe(2);
    expect(value('x == 0 or sqrt(0 - 1) > 0 ? 1 : 2', { x: 0 })).toBe(1);
  });

  it.each([
    ['b / (h - 200) + 1', 'b / (h - 200) divides by 0'],
    ['1 + sqrt(h - 300)', 'sqrt(h - 300) takes the square root of -100'],
    ['log(h - 200)', 'log(h - 200) takes the logarithm of 0'],
    ['(h - 201)^0.5', '(h - 201)^0.5 takes a root of -1'],
    ['(h - 200)^-1', '(h - 200)^(-1) divides by 0'],
    ['h^200', 'h^200 is too large to be calculated with'],
    ['exp(h * h)', 'exp(h * h) is too large to be calculated with'],
    ['h > 100 ? 1 / (h - 200) : sqrt(0 - h)', '1 / (h - 200) divides by 0'],
    ['sqrt(0 - h) > 1 ? 1 : 2', 'sqrt(0 - h) takes the square root of -200'],
    ['min(1, 1 / (h - 200)) + sqrt(0 - b)', 'sqrt(0 - b) takes the square root of -47'],
  ])('says why: %s', (text, reason) => {
    const numbers: Record<string, number> = { h: 200, b: 47 };
    expect(whyNotFinite(read(text), (symbol) => numbers[symbol] ?? NaN)).toBe(reason);
  });

  it('has nothing to say where there is a value', () => {
    expect(whyNotFinite(read('min(1, b / 0)'), () => 47)).toBeNull();
  });
});

describe('rounding', () => {
  it('is exact, where mathjs takes a number within its tolerance of a whole one for whole', () => {
    expect(value('ceil(x)', { x: 3.0000000000001 })).toBe(4);
    expect(value('floor(x)', { x: 2.9999999999999 })).toBe(2);
    expect(value('ceil(x)', { x: -0.5 })).toBeCloseTo(0);
  });
});

describe('products and mathematics', () => {
  it('takes a product apart for the cascade, quotients turned', () => {
    const parts = flattenProduct(read('f_m * K_3 / (gamma / k) * (1 + a)'));
    expect(parts.map(({ part, role }) => `${role} ${printFormula(part)}`)).toEqual([
      'times f_m',
      'times K_3',
      'over gamma',
      'times k',
      'times 1 + a',
    ]);
  });

  it('sets formulas and symbols for reading', () => {
    expect(symbolTex('sigma_m_d')).toBe('\\sigma_{m,d}');
    expect(symbolTex('K7')).toBe('K_{7}');
    expect(toTex(read('(300 / h)^0.11'))).toBe('\\left(\\frac{300}{h}\\right)^{0.11}');
    expect(toTex(read('sqrt(b) * min(1, k_h)'))).toBe('\\sqrt{b} \\cdot \\min\\left(1, k_{h}\\right)');
  });
});
