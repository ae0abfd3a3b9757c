import type { Beam, Effects, Piece } from './types.ts';

/** How far two ratios of stiffness may differ and still count as the same: the rounding of a few products. */
const ROUNDING = 1e-12;

/**
 * Factor on rotation and deflection when a member analysed with one stiffness gets another, all else alike;
 * its forces then stay as they are. Null where that isn't so: with shear deformation deflection has a part
 * by EI and a part by GA, and in a continuous member their ratio also shares out the moments, so the member
 * has to be analysed anew unless EI and GA change in proportion.
 */
export function stiffnessFactor(
  analysed: Pick<Beam, 'EI' | 'GA'>,
  wanted: Pick<Beam, 'EI' | 'GA'>,
): number | null {
  const bending = analysed.EI / wanted.EI;
  if (analysed.GA === undefined && wanted.GA === undefined) return bending;
  if (analysed.GA === undefined || wanted.GA === undefined) return null;
  const shear = analysed.GA / wanted.GA;
  return Math.abs(shear - bending) <= ROUNDING * bending ? bending : null;
}

/** The same effects with rotation and deflection multiplied: a member `factor` times as flexible. */
export function scaleDeflection(effects: Effects, factor: number): Effects {
  const scale = (pieces: readonly Piece[]) =>
    pieces.map(({ from, to, coefficients }) => ({
      from,
      to,
      coefficients: coefficients.map((c) => c * factor),
    }));
  return { ...effects, rotation: scale(effects.rotation), deflection: scale(effects.deflection) };
}
