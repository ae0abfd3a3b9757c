import { useEffect, useMemo, useRef, useState } from 'react';
import { withProjectChoices } from '#shared/basis/inherit.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { check, compile } from '#shared/engine/index.ts';
import type { Plan, Result, StockSection } from '#shared/engine/types.ts';
import { answersFor, noAnswers, type Answers } from './answers.ts';
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

type Sections = readonly StockSection[];

/** A worker that answers one question at a time; of those that come meanwhile the newest waits. */
function startWorker(edition: Edition, onAnswers: (answers: Answers, of: Member) => void) {
  const thread = new Worker(new URL('./answers.worker.ts', import.meta.url), { type: 'module' });
  const post = (question: Question) => thread.postMessage(question);
  let number = 0;
  let under: { number: number; member: Member } | null = null;
  let next: { member: Member; stock: Sections } | null = null;
  const send = (member: Member, stock: Sections) => {
    number += 1;
    under = { number, member };
    post({ kind: 'member', number, member, stock });
  };
  thread.addEventListener('message', ({ data }: MessageEvent<{ number: number; answers: Answers }>) => {
    if (under?.number !== data.number) return;
    onAnswers(data.answers, under.member);
    under = null;
    if (next) send(next.member, next.stock);
    next = null;
  });
  post({ kind: 'edition', edition });
  return {
    ask: (member: Member, stock: Sections) => {
      if (under) next = { member, stock };
      else send(member, stock);
    },
    stop: () => thread.terminate(),
  };
}

/**
 * The slower answers. Those of the member as it was opened are worked out in the page, once it is painted;
 * from the first change on a worker does it, so that a page that is only read doesn't fetch one. What is shown
 * is of the newest member for which there was time, and `of` says which.
 */
export function useAnswers(
  plan: Plan | null,
  member: Member,
  stock: Sections,
): Answers & { of: Member | null } {
  const [state, setState] = useState<Answers & { of: Member | null }>({ ...noAnswers, of: null });
  const opened = useRef(member);
  const worker = useRef<ReturnType<typeof startWorker> | null>(null);
  useEffect(
    () => () => {
      worker.current?.stop();
      worker.current = null;
    },
    [plan],
  );
  useEffect(() => {
    if (!plan) return undefined;
    if (member === opened.current && !worker.current) {
      const timer = setTimeout(() => setState({ ...answersFor(plan, member, stock), of: member }), 30);
      return () => clearTimeout(timer);
    }
    worker.current ??= startWorker(plan.edition, (answers, of) => setState({ ...answers, of }));
    worker.current.ask(member, stock);
    return undefined;
  }, [plan, member, stock]);
  return state;
}
