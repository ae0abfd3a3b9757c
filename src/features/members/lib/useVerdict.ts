import { useEffect, useMemo, useRef, useState } from 'react';
import { withProjectChoices } from '#shared/basis/inherit.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { check, compile } from '#shared/engine/index.ts';
import type { Plan, Result, StockSection } from '#shared/engine/types.ts';
import { noAnswers, type Answers } from './answers.ts';
import type { Question } from './answers.worker.ts';

/** A compiled edition, once for each document. */
export function usePlan(edition: Edition | undefined): Plan | null {
  return useMemo(() => {
    if (!edition) return null;
    const outcome = compile(edition);
    return outcome.ok ? outcome.plan : null;
  }, [edition]);
}

/** The verdict at once, on each keystroke. */
export function useVerdict(
  plan: Plan | null,
  member: Member,
  projectChoices: Readonly<Record<string, string>>,
) {
  const whole = useMemo(
    () => (plan ? withProjectChoices(plan.edition, projectChoices, member) : member),
    [plan, projectChoices, member],
  );
  const result: Result | null = useMemo(() => (plan ? check(plan, whole) : null), [plan, whole]);
  return { whole, result };
}

/**
 * The slower answers, worked out in a worker. One question is under way at a time and the newest waits: what
 * is shown is that of the newest member for which there was time, and `of` says which.
 */
export function useAnswers(
  edition: Edition,
  member: Member,
  stock: readonly StockSection[],
): Answers & { of: Member | null } {
  const [state, setState] = useState<Answers & { of: Member | null }>({ ...noAnswers, of: null });
  const worker = useRef<{ ask: (member: Member, stock: readonly StockSection[]) => void } | null>(null);
  useEffect(() => {
    const thread = new Worker(new URL('./answers.worker.ts', import.meta.url), { type: 'module' });
    const post = (question: Question) => thread.postMessage(question);
    let number = 0;
    let under: { number: number; member: Member } | null = null;
    let next: { member: Member; stock: readonly StockSection[] } | null = null;
    const send = (asked: Member, sections: readonly StockSection[]) => {
      number += 1;
      under = { number, member: asked };
      post({ kind: 'member', number, member: asked, stock: sections });
    };
    thread.addEventListener('message', ({ data }: MessageEvent<{ number: number; answers: Answers }>) => {
      if (under?.number !== data.number) return;
      setState({ ...data.answers, of: under.member });
      under = null;
      if (next) send(next.member, next.stock);
      next = null;
    });
    post({ kind: 'edition', edition });
    worker.current = {
      ask: (asked, sections) => {
        if (under) next = { member: asked, stock: sections };
        else send(asked, sections);
      },
    };
    return () => {
      worker.current = null;
      thread.terminate();
    };
  }, [edition]);
  useEffect(() => worker.current?.ask(member, stock), [edition, member, stock]);
  return state;
}
