import { breaksOf, type Course, integrateSpan } from './integrate.ts';
import { nodesOf } from './pieces.ts';
import { beamProblems, loadProblems } from './problems.ts';
import { carriedByLoads, type Section } from './section.ts';
import { type PlacedLoads, placeLoads, SAME_PLACE, type SpanLoads } from './spanLoads.ts';
import { fixedEndMoments, spanStiffness, type SpanStiffness } from './spanStiffness.ts';
import { factorise, type Tridiagonal } from './tridiagonal.ts';
import type { AnalysisOutcome, AnalysisProblem, Beam, BeamLoad, Restraint } from './types.ts';

export { MOST_SPANS } from './problems.ts';

/** A member made ready: its stiffness is factorised once and used for each set of loads. */
export interface Solver {
  solve: (loads: readonly BeamLoad[]) => AnalysisOutcome;
}

export type Prepared = { ok: true; solver: Solver } | { ok: false; problems: AnalysisProblem[] };

/**
 * Prepares a member for analysis by the slope-deflection method: unknown are the rotations at the supports.
 * A cantilever or overhang adds no unknown, for statics alone give its forces. Never throws; what can't be
 * analysed comes back as problems.
 */
export function prepare(beam: Beam): Prepared {
  const problems = beamProblems(beam);
  if (problems.length) return { ok: false, problems };
  const frame = frameOf(beam);
  if (!frame) {
    const message = 'The shear stiffness GA is too small beside the bending stiffness EI to calculate with.';
    return { ok: false, problems: [{ code: 'bad-stiffness', message }] };
  }
  return { ok: true, solver: { solve: (loads) => solveFrame(frame, loads) } };
}

/** Effects of a set of loads on a member: shear, moment, rotation, deflection, reactions. */
export function solve(beam: Beam, loads: readonly BeamLoad[]): AnalysisOutcome {
  const prepared = prepare(beam);
  return prepared.ok ? prepared.solver.solve(loads) : prepared;
}

interface Frame {
  restraints: readonly Restraint[];
  nodes: readonly number[];
  spans: readonly SpanStiffness[];
  flexibility: number;
  shearFlexibility: number;
  rotations: Tridiagonal;
}

function frameOf({ spans: lengths, restraints, EI, GA }: Beam): Frame | null {
  const shearFlexibility = GA === undefined ? 0 : EI / GA;
  const nodes = nodesOf(lengths);
  const spans = lengths.map((length) => spanStiffness(length, shearFlexibility));
  const diagonal = new Float64Array(nodes.length);
  const beside = new Float64Array(nodes.length);
  for (let i = 0; i < spans.length; i += 1) {
    if (restraints[i] === 'free' || restraints[i + 1] === 'free') continue;
    const { near, far } = spans[i] as SpanStiffness;
    diagonal[i] = (diagonal[i] as number) + near;
    diagonal[i + 1] = (diagonal[i + 1] as number) + near;
    if (restraints[i] === 'pin' && restraints[i + 1] === 'pin') beside[i] = far;
  }
  for (let i = 0; i < nodes.length; i += 1) if (restraints[i] !== 'pin') diagonal[i] = 1;
  const rotations = factorise(diagonal, beside);
  if (!rotations) return null;
  return { restraints, nodes, spans, flexibility: 1 / EI, shearFlexibility, rotations };
}

function solveFrame(frame: Frame, loads: readonly BeamLoad[]): AnalysisOutcome {
  const { restraints, nodes, spans, flexibility, shearFlexibility } = frame;
  const total = nodes[nodes.length - 1] as number;
  const problems = loadProblems(loads, total);
  if (problems.length) return { ok: false, problems };
  const placed = placeLoads(nodes, loads);
  const alone = spans.map(({ length }, i) =>
    carriedByLoads(placed.spans[i] as SpanLoads, length, shearFlexibility),
  );
  const ends = endMoments(frame, placed, alone);
  const course: Course = { shear: [], moment: [], rotation: [], deflection: [] };
  const reactions = Array.from(placed.nodeForces);
  const fixingMoments = restraints.map((restraint, i) =>
    restraint === 'fixed' ? 0 - (placed.nodeCouples[i] as number) : 0,
  );
  for (let i = 0; i < spans.length; i += 1) {
    const own = placed.spans[i] as SpanLoads;
    const start = startOf(frame, placed, alone, ends, i);
    const end = integrateSpan(
      course,
      own,
      breaksOf(own, (spans[i] as SpanStiffness).length, total * SAME_PLACE),
      start,
      nodes[i] as number,
      nodes[i + 1] as number,
      flexibility,
      shearFlexibility,
    );
    reactions[i] = (reactions[i] as number) + start.shear;
    reactions[i + 1] = (reactions[i + 1] as number) - end.shear;
    if (restraints[i] === 'fixed') fixingMoments[i] = (fixingMoments[i] as number) + start.moment;
    if (restraints[i + 1] === 'fixed') fixingMoments[i + 1] = (fixingMoments[i + 1] as number) - end.moment;
  }
  for (let i = 0; i < reactions.length; i += 1) if (restraints[i] === 'free') reactions[i] = 0;
  return { ok: true, effects: { ...course, reactions, fixingMoments } };
}

