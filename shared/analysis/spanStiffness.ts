import type { Section } from './section.ts';

/**
 * How a span answers rotations of its two ends, with EI taken as 1. Timoshenko's beam; without shear
 * deformation the familiar 4/L and 2/L.
 */
export interface SpanStiffness {
  length: number;
  /** End moment by a unit rotation of the same end, and of the other end. */
  near: number;
  far: number;
  /** Moment and shear at the left end by a unit gap of rotation and of deflection at the right end. */
  momentByRotation: number;
  momentByDeflection: number;
  shearByRotation: number;
  shearByDeflection: number;
}

/** @param shearFlexibility EI / GA, 0 without shear deformation. */
export function spanStiffness(length: number, shearFlexibility: number): SpanStiffness {
  const softness = (12 * shearFlexibility) / (length * length);
  const base = length * (1 + softness);
  const near = (4 + softness) / base;
  const far = (2 - softness) / base;
  return {
    length,
    near,
    far,
    momentByRotation: -far,
    momentByDeflection: 6 / (length * base),
    shearByRotation: 6 / (length * base),
    shearByDeflection: -12 / (length * length * base),
  };
}

/** Sagging moments at the two ends of a span held against rotation, under its own loads. */
export function fixedEndMoments(
  { length, momentByRotation, momentByDeflection, shearByRotation, shearByDeflection }: SpanStiffness,
  loads: Section,
): { left: number; right: number } {
  const left = momentByRotation * loads.rotation + momentByDeflection * loads.deflection;
  const shear = shearByRotation * loads.rotation + shearByDeflection * loads.deflection;
  return { left, right: left + shear * length + loads.moment };
}
