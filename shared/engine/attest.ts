import { replay, type Told } from './decide/replay.ts';
import type { Condition, Finding, LedgerEntry, Plan, Result } from './types.ts';

/**
 * Lets json-rules-engine decide every decision of a result's ledger again, from the facts in the ledger
 * and the conditions of the edition. Gives an error for each that it decides otherwise, or where it saw
 * other values. Kept out of the engine's index, since browsers have no use for it.
 */
export async function attest(plan: Plan, result: Result): Promise<Finding[]> {
  const findings: Finding[] = [];
  for (const entry of result.ledger) {
    for (const message of await replayEntry(plan, result.ledger, entry)) {
      findings.push({
        severity: 'error',
        code: 'decision-differs',
        message: `${entry.title} (${entry.symbol}): ${message}`,
        pointer: entry.pointer,
        in: entry.in,
        ...(entry.clause === undefined ? {} : { clause: entry.clause }),
      });
    }
  }
  return findings;
}

async function replayEntry(
  plan: Plan,
  ledger: readonly LedgerEntry[],
  { choosing, uses, kind, clause: id }: LedgerEntry,
): Promise<string[]> {
  if (!choosing) return [];
  const conditions = conditionsOf(plan, kind, id);
  const told: Told[] = [];
  for (const tried of choosing.tried) {
    const when = conditions.get(tried.case);
    if (!when) return [`The edition has no case “${tried.case}” with a condition here.`];
    told.push({ ...tried, when });
  }
  const problems = orderProblems(choosing, [...conditions.keys()]);
  if (told.length === 0) return problems;
  const factOf = (symbol: string) => ledger[uses[symbol] ?? -1]?.value ?? null;
  const isNumber = (symbol: string) => plan.symbols.get(symbol)?.dimension !== undefined;
  return [...problems, ...(await replay(told, factOf, isNumber))];
}

function conditionsOf(plan: Plan, kind: LedgerEntry['kind'], id: string | undefined): Map<string, Condition> {
  if (kind === 'check') {
    const applies = plan.edition.checks.find((check) => check.id === id)?.applies;
    return new Map(applies ? [['applies', applies]] : []);
  }
  const cases = plan.edition.clauses.find((clause) => clause.id === id)?.cases ?? [];
  return new Map(cases.flatMap(({ id: name, when }) => (when ? [[name, when] as const] : [])));
}

/** Cases are tried in order, all before the chosen one fail, and the chosen one holds or has no condition. */
function orderProblems(
  { case: chosen, tried }: NonNullable<LedgerEntry['choosing']>,
  order: readonly string[],
): string[] {
  const inOrder = tried.every((each, i) => each.case === order[i]);
  const last = tried[tried.length - 1];
  const earlier = tried.slice(0, -1).every(({ holds }) => holds === false);
  const settled = !last || (last.case === chosen ? last.holds === true : last.holds !== true);
  return inOrder && earlier && settled ? [] : ['The cases were not tried in the order of the edition.'];
}
