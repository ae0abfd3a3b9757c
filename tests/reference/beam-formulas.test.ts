import { describe, expect, it } from 'vitest';
import { peaks } from '#shared/analysis/peaks.ts';
import { piecesBetween, valueAt } from '#shared/analysis/pieces.ts';
import { solve } from '#shared/analysis/solve.ts';
import type { BeamLoad, Effects, Restraint } from '#shared/analysis/types.ts';
import data from './data/beam-formulas.json' with { type: 'json' };

/*
 * Closed-form beam results. Sources are named in the data beside each case and in each test's title; most
 * are standard textbook results (Roark's Formulas for Stress and Strain; Design Aid No. 6, American Wood
 * Council), each instance solved exactly on rational numbers when the data was collected. Where an exact
 * fraction is given the tolerance is 1e-9 relative; where only ten printed digits are, half the last digit.
 */

interface Given {
  exact?: string | null;
  value: number;
  x?: number;
}
interface Instance {
  params: Record<string, number>;
  reactions_up: Record<string, Given>;
  fixed_end_moments: Record<string, Given>;
  support_moments: Record<string, Given>;
  V_abs_max: number;
  M_max: Given;
  M_min: Given;
  deflection_max_mm: Given;
  deflection_min_mm: Given;
  at_points: Record<string, { x: number; deflection_mm?: number; M?: number }>;
  per_span: {
    from_x: number;
    to_x: number;
    M_max: number;
    M_min: number;
    deflection_extreme_mm: number;
  }[];
}

const uniform = (w: number, from: number, to: number): BeamLoad => ({
  kind: 'line',
  from,
  to,
  startIntensity: w,
  endIntensity: w,
});
const ramp = (from: number, to: number, start: number, end: number): BeamLoad => ({
  kind: 'line',
  from,
  to,
  startIntensity: start,
  endIntensity: end,
});
const point = (force: number, x: number): BeamLoad => ({ kind: 'point', x, force });
const couple = (moment: number, x: number): BeamLoad => ({ kind: 'couple', x, moment });

type P = Record<string, number>;
type Build = (p: Record<'L' | 'L1' | 'L2' | 'w' | 'P' | 'M' | 'a' | 'b', number>) => {
  spans: number[];
  held: string;
  loads: BeamLoad[];
};
const oneSpan =
  (held: string, load: (p: Parameters<Build>[0]) => BeamLoad[]): Build =>
  (p) => ({
    spans: [p.L],
    held,
    loads: load(p),
  });
const simple = (load: (p: Parameters<Build>[0]) => BeamLoad[]) => oneSpan('pp', load);
const equal =
  (count: number, load: (p: Parameters<Build>[0]) => BeamLoad[]): Build =>
  (p) => ({
    spans: Array.from({ length: count }, () => p.L),
    held: 'p'.repeat(count + 1),
    loads: load(p),
  });

