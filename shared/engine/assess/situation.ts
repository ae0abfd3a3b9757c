import type { BeamLoad } from '#shared/analysis/types.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import { addTo, type GridCase, type Grid, MOMENT_TERMS, SHEAR_TERMS, valueAt } from '../effects/grid.ts';
import type { Model } from '../effects/model.ts';

/** How shear is taken near a support, with the distance worked out. */
export type ShearRule =
  | { at: 'support' }
  | { at: 'distance'; distance: number; from: 'centre' | 'face'; pointLoads: 'keep' | 'omit' | 'scale' };

/** Effects of one action at the places that never move, one row per arrangement. */
export interface ActionEffects {
  action: number;
  variable: boolean;
  cases: readonly GridCase[];
  loads: readonly (readonly BeamLoad[])[];
  /** Shear just left and right of each node, as it is and as reduced near the support. */
  nodal: readonly NodalShear[];
}

export interface NodalShear {
  left: Float64Array;
  right: Float64Array;
  reducedLeft: Float64Array;
  reducedRight: Float64Array;
}

/** A member under its loads, with its section: what the places are read from. */
export interface Situation {
  model: Model;
  grid: Grid;
  /** In the edition's order of actions. */
  actions: readonly ActionEffects[];
  /** 1 / EI; null where the edition gives no stiffness. */
  flexibility: number | null;
  /** Whether the reduced shear can differ from the shear. */
  reduced: boolean;
}

/** Puts section and self-weight into a model. */
export function situate(
  model: Model,
  natures: (action: number) => boolean,
  selfWeight: { action: number; line: number } | null,
  flexibility: number | null,
  rule: ShearRule,
  bearings: readonly (number | null)[],
): Situation {
  const carried = [...model.casesOf.keys()];
  if (selfWeight && !carried.includes(selfWeight.action)) carried.push(selfWeight.action);
  carried.sort((a, b) => a - b);
  const actions = carried.map((action): ActionEffects => {
    let cases = model.casesOf.get(action) ?? [];
    let loads = model.loadsOf.get(action) ?? [];
    if (selfWeight?.action === action) {
      const { line } = selfWeight;
      const own = model.unitSelfWeightLoads.map((load) => scaled(load, line));
      cases = cases.length
        ? cases.map((each) => withSelfWeight(model, each, line))
        : [withSelfWeight(model, null, line)];
      loads = loads.length ? loads.map((each) => [...each, ...own]) : [own];
    }
    return {
      action,
      variable: natures(action),
      cases,
      loads,
      nodal: cases.map((each, i) => nodalShear(model, each, loads[i] ?? [], rule, bearings)),
    };
  });
  return { model, grid: model.grid, actions, flexibility, reduced: rule.at === 'distance' };
}

/** A case with self-weight of a given size added. */
function withSelfWeight(model: Model, base: GridCase | null, line: number): GridCase {
  const unit = model.unitSelfWeight;
  const sum = (key: 'shear' | 'moment' | 'deflection') => {
    const out = base ? base[key].slice() : new Float64Array(unit[key].length);
    addTo(out, unit[key], line);
    return out;
  };
  return {
    shear: sum('shear'),
    moment: sum('moment'),
    deflection: sum('deflection'),
    reactions: unit.reactions.map((reaction, i) => (base?.reactions[i] ?? 0) + line * reaction),
  };
}

function scaled(load: BeamLoad, by: number): BeamLoad {
  if (load.kind !== 'line') return load;
  return { ...load, startIntensity: load.startIntensity * by, endIntensity: load.endIntensity * by };
}

