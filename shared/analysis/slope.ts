/** How a load on a sloped member is measured and which way it acts. */
export type SlopedLoad =
  /** Vertical, per unit of length along the slope, as self-weight and roof covering. */
  | 'onSlope'
  /** Vertical, per unit of length in plan, as snow and imposed loads on roofs. */
  | 'onPlan'
  /** At right angles to the member, per unit of length along the slope, as wind. */
  | 'normal';

/**
 * What a load of 1 on a sloped member comes to, per unit of length along the member, for a slope with this
 * cosine. From geometry alone.
 */
export interface SlopeFactors {
  /** At right angles to the member: bends it. */
  normal: number;
  /** Along the member, towards its lower end: compresses or stretches it. */
  along: number;
}

/**
 * @param angle Slope against the horizontal, radians, from 0 up to but not including π/2.
 * @throws RangeError for any other slope.
 */
export function slopeFactor(load: SlopedLoad, angle: number): SlopeFactors {
  if (!(angle >= 0 && angle < Math.PI / 2)) {
    throw new RangeError('The slope of a member has to lie between horizontal and upright.');
  }
  const cosine = Math.cos(angle);
  const sine = Math.sin(angle);
  switch (load) {
    case 'onSlope':
      return { normal: cosine, along: sine };
    case 'onPlan':
      return { normal: cosine * cosine, along: sine * cosine };
    case 'normal':
      return { normal: 1, along: 0 };
  }
}

/**
 * Vertical reaction of a support that carries vertical loads of a sloped member, from its component at right
 * angles to the member. Not for loads at right angles to the slope, whose reactions are not vertical.
 */
export function verticalReaction(normalReaction: number, angle: number): number {
  return normalReaction / Math.cos(angle);
}

/** Line load on a member that carries a strip of an area load: spacing, or tributary width. */
export function areaToLine(areaLoad: number, width: number): number {
  return areaLoad * width;
}
