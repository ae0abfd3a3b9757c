import { type Given, LARGEST } from '../member/given.ts';
import type { Env, Problem } from '../run/env.ts';
import type { Runtime } from '../run/runtime.ts';
import { memberValue, type NumberOutcome } from './memberValue.ts';

/** What the analysis takes of a member's stiffness. */
export interface Stiffness {
  /** 1 / EI; null where the edition gives none. */
  flexibility: number | null;
  /** GA / EI where shear deformation counts; the reason where it is needed and can't be worked out. */
  ratio: number | null | Problem;
  /** Why there is no flexibility. */
  problem: Problem | null;
}

/**
 * Stiffness by the edition's clauses. Moments and reactions don't need it, unless the member is continuous
 * and shear deformation counts; then they can't be worked out without.
 */
export function stiffnessOf(runtime: Runtime, env: Env, given: Given): Stiffness {
  const { bendingStiffness, shearStiffness } = runtime.edition.analysis;
  const bending = usable(memberValue(runtime, env, bendingStiffness), bendingStiffness);
  if (!bending.ok && shearStiffness === undefined) {
    return { flexibility: null, ratio: null, problem: bending.problem };
  }
  if (bending.ok && shearStiffness === undefined) {
    return { flexibility: 1 / bending.value, ratio: null, problem: null };
  }
  const symbol = shearStiffness ?? bendingStiffness;
  const shear = usable(memberValue(runtime, env, symbol), symbol);
  if (bending.ok && shear.ok) {
    return {
      flexibility: 1 / bending.value,
      ratio: withoutTrace(shear.value / bending.value),
      problem: null,
    };
  }
  const failing = bending.ok ? shear : bending;
  const problem = failing.ok ? null : failing.problem;
  return { flexibility: null, ratio: isDeterminate(given) ? null : problem, problem };
}

/** A stiffness that can be calculated with. */
function usable(found: NumberOutcome, symbol: string): NumberOutcome {
  if (!found.ok || (found.value > 1 / LARGEST && found.value < LARGEST ** 2)) return found;
  const message = `The stiffness ${symbol} comes to ${String(found.value)}, which can’t be calculated with.`;
  return { ok: false, problem: { kind: 'failed', symbol, message } };
}

/**
 * A ratio without the trace that rounding leaves in its last digits: grades whose shear modulus is the same
 * share of E have the same ratio, and so the same analysis.
 */
const withoutTrace = (ratio: number) => Number(ratio.toPrecision(13));

/** Whether statics alone give the moments: as many held movements as there are equations. */
function isDeterminate({ restraints }: Given): boolean {
  let held = 0;
  for (const restraint of restraints) held += restraint === 'fixed' ? 2 : restraint === 'pin' ? 1 : 0;
  return held === 2;
}
