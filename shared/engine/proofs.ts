import type { Proof } from '#shared/basis/schema/index.ts';
import { unitOf, coherentFactor } from '#shared/units/units.ts';
import { check } from './check.ts';
import { entriesBehind } from './answers/drivers.ts';
import type { Plan, Result } from './types.ts';

/** One known answer and what came out. */
export interface ProofLine {
  check: string;
  of: string;
  expected: number;
  found: number | null;
  unit: string;
  tolerance: number;
  holds: boolean;
}

export interface ProofResult {
  id: string;
  title: string;
  holds: boolean;
  lines: readonly ProofLine[];
  /** Where the proof's member itself can't be checked, or its verdict is another. */
  problems: readonly string[];
}

/** Runs the proofs of an edition: members with known answers which it has to reproduce. */
export function runProofs(plan: Plan): ProofResult[] {
  return plan.edition.proofs.map((proof) => runProof(plan, proof));
}

function runProof(plan: Plan, proof: Proof): ProofResult {
  const result = check(plan, proof.member);
  const problems = result.findings
    .filter(({ severity }) => severity === 'error')
    .map(({ message }) => message);
  if (proof.verdict && proof.verdict !== result.verdict.word) {
    problems.push(`The verdict is “${result.verdict.word}” and should be “${proof.verdict}”.`);
  }
  const lines = proof.expect.map((expect): ProofLine => {
    const found = valueOf(plan, result, expect);
    return {
      check: expect.check,
      of: typeof expect.of === 'string' ? expect.of : expect.of.symbol,
      expected: expect.value,
      found,
      unit: expect.unit,
      tolerance: expect.tolerance,
      holds: found !== null && Math.abs(found - expect.value) <= expect.tolerance,
    };
  });
  return {
    id: proof.id,
    title: proof.title,
    holds: problems.length === 0 && lines.every(({ holds }) => holds),
    lines,
    problems,
  };
}

/** What the proof asks for, in the unit it is given in; null where the result has no such value. */
function valueOf(
  plan: Plan,
  result: Result,
  { check: id, of, unit }: Proof['expect'][number],
): number | null {
  const found = result.checks.find((each) => each.id === id);
  if (!found) return null;
  const value =
    of === 'utilisation'
      ? found.utilisation
      : of === 'demand' || of === 'limit'
        ? (found[of]?.value ?? null)
        : symbolBehind(result, found.entry, of.symbol);
  const known = unitOf(unit);
  if (value === null || !known) return value;
  return value / coherentFactor(known, plan.edition.unitSystem);
}

function symbolBehind(result: Result, entry: number, symbol: string): number | null {
  const value = entriesBehind(result.ledger, entry).find((each) => each.symbol === symbol)?.value;
  return typeof value === 'number' ? value : null;
}
