import { power } from '#shared/numbers/arithmetic.ts';
import type { SpanLoads } from './spanLoads.ts';

/**
 * What is known at a section of the member, with EI taken as 1: rotation and deflection carry the factor EI.
 * Rotation is that of the section, which is not that of the axis where shear deforms.
 */
export interface Section {
  shear: number;
  moment: number;
  rotation: number;
  deflection: number;
}

/**
 * State at the right end of a span whose left end is at rest and free of force, so the work of its loads
 * alone. Each load's part is a closed form: the integral of q (L − x)ⁿ / n! over the load.
 *
 * @param shearFlexibility EI / GA, 0 without shear deformation.
 */
export function carriedByLoads(
  { lines, points, couples }: SpanLoads,
  length: number,
  shearFlexibility: number,
): Section {
  let shear = 0;
  let moment = 0;
  let rotation = 0;
  let deflection = 0;
  const add = (force: number, first: number, second: number, third: number) => {
    shear -= force;
    moment -= first;
    rotation += second / 2;
    deflection += third / 6 - first * shearFlexibility;
  };
  for (const { at, force } of points) {
    const arm = length - at;
    add(force, force * arm, force * power(arm, 2), force * power(arm, 3));
  }
  for (const { at, moment: couple } of couples) {
    const arm = length - at;
    moment += couple;
    rotation -= couple * arm;
    deflection -= (couple * power(arm, 2)) / 2;
  }
  for (const { from, to, start, end } of lines) {
    // Integrals of q ηⁿ, η measured from the load's right end, then moved to the span's right end.
    const d = to - from;
    const b = length - to;
    const rise = start - end;
    const i0 = d * (end + rise / 2);
    const i1 = d * d * (end / 2 + rise / 3);
    const i2 = power(d, 3) * (end / 3 + rise / 4);
    const i3 = power(d, 4) * (end / 4 + rise / 5);
    add(i0, b * i0 + i1, b * b * i0 + 2 * b * i1 + i2, power(b, 3) * i0 + 3 * b * b * i1 + 3 * b * i2 + i3);
  }
  return { shear, moment, rotation, deflection };
}