function nodalShear(
  model: Model,
  { shear }: GridCase,
  loads: readonly BeamLoad[],
  rule: ShearRule,
  bearings: readonly (number | null)[],
): NodalShear {
  const { grid, geometry } = model;
  const nodes = geometry.nodes.length;
  const left = new Float64Array(nodes);
  const right = new Float64Array(nodes);
  for (let node = 0; node < nodes; node += 1) {
    const first = grid.firstOfSpan[node] as number;
    const x = geometry.nodes[node] as number;
    if (node > 0) left[node] = valueAt(grid, shear, SHEAR_TERMS, first - 1, x);
    if (node < nodes - 1) right[node] = valueAt(grid, shear, SHEAR_TERMS, first, x);
  }
  if (rule.at === 'support') return { left, right, reducedLeft: left, reducedRight: right };
  const reducedLeft = left.slice();
  const reducedRight = right.slice();
  for (let node = 0; node < nodes; node += 1) {
    const face = rule.from === 'face' ? (bearings[node] ?? 0) / 2 : 0;
    const distance = rule.distance + face;
    if (node > 0) reducedLeft[node] = reducedShear(model, shear, loads, node, -1, distance, rule.pointLoads);
    if (node < nodes - 1) {
      reducedRight[node] = reducedShear(model, shear, loads, node, 1, distance, rule.pointLoads);
    }
  }
  return { left, right, reducedLeft, reducedRight };
}

/**
 * Shear at a distance from a node, with point loads inside the distance kept, left out, or counted in
 * proportion to their distance. Not reduced where the distance reaches the next node.
 */
function reducedShear(
  { grid, geometry }: Model,
  shear: Float64Array,
  loads: readonly BeamLoad[],
  node: number,
  direction: 1 | -1,
  distance: number,
  pointLoads: 'keep' | 'omit' | 'scale',
): number {
  const support = geometry.nodes[node] as number;
  const span = direction > 0 ? node : node - 1;
  const spanLength = (geometry.nodes[span + 1] as number) - (geometry.nodes[span] as number);
  const first = grid.firstOfSpan[span] as number;
  const last = (grid.firstOfSpan[span + 1] as number) - 1;
  if (distance >= spanLength || distance <= 0) {
    return valueAt(grid, shear, SHEAR_TERMS, direction > 0 ? first : last, support);
  }
  const x = support + direction * distance;
  let piece = direction > 0 ? first : last;
  while (direction > 0 ? (grid.breaks[piece + 1] as number) <= x : (grid.breaks[piece] as number) >= x) {
    piece += direction;
  }
  let value = valueAt(grid, shear, SHEAR_TERMS, piece, x);
  if (pointLoads === 'omit') return value;
  for (const load of loads) {
    if (load.kind !== 'point') continue;
    const away = (load.x - support) * direction;
    if (away <= 0 || away > distance) continue;
    value += direction * load.force * (pointLoads === 'scale' ? away / distance : 1);
  }
  return value;
}

/** Sum of moments (or deflections) of a combination in one arrangement, into a buffer. */
export function superpose(
  situation: Situation,
  combination: ExpandedCombination,
  arrangement: number,
  key: 'moment' | 'deflection' | 'shear',
  sum: Float64Array,
): void {
  sum.fill(0);
  for (const { action, factor } of combination.terms) {
    const effects = effectsOf(situation, action);
    if (effects) addTo(sum, caseOf(effects, arrangement)[key], factor);
  }
}

export function effectsOf(situation: Situation, action: number): ActionEffects | undefined {
  const { actions } = situation;
  for (let i = 0; i < actions.length; i += 1) {
    const effects = actions[i] as ActionEffects;
    if (effects.action === action) return effects;
  }
  return undefined;
}

/** The case of an action in an arrangement; an action that isn't patterned has one for all. */
export function caseOf(effects: ActionEffects, arrangement: number): GridCase {
  return (effects.cases[arrangement] ?? effects.cases[0]) as GridCase;
}

export function nodalOf(effects: ActionEffects, arrangement: number): NodalShear {
  return (effects.nodal[arrangement] ?? effects.nodal[0]) as NodalShear;
}

/** How many arrangements a combination has. */
export function arrangementCount(situation: Situation, combination: ExpandedCombination): number {
  let most = 1;
  for (const { action } of combination.terms) {
    most = Math.max(most, effectsOf(situation, action)?.cases.length ?? 1);
  }
  return most;
}

/** Moment of one action, unfactored. */
export function momentOf(
  situation: Situation,
  effects: ActionEffects,
  arrangement: number,
  piece: number,
  x: number,
): number {
  return valueAt(situation.grid, caseOf(effects, arrangement).moment, MOMENT_TERMS, piece, x);
}
