import { lusolve } from 'mathjs';
import type { Beam, BeamLoad } from '#shared/analysis/types.ts';

/** Effects at a place of the member, approached from the right or from the left. */
export interface Sample {
  x: number;
  shear: number;
  moment: number;
  rotation: number;
  deflection: number;
}

/**
 * A second way to solve a member, for tests only: it shares neither method nor code with the analysis. The
 * member is cut wherever anything happens. In each segment the general solution of the differential
 * equations has four unknown constants; these of all segments together follow from the conditions at the
 * cuts and ends in one dense system, solved by mathjs.
 *
 * @returns Samples at both ends and inside of every segment, and the reactions and fixing moments per node.
 */
export function solveDensely(beam: Beam, loads: readonly BeamLoad[]) {
  const { spans, restraints, EI } = beam;
  const shearFlexibility = beam.GA === undefined ? 0 : 1 / beam.GA;
  const nodes = spans.reduce<number[]>((all, length) => [...all, (all.at(-1) ?? 0) + length], [0]);
  const cuts = cutsOf(nodes, loads);
  const segments = cuts.slice(1).map((to, i) => segmentOf(cuts[i] ?? 0, to, loads));
  const size = 4 * segments.length;

  /** One quantity at a place of one segment: its factors on the four constants, and the part by the loads. */
  const at = (segment: number, key: keyof Omit<Sample, 'x'>, t: number) => {
    const { q0, q1 } = segments[segment] as Segment;
    const [v, m, r, w] = [0, 1, 2, 3].map((i) => 4 * segment + i) as [number, number, number, number];
    const terms = new Map<number, number>();
    let known: number;
    if (key === 'shear') {
      terms.set(v, 1);
      known = -q0 * t - (q1 * t ** 2) / 2;
    } else if (key === 'moment') {
      terms.set(m, 1).set(v, t);
      known = (-q0 * t ** 2) / 2 - (q1 * t ** 3) / 6;
    } else if (key === 'rotation') {
      terms
        .set(r, 1)
        .set(m, -t / EI)
        .set(v, -(t ** 2) / (2 * EI));
      known = (q0 * t ** 3) / (6 * EI) + (q1 * t ** 4) / (24 * EI);
    } else {
      terms
        .set(w, 1)
        .set(r, t)
        .set(m, -(t ** 2) / (2 * EI));
      terms.set(v, -(t ** 3) / (6 * EI) + t * shearFlexibility);
      known =
        (q0 * t ** 4) / (24 * EI) +
        (q1 * t ** 5) / (120 * EI) -
        shearFlexibility * ((q0 * t ** 2) / 2 + (q1 * t ** 3) / 6);
    }
    return { terms, known };
  };

  const matrix: number[][] = [];
  const rhs: number[] = [];
  /** Adds the equation: sum of factored quantities = value. */
  const equation = (parts: [number, ReturnType<typeof at>][], value: number) => {
    const row = Array.from({ length: size }, () => 0);
    let right = value;
    for (const [factor, { terms, known }] of parts) {
      for (const [column, term] of terms) row[column] = (row[column] ?? 0) + factor * term;
      right -= factor * known;
    }
    matrix.push(row);
    rhs.push(right);
  };

  cuts.forEach((x, cut) => {
    const node = nodes.findIndex((place) => Math.abs(place - x) < 1e-9);
    const held = node < 0 ? 'none' : (restraints[node] ?? 'none');
    const force = sumAt(loads, 'point', x);
    const couple = sumAt(loads, 'couple', x);
    const before = cut > 0 ? cut - 1 : null;
    const after = cut < segments.length ? cut : null;
    const left = (key: keyof Omit<Sample, 'x'>) =>
      before === null ? null : at(before, key, (segments[before] as Segment).length);
    const right = (key: keyof Omit<Sample, 'x'>) => (after === null ? null : at(after, key, 0));
    const step = (key: keyof Omit<Sample, 'x'>, value: number) => {
      const parts: [number, ReturnType<typeof at>][] = [];
      const here = right(key);
      const there = left(key);
      if (here) parts.push([1, here]);
      if (there) parts.push([-1, there]);
      equation(parts, value);
    };
    const zero = (key: keyof Omit<Sample, 'x'>) => {
      for (const side of [left(key), right(key)]) if (side) equation([[1, side]], 0);
    };
    const inside = before !== null && after !== null;
    if (held === 'none' || held === 'free') {
      step('shear', -force);
      step('moment', couple);
      if (inside) {
        step('rotation', 0);
        step('deflection', 0);
      }
    } else if (held === 'pin') {
      zero('deflection');
      step('moment', couple);
      if (inside) step('rotation', 0);
    } else {
      zero('deflection');
      zero('rotation');
    }
  });

  const solution = (lusolve(matrix, rhs) as number[][]).map((row) => row[0] ?? NaN);
  const value = (segment: number, key: keyof Omit<Sample, 'x'>, t: number) => {
    const { terms, known } = at(segment, key, t);
    let sum = known;
    for (const [column, factor] of terms) sum += factor * (solution[column] ?? NaN);
    return sum;
  };
  const sample = (segment: number, t: number): Sample => ({
    x: (segments[segment] as Segment).from + t,
    shear: value(segment, 'shear', t),
    moment: value(segment, 'moment', t),
    rotation: value(segment, 'rotation', t),
    deflection: value(segment, 'deflection', t),
  });
  const samples = segments.map(({ length }, i) => ({
    start: sample(i, 0),
    inside: [0.21, 0.5, 0.83].map((share) => sample(i, share * length)),
    end: sample(i, length),
  }));
  const jump = (x: number, key: 'shear' | 'moment') => {
    const after = samples.find(({ start }) => Math.abs(start.x - x) < 1e-9)?.start[key] ?? 0;
    const before = samples.find(({ end }) => Math.abs(end.x - x) < 1e-9)?.end[key] ?? 0;
    return after - before;
  };
  return {
    samples,
    reactions: nodes.map((x, i) =>
      restraints[i] === 'free' ? 0 : jump(x, 'shear') + sumAt(loads, 'point', x),
    ),
    fixingMoments: nodes.map((x, i) =>
      restraints[i] === 'fixed' ? jump(x, 'moment') - sumAt(loads, 'couple', x) : 0,
    ),
  };
}

