import { coherentFactor, type Dimension, unitOf, type UnitSystem } from '#shared/units/units.ts';

/** Multipliers from a member document's units to the coherent units of an edition. */
export interface UnitFactors {
  length: number;
  /** Load on an area, to force per area. */
  area: number;
  /** Load on a line, to force per length. */
  line: number;
  force: number;
  couple: number;
}

/** Units in which a member document is written. */
const written: Record<UnitSystem, Record<keyof UnitFactors, string>> = {
  metric: { length: 'mm', area: 'kN/m2', line: 'kN/m', force: 'kN', couple: 'kN m' },
  'inch-pound': { length: 'in', area: 'psf', line: 'plf', force: 'lbf', couple: 'lbf ft' },
};

/** Multipliers for a member document in `from` checked to an edition in `to`. */
export function unitFactors(from: UnitSystem, to: UnitSystem): UnitFactors {
  return factors[from][to];
}

function factorsFor(from: UnitSystem, to: UnitSystem): UnitFactors {
  const units = written[from];
  return {
    length: factorOf(units.length, to),
    area: factorOf(units.area, to),
    line: factorOf(units.line, to),
    force: factorOf(units.force, to),
    couple: factorOf(units.couple, to),
  };
}

/** Multiplier from a unit to the coherent unit of a system; 1 for a unit without a name in the list. */
export function factorOf(unit: string, to: UnitSystem): number {
  const known = unitOf(unit);
  return known ? coherentFactor(known, to) : 1;
}

/** Multiplier of a quantity between the coherent units of two systems. */
export function systemFactor(from: UnitSystem, to: UnitSystem, dimension: Dimension): number {
  if (from === to) return 1;
  return coherentFactor({ symbol: '', system: from, dimension, factor: 1 }, to);
}

const systems = ['metric', 'inch-pound'] as const;

const factors = Object.fromEntries(
  systems.map((from) => [from, Object.fromEntries(systems.map((to) => [to, factorsFor(from, to)]))]),
) as Record<UnitSystem, Record<UnitSystem, UnitFactors>>;
