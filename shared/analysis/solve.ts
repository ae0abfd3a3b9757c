import { breaksOf, integrateSpan, type SectionState, type Stretch } from './integrate.ts';
import { factorise, type Factorised } from './linear.ts';
import { beamProblems, loadProblems } from './problems.ts';
import { placeLoads, type PlacedLoads } from './spanLoads.ts';
import type { AnalysisOutcome, AnalysisProblem, Beam, BeamLoad, Effects, Piece } from './types.ts';

export { MOST_SPANS } from './problems.ts';

/** A member made ready: its stiffness is factorised once and used for each set of loads. */
export interface Solver {
  solve: (loads: readonly BeamLoad[]) => AnalysisOutcome;
}

export type Prepared = { ok: true; solver: Solver } | { ok: false; problems: AnalysisProblem[] };

/** End forces of a span as linear functions of its end displacements and of what its loads do alone. */
interface SpanRule {
  length: number;
  /** Shear and moment at the left end per unit of A (rotation gap × EI) and B (deflection gap × EI). */
  shearA: number;
  shearB: number;
  momentA: number;
  momentB: number;
}

/** What a span's loads do from a left end at rest. */
type Particular = SectionState;

const atRest: SectionState = { shear: 0, moment: 0, rotation: 0, deflection: 0 };

/**
 * Prepares a member for analysis by the displacement method: unknown are the rotation and deflection of each
 * node as far as its restraint leaves them free. Never throws; what can't be analysed comes back as problems.
 */
export function prepare(beam: Beam): Prepared {
  const problems = beamProblems(beam);
  if (problems.length) return { ok: false, problems };
  const system = new BeamSystem(beam);
  if (!system.stands) {
    return {
      ok: false,
      problems: [{ code: 'mechanism', message: 'The member is not held: it would move.' }],
    };
  }
  return { ok: true, solver: { solve: (loads) => system.solve(loads) } };
}

/** Effects of a set of loads on a member: shear, moment, rotation, deflection, reactions. */
export function solve(beam: Beam, loads: readonly BeamLoad[]): AnalysisOutcome {
  const prepared = prepare(beam);
  return prepared.ok ? prepared.solver.solve(loads) : prepared;
}

class BeamSystem {
  readonly stands: boolean;
  readonly #beam: Beam;
  readonly #nodes: number[];
  readonly #rules: SpanRule[];
  /** Number of the unknown, or −1 where the restraint holds it at 0. Displacements times EI. */
  readonly #rotations: Int32Array;
  readonly #deflections: Int32Array;
  readonly #unknowns: number;
  readonly #factorised: Factorised | null;

  constructor(beam: Beam) {
    this.#beam = beam;
    this.#nodes = [0];
    for (const length of beam.spans)
      this.#nodes.push((this.#nodes[this.#nodes.length - 1] as number) + length);
    const shear = beam.GA === undefined ? 0 : beam.EI / beam.GA;
    this.#rules = beam.spans.map((length) => spanRule(length, shear));
    const count = beam.restraints.length;
    this.#rotations = new Int32Array(count).fill(-1);
    this.#deflections = new Int32Array(count).fill(-1);
    let unknowns = 0;
    beam.restraints.forEach((restraint, node) => {
      if (restraint !== 'fixed') this.#rotations[node] = unknowns++;
      if (restraint === 'free') this.#deflections[node] = unknowns++;
    });
    this.#unknowns = unknowns;
    this.#factorised = this.#assembled();
    this.stands = this.#factorised !== null;
  }