interface Segment {
  from: number;
  length: number;
  q0: number;
  q1: number;
}

function cutsOf(nodes: readonly number[], loads: readonly BeamLoad[]): number[] {
  const places = [
    ...nodes,
    ...loads.flatMap((load) => (load.kind === 'line' ? [load.from, load.to] : [load.x])),
  ];
  places.sort((a, b) => a - b);
  return places.filter((x, i) => i === 0 || x - (places[i - 1] ?? 0) > 1e-9);
}

function segmentOf(from: number, to: number, loads: readonly BeamLoad[]): Segment {
  const intensity = (x: number) =>
    loads.reduce((sum, load) => {
      if (load.kind !== 'line' || (from + to) / 2 < load.from || (from + to) / 2 > load.to) return sum;
      const share = (x - load.from) / (load.to - load.from);
      return sum + load.startIntensity * (1 - share) + load.endIntensity * share;
    }, 0);
  return {
    from,
    length: to - from,
    q0: intensity(from),
    q1: (intensity(to) - intensity(from)) / (to - from),
  };
}

function sumAt(loads: readonly BeamLoad[], kind: 'point' | 'couple', x: number): number {
  return loads.reduce((sum, load) => {
    if (load.kind === 'line' || load.kind !== kind || Math.abs(load.x - x) > 1e-9) return sum;
    return sum + (load.kind === 'point' ? load.force : load.moment);
  }, 0);
}
