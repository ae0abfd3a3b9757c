import type { Edition } from '#shared/basis/schema/index.ts';
import type { Place } from '../assess/places.ts';
import { caseOf, effectsOf, nodalOf } from '../assess/situation.ts';
import type { ExpandedCombination, ExpandedTerm } from '../combine/expand.ts';
import { MOMENT_TERMS, valueAt } from '../effects/grid.ts';
import { atTerm, leaveTerm } from '../run/terms.ts';
import { placeName, spanNames } from './places.ts';
import type { Draft, Recorder, Uses } from './recorder.ts';

/** Effects that add up over the actions of a combination. */
export type SummedEffect = 'M' | 'V' | 'V_d' | 'R' | 'w';

const names: Record<SummedEffect, string> = {
  M: 'Bending moment',
  V: 'Shear force',
  V_d: 'Shear force near the support',
  R: 'Reaction at right angles to the member',
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
    const written = formula ? recorder.run(formula) : { uses: {} };
    leaveTerm(runtime, env, context);
    return {
      kind: 'combination',
      symbol: factorName(carrying.symbol),
      title: `Factor on ${carrying.title.toLowerCase()}, ${combination.title}`,
      value: factor,
      unit: '1',
      reference: pattern.reference,
      ...written,
      standing: recorder.standings.of(pattern.provenance),
      in: 'edition',
      pointer: `/combinations/${combination.pattern}/terms/${term}/factor`,
    };
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
    return {
      kind: 'effect',
      symbol: partName(effect, carrying.symbol),
      title: `${names[effect]} from ${carrying.title.toLowerCase()}, unfactored, ${where}${arrangement(recorder, place, action)}`,
      value: partValue(recorder, effect, place, action),
      unit,
      uses: recordLoads(recorder, action, effect === 'w'),
      in: 'edition',
      pointer: '',
    };
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
  return recorder.once(`load@${index}`, () => loadDraft(recorder, index));
}

function loadDraft(recorder: Recorder, index: number): Draft {
  const { edition, given } = recorder.context;
  const load = given.loads.find((each) => each.index === index);
  const source = given.member.loads[index];
  if (!load || !source) throw new RangeError(`The member has no load ${index}.`);
  const action = edition.actions[load.action]?.title ?? source.action;
  const [force, length] = edition.unitSystem === 'metric' ? ['N', 'mm'] : ['lbf', 'in'];
  const head = { kind: 'input', symbol: `q_${index + 1}`, in: 'member', uses: {} } as const;
  const title = source.title ?? action;
  if (load.load.kind === 'point') {
    return {
      ...head,
      title,
      value: load.load.force,
      unit: force as string,
      pointer: `/loads/${index}/force`,
    };
  }
  if (load.load.kind === 'couple') {
    return {
      ...head,
      title,
      value: load.load.moment,
      unit: `${force as string} ${length as string}`,
      pointer: `/loads/${index}/moment`,
    };
  }
  const unit = `${force as string}/${length as string}`;
  if (source.kind === 'line') {
    return { ...head, title, value: load.load.startIntensity, unit, pointer: `/loads/${index}/start` };
  }
  const width = recorder.symbol(given.spacing === null ? 'tributary' : 'spacing');
  const area = recorder.once(`area@${index}`, () => ({
    ...head,
    symbol: `p_${index + 1}`,
    title: `${title}, on an area`,
    value: load.area ?? 0,
    unit: edition.unitSystem === 'metric' ? 'N/mm2' : 'psi',
    pointer: `/loads/${index}/intensity`,
  }));
  const uses: Uses = { [`p_${index + 1}`]: area, width };
  return {
    ...head,
    title: `${title}, per length of member`,
    value: load.load.startIntensity,
    unit,
    uses,
    ...recorder.formula(`p_${index + 1} * width`, uses),
    pointer: `/loads/${index}`,
  };
}

/** A span of the model, with how it comes from the span as measured. */
export function recordSpan(recorder: Recorder, span: number): number {
  return recorder.once(`span@${span}`, () => {
    const { geometry, given, edition } = recorder.context;
    const spans = geometry?.spans[span];
    if (!spans) throw new RangeError(`The member has no span ${span + 1}.`);
    const unit = edition.unitSystem === 'metric' ? 'mm' : 'in';
    const name = `l_${span + 1}`;
    const measured = (): Draft => ({
      kind: 'input',
      symbol: name,
      title: `Span ${span + 1}, ${given.member.spanMeasured === 'clear' ? 'clear' : 'between centres'}`,
      value: spans.measured,
      unit,
      uses: {},
      in: 'member',
      pointer: `/spans/${span}/length`,
    });
    if (spans.left === 0 && spans.right === 0 && geometry.cosine === 1) {
      return { ...measured(), symbol: `L_${span + 1}`, title: `Span ${span + 1}` };
    }
    const uses: Uses = { [name]: recorder.once(`measured@${span}`, measured) };
    let formula = name;
    for (const [end, added] of [
      ['a', spans.left],
      ['b', spans.right],
    ] as const) {
      if (added === 0) continue;
      const symbol = `${end}_${span + 1}`;
      uses[symbol] = recorder.add({
        kind: 'input',
        symbol,
        title: `Added at the ${end === 'a' ? 'left' : 'right'} end of span ${span + 1}`,
        value: added,
        unit,
        reference: edition.analysis.span.reference,
        uses: {},
        in: 'edition',
        pointer: '/analysis/span',
      });
      formula += ` + ${symbol}`;
    }
    if (geometry.cosine !== 1) {
      recorder.symbols(['slope'], uses);
      formula = `(${formula}) / cos(slope * pi / 180)`;
    }
    return {
      kind: 'quantity',
      symbol: `L_${span + 1}`,
      title: `Span ${span + 1} for the analysis`,
      value: spans.length,
      unit,
      reference: edition.analysis.span.reference,
      uses,
      ...recorder.formula(formula, uses),
      in: 'edition',
      pointer: '/analysis/span',
    };
  });
}
