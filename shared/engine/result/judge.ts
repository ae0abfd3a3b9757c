import { type Assessment, ROUNDING } from '../assess/assess.ts';
import type { VerdictWord } from '../types.ts';

/** Word of a check. A refusal fails; without an answer somewhere there is no word, unless it fails anyway. */
export function wordOf({ utilisation, refused, unanswered }: Assessment, closeFrom: number): VerdictWord {
  if (refused || utilisation > 1 + ROUNDING) return 'fails';
  if (unanswered || utilisation === -Infinity) return 'none';
  return utilisation >= closeFrom ? 'close' : 'passes';
}

/** Utilisation of a check; null where the edition refuses or nothing could be worked out. */
export function utilisationOf({ utilisation, refused }: Assessment): number | null {
  return refused || utilisation === -Infinity ? null : utilisation;
}

/** Checks that apply, the governing one first: refusals, then by utilisation, then those without one. */
export function inOrder(assessments: readonly Assessment[]): Assessment[] {
  const rank = ({ refused, utilisation }: Assessment) => (refused ? Infinity : utilisation);
  return assessments.filter(({ times }) => times > 0).sort((a, b) => compare(rank(b), rank(a)));
}

function compare(a: number, b: number): number {
  return a === b ? 0 : a < b ? -1 : 1;
}

export interface Judgement {
  word: VerdictWord;
  check: string | null;
  utilisation: number | null;
  because?: string;
}

/** The verdict on a member from its checks in order. */
export function judge(ordered: readonly Assessment[], closeFrom: number): Judgement {
  const first = ordered[0];
  if (!first) {
    return {
      word: 'none',
      check: null,
      utilisation: null,
      because: 'No check of this edition applies to the member.',
    };
  }
  const governing = { check: first.check.check.id, utilisation: utilisationOf(first) };
  if (first.refused) return { word: 'fails', ...governing, because: first.refused.problem.message };
  const words = ordered.map((each) => wordOf(each, closeFrom));
  if (words.includes('fails')) return { word: 'fails', ...governing };
  const open = ordered.find((each) => each.unanswered);
  if (open) {
    return {
      word: 'none',
      ...governing,
      because: `${open.check.check.title}: ${open.unanswered?.problem.message ?? ''}`,
    };
  }
  return { word: words.includes('close') ? 'close' : 'passes', ...governing };
}
