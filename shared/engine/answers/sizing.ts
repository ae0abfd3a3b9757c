import { ModelMemo } from '../assess/modelMemo.ts';
import { ROUNDING } from '../assess/assess.ts';
import type { Member, Plan, RequiredDepth } from '../types.ts';
import { type QuickVerdict, verdict } from '../verdict.ts';

/** Deepest section looked at: nothing is sawn or glued deeper for a building. */
const DEEPEST = { metric: 2000, 'inch-pound': 80 } as const;
/** Steps of the search and of the rounding: whole millimetres, sixteenths of an inch. */
const STEP = { metric: 1, 'inch-pound': 1 / 16 } as const;

/** How the checks came out at one depth. */
interface Trial {
  /** By check id; a check that does not apply is absent. */
  passes: Map<string, boolean>;
  all: boolean;
  /** Why there was no answer at all. */
  because?: string;
}

/**
 * Least depth at the member's breadth, by each check on its own and by all of them.
 *
 * A check's least depth is the one from which every deeper section up to the bound passes too: factors
 * that jump at a depth can let a shallow section pass and a deeper one fail. The search goes in whole
 * steps, then finds the exact depth inside the last step that fails. Where a check fails with greater
 * depth (such as a limit of depth to breadth), the least depth is looked for below that, and `why` says so.
 */
export function requiredDepth(plan: Plan, member: Member): RequiredDepth {
  const { units } = member;
  const step = STEP[units];
  const count = Math.round(DEEPEST[units] / step);
  const memo = new ModelMemo();
  const at = (depth: number) => trialAt(plan, member, depth, memo);
  const whole: (Trial | undefined)[] = [];
  const atStep = (n: number): Trial => (whole[n] ??= at(n * step));
  const titles = new Map(plan.edition.checks.map(({ id, title }) => [id, title]));

  const seen = checksSeen(atStep, count);
  const byCheck = [...titles.entries()]
    .filter(([id]) => seen.has(id))
    .map(([check, title]) => {
      const passes = (trial: Trial) => trial.passes.get(check) ?? true;
      return { check, title, ...least(passes, atStep, at, step, count) };
    });
  const all = least((trial) => trial.all, atStep, at, step, count);
  return { byCheck, all, unit: units === 'metric' ? 'mm' : 'in' };
}

function trialAt(plan: Plan, member: Member, depth: number, memo: ModelMemo): Trial {
  const found = verdict(plan, withDepth(member, depth), memo);
  return trialOf(found);
}

function trialOf({ checks, word, because }: QuickVerdict): Trial {
  const passes = new Map(
    checks.map(({ id, utilisation, word: own }) => [
      id,
      own !== 'none' && utilisation !== null && utilisation <= 1 + ROUNDING,
    ]),
  );
  const all = word === 'passes' || word === 'close';
  return { passes, all, ...(because === undefined ? {} : { because }) };
}

/** The member at another depth; what was ordered for the old one no longer stands. */
export function withDepth(member: Member, depth: number): Member {
  const { b, pieces } = member.section;
  return { ...member, section: { b, h: depth, pieces } };
}

/** Checks that apply at some depth, looked for at a few. */
function checksSeen(atStep: (n: number) => Trial, count: number): Set<string> {
  const seen = new Set<string>();
  for (let n = Math.max(1, Math.round(count / 64)); n <= count; n = n * 2) {
    for (const id of atStep(n).passes.keys()) seen.add(id);
  }
  return seen;
}

interface Least {
  exact: number | null;
  rounded: number | null;
  why?: string;
}

function least(
  passes: (trial: Trial) => boolean,
  atStep: (n: number) => Trial,
  at: (depth: number) => Trial,
  step: number,
  count: number,
): Least {
  let top = count;
  while (top > 0 && !passes(atStep(top))) top -= 1;
  if (top === 0) {
    const because = atStep(count).because;
    return {
      exact: null,
      rounded: null,
      why: because ?? `No depth up to ${String(count * step)} passes at this breadth.`,
    };
  }
  let last = top;
  while (last > 1 && passes(atStep(last - 1))) last -= 1;
  const exact = last === 1 ? null : boundary((depth) => passes(at(depth)), (last - 1) * step, last * step);
  const why =
    top < count
      ? `Deeper than ${String(top * step)} it fails again, so that is an upper bound.`
      : exact === null
        ? 'It passes at any depth.'
        : undefined;
  return { exact: exact ?? last * step, rounded: last * step, ...(why === undefined ? {} : { why }) };
}

/** Least depth between one that fails and one that passes, to one part in a thousand million. */
function boundary(passes: (depth: number) => boolean, failing: number, passing: number): number {
  let low = failing;
  let high = passing;
  while (high - low > high * 1e-10) {
    const middle = (low + high) / 2;
    if (passes(middle)) high = middle;
    else low = middle;
  }
  return high;
}
