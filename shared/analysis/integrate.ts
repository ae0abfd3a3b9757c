import type { Section } from './section.ts';
import type { SpanLoads } from './spanLoads.ts';
import type { Piece } from './types.ts';

/** The four effects along the member as they are written down, stretch by stretch. */
export interface Course {
  shear: Piece[];
  moment: Piece[];
  rotation: Piece[];
  deflection: Piece[];
}

/** Places in a span where something begins, ends or jumps, with both ends of the span. */
export function breaksOf({ lines, points, couples }: SpanLoads, length: number, trace: number): number[] {
  const all: number[] = [];
  for (const { from, to } of lines) {
    if (from > trace) all.push(from);
    if (to < length - trace) all.push(to);
  }
  for (const { at } of points) all.push(at);
  for (const { at } of couples) all.push(at);
  if (all.length === 0) return [0, length];
  all.sort((a, b) => a - b);
  const kept = [0];
  let last = 0;
  for (const x of all) {
    if (x - last <= trace) continue;
    kept.push(x);
    last = x;
  }
  kept.push(length);
  return kept;
}

/**
 * Integrates the differential equations of the member along one span from the state at its left end:
 * V' = −q, M' = V, EI ψ' = −M, w' = ψ + V / GA. Exact, since between breaks the load is linear.
 *
 * @param origin Place of the span's left end on the member; `end` of its right end.
 * @param flexibility 1 / EI, by which rotation and deflection are multiplied when written down.
 * @param shearFlexibility EI / GA, 0 without shear deformation.
 * @returns The state at the span's right end.
 */
export function integrateSpan(
  course: Course,
  loads: SpanLoads,
  breaks: readonly number[],
  start: Section,
  origin: number,
  end: number,
  flexibility: number,
  shearFlexibility: number,
): Section {
  let { shear, moment, rotation, deflection } = start;
  const last = breaks.length - 2;
  for (let k = 0; k <= last; k += 1) {
    const left = breaks[k] as number;
    const right = breaks[k + 1] as number;
    for (const { at, force } of loads.points) if (at >= left && at < right) shear -= force;
    for (const { at, moment: couple } of loads.couples) if (at >= left && at < right) moment += couple;
    let q = 0;
    let slope = 0;
    const middle = (left + right) / 2;
    for (const line of loads.lines) {
      if (middle < line.from || middle > line.to) continue;
      const rise = (line.end - line.start) / (line.to - line.from);
      q += line.start + rise * (left - line.from);
      slope += rise;
    }
    const from = origin + left;
    const to = k === last ? end : origin + right;
    const t = right - left;
    const f = flexibility;
    const s = shearFlexibility;
    course.shear.push({ from, to, coefficients: [shear, -q, -slope / 2] });
    course.moment.push({ from, to, coefficients: [moment, shear, -q / 2, -slope / 6] });
    course.rotation.push({
      from,
      to,
      coefficients: [rotation * f, -moment * f, (-shear / 2) * f, (q / 6) * f, (slope / 24) * f],
    });
    course.deflection.push({
      from,
      to,
      coefficients: [
        deflection * f,
        (rotation + shear * s) * f,
        ((-moment - q * s) / 2) * f,
        ((-shear - slope * s) / 6) * f,
        (q / 24) * f,
        (slope / 120) * f,
      ],
    });
    deflection +=
      t *
      (rotation +
        shear * s +
        t * ((-moment - q * s) / 2 + t * ((-shear - slope * s) / 6 + t * (q / 24 + t * (slope / 120)))));
    rotation += t * (-moment + t * (-shear / 2 + t * (q / 6 + t * (slope / 24))));
    moment += t * (shear + t * (-q / 2 - t * (slope / 6)));
    shear -= t * (q + t * (slope / 2));
  }
  return { shear, moment, rotation, deflection };
}
