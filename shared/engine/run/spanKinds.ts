import type { BeamLoad, Restraint } from '#shared/analysis/types.ts';

export type SpanKind = 'simple' | 'end' | 'inner' | 'cantilever';
export type LoadForm = 'none' | 'uniform' | 'point' | 'mixed' | 'end-moment';

/**
 * Kind of a span: `cantilever` with a free end; else by how many of its ends the member carries on or is
 * fixed: none `simple`, one `end`, both `inner`.
 */
export function spanKind(restraints: readonly Restraint[], span: number): SpanKind {
  const left = restraints[span];
  const right = restraints[span + 1];
  if (left === 'free' || right === 'free') return 'cantilever';
  const goesOnLeft = span > 0 || left === 'fixed';
  const goesOnRight = span + 2 < restraints.length || right === 'fixed';
  return goesOnLeft && goesOnRight ? 'inner' : goesOnLeft || goesOnRight ? 'end' : 'simple';
}

/**
 * Form of the loads on a span. `uniform`: even line loads over the whole span; `point`: point loads only;
 * (one at a free end counts); `mixed`: anything else; `end-moment`: no load of its own, but a moment from its ends.
 */
export function loadForm(
  loads: readonly BeamLoad[],
  from: number,
  to: number,
  momentInside: boolean,
  free: { left: boolean; right: boolean } = { left: false, right: false },
): LoadForm {
  const tolerance = (to - from) * 1e-9;
  let uniform = false;
  let point = false;
  let other = false;
  for (const load of loads) {
    if (load.kind === 'line') {
      if (load.to <= from + tolerance || load.from >= to - tolerance) continue;
      if (load.startIntensity === 0 && load.endIntensity === 0) continue;
      const whole = load.from <= from + tolerance && load.to >= to - tolerance;
      if (whole && load.startIntensity === load.endIntensity) uniform = true;
      else other = true;
    } else {
      const inside = load.x > from + tolerance && load.x < to - tolerance;
      const atFreeEnd =
        (free.left && Math.abs(load.x - from) <= tolerance) ||
        (free.right && Math.abs(load.x - to) <= tolerance);
      if (load.kind === 'couple') other ||= inside && load.moment !== 0;
      else point ||= (inside || atFreeEnd) && load.force !== 0;
    }
  }
  if (other || (uniform && point)) return 'mixed';
  if (uniform) return 'uniform';
  if (point) return 'point';
  return momentInside ? 'end-moment' : 'none';
}
