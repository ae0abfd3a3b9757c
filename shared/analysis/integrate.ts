import { evaluate } from './polynomial.ts';
import type { SpanLoads } from './spanLoads.ts';

/** What is known at a section. Rotation is that of the section, not of the axis, where shear deforms. */
export interface SectionState {
  shear: number;
  moment: number;
  rotation: number;
  deflection: number;
}

/** Polynomials of one stretch without jumps, in the distance from its start. */
export interface Stretch {
  from: number;
  to: number;
  shear: number[];
  moment: number[];
  rotation: number[];
  deflection: number[];
}

/** Places in a span where something begins, ends or jumps, with both ends of the span. */
export function breaksOf({ lines, points, couples }: SpanLoads, length: number): number[] {
  if (points.length === 0 && couples.length === 0 && lines.every((l) => l.from === 0 && l.to === length)) {
    return [0, length];
  }
  const all = [0, length];
  for (const { from, to } of lines) all.push(from, to);
  for (const { at } of points) all.push(at);
  for (const { at } of couples) all.push(at);
  all.sort((a, b) => a - b);
  const trace = length * 1e-12;
  const kept = [0];
  for (const x of all) if (x - (kept[kept.length - 1] as number) > trace) kept.push(x);
  kept[kept.length - 1] = length;
  return kept;
}

/**
 * Integrates the differential equations of the member along one span from its left end:
 * V' = −q, M' = V, ψ' = −M / EI, w' = ψ + V / GA. Exact, since the load is piecewise linear.
 *
 * @param flexibility 1 / EI.
 * @param shearFlexibility 1 / GA, 0 without shear deformation.
 * @returns The stretches, and the state at the right end.
 */
export function integrateSpan(
  loads: SpanLoads,
  breaks: readonly number[],
  start: SectionState,
  flexibility: number,
  shearFlexibility: number,
): { stretches: Stretch[]; end: SectionState } {
  const stretches: Stretch[] = [];
  let state = start;
  for (let k = 0; k + 1 < breaks.length; k += 1) {
    const from = breaks[k] as number;
    const to = breaks[k + 1] as number;
    const length = to - from;
    state = jumped(state, loads, from, length);
    let q0 = 0;
    let q1 = 0;
    const middle = (from + to) / 2;
    for (const line of loads.lines) {
      if (middle < line.from || middle > line.to) continue;
      const slope = (line.end - line.start) / (line.to - line.from);
      q0 += line.start + slope * (from - line.from);
      q1 += slope;
    }
    const shear = [state.shear, -q0, -q1 / 2];
    const moment = [state.moment, state.shear, -q0 / 2, -q1 / 6];
    const rotation = [
      state.rotation,
      -state.moment * flexibility,
      (-state.shear / 2) * flexibility,
      (q0 / 6) * flexibility,
      (q1 / 24) * flexibility,
    ];
    const deflection = [
      state.deflection,
      state.rotation + state.shear * shearFlexibility,
      (-state.moment / 2) * flexibility - (q0 / 2) * shearFlexibility,
      (-state.shear / 6) * flexibility - (q1 / 6) * shearFlexibility,
      (q0 / 24) * flexibility,
      (q1 / 120) * flexibility,
    ];
    stretches.push({ from, to, shear, moment, rotation, deflection });
    state = {
      shear: evaluate(shear, length),
      moment: evaluate(moment, length),
      rotation: evaluate(rotation, length),
      deflection: evaluate(deflection, length),
    };
  }
  return { stretches, end: state };
}

/** A point load takes its force off the shear; a clockwise couple adds to the moment. */
function jumped(
  state: SectionState,
  { points, couples }: SpanLoads,
  x: number,
  length: number,
): SectionState {
  if (points.length === 0 && couples.length === 0) return state;
  const here = (at: number) => Math.abs(at - x) <= length * 1e-9;
  let { shear, moment } = state;
  for (const { at, force } of points) if (here(at)) shear -= force;
  for (const { at, moment: couple } of couples) if (here(at)) moment += couple;
  return { ...state, shear, moment };
}
