import { type PlaceKind, PlaceVisitor } from '../assess/places.ts';
import { arrangementCount, type Situation, superpose } from '../assess/situation.ts';
import { stand } from '../assess/stand.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import { DEFLECTION_TERMS, type Grid, MOMENT_TERMS, SHEAR_TERMS } from '../effects/grid.ts';
import { valueOf } from '../effects/polynomial.ts';
import { preparedOf } from '../runtimes.ts';
import type { Curves, Member, Plan } from '../types.ts';

/** Places taken within each piece, its ends included. */
const PER_PIECE = 13;

const effects = [
  { name: 'V', key: 'shear', terms: SHEAR_TERMS, kind: 'shear' },
  { name: 'M', key: 'moment', terms: MOMENT_TERMS, kind: 'moment' },
  { name: 'w', key: 'deflection', terms: DEFLECTION_TERMS, kind: 'deflection' },
] as const;
type EffectName = (typeof effects)[number]['name'];

/**
 * Shear, moment and deflection along the member, for the drawings: by combination with all spans loaded,
 * and the envelope over every combination and arrangement. At a jump the place comes twice, once for
 * either side. Combinations for deflection give w, those for strength V and M. Null where the member
 * can't be analysed.
 */
export function curves(plan: Plan, member: Member): Curves | null {
  const { runtime } = preparedOf(plan);
  const outcome = stand(runtime, member);
  if (!outcome.ok) return null;
  const { context, combinations, runtime: ready } = outcome.standing;
  const { situation } = context;
  if (!situation) return null;
  const places = placesOn(situation.grid);
  const statesOf = (kind: PlaceKind) =>
    new Set(ready.checks.filter((check) => check.kind === kind).map(({ state }) => state));
  const byCombination: Record<string, Record<EffectName, number[]>> = {};
  const envelope = newEnvelope(places.x.length);
  for (const combination of combinations) {
    if (combination.problem) continue;
    const own: Record<EffectName, number[]> = { V: [], M: [], w: [] };
    for (const effect of effects) {
      if (!statesOf(effect.kind).has(combination.state)) continue;
      const count = arrangementCount(situation, combination);
      for (let a = 0; a < count; a += 1) {
        const values = sampled(situation, combination, a, effect, places);
        if (a === 0) own[effect.name] = values;
        widen(envelope[effect.name], values);
      }
    }
    byCombination[combination.id] = own;
  }
  return { x: places.x, byCombination, envelope, peaks: peaksOf(situation, combinations, statesOf) };
}

interface Places {
  x: number[];
  piece: number[];
  within: number[];
}

function placesOn({ breaks }: Grid): Places {
  const places: Places = { x: [], piece: [], within: [] };
  for (let piece = 0; piece < breaks.length - 1; piece += 1) {
    const from = breaks[piece] as number;
    const length = (breaks[piece + 1] as number) - from;
    for (let i = 0; i < PER_PIECE; i += 1) {
      const within = (length * i) / (PER_PIECE - 1);
      places.x.push(from + within);
      places.piece.push(piece);
      places.within.push(within);
    }
  }
  return places;
}

function sampled(
  situation: Situation,
  combination: ExpandedCombination,
  arrangement: number,
  { key, terms, name }: (typeof effects)[number],
  { piece, within }: Places,
): number[] {
  const sum = new Float64Array(situation.model.unitSelfWeight.grid[key].length);
  superpose(situation, combination, arrangement, key, sum);
  const scale = name === 'w' ? (situation.flexibility ?? 0) : 1;
  return piece.map((k, i) => valueOf(sum, k * terms, terms, within[i] as number) * scale);
}

interface Band {
  most: number[];
  least: number[];
}

function newEnvelope(length: number): Record<EffectName, Band> {
  const band = (): Band => ({
    most: new Array<number>(length).fill(0),
    least: new Array<number>(length).fill(0),
  });
  return { V: band(), M: band(), w: band() };
}

function widen({ most, least }: Band, values: readonly number[]): void {
  values.forEach((value, i) => {
    if (value > (most[i] as number)) most[i] = value;
    if (value < (least[i] as number)) least[i] = value;
  });
}

/** Largest and smallest value of each effect over all combinations. */
function peaksOf(
  situation: Situation,
  combinations: readonly ExpandedCombination[],
  statesOf: (kind: PlaceKind) => Set<string | undefined>,
): Curves['peaks'] {
  const visitor = new PlaceVisitor(situation);
  return effects.flatMap(({ name, kind }) => {
    const states = statesOf(kind);
    const found: Curves['peaks'][number][] = [];
    for (const combination of combinations) {
      if (combination.problem || !states.has(combination.state)) continue;
      visitor.visit(kind, combination, ({ x, value }) => {
        if (Number.isFinite(value)) found.push({ of: name, x, value, combination: combination.id });
      });
    }
    const first = found[0];
    if (!first) return [];
    const most = found.reduce((best, each) => (each.value > best.value ? each : best), first);
    const least = found.reduce((best, each) => (each.value < best.value ? each : best), first);
    return [...(most.value > 0 ? [most] : []), ...(least.value < 0 ? [least] : [])];
  });
}