const members: Record<string, Build> = {
  'ss-udl': simple((p) => [uniform(p.w, 0, p.L)]),
  'ss-udl-partial': simple((p) => [uniform(p.w, p.a, p.a + p.b)]),
  'ss-udl-one-end': simple((p) => [uniform(p.w, 0, p.a)]),
  'ss-tri-end': simple((p) => [ramp(0, p.L, 0, p.w)]),
  'ss-tri-mid': simple((p) => [ramp(0, p.L / 2, 0, p.w), ramp(p.L / 2, p.L, p.w, 0)]),
  'ss-point-mid': simple((p) => [point(p.P, p.L / 2)]),
  'ss-point-any': simple((p) => [point(p.P, p.a)]),
  'ss-two-points-sym': simple((p) => [point(p.P, p.a), point(p.P, p.L - p.a)]),
  'ss-three-points': simple((p) => [1, 2, 3].map((i) => point(p.P, (p.L * i) / 4))),
  'ss-end-moment': simple((p) => [couple(p.M, 0)]),
  'ss-equal-end-moments': simple((p) => [couple(p.M, 0), couple(-p.M, p.L)]),
  'cant-udl': oneSpan('xf', (p) => [uniform(p.w, 0, p.L)]),
  'cant-point-end': oneSpan('xf', (p) => [point(p.P, p.L)]),
  'cant-point-any': oneSpan('xf', (p) => [point(p.P, p.a)]),
  'cant-end-moment': oneSpan('xf', (p) => [couple(p.M, p.L)]),
  'propped-udl': oneSpan('px', (p) => [uniform(p.w, 0, p.L)]),
  'propped-point-mid': oneSpan('px', (p) => [point(p.P, p.L / 2)]),
  'fixed-udl': oneSpan('xx', (p) => [uniform(p.w, 0, p.L)]),
  'fixed-point-mid': oneSpan('xx', (p) => [point(p.P, p.L / 2)]),
  'overhang-udl': (p) => ({ spans: [p.L, p.a], held: 'ppf', loads: [uniform(p.w, 0, p.L + p.a)] }),
  'overhang-udl-tip': (p) => ({ spans: [p.L, p.a], held: 'ppf', loads: [uniform(p.w, p.L, p.L + p.a)] }),
  'overhang-point-tip': (p) => ({ spans: [p.L, p.a], held: 'ppf', loads: [point(p.P, p.L + p.a)] }),
  'overhang-both-udl': (p) => ({
    spans: [p.a, p.L, p.a],
    held: 'fppf',
    loads: [uniform(p.w, 0, p.L + 2 * p.a)],
  }),
  'cont2-udl-all': equal(2, (p) => [uniform(p.w, 0, 2 * p.L)]),
  'cont2-udl-one': equal(2, (p) => [uniform(p.w, 0, p.L)]),
  'cont2-point-both': equal(2, (p) => [point(p.P, p.L / 2), point(p.P, 1.5 * p.L)]),
  'cont2-udl-unequal': (p) => ({
    spans: [p.L1, p.L2],
    held: 'ppp',
    loads: [uniform(p.w, 0, p.L1 + p.L2)],
  }),
  'cont3-udl-all': equal(3, (p) => [uniform(p.w, 0, 3 * p.L)]),
  'cont3-udl-outer': equal(3, (p) => [uniform(p.w, 0, p.L), uniform(p.w, 2 * p.L, 3 * p.L)]),
  'cont3-udl-centre': equal(3, (p) => [uniform(p.w, p.L, 2 * p.L)]),
  'cont4-udl-all': equal(4, (p) => [uniform(p.w, 0, 4 * p.L)]),
  'cont4-udl-1-3': equal(4, (p) => [uniform(p.w, 0, p.L), uniform(p.w, 2 * p.L, 3 * p.L)]),
};

const restraintOf: Record<string, Restraint> = { p: 'pin', x: 'fixed', f: 'free' };

function exactly({ exact, value }: Given): number {
  if (exact === undefined || exact === null) return value;
  const [above = NaN, below = 1] = exact.split('/').map(Number);
  return above / below;
}

/** 1e-9 relative; absolute beside it for what is zero next to the largest value at hand. */
function near(actual: number, wanted: number, scale: number, relative = 1e-9): void {
  expect(Math.abs(actual - wanted)).toBeLessThanOrEqual(relative * Math.max(Math.abs(wanted), scale * 1e-3));
}

function solved(id: string, params: P): { effects: Effects; nodes: number[] } {
  const build = members[id];
  if (!build) throw new Error(`No member is written for case ${id}.`);
  const { spans, held, loads } = build(params as Parameters<Build>[0]);
  const restraints = [...held].map((letter) => restraintOf[letter] ?? 'pin');
  const outcome = solve({ spans, restraints, EI: params['EI'] ?? NaN }, loads);
  if (!outcome.ok) throw new Error(outcome.problems.map((p) => p.message).join(' '));
  const nodes = spans.reduce((sum, length) => [...sum, (sum.at(-1) ?? 0) + length], [0]);
  return { effects: outcome.effects, nodes };
}

