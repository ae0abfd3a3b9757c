import { describe, expect, it } from 'vitest';
import { pure, unitOf, type Dimension } from '#shared/units/units.ts';
import { parseFormula } from '../formula/parse.ts';
import { dimensionProblem } from './dimensions.ts';
import type { SymbolInfo } from './plan.ts';

const units: Record<string, string> = {
  b: 'mm',
  h: 'mm',
  L: 'mm',
  M: 'N mm',
  V: 'N',
  E: 'N/mm2',
  I: 'mm4',
  W: 'mm3',
  k: '1',
  rho: 'kg/m3',
};
const dimensionOf = (unit: string): Dimension => unitOf(unit)?.dimension ?? pure;
const symbols = new Map(
  Object.entries(units).map(([symbol, unit], index): [string, SymbolInfo] => [
    symbol,
    {
      symbol,
      title: symbol,
      origin: 'builtIn',
      index,
      unit,
      dimension: dimensionOf(unit),
      level: 'member',
      pointer: '',
    },
  ]),
);
function problem(text: string, unit: string): string | null {
  const outcome = parseFormula(text);
  if (!outcome.ok) throw new Error(outcome.message);
  return dimensionProblem(outcome.ast, dimensionOf(unit), symbols);
}

describe('dimensions', () => {
  it.each([
    ['b * h^2 / 6', 'mm3'],
    ['M / W', 'N/mm2'],
    ['1.5 * V / (b * h)', 'N/mm2'],
    ['sqrt(E * I / V)', 'mm'],
    ['(E * I)^0.5 / V^(1/2)', 'mm'],
    ['(b * h)^(3/2)', 'mm3'],
    ['min(b, h, 0)', 'mm'],
    ['max(0, b - h)', 'mm'],
    ['b > h ? b : 0', 'mm'],
    ['(h / b)^k', '1'],
    ['exp(-k) * log(h / b)', '1'],
    ['abs(b - h) + round(k) * b', 'mm'],
    ['0', 'mm'],
    ['-L / 250', 'mm'],
    ['b < h and not (k > 1) ? 1 : 2', '1'],
    ['2^3 * b^(5 - 3)', 'mm2'],
  ])('%s is %s', (text, unit) => {
    expect(problem(text, unit)).toBeNull();
  });

  it.each([
    ['b + 3', 'mm', 'Adding: b is length and 3 is a pure number.'],
    ['b - h^2', 'mm', 'Subtracting: b is length and h^2 is length².'],
    ['min(b, 30)', 'mm', 'Choosing with min: b is length and 30 is a pure number.'],
    ['k > 1 ? b : k', 'mm', 'The two outcomes: b is length and k is a pure number.'],
    ['b > 72 ? 1 : 2', '1', 'Comparing with >: b is length and 72 is a pure number.'],
    ['k^b', '1', 'An exponent needs a pure number: b is length.'],
    ['b^k', 'mm', 'b is length and has an exponent that is not a number.'],
    ['exp(b)', '1', 'exp needs a pure number: b is length.'],
    ['sqrt(b)', 'mm', 'The formula gives length⁰·⁵, and length is declared.'],
    ['M / h', 'N/mm2', 'The formula gives force, and force / length² is declared.'],
    ['rho * b', 'N/mm', 'The formula gives length · density, and force / length is declared.'],
    ['(b + 3 > 0) ? 1 : 2', '1', 'Adding: b is length and 3 is a pure number.'],
    ['round(b)', 'mm', 'round needs a pure number: b is length.'],
  ])('%s is not %s', (text, unit, reason) => {
    expect(problem(text, unit)).toBe(reason);
  });
});
