import type { Edition } from '#shared/basis/schema/index.ts';
import type { Place } from '../assess/places.ts';
import { caseOf, effectsOf, nodalOf } from '../assess/situation.ts';
import type { ExpandedCombination, ExpandedTerm } from '../combine/expand.ts';
import { MOMENT_TERMS, valueAt } from '../effects/grid.ts';
import { atTerm, leaveTerm } from '../run/terms.ts';
import type { LedgerEntry } from '../types.ts';
import { placeName, spanNames } from './places.ts';
import { entryOf, type Uses } from './entry.ts';
import type { Recorder } from './recorder.ts';

/** Effects that add up over the actions of a combination. */
export type SummedEffect = 'M' | 'V' | 'V_d' | 'R' | 'w';

const names: Record<SummedEffect, string> = {
  M: 'Bending moment',
  V: 'Shear force',
  V_d: 'Shear force near the support',
  R: 'Reaction',
  w: 'Deflection',
};

/** Name of an action's part in a formula, such as M_G, and of the factor on it, such as k_G. */
const partName = (effect: SummedEffect, symbol: string) => `${effect}_${symbol}`;
const factorName = (symbol: string) => `k_${symbol}`;

/** Factors and unfactored parts of an effect at the place, with the sum as text: "k_G * M_G + k_Q * M_Q". */
export function recordSum(
  recorder: Recorder,
  effect: SummedEffect,
  unit: string,
  onlyVariable: boolean,
): { sum: string; uses: Uses } {
  const { combination, place, edition, situation } = recorder.context;
  const uses: Uses = {};
  const terms: string[] = [];
  if (combination && place && situation) {
    for (const term of combination.terms) {
      const action = edition.actions[term.action] as Edition['actions'][number];
      if (onlyVariable && action.nature !== 'variable') continue;
      const factor = factorName(action.symbol);
      const part = partName(effect, action.symbol);
      uses[factor] = recordFactor(recorder, combination, term);
      uses[part] = recordPart(recorder, effect, unit, place, term.action);
      terms.push(`${factor} * ${part}`);
    }
  }
  return { sum: terms.length ? terms.join(' + ') : '0', uses };
}

/** The factor on one action of a combination. */
export function recordFactor(
  recorder: Recorder,
  combination: ExpandedCombination,
  { action, factor, term }: ExpandedTerm,
): number {
  const { runtime, env, context } = recorder;
  return recorder.once(`factor@${combination.id}@${action}`, () => {
    const pattern = context.edition.combinations[combination.pattern] as Edition['combinations'][number];
    const carrying = context.edition.actions[action] as Edition['actions'][number];
    const formula = runtime.factors[combination.pattern]?.[term];
    atTerm(runtime, env, context, action);
    const uses = formula ? recorder.symbols(formula.symbols) : {};
    leaveTerm(runtime, env, context);
    const entry = entryOf(
      'combination',
      factorName(carrying.symbol),
      `Factor on ${carrying.title.toLowerCase()}, ${combination.title}`,
      factor,
      '1',
      uses,
      'edition',
      `/combinations/${combination.pattern}/terms/${term}/factor`,
    );
    entry.reference = pattern.reference;
    entry.standing = recorder.standings.of(pattern.provenance);
    return formula ? recorder.formula(entry, formula.text) : entry;
  });
}

/** What one action does at a place, unfactored, as the analysis gives it. */
function recordPart(
  recorder: Recorder,
  effect: SummedEffect,
  unit: string,
  place: Place,
  action: number,
): number {
  const { edition, geometry } = recorder.context;
  const key = `${effect}@${place.node}${place.side}@${place.x}@${place.piece}@${place.arrangement}@${action}`;
  return recorder.once(key, () => {
    const carrying = edition.actions[action] as Edition['actions'][number];
    const where = placeName(place, geometry?.nodes.length ?? 0);
    const normal = effect === 'R' && geometry?.cosine !== 1 ? ' at right angles to the member' : '';
    const name = `${names[effect]}${normal}`;
    return entryOf(
      'effect',
      partName(effect, carrying.symbol),
      `${name} from ${carrying.title.toLowerCase()}, unfactored, ${where}${arrangement(recorder, place, action)}`,
      partValue(recorder, effect, place, action),
      unit,
      recordLoads(recorder, action, effect === 'w'),
      'edition',
      '',
    );
  });
}

/** Spans loaded, where the action is placed span by span. */
function arrangement(recorder: Recorder, place: Place, action: number): string {
  const { situation } = recorder.context;
  const effects = situation && effectsOf(situation, action);
  if (!effects || effects.cases.length === 1) return '';
  const spans = situation.model.arrangements[place.arrangement] ?? [];
  return spans.length === situation.model.beam.spans.length
    ? ', all spans loaded'
    : `, on ${spanNames(spans)}`;
}

