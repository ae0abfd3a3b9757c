import type { ExpandedCombination, ExpandedTerm } from '../combine/expand.ts';
import { DEFLECTION_TERMS, MOMENT_TERMS, valueAt } from '../effects/grid.ts';
import { deflectionPeak, type GridPeak, momentPeaks } from '../effects/peaks.ts';
import { arrangementCount, caseOf, effectsOf, nodalOf, type Situation, superpose } from './situation.ts';

export type PlaceKind = 'moment' | 'shear' | 'support' | 'deflection';

/** A place under one combination, with the effects found there. One object is used again and again. */
export interface Place {
  kind: PlaceKind;
  /** Position in the order of visits under its combination. */
  ordinal: number;
  arrangement: number;
  /** Span concerned; for a support the longer of its spans. */
  span: number;
  /** Node, for shear and supports, else −1. */
  node: number;
  side: 'left' | 'right';
  x: number;
  piece: number;
  /** Signed effect: moment, shear, upward reaction normal to the member, or deflection. */
  value: number;
  /** The part of it from variable actions. */
  variable: number;
  /** Shear as reduced near the support. */
  reduced: number;
}

/** Values this close are equal but for rounding. */
const SAME = 1e-9;

export const newPlace = (): Place => ({
  kind: 'moment',
  ordinal: 0,
  arrangement: 0,
  span: 0,
  node: -1,
  side: 'left',
  x: 0,
  piece: 0,
  value: 0,
  variable: 0,
  reduced: 0,
});

/** Visits the places of one kind under a combination, each with its worst arrangement. */
export class PlaceVisitor {
  private readonly place = newPlace();
  private readonly sums: Float64Array[] = [];
  /** Not one of the sums, since it is asked for while they are being visited. */
  private aside: Float64Array | null = null;
  private readonly peaks: { most: GridPeak; least: GridPeak }[] = [];
  private readonly most: GridPeak = { x: 0, piece: 0, value: 0 };
  private readonly least: GridPeak = { x: 0, piece: 0, value: 0 };
  private readonly situation: Situation;

  constructor(situation: Situation) {
    this.situation = situation;
  }

  visit(kind: PlaceKind, combination: ExpandedCombination, to: (place: Place) => void): void {
    this.place.kind = kind;
    this.place.ordinal = 0;
    if (kind === 'moment') this.moments(combination, to);
    else if (kind === 'deflection') this.deflections(combination, to);
    else if (kind === 'shear') this.shears(combination, to);
    else this.supports(combination, to);
  }

  /** Moment along the member in one arrangement; for the length between points of zero moment. */
  momentSum(combination: ExpandedCombination, arrangement: number): Float64Array {
    this.aside ??= new Float64Array(this.situation.model.unitSelfWeight.grid.moment.length);
    superpose(this.situation, combination, arrangement, 'moment', this.aside);
    return this.aside;
  }

  private buffer(index: number, length: number): Float64Array {
    const known = this.sums[index];
    if (known?.length === length) return known;
    const buffer = new Float64Array(length);
    this.sums[index] = buffer;
    return buffer;
  }

  /** Largest and smallest moment of a span in an arrangement, kept from the first pass to the second. */
  private peaksAt(index: number): { most: GridPeak; least: GridPeak } {
    return (this.peaks[index] ??= {
      most: { x: 0, piece: 0, value: 0 },
      least: { x: 0, piece: 0, value: 0 },
    });
  }

  /** Fills one buffer per arrangement; returns how many. */
  private superposeAll(combination: ExpandedCombination, key: 'moment' | 'deflection'): number {
    const count = arrangementCount(this.situation, combination);
    const { length } = this.situation.model.unitSelfWeight.grid[key];
    for (let a = 0; a < count; a += 1) superpose(this.situation, combination, a, key, this.buffer(a, length));
    return count;
  }

