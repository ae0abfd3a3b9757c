/**
 * The structural model and its effects. One coherent unit system throughout: lengths in L,
 * forces in F (so moments F·L, line loads F/L, stiffness EI in F·L², GA in F). The analysis
 * neither knows nor cares whether L and F are millimetres and newtons or inches and pounds.
 *
 * Signs: x from the left end; loads and deflection positive downwards; sagging moment positive;
 * shear positive when the part to the left of the cut is pushed up; reactions positive upwards;
 * couples positive clockwise.
 */

/** How a node of the member is held. `free` is a free end (cantilever tip). */
export type Restraint = 'pin' | 'fixed' | 'free';

/** A straight prismatic member: nodes at span ends, one restraint per node. */
export interface Beam {
  /** Span lengths, left to right; a cantilever or overhang counts as a span with a free end. */
  spans: readonly number[];
  /** One more than spans. Only the first and the last may be `free`. */
  restraints: readonly Restraint[];
  /** Bending stiffness, F·L². */
  EI: number;
  /** Shear stiffness including the form factor, F; left out: no shear deformation. */
  GA?: number;
}

/** A load on the member, positions from the left end of the whole member. */
export type BeamLoad =
  /** Linearly varying line load between two places; equal ends give a uniform load. */
  | { kind: 'line'; from: number; to: number; startIntensity: number; endIntensity: number }
  | { kind: 'point'; x: number; force: number }
  | { kind: 'couple'; x: number; moment: number };

/** A polynomial piece valid on [from, to]; coefficients in (x − from), lowest power first. */
export interface Piece {
  from: number;
  to: number;
  coefficients: readonly number[];
}

/** Effects of one set of loads along the member, as exact piecewise polynomials. */
export interface Effects {
  shear: readonly Piece[];
  moment: readonly Piece[];
  rotation: readonly Piece[];
  deflection: readonly Piece[];
  /** Per node: upward force (0 at a free end). */
  reactions: readonly number[];
  /** Per node: moment given by a fixed restraint to the member, clockwise positive (0 elsewhere). */
  fixingMoments: readonly number[];
}

/** A peak of an effect and its place. */
export interface Peak {
  x: number;
  value: number;
}

/** What cannot be analysed, said for people and placed. */
export interface AnalysisProblem {
  code:
    | 'no-span'
    | 'bad-length'
    | 'bad-stiffness'
    | 'too-many-spans'
    | 'bad-restraints'
    | 'mechanism'
    | 'load-outside'
    | 'bad-load';
  message: string;
  /** Index of the span, node or load concerned. */
  index?: number;
}

export type AnalysisOutcome = { ok: true; effects: Effects } | { ok: false; problems: AnalysisProblem[] };
