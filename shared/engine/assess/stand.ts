import type { Member } from '#shared/basis/schema/index.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import { buildModel, type ActionLoads, type Model } from '../effects/model.ts';
import { layOut, type Geometry, type SpanRule } from '../member/geometry.ts';
import { type Given, LARGEST, readMember } from '../member/given.ts';
import { inputProblems } from '../member/inputs.ts';
import { placeLoads } from '../member/placeLoads.ts';
import { systemFactor } from '../member/units.ts';
import type { Context } from '../run/context.ts';
import type { Env, Problem } from '../run/env.ts';
import { evaluate, whyNot } from '../run/formula.ts';
import type { Runtime } from '../run/runtime.ts';
import { atTerm, leaveTerm } from '../run/terms.ts';
import type { Finding } from '../types.ts';
import { assess, type Assessment, atMember, type Extent } from './assess.ts';
import type { ModelMemo } from './modelMemo.ts';
import { memberValue } from './memberValue.ts';
import { type ShearRule, situate } from './situation.ts';
import { stiffnessOf } from './stiffness.ts';

/** A member assessed: everything that results are drawn from. */
export interface Standing {
  runtime: Runtime;
  env: Env;
  context: Context;
  given: Given;
  combinations: readonly ExpandedCombination[];
  assessments: readonly Assessment[];
  findings: readonly Finding[];
}

export type StandOutcome = { ok: true; standing: Standing } | { ok: false; findings: readonly Finding[] };

/**
 * Reads a member, analyses it, and evaluates every check. Values of clauses can be replaced for a trial,
 * by clause id, in the edition's units.
 */
export function stand(
  runtime: Runtime,
  member: Member,
  memo: ModelMemo | null = null,
  trial: ReadonlyMap<string, number> | null = null,
  extent: Extent = 'numbers',
): StandOutcome {
  const { edition, env } = runtime;
  const reading = readMember(edition, member);
  if (!reading.ok) return reading;
  const { given } = reading;
  const wrong = inputProblems(runtime, given);
  if (wrong.length) return { ok: false, findings: wrong };
  const context = newContext(runtime, given, trial);
  runtime.context.current = context;
  env.state.fill(0);
  atMember(runtime, env, context);

  const geometry = geometryOf(runtime, env, given);
  if (!geometry.ok) return geometry;
  context.geometry = geometry.geometry;
  env.state.fill(0);

  const placing = placeLoads(edition, given, geometry.geometry);
  if (!placing.ok) return placing;
  const stiffness = stiffnessOf(runtime, env, given);
  context.noStiffness = stiffness.problem;
  const analysed = analyse(geometry.geometry, given, placing.actions, stiffness.ratio, memo);
  if (!analysed.ok) return analysed;

  const own = selfWeightOf(runtime, env);
  if (!own.ok) return own;
  const shear = shearRuleOf(runtime, env);
  if (!shear.ok) return shear;
  context.situation = situate(
    analysed.model,
    (action) => edition.actions[action]?.nature === 'variable',
    own.selfWeight,
    stiffness.flexibility,
    shear.rule,
    given.bearings,
  );

  if (context.situation.actions.length === 0) {
    const message = 'No load acts on this member. Enter at least one.';
    return { ok: false, findings: [finding('no-load', '/loads', message)] };
  }
  const expansion = runtime.expansions.expand(
    edition,
    context.situation.actions.map(({ action }) => action),
    (pattern, term, action) => factorAt(runtime, env, context, pattern, term, action),
    runtime.byPattern,
  );
  if (!expansion.ok) {
    return { ok: false, findings: [finding('too-many-combinations', '/loads', expansion.message)] };
  }
  const assessments = assess(runtime, env, context, expansion.combinations, extent);
  return {
    ok: true,
    standing: {
      runtime,
      env,
      context,
      given,
      combinations: expansion.combinations,
      assessments,
      findings: notAssessed(assessments),
    },
  };
}

function finding(code: string, pointer: string, message: string): Finding {
  return { severity: 'error', code, message, pointer, in: 'member' };
}

function newContext(runtime: Runtime, given: Given, trial: ReadonlyMap<string, number> | null): Context {
  const { edition, clauses } = runtime;
  const overrides = new Map<number, number>();
  for (const { clause, slot } of clauses) {
    const departure = given.departures.get(clause.id);
    const powers = runtime.powersOf(slot);
    if (departure) {
      const factor = systemFactor(given.member.units, edition.unitSystem, powers);
      overrides.set(slot, departure.value * factor);
    }
    const tried = trial?.get(clause.id);
    if (tried !== undefined) overrides.set(slot, tried);
  }
  return {
    edition,
    given,
    geometry: null,
    situation: null,
    noStiffness: null,
    visitor: null,
    pattern: -1,
    combination: null,
    action: -1,
    place: null,
    overrides: overrides.size ? overrides : null,
  };
}