/** Sagging moments at both ends of each span, and the rotation of each support. */
interface EndMoments {
  left: Float64Array;
  right: Float64Array;
  rotations: Float64Array;
}

/**
 * Equilibrium of moments at each support that is free to turn gives the rotations, these the end moments.
 * Where statics give a moment it is taken from there, free of the rounding of the solution.
 */
function endMoments(frame: Frame, placed: PlacedLoads, alone: readonly Section[]): EndMoments {
  const { restraints, spans } = frame;
  const count = spans.length;
  const left = new Float64Array(count);
  const right = new Float64Array(count);
  const rotations = Float64Array.from(placed.nodeCouples);
  for (let i = 0; i < count; i += 1) {
    const span = spans[i] as SpanStiffness;
    const loads = alone[i] as Section;
    if (restraints[i] === 'free') {
      left[i] = placed.nodeCouples[0] as number;
      right[i] = loads.moment + (left[i] as number) - (placed.nodeForces[0] as number) * span.length;
    } else if (restraints[i + 1] === 'free') {
      right[i] = 0 - (placed.nodeCouples[i + 1] as number);
      left[i] =
        (right[i] as number) -
        loads.moment -
        ((placed.nodeForces[i + 1] as number) - loads.shear) * span.length;
    } else {
      const fixed = fixedEndMoments(span, loads);
      left[i] = fixed.left;
      right[i] = fixed.right;
    }
    rotations[i] = (rotations[i] as number) - (left[i] as number);
    rotations[i + 1] = (rotations[i + 1] as number) + (right[i] as number);
  }
  for (let i = 0; i <= count; i += 1) if (restraints[i] !== 'pin') rotations[i] = 0;
  frame.rotations.solve(rotations);
  for (let i = 0; i < count; i += 1) {
    if (restraints[i] === 'free' || restraints[i + 1] === 'free') continue;
    const { near, far } = spans[i] as SpanStiffness;
    const here = rotations[i] as number;
    const there = rotations[i + 1] as number;
    left[i] = (left[i] as number) + near * here + far * there;
    right[i] = (right[i] as number) - far * here - near * there;
  }
  if (restraints[0] === 'pin') left[0] = placed.nodeCouples[0] as number;
  if (restraints[count] === 'pin') right[count - 1] = 0 - (placed.nodeCouples[count] as number);
  return { left, right, rotations };
}

/** State at the left end of a span: at a support known, at a free end found back from the support. */
function startOf(
  { restraints, spans, shearFlexibility }: Frame,
  placed: PlacedLoads,
  alone: readonly Section[],
  { left, right, rotations }: EndMoments,
  i: number,
): Section {
  const { length } = spans[i] as SpanStiffness;
  const loads = alone[i] as Section;
  const moment = left[i] as number;
  if (restraints[i] === 'free') {
    const shear = 0 - (placed.nodeForces[i] as number);
    const rotation = (rotations[i + 1] as number) + length * (moment + (shear * length) / 2) - loads.rotation;
    const deflection =
      length * (-rotation - shear * shearFlexibility + length * (moment / 2 + (shear * length) / 6)) -
      loads.deflection;
    return { shear, moment, rotation, deflection };
  }
  const shear =
    restraints[i + 1] === 'free'
      ? (placed.nodeForces[i + 1] as number) - loads.shear
      : ((right[i] as number) - moment - loads.moment) / length;
  return { shear, moment, rotation: rotations[i] as number, deflection: 0 };
}
