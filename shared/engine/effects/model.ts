import { arrangements, clipToSpans } from '#shared/analysis/arrangements.ts';
import { prepare, type Solver } from '#shared/analysis/solve.ts';
import type { AnalysisProblem, Beam, BeamLoad, Effects } from '#shared/analysis/types.ts';
import type { Geometry } from '../member/geometry.ts';
import { type Grid, type GridCase, toGrid } from './grid.ts';

/** Loads of one action on the model's axis. */
export interface ActionLoads {
  action: number;
  patterned: boolean;
  loads: readonly BeamLoad[];
}

/** Everything the analysis says of a member, apart from the size of its self-weight and its stiffness. */
export interface Model {
  beam: Beam;
  geometry: Geometry;
  grid: Grid;
  /** Spans loaded in each arrangement of the patterned actions; the first has all of them. */
  arrangements: readonly (readonly number[])[];
  solver: Solver;
  /** By action, one per arrangement for a patterned action, else one. */
  casesOf: ReadonlyMap<number, readonly ModelCase[]>;
  /** Self-weight of 1 per unit length, vertical, along the whole member. */
  unitSelfWeight: ModelCase;
}

/** One set of loads and what it does. */
export interface ModelCase {
  loads: readonly BeamLoad[];
  effects: Effects;
  grid: GridCase;
}

export type ModelOutcome = { ok: true; model: Model } | { ok: false; problems: readonly AnalysisProblem[] };

/**
 * Analyses a member with a bending stiffness of 1; `shearStiffness` is GA / EI, where the edition counts
 * shear deformation. Deflections of the model are therefore to be divided by EI.
 */
export function buildModel(
  geometry: Geometry,
  restraints: Beam['restraints'],
  actions: readonly ActionLoads[],
  shearStiffness: number | null,
): ModelOutcome {
  const beam: Beam = {
    spans: geometry.spans.map(({ length }) => length),
    restraints,
    EI: 1,
    ...(shearStiffness === null ? {} : { GA: shearStiffness }),
  };
  const prepared = prepare(beam);
  if (!prepared.ok) return { ok: false, problems: prepared.problems };
  const patterned = beam.spans.length > 1 && actions.some((each) => each.patterned);
  const subsets = patterned ? arrangementsOf(beam) : [beam.spans.map((_, i) => i)];

  const total = geometry.nodes[geometry.nodes.length - 1] as number;
  const unitSelfWeightLoads: BeamLoad[] = [
    { kind: 'line', from: 0, to: total, startIntensity: geometry.cosine, endIntensity: geometry.cosine },
  ];
  const sets = new Map<number, readonly (readonly BeamLoad[])[]>();
  for (const { action, patterned: byPattern, loads } of actions) {
    sets.set(
      action,
      byPattern && patterned
        ? subsets.map((subset, i) => (i === 0 ? loads : clipToSpans(loads, beam, subset)))
        : [loads],
    );
  }
  const all = [unitSelfWeightLoads, ...[...sets.values()].flat()];
  const effects: Effects[] = [];
  for (const loads of all) {
    const outcome = prepared.solver.solve(loads);
    if (!outcome.ok) return { ok: false, problems: outcome.problems };
    effects.push(outcome.effects);
  }
  const grid = toGrid(geometry.nodes, effects);
  const cases = all.map((loads, i): ModelCase => ({
    loads,
    effects: effects[i] as Effects,
    grid: grid.cases[i] as GridCase,
  }));
  const casesOf = new Map<number, readonly ModelCase[]>();
  let next = 1;
  for (const [action, { length }] of sets) {
    casesOf.set(action, cases.slice(next, next + length));
    next += length;
  }
  const unitSelfWeight = cases[0] as ModelCase;
  return {
    ok: true,
    model: {
      beam,
      geometry,
      grid,
      arrangements: subsets,
      solver: prepared.solver,
      casesOf,
      unitSelfWeight,
    },
  };
}

/** All spans loaded first, then the others as the analysis gives them. */
function arrangementsOf(beam: Beam): readonly (readonly number[])[] {
  const all = beam.spans.map((_, i) => i);
  const others = arrangements(beam.spans.length, beam.restraints).filter(
    (subset) => subset.length < all.length && subset.length > 0,
  );
  return [all, ...others];
}
