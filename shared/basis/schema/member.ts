import { Type, type Static } from '@sinclair/typebox';
import { closed, Id, named, oneOf, Symbol, Text, Title } from './common.ts';

/*
 * Units of a member document, by its `units`:
 *   metric:      lengths mm, area loads kN/m2, line loads kN/m, forces kN, couples kN m
 *   inch-pound:  lengths in, area loads psf,   line loads plf,  forces lbf, couples lbf ft
 * Numbers in `inputs` and departures are in mm, N (in, lbf) or pure numbers. Slope in degrees.
 */

const positive = (description: string, maximum: number) =>
  Type.Number({ exclusiveMinimum: 0, maximum, description });

export const SpanInput = closed({
  length: positive('Span length.', 100_000),
  inputs: Type.Optional(named(Symbol, Type.Number())),
});

export const SupportInput = closed({
  restraint: oneOf('pin', 'fixed', 'free'),
  /** Length of bearing along the member. */
  bearing: Type.Optional(positive('Bearing length.', 5000)),
  inputs: Type.Optional(named(Symbol, Type.Number())),
});

/** How a load on a sloping member is given: per length on plan, per length on the slope (both acting
 *  vertically), or at right angles to the member. */
const Direction = Type.Optional(oneOf('plan', 'slope', 'normal'));

/** Where a load came from, when it was not typed in. */
const Origin = Type.Optional(
  Type.Union([
    closed({ kind: Type.Literal('set'), set: Id }),
    closed({
      kind: Type.Literal('member'),
      member: Type.String({ format: 'uuid' }),
      support: Type.Integer({ minimum: 0 }),
    }),
  ]),
);

const place = (description: string) => Type.Number({ minimum: 0, maximum: 5_000_000, description });
const common = { id: Id, action: Id, title: Type.Optional(Title), direction: Direction, origin: Origin };

/** Loads, downwards positive; positions along the member from its left end. */
export const LoadInput = Type.Union([
  /** Over the whole member, or between two places; through the spacing or tributary width. */
  closed({
    ...common,
    kind: Type.Literal('area'),
    intensity: Type.Number(),
    from: Type.Optional(place('Start.')),
    to: Type.Optional(place('End.')),
  }),
  /** Uniform or linearly varying, over the whole member or between two places. */
  closed({
    ...common,
    kind: Type.Literal('line'),
    start: Type.Number(),
    end: Type.Optional(Type.Number()),
    from: Type.Optional(place('Start.')),
    to: Type.Optional(place('End.')),
  }),
  closed({ ...common, kind: Type.Literal('point'), force: Type.Number(), x: place('Place.') }),
  closed({ ...common, kind: Type.Literal('couple'), moment: Type.Number(), x: place('Place.') }),
]);
export type LoadInput = Static<typeof LoadInput>;

/** A clause's value replaced by hand for this member. */
export const Departure = closed({
  clause: Id,
  value: Type.Number(),
  reason: Type.String({ minLength: 1, maxLength: 2000 }),
  approvedBy: Type.Optional(Title),
});
export type Departure = Static<typeof Departure>;

/** A beam, joist, rafter or lintel. */
export const Member = closed({
  schema: Type.Literal('member/1'),
  mark: Type.String({ minLength: 1, maxLength: 24 }),
  title: Type.Optional(Title),
  units: oneOf('metric', 'inch-pound'),
  /** Options of the edition's project and member choices. */
  choices: named(Symbol, Id),
  grade: Id,
  section: closed({
    /** Finished breadth of one piece, and depth. */
    b: positive('Actual breadth of one piece.', 5000),
    h: positive('Actual depth.', 10_000),
    /** Pieces side by side acting together. */
    pieces: Type.Integer({ minimum: 1, maximum: 20 }),
    /** Ordered size, where it differs. */
    nominal: Type.Optional(
      closed({ b: positive('Ordered breadth.', 5000), h: positive('Ordered depth.', 10_000) }),
    ),
    /** Key of the stock section it was taken from. */
    stock: Type.Optional(Type.String({ maxLength: 80 })),
  }),
  /** `clear`: between the faces of the supports, `centres`: between the centres of bearings. */
  spanMeasured: oneOf('centres', 'clear'),
  spans: Type.Array(SpanInput, { minItems: 1, maxItems: 50 }),
  supports: Type.Array(SupportInput, { minItems: 2, maxItems: 51 }),
  /** Slope from the horizontal, degrees; spans are then measured on plan. */
  slope: Type.Optional(Type.Number({ minimum: 0, maximum: 75 })),
  /** Width over which area loads reach the member: repeated members at a spacing, or one alone. */
  carries: Type.Optional(closed({ by: oneOf('spacing', 'tributary'), width: positive('Width.', 50_000) })),
  loads: Type.Array(LoadInput, { maxItems: 200 }),
  inputs: named(Symbol, Type.Number()),
  departures: Type.Array(Departure, { maxItems: 50 }),
  note: Type.Optional(Text),
});
export type Member = Static<typeof Member>;
