import type { Assessment } from '../assess/assess.ts';
import type { Place } from '../assess/places.ts';
import type { Standing } from '../assess/stand.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import { evaluate, type FormulaRun } from '../run/formula.ts';
import type { RunCheck } from '../run/runtime.ts';
import { placeName } from '../ledger/places.ts';
import { entryOf, type Uses } from '../ledger/entry.ts';
import type { Recorder } from '../ledger/recorder.ts';
import type { CheckResult, Choosing, Instance } from '../types.ts';
import { evidenceOf } from '../decide/evidence.ts';
import { utilisationOf, wordOf } from './judge.ts';
import { moveTo, spotOf } from './walk.ts';

/** One check of the result, with its ledger written on the way. */
export function checkResult(standing: Standing, recorder: Recorder, assessment: Assessment): CheckResult {
  const { check } = assessment;
  const { env, context, combinations } = standing;
  const { id, title, reference, demand, limit } = check.check;
  const spot = spotOf(assessment);
  const { place } = spot;
  moveTo(standing, spot);
  const utilisation = utilisationOf(assessment);
  const entry = recordCheck(recorder, assessment, place, combinations[spot.combination]);
  const problem =
    assessment.refused?.problem ?? (utilisation === null ? assessment.unanswered?.problem : undefined);
  const part = (formula: FormulaRun | null, head: { title: string; unit: string } | undefined) => {
    const value = formula && head ? evaluate(formula, env) : NaN;
    return head && !Number.isNaN(value) ? { value, unit: head.unit, title: head.title } : null;
  };
  const demanded = part(check.demand, demand);
  const limited = part(check.limit, limit);
  return {
    id,
    title,
    reference,
    at: check.kind,
    ...(check.state === undefined ? {} : { state: check.state }),
    word: wordOf(assessment, context.edition.analysis.closeFrom),
    utilisation,
    ...(demanded ? { demand: demanded } : {}),
    ...(limited ? { limit: limited } : {}),
    governing: instanceOf(standing, place, combinations[spot.combination], utilisation),
    instances: instances(standing, assessment),
    entry,
    ...(problem ? { refused: problem.message } : {}),
  };
}

function instanceOf(
  { context }: Standing,
  place: Place | null,
  combination: ExpandedCombination | undefined,
  utilisation: number | null,
): Instance {
  const instance: Instance = { utilisation };
  if (combination) instance.combination = combination.id;
  if (place) {
    instance.place = placeName(place, context.geometry?.nodes.length ?? 0);
    instance.x = place.x;
  }
  return instance;
}

/** The worst place under each combination. */
function instances(standing: Standing, assessment: Assessment): Instance[] {
  const { check, byCombination, places } = assessment;
  if (check.kind === 'member') return [instanceOf(standing, null, undefined, utilisationOf(assessment))];
  return standing.combinations.flatMap((combination, c) => {
    const utilisation = byCombination[c] as number;
    if (utilisation === -Infinity) return [];
    return [instanceOf(standing, places[c] ?? null, combination, utilisation)];
  });
}

/** Entry of a check: its demand over its limit, or the formula of its utilisation. */
function recordCheck(
  recorder: Recorder,
  assessment: Assessment,
  place: Place | null,
  combination: ExpandedCombination | undefined,
): number {
  const { check } = assessment;
  const { context } = recorder;
  const where = place ? placeName(place, context.geometry?.nodes.length ?? 0) : '';
  const parts = [where, combination?.title].filter(Boolean).join(', ');
  const entry = entryOf(
    'check',
    'U',
    `${check.check.title}: utilisation${parts ? `, ${parts}` : ''}`,
    utilisationOf(assessment),
    '1',
    {},
    'edition',
    `/checks/${check.index}`,
  );
  entry.reference = check.check.reference;
  entry.clause = check.check.id;
  const problem =
    assessment.refused?.problem ?? (entry.value === null ? assessment.unanswered?.problem : undefined);
  if (problem) entry.refused = problem.message;
  // Without a place there is nothing to read: the factors of the combination themselves have no value.
  if (!place && check.kind !== 'member') return recorder.add(entry);
  const { uses } = entry;
  const choosing = recordApplies(recorder, check, uses);
  if (choosing) entry.choosing = choosing;
  if (check.utilisation) {
    recorder.symbols(check.utilisation.symbols, uses);
    return recorder.add(recorder.formula(entry, check.utilisation.text));
  }
  uses['demand'] = recordPart(recorder, check, 'demand');
  uses['limit'] = recordPart(recorder, check, 'limit');
  return recorder.add(recorder.formula(entry, 'demand / limit'));
}

function recordPart(recorder: Recorder, check: RunCheck, which: 'demand' | 'limit'): number {
  const formula = check[which];
  const head = check.check[which];
  if (!formula || !head) throw new RangeError(`Check ${check.check.id} has no ${which}.`);
  const value = evaluate(formula, recorder.env);
  const entry = entryOf(
    which === 'demand' ? 'quantity' : 'limit',
    which,
    head.title,
    Number.isNaN(value) ? null : value,
    head.unit,
    recorder.symbols(formula.symbols),
    'edition',
    `/checks/${check.index}/${which}/formula`,
  );
  entry.reference = check.check.reference;
  entry.clause = check.check.id;
  return recorder.add(recorder.formula(entry, formula.text));
}

function recordApplies(recorder: Recorder, check: RunCheck, uses: Uses): Choosing | null {
  const { applies } = check.check;
  if (!applies || !check.applies) return null;
  recorder.symbols(check.applies.symbols, uses);
  const evidence = evidenceOf(applies, (symbol) => recorder.entries[uses[symbol] ?? -1]?.value ?? null);
  return { case: 'applies', tried: [{ case: 'applies', holds: evidence.holds, evidence }] };
}
