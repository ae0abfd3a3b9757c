import { compile } from '#shared/engine/index.ts';
import type { Edition, Member, Plan, StockSection } from '#shared/engine/types.ts';
import { answersFor } from './answers.ts';

export type Question =
  | { kind: 'edition'; edition: Edition }
  | { kind: 'member'; number: number; member: Member; stock: readonly StockSection[] };

let plan: Plan | null = null;

self.addEventListener('message', ({ data }: MessageEvent<Question>) => {
  if (data.kind === 'edition') {
    const outcome = compile(data.edition);
    plan = outcome.ok ? outcome.plan : null;
  } else if (plan) {
    self.postMessage({ number: data.number, answers: answersFor(plan, data.member, data.stock) });
  }
});
