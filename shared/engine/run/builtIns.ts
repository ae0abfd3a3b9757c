import type { Place } from '../assess/places.ts';
import { effectsOf } from '../assess/situation.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import { zeroMomentLength } from '../effects/peaks.ts';
import type { Context } from './context.ts';
import type { Env } from './env.ts';
import { loadForm, spanKind } from './spanKinds.ts';

/** Reads a fact that every member has; null where it has none, with the sentence that says why. */
export interface BuiltIn {
  read: (context: Context) => number | string | null;
  missing: string;
}

const notHere = 'it does not exist at this place';

const atPlace = (
  read: (place: Place, context: Context) => number | string | null,
  missing = notHere,
): BuiltIn => ({
  read: (context) => (context.place ? read(context.place, context) : null),
  missing,
});

const atNode = (read: (place: Place, context: Context) => number | string | null, missing: string): BuiltIn =>
  atPlace((place, context) => (place.node < 0 ? null : read(place, context)), missing);

const ofKind = (kind: Place['kind'], read: (place: Place, context: Context) => number | string | null) =>
  atPlace((place, context) => (place.kind === kind ? read(place, context) : null));

const always = (read: (context: Context) => number | string | null): BuiltIn => ({ read, missing: notHere });

/** Facts of `shared/basis/facts.ts`, by symbol. */
export const builtIns: Readonly<Record<string, BuiltIn>> = {
  b: always(({ given }) => given.section.b),
  b_1: always(({ given }) => given.section.b1),
  h: always(({ given }) => given.section.h),
  b_nominal: always(({ given }) => given.section.bNominal),
  h_nominal: always(({ given }) => given.section.hNominal),
  pieces: always(({ given }) => given.section.pieces),
  spacing: {
    read: ({ given }) => given.spacing,
    missing: 'the member is not one of several at a spacing',
  },
  tributary: { read: ({ given }) => given.tributary, missing: 'no tributary width is given' },
  spans: always(({ given }) => given.lengths.length),
  L_max: {
    read: ({ geometry }) =>
      geometry && geometry.spans.reduce((most, { length }) => Math.max(most, length), 0),
    missing: 'the spans are not worked out yet where this is needed',
  },
  slope: always(({ given }) => given.slope),
  grade: always(({ given }) => given.grade.id),

  duration: {
    read: ({ combination, pattern, edition }) =>
      combination
        ? (edition.durations[combination.duration]?.id ?? null)
        : (edition.combinations[pattern]?.duration ?? null),
    missing: 'the duration of a combination is known only once its factors are',
  },
  combination: {
    read: ({ pattern, edition }) => edition.combinations[pattern]?.id ?? null,
    missing: 'there is no combination here',
  },
  state: {
    read: ({ pattern, edition }) => edition.combinations[pattern]?.state ?? null,
    missing: 'there is no combination here',
  },
  action: always(({ action, edition }) => edition.actions[action]?.id ?? null),
  nature: always(({ action, edition }) => edition.actions[action]?.nature ?? null),
  action_duration: always(({ action, edition }) => edition.actions[action]?.duration ?? null),

  x: atPlace(({ x }) => x),
  L: atPlace(({ span }, { geometry }) => geometry?.spans[span]?.length ?? null),
  span_kind: atPlace(({ span }, { given }) => spanKind(given.restraints, span)),
  load_form: atPlace(formOfLoad),

  M: ofKind('moment', ({ value }) => Math.abs(value)),
  M_variable: ofKind('moment', towards),
  bending_side: ofKind('moment', ({ value }) => (value < 0 ? 'hogging' : 'sagging')),
  L_0: ofKind('moment', lengthBetweenZeros),
  V: ofKind('shear', ({ value }) => Math.abs(value)),
  V_d: ofKind('shear', ({ reduced }) => Math.abs(reduced)),
  V_variable: ofKind('shear', towards),
  R: ofKind('support', (place, context) => Math.max(0, verticalReaction(place.value, context))),
  R_up: ofKind('support', (place, context) => Math.max(0, -verticalReaction(place.value, context))),
  R_variable: ofKind('support', (place, context) => verticalReaction(towards(place), context)),
  w: atPlace(
    ({ kind, value }) => (kind === 'deflection' && !Number.isNaN(value) ? Math.abs(value) : null),
    'the edition gives no stiffness for this member',
  ),

  support_kind: atNode(
    ({ node }, { given }) => (node === 0 || node === given.restraints.length - 1 ? 'end' : 'inner'),
    notHere,
  ),
  l_b: atNode(
    ({ node }, { given }) => given.bearings[node] ?? null,
    'no bearing length is given at this support',
  ),
  end_distance: atNode(endDistance, 'no bearing length is given at this support'),
};

/** Fills the slot of a built-in fact. */
export function fillBuiltIn(env: Env, slot: number, symbol: string, title: string, context: Context): void {
  const builtIn = builtIns[symbol];
  const value = builtIn ? builtIn.read(context) : null;
  if (typeof value === 'number') env.setNumber(slot, value);
  else if (typeof value === 'string') env.setWord(slot, value);
  else if (symbol === 'w' && context.noStiffness) env.setProblem(slot, context.noStiffness);
  else {
    env.setProblem(slot, {
      kind: 'missing',
      symbol,
      message: `${title} (${symbol}) has no value here: ${builtIn?.missing ?? notHere}.`,
    });
  }
}

/** The part from variable actions, positive in the direction of the whole. */
function towards({ value, variable }: Place): number {
  return value < 0 ? -variable : variable;
}

/** Reactions act vertically; the analysis gives their part at right angles to the member. */
export function verticalReaction(normal: number, { given }: Context): number {
  return normal / given.cosine;
}

function lengthBetweenZeros(place: Place, { visitor, combination, situation }: Context): number | null {
  if (!visitor || !combination || !situation) return null;
  const moment = visitor.momentSum(combination, place.arrangement);
  return zeroMomentLength(situation.grid, moment, place.piece, place.x);
}

function formOfLoad({ span, arrangement, value, kind }: Place, context: Context): string | null {
  const { combination, situation, geometry } = context;
  if (!combination || !situation || !geometry) return null;
  const loads = loadsUnder(combination, arrangement, context);
  const from = geometry.nodes[span] as number;
  const to = geometry.nodes[span + 1] as number;
  const { restraints } = context.given;
  const free = { left: restraints[span] === 'free', right: restraints[span + 1] === 'free' };
  return loadForm(loads, from, to, kind !== 'moment' || value !== 0, free);
}

function loadsUnder(combination: ExpandedCombination, arrangement: number, { situation }: Context) {
  if (!situation) return [];
  return combination.terms.flatMap(({ action }) => {
    const effects = effectsOf(situation, action);
    return effects?.loads[arrangement] ?? effects?.loads[0] ?? [];
  });
}

/** From the edge of the bearing to the nearer end of the member; 0 at its very end. */
function endDistance({ node }: Place, { given, geometry }: Context): number | null {
  if (!geometry) return null;
  const last = geometry.nodes.length - 1;
  if (node === 0 || node === last) return 0;
  const bearing = given.bearings[node] ?? null;
  if (bearing === null) return null;
  const x = geometry.nodes[node] as number;
  const away = Math.min(x, (geometry.nodes[last] as number) - x);
  return Math.max(0, away - bearing / 2);
}