function geometryOf(
  runtime: Runtime,
  env: Env,
  given: Given,
): { ok: true; geometry: Geometry } | { ok: false; findings: readonly Finding[] } {
  const { span } = runtime.edition.analysis;
  let rule: SpanRule = { rule: 'centres' };
  if (span.rule === 'clearPlus') {
    const allowance = memberValue(runtime, env, span.allowance);
    if (!allowance.ok)
      return { ok: false, findings: [finding('no-span-rule', '', allowance.problem.message)] };
    rule = { rule: 'clearPlus', allowance: allowance.value };
  }
  return layOut(
    {
      measured: given.member.spanMeasured,
      lengths: given.lengths,
      restraints: given.restraints,
      bearings: given.bearings,
      cosine: given.cosine,
    },
    rule,
  );
}

function analyse(
  geometry: Geometry,
  given: Given,
  actions: readonly ActionLoads[],
  ratio: number | null | Problem,
  memo: ModelMemo | null,
): { ok: true; model: Model } | { ok: false; findings: readonly Finding[] } {
  if (typeof ratio === 'object' && ratio !== null) {
    const message = `A continuous member shares out its moments by its stiffness, which can’t be worked out. ${ratio.message}`;
    return { ok: false, findings: [finding('no-stiffness', '', message)] };
  }
  const known = memo?.recall(given.member, geometry, ratio);
  if (known) return { ok: true, model: known };
  const built = buildModel(geometry, given.restraints, actions, ratio);
  if (!built.ok) {
    return {
      ok: false,
      findings: built.problems.map(({ code, message }) =>
        finding(code, code === 'mechanism' || code === 'bad-restraints' ? '/supports' : '/spans', message),
      ),
    };
  }
  memo?.keep(given.member, geometry, ratio, built.model);
  return { ok: true, model: built.model };
}

function selfWeightOf(
  runtime: Runtime,
  env: Env,
):
  | { ok: true; selfWeight: { action: number; line: number } | null }
  | { ok: false; findings: readonly Finding[] } {
  const { selfWeight } = runtime.edition.analysis;
  if (!selfWeight) return { ok: true, selfWeight: null };
  const action = runtime.edition.actions.findIndex(({ id }) => id === selfWeight.action);
  const line = memberValue(runtime, env, selfWeight.line);
  if (!line.ok || action < 0 || !(Math.abs(line.value) <= LARGEST)) {
    const message = line.ok ? 'The self-weight has no sensible size.' : line.problem.message;
    return { ok: false, findings: [finding('no-self-weight', '/grade', message)] };
  }
  return { ok: true, selfWeight: { action, line: line.value } };
}

function shearRuleOf(
  runtime: Runtime,
  env: Env,
): { ok: true; rule: ShearRule } | { ok: false; findings: readonly Finding[] } {
  const { shear } = runtime.edition.analysis;
  if (shear.at === 'support') return { ok: true, rule: { at: 'support' } };
  const distance = memberValue(runtime, env, shear.distance);
  if (!distance.ok) return { ok: false, findings: [finding('no-shear-rule', '', distance.problem.message)] };
  return {
    ok: true,
    rule: { at: 'distance', distance: distance.value, from: shear.from, pointLoads: shear.pointLoads },
  };
}

function factorAt(
  runtime: Runtime,
  env: Env,
  context: Context,
  pattern: number,
  term: number,
  action: number,
): number | Problem {
  const formula = runtime.factors[pattern]?.[term];
  if (!formula) return { kind: 'failed', symbol: '', message: 'A combination has no factor here.' };
  if (context.pattern !== pattern) {
    context.pattern = pattern;
    context.combination = null;
    env.clear(runtime.belowMember);
  }
  atTerm(runtime, env, context, action);
  const value = evaluate(formula, env);
  const title = runtime.edition.combinations[pattern]?.title ?? '';
  const result = Number.isNaN(value) ? whyNot(formula, env, `k_${action}`, title) : value;
  leaveTerm(runtime, env, context);
  return result;
}

/** Checks of combinations that this member never comes under are said, not passed over. */
function notAssessed(assessments: readonly Assessment[]): Finding[] {
  return assessments
    .filter(({ check, times }) => times === 0 && check.kind !== 'member' && !check.applies)
    .map(({ check }) => ({
      severity: 'note',
      code: 'check-not-made',
      message: `${check.check.title} was not checked: no combination of the state “${check.state ?? ''}” acts on this member.`,
      pointer: `/checks/${check.index}`,
      in: 'edition',
    }));
}
