import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { coherentUnit, unitOf } from '#shared/units/units.ts';

/** Units in which a member's fields are typed, by its unit system. */
export interface MemberUnits {
  length: string;
  area: string;
  line: string;
  force: string;
  couple: string;
}

export function unitsOf(member: Member): MemberUnits {
  return member.units === 'metric'
    ? { length: 'mm', area: 'kN/m2', line: 'kN/m', force: 'kN', couple: 'kN m' }
    : { length: 'in', area: 'psf', line: 'plf', force: 'lbf', couple: 'lbf ft' };
}

/** Unit in which an edition's own input is typed: coherent in the member's system. */
export function inputUnit(input: Edition['inputs'][number], member: Member): string {
  const unit = unitOf(input.unit);
  return unit ? (coherentUnit(unit.dimension, member.units) ?? input.unit) : input.unit;
}
