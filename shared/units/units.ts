/**
 * Units as data. Each unit belongs to one of two coherent systems and has its factor to that system's
 * coherent unit, so that conversion within a system is exact. Between the systems: 1 in = 25.4 mm exactly
 * (international yard and pound agreement, 1959), 1 lb = 0.45359237 kg exactly (same), standard gravity
 * 9.80665 m/s² exactly (3rd CGPM, 1901), so 1 lbf = 4.4482216152605 N exactly.
 */

import { power } from '#shared/numbers/arithmetic.ts';

export type UnitSystem = 'metric' | 'inch-pound';

/** Powers of length and force, and of mass density, which is kept for its own sake. */
export interface Dimension {
  length: number;
  force: number;
  density: number;
}

export interface UnitInfo {
  symbol: string;
  system: UnitSystem | 'both';
  dimension: Dimension;
  /** Coherent units in one of this unit. */
  factor: number;
}

export const millimetresPerInch = 25.4;
export const newtonsPerPoundForce = 4.4482216152605;
/** 0.45359237 kg / (0.3048 m)³. */
export const kilogramsPerCubicMetrePerPcf = 0.45359237 / power(0.3048, 3);

const dim = (length: number, force: number, density = 0): Dimension => ({ length, force, density });
export const pure: Dimension = dim(0, 0);

const metric: readonly (readonly [string, Dimension, number])[] = [
  ['mm', dim(1, 0), 1],
  ['cm', dim(1, 0), 10],
  ['m', dim(1, 0), 1000],
  ['mm2', dim(2, 0), 1],
  ['mm3', dim(3, 0), 1],
  ['mm4', dim(4, 0), 1],
  ['N', dim(0, 1), 1],
  ['kN', dim(0, 1), 1000],
  ['N/mm', dim(-1, 1), 1],
  ['N/m', dim(-1, 1), 1e-3],
  ['kN/m', dim(-1, 1), 1],
  ['N/mm2', dim(-2, 1), 1],
  ['MPa', dim(-2, 1), 1],
  ['kPa', dim(-2, 1), 1e-3],
  ['GPa', dim(-2, 1), 1000],
  ['kN/mm2', dim(-2, 1), 1000],
  ['N/m2', dim(-2, 1), 1e-6],
  ['kN/m2', dim(-2, 1), 1e-3],
  ['N mm', dim(1, 1), 1],
  ['kN m', dim(1, 1), 1e6],
  ['N mm2', dim(2, 1), 1],
  ['kN m2', dim(2, 1), 1e9],
  ['kg/m3', dim(0, 0, 1), 1],
];

const inchPound: readonly (readonly [string, Dimension, number])[] = [
  ['in', dim(1, 0), 1],
  ['ft', dim(1, 0), 12],
  ['in2', dim(2, 0), 1],
  ['in3', dim(3, 0), 1],
  ['in4', dim(4, 0), 1],
  ['lbf', dim(0, 1), 1],
  ['kip', dim(0, 1), 1000],
  ['lbf/in', dim(-1, 1), 1],
  ['plf', dim(-1, 1), 1 / 12],
  ['lbf/ft', dim(-1, 1), 1 / 12],
  ['psi', dim(-2, 1), 1],
  ['ksi', dim(-2, 1), 1000],
  ['psf', dim(-2, 1), 1 / 144],
  ['lbf in', dim(1, 1), 1],
  ['lbf ft', dim(1, 1), 12],
  ['kip ft', dim(1, 1), 12_000],
  ['lbf in2', dim(2, 1), 1],
  ['pcf', dim(0, 0, 1), 1],
];

const both: readonly (readonly [string, Dimension, number])[] = [
  ['1', pure, 1],
  ['%', pure, 0.01],
  ['deg', pure, 1],
];

const table = new Map<string, UnitInfo>();
const put = (system: UnitInfo['system'], rows: typeof metric) => {
  for (const [symbol, dimension, factor] of rows) table.set(symbol, { symbol, system, dimension, factor });
};
put('metric', metric);
put('inch-pound', inchPound);
put('both', both);

/** Symbols of all known units. */
export const unitSymbols: readonly string[] = [...table.keys()];

/** The unit of this name, undefined when it is not known. */
export function unitOf(symbol: string): UnitInfo | undefined {
  return table.get(symbol);
}

export function sameDimension(a: Dimension, b: Dimension): boolean {
  const near = (x: number, y: number) => Math.abs(x - y) < 1e-9;
  return near(a.length, b.length) && near(a.force, b.force) && near(a.density, b.density);
}

/** Size of a coherent unit of one system in the other's, by dimension. */
function acrossFactor({ length, force, density }: Dimension, from: UnitSystem): number {
  const toMetric =
    power(millimetresPerInch, length) *
    power(newtonsPerPoundForce, force) *
    power(kilogramsPerCubicMetrePerPcf, density);
  return from === 'inch-pound' ? toMetric : 1 / toMetric;
}

/** Multiplier from a unit to the coherent unit of a system. */
export function coherentFactor(unit: UnitInfo, system: UnitSystem): number {
  if (unit.system === 'both' || unit.system === system) return unit.factor;
  return unit.factor * acrossFactor(unit.dimension, unit.system);
}

/** Converts between two units of one dimension; undefined where they measure different things. */
export function convert(value: number, from: string, to: string): number | undefined {
  const a = unitOf(from);
  const b = unitOf(to);
  if (!a || !b || !sameDimension(a.dimension, b.dimension)) return undefined;
  if (from === to) return value;
  const system = b.system === 'both' ? 'metric' : b.system;
  return (value * coherentFactor(a, system)) / b.factor;
}

/** The coherent unit of a dimension in a system, undefined where none has a name. */
export function coherentUnit(dimension: Dimension, system: UnitSystem): string | undefined {
  for (const unit of table.values()) {
    const fits = unit.system === system || unit.system === 'both';
    if (fits && unit.factor === 1 && unit.symbol !== 'deg' && sameDimension(unit.dimension, dimension)) {
      return unit.symbol;
    }
  }
  return undefined;
}

/** A dimension in words for messages, such as "force / length²". */
export function dimensionInWords({ length, force, density }: Dimension): string {
  const part = (name: string, power: number) =>
    power === 1
      ? name
      : `${name}${[...String(Number(power.toFixed(4)))].map((c) => raised[c] ?? c).join('')}`;
  const above = [
    ['force', force],
    ['length', length],
    ['density', density],
  ] as const;
  const over = above.filter(([, power]) => power > 1e-9).map(([name, power]) => part(name, power));
  const under = above.filter(([, power]) => power < -1e-9).map(([name, power]) => part(name, -power));
  if (!over.length && !under.length) return 'a pure number';
  return `${over.join(' · ') || '1'}${under.length ? ` / ${under.join(' / ')}` : ''}`;
}

const raised: Record<string, string> = {
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
  '.': '·',
};