  private moments(combination: ExpandedCombination, to: (place: Place) => void): void {
    const { situation, place } = this;
    const count = this.superposeAll(combination, 'moment');
    const spans = situation.model.beam.spans.length;
    const sagging = new Float64Array(spans).fill(-Infinity);
    const hogging = new Float64Array(spans).fill(Infinity);
    let largest = 0;
    for (let span = 0; span < spans; span += 1) {
      for (let a = 0; a < count; a += 1) {
        const { most, least } = this.peaksAt(span * count + a);
        momentPeaks(situation.grid, this.sums[a] as Float64Array, span, most, least);
        sagging[span] = Math.max(sagging[span] as number, most.value);
        hogging[span] = Math.min(hogging[span] as number, least.value);
      }
      largest = Math.max(largest, sagging[span] as number, -(hogging[span] as number));
    }
    // Where there is no moment, or only what rounding leaves of none, there is nothing to check.
    const trace = largest * SAME;
    for (let span = 0; span < spans; span += 1) {
      const sag = sagging[span] as number;
      const hog = hogging[span] as number;
      place.span = span;
      place.node = -1;
      for (let a = 0; a < count; a += 1) {
        // Arrangements with the same moment can differ in what else counts, such as where it is zero.
        const { most, least } = this.peaksAt(span * count + a);
        if (sag > trace && most.value >= sag * (1 - SAME)) this.putMoment(combination, a, most, to);
        if (-hog > trace && -least.value >= -hog * (1 - SAME)) this.putMoment(combination, a, least, to);
      }
    }
  }

  private putMoment(
    combination: ExpandedCombination,
    arrangement: number,
    peak: GridPeak,
    to: (place: Place) => void,
  ): void {
    const { place, situation } = this;
    place.arrangement = arrangement;
    place.x = peak.x;
    place.piece = peak.piece;
    place.value = 0;
    place.variable = 0;
    for (const { action, factor } of combination.terms) {
      const effects = effectsOf(situation, action);
      if (!effects) continue;
      const { moment } = caseOf(effects, arrangement);
      const part = factor * valueAt(situation.grid, moment, MOMENT_TERMS, peak.piece, peak.x);
      place.value += part;
      if (effects.variable) place.variable += part;
    }
    to(place);
    place.ordinal += 1;
  }

  private deflections(combination: ExpandedCombination, to: (place: Place) => void): void {
    const { situation, place, most, least } = this;
    const count = this.superposeAll(combination, 'deflection');
    for (let span = 0; span < situation.model.beam.spans.length; span += 1) {
      least.value = 0;
      place.arrangement = 0;
      for (let a = 0; a < count; a += 1) {
        deflectionPeak(situation.grid, this.sums[a] as Float64Array, span, most);
        if (a > 0 && Math.abs(most.value) <= Math.abs(least.value)) continue;
        Object.assign(least, most);
        place.arrangement = a;
      }
      place.span = span;
      place.node = -1;
      place.x = least.x;
      place.piece = least.piece;
      place.value = 0;
      place.variable = 0;
      for (const { action, factor } of combination.terms) {
        const effects = effectsOf(situation, action);
        if (!effects) continue;
        const part = factor * this.deflectionOf(action, place.arrangement, place.piece, place.x);
        place.value += part;
        if (effects.variable) place.variable += part;
      }
      to(place);
      place.ordinal += 1;
    }
  }

  /** Deflection of one action, unfactored. NaN where the edition gives no stiffness. */
  deflectionOf(action: number, arrangement: number, piece: number, x: number): number {
    const { situation } = this;
    const effects = effectsOf(situation, action);
    if (!effects) return 0;
    const { deflection } = caseOf(effects, arrangement);
    const perStiffness = valueAt(situation.grid, deflection, DEFLECTION_TERMS, piece, x);
    return perStiffness * (situation.flexibility ?? NaN);
  }

