import type { Edition, Member } from '#shared/basis/schema/index.ts';

type System = Edition['unitSystem'];

/** Millimetres to an inch and newtons to a pound-force: international yard and pound agreement, 1959. */
const MM_PER_INCH = 25.4;
const N_PER_LBF = 4.4482216152605;
/** kg/m3 to lb/ft3. */
const DENSITY = 0.45359237 / 0.3048 ** 3;

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

/** The document's own units, to coherent units of its own system: mm and N, in and lbf. */
const coherent: Record<Member['units'], UnitFactors> = {
  metric: { length: 1, area: 1e-3, line: 1, force: 1e3, couple: 1e6 },
  'inch-pound': { length: 1, area: 1 / 144, line: 1 / 12, force: 1, couple: 12 },
};

/** Multiplier of a quantity of dimension length^a × force^b × density^c between coherent unit systems. */
export function systemFactor(from: System, to: System, length: number, force: number, density = 0): number {
  if (from === to) return 1;
  const direction = from === 'inch-pound' ? 1 : -1;
  return (
    MM_PER_INCH ** (direction * length) *
    N_PER_LBF ** (direction * force) *
    DENSITY ** (-direction * density * -1)
  );
}

/** Multipliers for a member document in `from` checked to an edition in `to`. */
export function unitFactors(from: Member['units'], to: System): UnitFactors {
  const own = coherent[from];
  return {
    length: own.length * systemFactor(from, to, 1, 0),
    area: own.area * systemFactor(from, to, -2, 1),
    line: own.line * systemFactor(from, to, -1, 1),
    force: own.force * systemFactor(from, to, 0, 1),
    couple: own.couple * systemFactor(from, to, 1, 1),
  };
}