function partValue(recorder: Recorder, effect: SummedEffect, place: Place, action: number): number {
  const { situation, visitor } = recorder.context;
  const effects = situation && effectsOf(situation, action);
  if (!effects || !visitor) return 0;
  const { arrangement: a, piece, x, node, side } = place;
  if (effect === 'M') return valueAt(situation.grid, caseOf(effects, a).moment, MOMENT_TERMS, piece, x);
  if (effect === 'w') return visitor.deflectionOf(action, a, piece, x);
  if (effect === 'R') return caseOf(effects, a).reactions[node] as number;
  const nodal = nodalOf(effects, a);
  if (effect === 'V') return (side === 'left' ? nodal.left : nodal.right)[node] as number;
  return (side === 'left' ? nodal.reducedLeft : nodal.reducedRight)[node] as number;
}

/** What the analysis was given: spans, the loads of the action, self-weight, stiffness for deflection. */
function recordLoads(recorder: Recorder, action: number, withStiffness: boolean): Uses {
  const { context } = recorder;
  const { edition, given, geometry } = context;
  const uses: Uses = {};
  geometry?.spans.forEach((_, span) => {
    uses[`L_${span + 1}`] = recordSpan(recorder, span);
  });
  given.loads.forEach((load) => {
    if (load.action === action) uses[`q_${load.index + 1}`] = recordLoad(recorder, load.index);
  });
  const { selfWeight, bendingStiffness, shearStiffness } = edition.analysis;
  if (selfWeight && edition.actions[action]?.id === selfWeight.action) {
    recorder.symbols([selfWeight.line], uses);
  }
  if (withStiffness) {
    recorder.symbols(shearStiffness ? [bendingStiffness, shearStiffness] : [bendingStiffness], uses);
  }
  return uses;
}

/** A load as given, in the edition's coherent unit; a load on an area as load per length. */
function recordLoad(recorder: Recorder, index: number): number {
  return recorder.once(`load@${index}`, () => loadEntry(recorder, index));
}

function loadEntry(recorder: Recorder, index: number): LedgerEntry {
  const { edition, given } = recorder.context;
  const load = given.loads.find((each) => each.index === index);
  const source = given.member.loads[index];
  if (!load || !source) throw new RangeError(`The member has no load ${index}.`);
  const title = source.title ?? edition.actions[load.action]?.title ?? source.action;
  const metric = edition.unitSystem === 'metric';
  const q = `q_${index + 1}`;
  const at = (value: number, unit: string, field: string) =>
    entryOf('input', q, title, value, unit, {}, 'member', `/loads/${index}/${field}`);
  if (load.load.kind === 'point') return at(load.load.force, metric ? 'N' : 'lbf', 'force');
  if (load.load.kind === 'couple') return at(load.load.moment, metric ? 'N mm' : 'lbf in', 'moment');
  const unit = metric ? 'N/mm' : 'lbf/in';
  if (source.kind === 'line') return at(load.load.startIntensity, unit, 'start');
  const p = `p_${index + 1}`;
  const uses: Uses = { width: recorder.symbol(given.spacing === null ? 'tributary' : 'spacing') };
  uses[p] = recorder.once(`area@${index}`, () => {
    const pressure = metric ? 'N/mm2' : 'psi';
    const pointer = `/loads/${index}/intensity`;
    return entryOf('input', p, `${title}, on an area`, load.area ?? 0, pressure, {}, 'member', pointer);
  });
  const entry = entryOf(
    'input',
    q,
    `${title}, per length of member`,
    load.load.startIntensity,
    unit,
    uses,
    'member',
    `/loads/${index}`,
  );
  return recorder.formula(entry, `${p} * width`);
}

/** A span of the model, with how it comes from the span as measured. */
export function recordSpan(recorder: Recorder, span: number): number {
  return recorder.once(`span@${span}`, () => {
    const { geometry, given, edition } = recorder.context;
    const found = geometry?.spans[span];
    if (!found) throw new RangeError(`The member has no span ${span + 1}.`);
    const unit = edition.unitSystem === 'metric' ? 'mm' : 'in';
    const measured = (symbol: string, title: string) =>
      entryOf('input', symbol, title, found.measured, unit, {}, 'member', `/spans/${span}/length`);
    const model = `L_${span + 1}`;
    if (found.left === 0 && found.right === 0 && geometry.cosine === 1) {
      return measured(model, `Span ${span + 1}`);
    }
    const name = `l_${span + 1}`;
    const how = given.member.spanMeasured === 'clear' ? 'clear' : 'between centres';
    const uses: Uses = { [name]: recorder.add(measured(name, `Span ${span + 1}, ${how}`)) };
    let formula = name;
    for (const [end, added] of [
      ['left', found.left],
      ['right', found.right],
    ] as const) {
      if (added === 0) continue;
      const symbol = `${end}_${span + 1}`;
      const title = `Added at the ${end} end of span ${span + 1}`;
      const entry = entryOf('input', symbol, title, added, unit, {}, 'edition', '/analysis/span');
      entry.reference = edition.analysis.span.reference;
      uses[symbol] = recorder.add(entry);
      formula += ` + ${symbol}`;
    }
    if (geometry.cosine !== 1) {
      recorder.symbols(['slope'], uses);
      formula = `(${formula}) / cos(slope * pi / 180)`;
    }
    const title = `Span ${span + 1} for the analysis`;
    const entry = entryOf('quantity', model, title, found.length, unit, uses, 'edition', '/analysis/span');
    entry.reference = edition.analysis.span.reference;
    return recorder.formula(entry, formula);
  });
}
