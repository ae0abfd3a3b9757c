import { shearNear } from '#shared/analysis/shearNear.ts';
import type { BeamLoad } from '#shared/analysis/types.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import { addTo, type GridCase, type Grid, MOMENT_TERMS, SHEAR_TERMS, valueAt } from '../effects/grid.ts';
import type { Model, ModelCase } from '../effects/model.ts';

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
  isVariable: (action: number) => boolean,
  selfWeight: { action: number; line: number } | null,
  flexibility: number | null,
  rule: ShearRule,
  bearings: readonly (number | null)[],
): Situation {
  const carried = [...model.casesOf.keys()];
  if (selfWeight && !carried.includes(selfWeight.action)) carried.push(selfWeight.action);
  carried.sort((a, b) => a - b);
  const unit = { ...model.unitSelfWeight, nodal: nodalShear(model, model.unitSelfWeight, rule, bearings) };
  const actions = carried.map((action): ActionEffects => {
    const line = selfWeight?.action === action ? selfWeight.line : null;
    const own = model.casesOf.get(action) ?? [];
    const cases = own.length ? own : [null];
    const weight = line === null ? [] : unit.loads.map((load) => scaled(load, line));
    return {
      action,
      variable: isVariable(action),
      cases: cases.map((each) =>
        line === null && each ? each.grid : withWeight(unit.grid, each?.grid, line ?? 0),
      ),
      loads: cases.map((each) => [...(each?.loads ?? []), ...weight]),
      nodal: cases.map((each) => {
        const typed = each && nodalShear(model, each, rule, bearings);
        return line === null && typed ? typed : addNodal(typed, unit.nodal, line ?? 0);
      }),
    };
  });
  return { model, grid: model.grid, actions, flexibility, reduced: rule.at === 'distance' };
}

/** A case with self-weight of a given size added. */
function withWeight(unit: GridCase, base: GridCase | undefined, line: number): GridCase {
  const sum = (key: 'shear' | 'moment' | 'deflection') => {
    const out = new Float64Array(unit[key].length);
    if (base) addTo(out, base[key], 1);
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

function addNodal(base: NodalShear | null, unit: NodalShear, line: number): NodalShear {
  const sum = (key: keyof NodalShear) => {
    const out = new Float64Array(unit[key].length);
    if (base) addTo(out, base[key], 1);
    addTo(out, unit[key], line);
    return out;
  };
  const left = sum('left');
  const right = sum('right');
  if (unit.reducedLeft === unit.left) return { left, right, reducedLeft: left, reducedRight: right };
  return { left, right, reducedLeft: sum('reducedLeft'), reducedRight: sum('reducedRight') };
}

/** Shear beside each support, as it is and by the edition's rule. */
function nodalShear(
  { grid, geometry, beam, solver }: Model,
  { grid: { shear }, effects, loads }: ModelCase,
  rule: ShearRule,
  bearings: readonly (number | null)[],
): NodalShear {
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
  const analysed = { spans: beam.spans, solver, loads, effects };
  const reducedLeft = new Float64Array(nodes);
  const reducedRight = new Float64Array(nodes);
  for (let node = 0; node < nodes; node += 1) {
    const toFace = (bearings[node] ?? 0) / 2;
    if (node > 0) reducedLeft[node] = shearNear(analysed, { node, side: 'left', toFace }, rule);
    if (node < nodes - 1) reducedRight[node] = shearNear(analysed, { node, side: 'right', toFace }, rule);
  }
  return { left, right, reducedLeft, reducedRight };
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