  /**
   * Equilibrium at each node: the moment right of it less the moment left of it, and the same for shear,
   * equals what acts on the node. Each equation has the number of the unknown it belongs to.
   */
  #assembled(): Factorised | null {
    const n = this.#unknowns;
    const matrix = new Float64Array(n * n);
    const add = (row: number, column: number, value: number) => {
      if (row >= 0 && column >= 0) matrix[row * n + column] = (matrix[row * n + column] as number) + value;
    };
    this.#rules.forEach((rule, span) => {
      const { length, shearA, shearB, momentA, momentB } = rule;
      // Columns: A and B per unit of the displacements at the span's two ends.
      const columns = [
        [this.#rotations[span] as number, 1, length],
        [this.#deflections[span] as number, 0, 1],
        [this.#rotations[span + 1] as number, -1, 0],
        [this.#deflections[span + 1] as number, 0, -1],
      ] as const;
      for (const [column, a, b] of columns) {
        const shear = shearA * a + shearB * b;
        const moment = momentA * a + momentB * b;
        add(this.#rotations[span] as number, column, moment);
        add(this.#deflections[span] as number, column, shear);
        add(this.#rotations[span + 1] as number, column, -(moment + shear * length));
        add(this.#deflections[span + 1] as number, column, -shear);
      }
    });
    return factorise(matrix, n);
  }

  solve(loads: readonly BeamLoad[]): AnalysisOutcome {
    const nodes = this.#nodes;
    const problems = loadProblems(loads, nodes[nodes.length - 1] as number);
    if (problems.length) return { ok: false, problems };
    const placed = placeLoads(nodes, loads);
    const breaks = placed.spans.map((span, i) => breaksOf(span, this.#beam.spans[i] as number));
    const shear = this.#beam.GA === undefined ? 0 : this.#beam.EI / this.#beam.GA;
    // With EI = 1 throughout, displacements carry the factor EI.
    const alone = placed.spans.map(
      (span, i) => integrateSpan(span, breaks[i] as number[], atRest, 1, shear).end,
    );
    const unknown = this.#displacements(placed, alone);
    const stretches: Stretch[][] = [];
    const ends: SectionState[] = [];
    const starts: SectionState[] = [];
    placed.spans.forEach((span, i) => {
      const start = this.#startOf(i, unknown, alone[i] as Particular);
      const run = integrateSpan(span, breaks[i] as number[], start, 1, shear);
      starts.push(start);
      ends.push(run.end);
      stretches.push(run.stretches);
    });
    const effects = this.#effects(placed, stretches, starts, ends);
    return isFinite(effects)
      ? { ok: true, effects }
      : {
          ok: false,
          problems: [{ code: 'bad-load', message: 'The loads are too large to calculate with.' }],
        };
  }

  #displacements({ nodeForces, nodeCouples }: PlacedLoads, alone: readonly Particular[]): Float64Array {
    const rhs = new Float64Array(this.#unknowns);
    const add = (row: number, value: number) => {
      if (row >= 0) rhs[row] = (rhs[row] as number) + value;
    };
    nodeForces.forEach((force, node) => add(this.#deflections[node] as number, -force));
    nodeCouples.forEach((couple, node) => add(this.#rotations[node] as number, couple));
    this.#rules.forEach((rule, span) => {
      const loads = alone[span] as Particular;
      const { shear, moment } = endForces(rule, loads.rotation, loads.deflection);
      add(this.#rotations[span] as number, -moment);
      add(this.#deflections[span] as number, -shear);
      add(this.#rotations[span + 1] as number, moment + shear * rule.length + loads.moment);
      add(this.#deflections[span + 1] as number, shear + loads.shear);
    });
    return this.#factorised?.solve(rhs) ?? rhs;
  }

  #startOf(span: number, unknown: Float64Array, alone: Particular): SectionState {
    const at = (index: number) => (index < 0 ? 0 : (unknown[index] as number));
    const rule = this.#rules[span] as SpanRule;
    const rotation = at(this.#rotations[span] as number);
    const deflection = at(this.#deflections[span] as number);
    const a = rotation - at(this.#rotations[span + 1] as number) + alone.rotation;
    const b =
      deflection + rotation * rule.length - at(this.#deflections[span + 1] as number) + alone.deflection;
    return { ...endForces(rule, a, b), rotation, deflection };
  }

  #effects(
    { nodeForces, nodeCouples }: PlacedLoads,
    stretches: readonly (readonly Stretch[])[],
    starts: readonly SectionState[],
    ends: readonly SectionState[],
  ): Effects {
    const { restraints, EI } = this.#beam;
    const pieces = (key: 'shear' | 'moment' | 'rotation' | 'deflection', scale: number): Piece[] =>
      stretches.flatMap((span, i) =>
        span.map((stretch) => ({
          from: (this.#nodes[i] as number) + stretch.from,
          to:
            stretch === span[span.length - 1]
              ? (this.#nodes[i + 1] as number)
              : (this.#nodes[i] as number) + stretch.to,
          coefficients: scale === 1 ? stretch[key] : stretch[key].map((c) => c * scale),
        })),
      );
    const reactions = restraints.map((restraint, node) =>
      restraint === 'free'
        ? 0
        : (starts[node]?.shear ?? 0) - (ends[node - 1]?.shear ?? 0) + (nodeForces[node] as number),
    );
    const fixingMoments = restraints.map((restraint, node) =>
      restraint === 'fixed'
        ? (starts[node]?.moment ?? 0) - (ends[node - 1]?.moment ?? 0) - (nodeCouples[node] as number)
        : 0,
    );
    return {
      shear: pieces('shear', 1),
      moment: pieces('moment', 1),
      rotation: pieces('rotation', 1 / EI),
      deflection: pieces('deflection', 1 / EI),
      reactions,
      fixingMoments,
    };
  }
}

/**
 * The two end conditions of a span, solved for the shear and moment at its left end:
 * M₀ L + V₀ L²/2 = A and M₀ L²/2 + V₀ (L³/6 − L EI/GA) = B.
 */
function spanRule(length: number, shear: number): SpanRule {
  const half = (length * length) / 2;
  const third = length ** 3 / 6 - length * shear;
  const determinant = length * third - half * half;
  return {
    length,
    shearA: -half / determinant,
    shearB: length / determinant,
    momentA: third / determinant,
    momentB: -half / determinant,
  };
}

function endForces({ shearA, shearB, momentA, momentB }: SpanRule, a: number, b: number) {
  return { shear: shearA * a + shearB * b, moment: momentA * a + momentB * b };
}

function isFinite({ shear, deflection, reactions }: Effects): boolean {
  return (
    reactions.every(Number.isFinite) &&
    shear.every(({ coefficients }) => coefficients.every(Number.isFinite)) &&
    deflection.every(({ coefficients }) => coefficients.every(Number.isFinite))
  );
}
