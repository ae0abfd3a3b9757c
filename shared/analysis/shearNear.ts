import { nodesOf, type Side, valueAt } from './pieces.ts';
import type { Solver } from './solve.ts';
import type { BeamLoad, Effects } from './types.ts';

/** What a design basis says of shear near a support, as data. */
export interface ShearNearRule {
  /** Where the distance is measured from: the centre of the support, or the face of its bearing. */
  from: 'centre' | 'face';
  /** Line load within this distance of the support is left out. 0: nothing is. */
  distance: number;
  /**
   * Point loads within the distance: `keep` them whole, `omit` what they bring to the shear at the support,
   * or `scale` it by their own distance over the distance.
   */
  pointLoads: 'keep' | 'omit' | 'scale';
}

/** One side of one support. */
export interface SupportSide {
  node: number;
  side: Side;
  /** From the support's centre to the face of its bearing on this side. */
  toFace: number;
}

/** An analysed member with the loads behind its effects. */
export interface Analysed {
  spans: readonly number[];
  solver: Solver;
  loads: readonly BeamLoad[];
  effects: Effects;
}

/**
 * Shear beside a support by a rule that leaves out load close to it. Of line load the force within the
 * distance is taken off, which gives the shear at the distance. Of a point load within it, what it brings to
 * the shear at the support is scaled: to take off its whole force would take off more than it brought, and
 * the rest of the loads would be relieved by it.
 *
 * Not reduced where the distance reaches the next node. 0 on the side where the member has ended.
 */
export function shearNear(analysed: Analysed, place: SupportSide, rule: ShearNearRule): number {
  const { spans, effects, loads } = analysed;
  const direction = place.side === 'right' ? 1 : -1;
  const length = spans[direction > 0 ? place.node : place.node - 1];
  const support = nodesOf(spans)[place.node];
  if (length === undefined || support === undefined) return 0;
  const start = rule.from === 'face' ? place.toFace : 0;
  const reach = start + rule.distance;
  if (!(rule.distance > 0 && reach < length)) return valueAt(effects.shear, support, place.side);

  let shear = valueAt(effects.shear, support, place.side);
  const section = support + direction * reach;
  for (const load of loads) {
    if (load.kind === 'line') {
      shear -= direction * lineBetween(load, Math.min(support, section), Math.max(support, section));
    } else if (load.kind === 'point') {
      const away = (load.x - support) * direction;
      if (away <= 0 || away > reach) continue;
      shear -= (1 - share(rule, away - start)) * shearAtSupport(analysed, load, support, place.side);
    }
  }
  return shear;
}

/** Force of a line load between two places. */
function lineBetween(load: Extract<BeamLoad, { kind: 'line' }>, left: number, right: number): number {
  const from = Math.max(load.from, left);
  const to = Math.min(load.to, right);
  if (!(to > from)) return 0;
  const slope = (load.endIntensity - load.startIntensity) / (load.to - load.from);
  const middle = load.startIntensity + slope * ((from + to) / 2 - load.from);
  return middle * (to - from);
}

function share({ pointLoads, distance }: ShearNearRule, away: number): number {
  if (pointLoads === 'keep') return 1;
  return pointLoads === 'omit' ? 0 : Math.max(away, 0) / distance;
}

function shearAtSupport({ solver }: Analysed, load: BeamLoad, support: number, side: Side): number {
  const alone = solver.solve([load]);
  return alone.ok ? valueAt(alone.effects.shear, support, side) : 0;
}
