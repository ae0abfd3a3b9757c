import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Standing } from '../assess/stand.ts';
import { recordFactor } from '../ledger/effects.ts';
import { openLedger } from '../ledger/open.ts';
import type { Recorder, Stationery } from '../ledger/recorder.ts';
import type { Combination, Finding, Result } from '../types.ts';
import { ENGINE_VERSION } from '../version.ts';
import { checkResult } from './checks.ts';
import { inOrder, judge } from './judge.ts';
import { reactionsOf } from './reactions.ts';

/** What a result says whether or not there is a verdict. */
function headOf(edition: Edition, editionHash: string, member: Member, memberHash: string) {
  return {
    schema: 'result/1',
    engine: ENGINE_VERSION,
    edition: { title: edition.title, hash: editionHash },
    member: { mark: member.mark, hash: memberHash },
    unitSystem: edition.unitSystem,
    caution: edition.caution,
  } as const;
}

/** Result of a member that can't be checked: no verdict, and why. */
export function withoutVerdict(
  edition: Edition,
  editionHash: string,
  member: Member,
  memberHash: string,
  findings: readonly Finding[],
): Result {
  const because = findings.find(({ severity }) => severity === 'error')?.message;
  return {
    ...headOf(edition, editionHash, member, memberHash),
    verdict: {
      word: 'none',
      check: null,
      utilisation: null,
      ...(because === undefined ? {} : { because }),
    },
    checks: [],
    combinations: [],
    reactions: [],
    ledger: [],
    marks: { unverified: 0, departures: member.departures },
    findings,
  };
}

/** The whole result of a member that was assessed. */
export function resultOf(
  standing: Standing,
  editionHash: string,
  memberHash: string,
  stationery: Stationery,
): Result {
  const { context, runtime, env, given, assessments, findings } = standing;
  const { edition } = context;
  const recorder = openLedger(runtime, env, context, stationery);
  const ordered = inOrder(assessments);
  const checks = ordered.map((assessment) => checkResult(standing, recorder, assessment));
  const combinations = combinationsOf(standing);
  recordCombinations(standing, recorder);
  return {
    ...headOf(edition, editionHash, given.member, memberHash),
    verdict: judge(ordered, edition.analysis.closeFrom),
    checks,
    combinations,
    reactions: reactionsOf(standing),
    ledger: recorder.entries,
    marks: {
      unverified: unverified(recorder),
      departures: given.member.departures,
    },
    findings,
  };
}

/** Stored values in the ledger that no second person has compared with their source. */
function unverified({ entries }: Recorder): number {
  return entries.filter(({ standing, departure }) => standing && !standing.verified && !departure).length;
}

function combinationsOf({ context, combinations }: Standing): Combination[] {
  const { edition } = context;
  return combinations.map(({ id, title, pattern, state, duration, leading, terms }) => {
    const source = edition.combinations[pattern] as Edition['combinations'][number];
    return {
      id,
      title,
      reference: source.reference,
      pattern: source.id,
      state,
      duration: edition.durations[duration]?.id ?? '',
      ...(leading === undefined ? {} : { leading: edition.actions[leading]?.id ?? '' }),
      terms: terms.map(({ action, factor, term }) => ({
        action: edition.actions[action]?.id ?? '',
        factor,
        formula: source.terms[term]?.factor ?? '',
      })),
    };
  });
}

/** Factors of combinations that govern nothing are in the ledger too, after everything else. */
function recordCombinations({ combinations, context, env, runtime }: Standing, recorder: Recorder): void {
  for (const combination of combinations) {
    context.combination = combination;
    context.pattern = combination.pattern;
    context.place = null;
    env.clear(runtime.belowMember);
    for (const term of combination.terms) recordFactor(recorder, combination, term);
  }
}
