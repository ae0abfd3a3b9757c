import type { Assessment } from './assess/assess.ts';
import type { ModelMemo } from './assess/modelMemo.ts';
import { stand } from './assess/stand.ts';
import { inOrder, judge, type Judgement, utilisationOf, wordOf } from './result/judge.ts';
import { preparedOf } from './runtimes.ts';
import type { Finding, Member, Plan, VerdictWord } from './types.ts';

/** The verdict on a member without its ledger. */
export interface QuickVerdict extends Judgement {
  /** Governing check first. */
  checks: readonly { id: string; utilisation: number | null; word: VerdictWord }[];
  findings: readonly Finding[];
}

/**
 * Verdict only, for lists, searches and many members: the same numbers as `check`, without the record.
 *
 * @param memo Handed from member to member where only the section or grade changes.
 * @param trial Values that stand in for clauses, by clause id, in the edition's units.
 * @param extent `until-failing` stops at the first check that fails: the word is right, the numbers only
 *   where it passes.
 */
export function verdict(
  plan: Plan,
  member: Member,
  memo: ModelMemo | null = null,
  trial: ReadonlyMap<string, number> | null = null,
  extent: 'numbers' | 'until-failing' = 'numbers',
): QuickVerdict {
  const { runtime } = preparedOf(plan);
  const outcome = stand(runtime, member, memo, trial, extent);
  if (!outcome.ok) {
    const because = outcome.findings.find(({ severity }) => severity === 'error')?.message;
    return {
      word: 'none',
      check: null,
      utilisation: null,
      ...(because === undefined ? {} : { because }),
      checks: [],
      findings: outcome.findings,
    };
  }
  const { assessments, context, findings } = outcome.standing;
  const { closeFrom } = context.edition.analysis;
  const ordered = inOrder(assessments);
  return {
    ...judge(ordered, closeFrom),
    checks: ordered.map((assessment) => summary(assessment, closeFrom)),
    findings,
  };
}

function summary(assessment: Assessment, closeFrom: number) {
  return {
    id: assessment.check.check.id,
    utilisation: utilisationOf(assessment),
    word: wordOf(assessment, closeFrom),
  };
}