  private shears(combination: ExpandedCombination, to: (place: Place) => void): void {
    const { situation, place } = this;
    const { nodes } = situation.model.geometry;
    const { restraints } = situation.model.beam;
    const count = arrangementCount(situation, combination);
    for (let node = 0; node < nodes.length; node += 1) {
      if (restraints[node] === 'free') continue;
      for (const side of ['left', 'right'] as const) {
        const span = side === 'left' ? node - 1 : node;
        if (span < 0 || span >= nodes.length - 1) continue;
        place.span = span;
        place.node = node;
        place.side = side;
        place.x = nodes[node] as number;
        const first = situation.grid.firstOfSpan[node] as number;
        place.piece = side === 'left' ? first - 1 : first;
        const byShear = this.worstShear(combination, count, 'value');
        this.putShear(combination, byShear, to);
        if (!situation.reduced) continue;
        const byReduced = this.worstShear(combination, count, 'reduced');
        if (byReduced !== byShear) this.putShear(combination, byReduced, to);
      }
    }
  }

  /** The arrangement with the largest shear, by size, at the place. */
  private worstShear(combination: ExpandedCombination, count: number, by: 'value' | 'reduced'): number {
    if (count === 1) return 0;
    let worst = 0;
    let size = -1;
    for (let a = 0; a < count; a += 1) {
      this.sumShear(combination, a);
      if (Math.abs(this.place[by]) > size) {
        size = Math.abs(this.place[by]);
        worst = a;
      }
    }
    return worst;
  }

  private sumShear(combination: ExpandedCombination, arrangement: number): void {
    const { place, situation } = this;
    place.arrangement = arrangement;
    place.value = 0;
    place.variable = 0;
    place.reduced = 0;
    for (let i = 0; i < combination.terms.length; i += 1) {
      const { action, factor } = combination.terms[i] as ExpandedTerm;
      const effects = effectsOf(situation, action);
      if (!effects) continue;
      const nodal = nodalOf(effects, arrangement);
      const isLeft = place.side === 'left';
      const part = factor * ((isLeft ? nodal.left : nodal.right)[place.node] as number);
      place.value += part;
      if (effects.variable) place.variable += part;
      place.reduced += factor * ((isLeft ? nodal.reducedLeft : nodal.reducedRight)[place.node] as number);
    }
  }

  private putShear(combination: ExpandedCombination, arrangement: number, to: (place: Place) => void): void {
    this.sumShear(combination, arrangement);
    to(this.place);
    this.place.ordinal += 1;
  }

  private supports(combination: ExpandedCombination, to: (place: Place) => void): void {
    const { situation, place } = this;
    const { nodes, spans } = situation.model.geometry;
    const { restraints } = situation.model.beam;
    const count = arrangementCount(situation, combination);
    for (let node = 0; node < nodes.length; node += 1) {
      if (restraints[node] === 'free') continue;
      const before = spans[node - 1]?.length ?? 0;
      const after = spans[node]?.length ?? 0;
      place.span = before > after ? node - 1 : node;
      place.side = before > after ? 'left' : 'right';
      place.node = node;
      place.x = nodes[node] as number;
      place.piece = Math.max(0, (situation.grid.firstOfSpan[node] as number) - (before > after ? 1 : 0));
      let down = 0;
      let up = 0;
      let most = -Infinity;
      let least = Infinity;
      for (let a = 0; a < count; a += 1) {
        this.sumReaction(combination, a);
        if (place.value > most) {
          most = place.value;
          down = a;
        }
        if (place.value < least) {
          least = place.value;
          up = a;
        }
      }
      this.putReaction(combination, down, to);
      if (least < 0 && up !== down) this.putReaction(combination, up, to);
    }
  }

  private sumReaction(combination: ExpandedCombination, arrangement: number): void {
    const { place, situation } = this;
    place.arrangement = arrangement;
    place.value = 0;
    place.variable = 0;
    for (let i = 0; i < combination.terms.length; i += 1) {
      const { action, factor } = combination.terms[i] as ExpandedTerm;
      const effects = effectsOf(situation, action);
      if (!effects) continue;
      const part = factor * (caseOf(effects, arrangement).reactions[place.node] as number);
      place.value += part;
      if (effects.variable) place.variable += part;
    }
  }

  private putReaction(
    combination: ExpandedCombination,
    arrangement: number,
    to: (place: Place) => void,
  ): void {
    this.sumReaction(combination, arrangement);
    to(this.place);
    this.place.ordinal += 1;
  }
}