describe.each(data.cases)('$id: $title ($sources)', ({ id, instance: raw }) => {
  const instance = raw as Instance;
  const { effects, nodes } = solved(id, instance.params);
  const moments = peaks(effects.moment);
  const deflections = peaks(effects.deflection);
  const momentScale = Math.max(Math.abs(moments.most.value), Math.abs(moments.least.value));
  const deflectionScale = 1000 * Math.max(deflections.most.value, -deflections.least.value);

  it('reactions and shear', () => {
    for (const given of Object.values(instance.reactions_up)) {
      const node = nodes.findIndex((x) => Math.abs(x - (given.x ?? NaN)) < 1e-9);
      near(effects.reactions[node] ?? NaN, exactly(given), instance.V_abs_max);
    }
    const shears = peaks(effects.shear);
    near(Math.max(shears.most.value, -shears.least.value), instance.V_abs_max, instance.V_abs_max);
  });

  it('moments', () => {
    near(moments.most.value, exactly(instance.M_max), momentScale);
    near(moments.least.value, exactly(instance.M_min), momentScale);
    for (const [place, given] of Object.entries(instance.support_moments)) {
      near(valueAt(effects.moment, Number(place.replace('x=', ''))), exactly(given), momentScale);
    }
    const ends = { left: valueAt(effects.moment, 0), right: valueAt(effects.moment, nodes.at(-1) ?? NaN) };
    for (const [end, given] of Object.entries(instance.fixed_end_moments)) {
      near(end === 'left' ? ends.left : ends.right, exactly(given), momentScale);
    }
  });

  it('deflections', () => {
    near(1000 * deflections.most.value, instance.deflection_max_mm.value, deflectionScale);
    near(1000 * deflections.least.value, instance.deflection_min_mm.value, deflectionScale);
  });

  it('named points and each span', () => {
    for (const { x, deflection_mm, M } of Object.values(instance.at_points)) {
      if (deflection_mm !== undefined) {
        near(1000 * valueAt(effects.deflection, x), deflection_mm, deflectionScale);
      }
      if (M !== undefined) {
        const sides = [valueAt(effects.moment, x, 'left'), valueAt(effects.moment, x, 'right')];
        const closest = sides.reduce((a, b) => (Math.abs(a - M) < Math.abs(b - M) ? a : b));
        near(closest, M, momentScale);
      }
    }
    for (const span of instance.per_span) {
      const inSpan = peaks(piecesBetween(effects.moment, span.from_x, span.to_x));
      near(inSpan.most.value, span.M_max, momentScale);
      near(inSpan.least.value, span.M_min, momentScale);
      const w = peaks(piecesBetween(effects.deflection, span.from_x, span.to_x));
      const extreme = Math.abs(w.most.value) >= Math.abs(w.least.value) ? w.most.value : w.least.value;
      near(1000 * extreme, span.deflection_extreme_mm, deflectionScale);
    }
  });
});

describe('shear coefficients of equal spans under uniform load (Civil Engineering Formulas, Table 2.1, seen)', () => {
  it.each(data.continuous.table)('$supports supports', ({ supports, rows }) => {
    const spans = Array.from({ length: supports - 1 }, () => 1);
    const outcome = solve(
      { spans, restraints: Array.from({ length: supports }, (): Restraint => 'pin'), EI: 1 },
      [uniform(1, 0, supports - 1)],
    );
    if (!outcome.ok) throw new Error('not solved');
    for (const row of rows) {
      const [left = 0, right = 0] = row.printed_left_right.map((text) => exactly({ exact: text, value: 0 }));
      const x = row.support - 1;
      near(outcome.effects.reactions[x] ?? NaN, left + right, 1);
      if (x > 0) near(-valueAt(outcome.effects.shear, x, 'left'), left, 1);
      near(valueAt(outcome.effects.shear, x, 'right'), right, 1);
      near(
        valueAt(outcome.effects.moment, row.support - 1),
        exactly({ exact: row.support_moment_wL2, value: 0 }),
        1,
      );
    }
  });
});

describe('shear deformation (w L² / 8 G As beside 5 w L⁴ / 384 E I; form only seen, numbers recomputed)', () => {
  it('45 × 240 mm, 4 m, 3 kN/m, E 10 GPa, G 625 MPa: 19.290123 + 1.066667 mm', () => {
    const beam = { spans: [4000], restraints: ['pin', 'pin'] as const, EI: (1e4 * 45 * 240 ** 3) / 12 };
    const load = [uniform(3, 0, 4000)];
    const stiff = solve(beam, load);
    const soft = solve({ ...beam, GA: (625 * 45 * 240 * 5) / 6 }, load);
    if (!stiff.ok || !soft.ok) throw new Error('not solved');
    const bending = peaks(stiff.effects.deflection).most.value;
    expect(bending).toBeCloseTo(19.290123, 6);
    expect(peaks(soft.effects.deflection).most.value - bending).toBeCloseTo(1.066667, 6);
  });
});
