/**
 * Facts that every member has, beside the symbols an edition declares (choices, inputs, grade columns,
 * action values, clauses). A symbol is known at the widest level at which it is constant.
 */

/** Levels, from wide to narrow. `term` (one action within a combination) and `place` don't meet. */
export const levels = ['edition', 'member', 'combination', 'term', 'place'] as const;
export type Level = (typeof levels)[number];

/** Physical dimension as powers of length and force, and mass density for its own sake. */
export type FactDimension =
  'number' | 'length' | 'force' | 'moment' | 'lineLoad' | 'stress' | 'angle' | 'word';

/** Where a place-level fact exists; `any` for facts of the wider levels. */
export type PlaceKind = 'moment' | 'shear' | 'support' | 'deflection';

export interface BuiltInFact {
  symbol: string;
  title: string;
  dimension: FactDimension;
  level: Level;
  /** For place facts: the kinds of check where the fact exists. */
  at?: readonly PlaceKind[];
  /** For words: what it can be, where the list doesn't depend on the edition. */
  words?: readonly string[];
  /** For numbers: what it can be; left out where anything. */
  range?: FactRange;
}

/** Bounds of a number: more than `above`, or at least `from`; at most `to`. */
export interface FactRange {
  above?: number;
  from?: number;
  to?: number;
  whole?: boolean;
}

const positive: FactRange = { above: 0 };
const notNegative: FactRange = { from: 0 };
const counted: FactRange = { from: 1, whole: true };

const everywhere = ['moment', 'shear', 'support', 'deflection'] as const;

export const builtInFacts: readonly BuiltInFact[] = [
  // Member
  { symbol: 'b', title: 'Breadth, all pieces', dimension: 'length', level: 'member', range: positive },
  { symbol: 'b_1', title: 'Breadth of one piece', dimension: 'length', level: 'member', range: positive },
  { symbol: 'h', title: 'Depth', dimension: 'length', level: 'member', range: positive },
  {
    symbol: 'b_nominal',
    title: 'Ordered breadth of one piece',
    dimension: 'length',
    level: 'member',
    range: positive,
  },
  { symbol: 'h_nominal', title: 'Ordered depth', dimension: 'length', level: 'member', range: positive },
  { symbol: 'pieces', title: 'Pieces acting together', dimension: 'number', level: 'member', range: counted },
  {
    symbol: 'spacing',
    title: 'Spacing of repeated members',
    dimension: 'length',
    level: 'member',
    range: positive,
  },
  { symbol: 'tributary', title: 'Tributary width', dimension: 'length', level: 'member', range: positive },
  { symbol: 'spans', title: 'Number of spans', dimension: 'number', level: 'member', range: counted },
  { symbol: 'L_max', title: 'Longest span', dimension: 'length', level: 'member', range: positive },
  { symbol: 'slope', title: 'Slope', dimension: 'angle', level: 'member', range: { from: 0, to: 75 } },
  { symbol: 'grade', title: 'Grade', dimension: 'word', level: 'member' },
  // Combination
  { symbol: 'duration', title: 'Duration of the combination', dimension: 'word', level: 'combination' },
  { symbol: 'combination', title: 'Combination pattern', dimension: 'word', level: 'combination' },
  { symbol: 'state', title: 'State of the combination', dimension: 'word', level: 'combination' },
  // Term: one action within a combination
  { symbol: 'action', title: 'Action', dimension: 'word', level: 'term' },
  {
    symbol: 'nature',
    title: 'Nature of the action',
    dimension: 'word',
    level: 'term',
    words: ['permanent', 'variable'],
  },
  { symbol: 'action_duration', title: 'Duration of the action', dimension: 'word', level: 'term' },
  // Place
  {
    symbol: 'x',
    title: 'Place from the left end',
    dimension: 'length',
    level: 'place',
    at: everywhere,
    range: notNegative,
  },
  { symbol: 'L', title: 'Span', dimension: 'length', level: 'place', at: everywhere, range: positive },
  {
    symbol: 'span_kind',
    title: 'Kind of span',
    dimension: 'word',
    level: 'place',
    at: everywhere,
    words: ['simple', 'end', 'inner', 'cantilever'],
  },
  {
    symbol: 'load_form',
    title: 'Form of the load on the span',
    dimension: 'word',
    level: 'place',
    at: everywhere,
    words: ['none', 'uniform', 'point', 'mixed', 'end-moment'],
  },
  {
    symbol: 'M',
    title: 'Bending moment',
    dimension: 'moment',
    level: 'place',
    at: ['moment'],
    range: notNegative,
  },
  {
    symbol: 'M_variable',
    title: 'Bending moment from variable actions',
    dimension: 'moment',
    level: 'place',
    at: ['moment'],
  },
  {
    symbol: 'bending_side',
    title: 'Edge in tension',
    dimension: 'word',
    level: 'place',
    at: ['moment'],
    words: ['sagging', 'hogging'],
  },
  {
    symbol: 'L_0',
    title: 'Length between points of zero moment',
    dimension: 'length',
    level: 'place',
    at: ['moment'],
  },
  {
    symbol: 'V',
    title: 'Shear force',
    dimension: 'force',
    level: 'place',
    at: ['shear'],
    range: notNegative,
  },
  {
    symbol: 'V_d',
    title: 'Shear force as reduced near the support',
    dimension: 'force',
    level: 'place',
    at: ['shear'],
    range: notNegative,
  },
  {
    symbol: 'V_variable',
    title: 'Shear force from variable actions',
    dimension: 'force',
    level: 'place',
    at: ['shear'],
  },
  {
    symbol: 'support_kind',
    title: 'Kind of support',
    dimension: 'word',
    level: 'place',
    at: ['shear', 'support'],
    words: ['end', 'inner'],
  },
  {
    symbol: 'l_b',
    title: 'Bearing length',
    dimension: 'length',
    level: 'place',
    at: ['shear', 'support'],
    range: positive,
  },
  {
    symbol: 'end_distance',
    title: 'Distance from the edge of the bearing to the end of the member',
    dimension: 'length',
    level: 'place',
    at: ['support'],
    range: notNegative,
  },
  {
    symbol: 'R',
    title: 'Reaction, downwards on the support',
    dimension: 'force',
    level: 'place',
    at: ['support'],
    range: notNegative,
  },
  {
    symbol: 'R_up',
    title: 'Uplift',
    dimension: 'force',
    level: 'place',
    at: ['support'],
    range: notNegative,
  },
  {
    symbol: 'R_variable',
    title: 'Reaction from variable actions',
    dimension: 'force',
    level: 'place',
    at: ['support'],
  },
  {
    symbol: 'w',
    title: 'Deflection',
    dimension: 'length',
    level: 'place',
    at: ['deflection'],
    range: notNegative,
  },
];
