import { Engine, type RuleProperties } from 'json-rules-engine';
import type { Condition } from '#shared/basis/schema/index.ts';
import type { Evidence } from '../types.ts';
import type { FactValue } from '#shared/basis/condition/compare.ts';
import { factsOf } from './compileCondition.ts';

/** A decision as the ledger tells it: conditions in the order they were tried, with their evidence. */
export interface Told {
  case: string;
  when: Condition;
  holds: boolean | null;
  evidence: Evidence;
}

/**
 * Lets json-rules-engine decide the same conditions on the same facts, and says in plain sentences where
 * it decides otherwise or saw other values. A fact without a value is handed over as a stand-in: where
 * the ledger says that the condition is settled without it, the rules engine has to agree.
 */
export async function replay(
  told: readonly Told[],
  factOf: (symbol: string) => FactValue | null,
  isNumber: (symbol: string) => boolean,
): Promise<string[]> {
  const facts: Record<string, FactValue> = {};
  for (const { when } of told) {
    for (const symbol of factsOf(when)) facts[symbol] = factOf(symbol) ?? (isNumber(symbol) ? 0 : '');
  }
  const engine = new Engine(told.map(ruleOf));
  const { results, failureResults } = await engine.run(facts);
  const byCase = new Map(
    [...results, ...failureResults].map((result) => [result.name, result.toJSON(false)]),
  );
  return told.flatMap(({ case: name, when, holds, evidence }) => {
    const result = byCase.get(name);
    if (!result) return [`The rules engine did not try case “${name}”.`];
    const top: unknown = isGroup(when) ? result.conditions : firstOf(result.conditions);
    const problems = compareEvidence(evidence, top, name);
    if (holds !== null && holds !== result.result) {
      problems.push(`Case “${name}” ${result.result ? 'holds' : 'does not hold'} for the rules engine.`);
    }
    return problems;
  });
}

/** json-rules-engine wants a group at the root. */
function ruleOf({ case: name, when }: Told): RuleProperties {
  const copy = structuredCloneOf(when);
  return {
    name,
    event: { type: name },
    conditions: 'all' in copy || 'any' in copy || 'not' in copy ? copy : { all: [copy] },
  };
}

/** The rules engine writes into the conditions it is given. */
function structuredCloneOf(condition: Condition): MutableCondition {
  if ('all' in condition) return { all: condition.all.map(structuredCloneOf) };
  if ('any' in condition) return { any: condition.any.map(structuredCloneOf) };
  if ('not' in condition) return { not: structuredCloneOf(condition.not) };
  const { fact, operator, value } = condition;
  return { fact, operator, value: Array.isArray(value) ? [...value] : value };
}

type MutableCondition =
  | { all: MutableCondition[] }
  | { any: MutableCondition[] }
  | { not: MutableCondition }
  | { fact: string; operator: string; value: unknown };

const isGroup = (condition: Condition) => 'all' in condition || 'any' in condition || 'not' in condition;

function record(node: unknown): Record<string, unknown> {
  return typeof node === 'object' && node !== null ? { ...node } : {};
}

function firstOf(node: unknown): unknown {
  const { all } = record(node);
  return Array.isArray(all) ? (all as unknown[])[0] : undefined;
}

function compareEvidence(evidence: Evidence, seen: unknown, name: string): string[] {
  const node = record(seen);
  if ('group' in evidence) {
    const inner = node[evidence.group];
    const list: unknown[] = Array.isArray(inner) ? inner : [inner];
    if (list.length !== evidence.of.length) {
      return [`Case “${name}”: the rules engine saw another group than “${evidence.group}”.`];
    }
    return evidence.of.flatMap((each, i) => compareEvidence(each, list[i], name));
  }
  const { fact, operator, actual, holds } = evidence;
  if (node['fact'] !== fact || node['operator'] !== operator) {
    return [`Case “${name}”: the rules engine compared another fact than ${fact}.`];
  }
  if (actual === null || holds === null) return [];
  if (node['factResult'] !== actual) {
    return [
      `Case “${name}”: the rules engine saw ${String(node['factResult'])} for ${fact}, the ledger ${String(actual)}.`,
    ];
  }
  return node['result'] === holds ? [] : [`Case “${name}”: the rules engine judged ${fact} otherwise.`];
}
