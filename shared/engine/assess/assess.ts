import type { ExpandedCombination } from '../combine/expand.ts';
import { HOLDS, UNKNOWN } from '../decide/compileCondition.ts';
import type { Context } from '../run/context.ts';
import type { Env, Problem } from '../run/env.ts';
import { evaluate, NO_VALUE, whyNot } from '../run/formula.ts';
import type { RunCheck, Runtime } from '../run/runtime.ts';
import { type Place, type PlaceKind, PlaceVisitor } from './places.ts';

/** Where a check was evaluated. The place is kept only where results are written from it. */
export interface Spot {
  /** Index of the combination, −1 for a check of the member itself. */
  combination: number;
  place: Place | null;
}

/** What a check came to over all its combinations and places. */
export interface Assessment {
  check: RunCheck;
  /** How often it was evaluated; 0: it does not apply to this member. */
  times: number;
  /** Largest utilisation; −Infinity where there is none. */
  utilisation: number;
  worst: Spot;
  /** First place where the edition refuses the member. */
  refused: (Spot & { problem: Problem }) | null;
  /** First place without an answer. */
  unanswered: (Spot & { problem: Problem }) | null;
  /** Worst utilisation and its place under each combination; −Infinity where not evaluated. */
  byCombination: Float64Array;
  places: (Place | null)[];
}

/** Utilisation this little above 1 is what rounding leaves of exactly 1. */
export const ROUNDING = 1e-12;

const kinds: readonly PlaceKind[] = ['moment', 'shear', 'support', 'deflection'];

/**
 * How much of an assessment is wanted: the numbers; the numbers and the places, for a result with its
 * ledger; or the numbers until the first check that fails, for a search.
 */
export type Extent = 'numbers' | 'places' | 'until-failing';

/** Evaluates every check of the edition under every combination at every place where it applies. */
export function assess(
  runtime: Runtime,
  env: Env,
  context: Context,
  combinations: readonly ExpandedCombination[],
  extent: Extent,
): Assessment[] {
  const assessments = runtime.checks.map((check) => newAssessment(check, combinations.length));
  const { situation } = context;
  const keep = extent === 'places';
  const stop = extent === 'until-failing';
  atMember(runtime, env, context);
  for (const assessment of assessments) {
    if (assessment.check.kind !== 'member') continue;
    assessAt(assessment, env, -1, null, keep);
    if (stop && fails(assessment)) return assessments;
  }
  if (!situation) return assessments;
  const visitor = new PlaceVisitor(situation);
  context.visitor = visitor;
  for (let c = 0; c < combinations.length; c += 1) {
    const combination = combinations[c] as ExpandedCombination;
    atCombination(runtime, env, context, combination);
    for (const kind of kinds) {
      const here = checksAt(runtime, assessments, combination.state, kind);
      if (here.length === 0) continue;
      if (combination.problem) {
        for (const assessment of here) note(assessment, combination.problem, c, null);
        continue;
      }
      visitor.visit(kind, combination, (place) => {
        atPlace(runtime, env, context, place);
        for (let i = 0; i < here.length; i += 1) {
          assessAt(here[i] as Assessment, env, c, place, keep);
        }
      });
      if (stop && here.some(fails)) return assessments;
    }
  }
  return assessments;
}

function checksAt(
  { checksAt: byKey }: Runtime,
  assessments: readonly Assessment[],
  state: string,
  kind: PlaceKind,
): readonly Assessment[] {
  const found = byKey.get(`${state}@${kind}`);
  return found ? found.map((index) => assessments[index] as Assessment) : [];
}

const fails = ({ refused, utilisation }: Assessment) => refused !== null || utilisation > 1 + ROUNDING;

/** Leaves combination and place, so that only what holds for the whole member can be read. */
export function atMember(runtime: Runtime, env: Env, context: Context): void {
  context.combination = null;
  context.pattern = -1;
  context.action = -1;
  context.place = null;
  env.clear(runtime.belowMember);
}

export function atCombination(
  runtime: Runtime,
  env: Env,
  context: Context,
  combination: ExpandedCombination,
): void {
  context.combination = combination;
  context.pattern = combination.pattern;
  context.action = -1;
  context.place = null;
  env.clear(runtime.belowMember);
}

export function atPlace(runtime: Runtime, env: Env, context: Context, place: Place): void {
  context.place = place;
  env.clear(runtime.atPlace);
}

function newAssessment(check: RunCheck, combinations: number): Assessment {
  return {
    check,
    times: 0,
    utilisation: -Infinity,
    worst: { combination: -1, place: null },
    refused: null,
    unanswered: null,
    byCombination: new Float64Array(combinations).fill(-Infinity),
    places: [],
  };
}

function note(assessment: Assessment, problem: Problem, combination: number, place: Place | null): void {
  assessment.times += 1;
  const found = { problem, combination, place: place && { ...place } };
  if (problem.kind === 'refused') assessment.refused ??= found;
  else assessment.unanswered ??= found;
}

function assessAt(
  assessment: Assessment,
  env: Env,
  combination: number,
  place: Place | null,
  keep: boolean,
): void {
  const { check } = assessment;
  if (check.applies) {
    const trial = check.applies.test(env);
    if (trial === UNKNOWN) {
      note(assessment, firstProblem(check.applies.slots, env), combination, place);
      return;
    }
    if (trial !== HOLDS) return;
  }
  const utilisation = utilisationAt(check, env);
  if (Number.isNaN(utilisation)) {
    note(assessment, problemAt(check, env), combination, place);
    return;
  }
  assessment.times += 1;
  const worse = utilisation > assessment.utilisation;
  const worseHere = combination >= 0 && utilisation > (assessment.byCombination[combination] as number);
  if (!worse && !worseHere) return;
  const kept = keep && place ? { ...place } : null;
  if (worse) {
    assessment.utilisation = utilisation;
    assessment.worst.combination = combination;
    assessment.worst.place = kept;
  }
  if (worseHere) {
    assessment.byCombination[combination] = utilisation;
    if (keep) assessment.places[combination] = kept;
  }
}

/** Utilisation where the evaluation stands; NaN where there is none. */
export function utilisationAt({ demand, limit, utilisation }: RunCheck, env: Env): number {
  if (utilisation) return evaluate(utilisation, env);
  if (!demand || !limit) return NO_VALUE;
  const most = evaluate(limit, env);
  // Nothing can be measured against a limit that is not above zero.
  if (!(most > 0)) return NO_VALUE;
  const value = evaluate(demand, env) / most;
  return Number.isFinite(value) ? value : NO_VALUE;
}

/** Why a check has no utilisation where the evaluation stands. */
export function problemAt(check: RunCheck, env: Env): Problem {
  const { id, title } = check.check;
  for (const formula of [check.utilisation, check.demand, check.limit]) {
    if (formula && Number.isNaN(evaluate(formula, env))) return whyNot(formula, env, id, title);
  }
  const limit = check.limit ? evaluate(check.limit, env) : NO_VALUE;
  return {
    kind: 'failed',
    symbol: id,
    message: `${title}: the limit comes to ${String(limit)}, and nothing can be measured against that.`,
  };
}

/** The problem of the first of several symbols that has none. */
export function firstProblem(slots: readonly number[], env: Env): Problem {
  for (const slot of slots) {
    const problem = env.problem(slot);
    if (problem) return problem;
  }
  return { kind: 'failed', symbol: '', message: 'A condition could not be decided.' };
}
