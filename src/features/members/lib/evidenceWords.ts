import type { Operator } from '#shared/basis/schema/index.ts';
import type { Choosing, Evidence } from '#shared/engine/types.ts';

type Seen = Extract<Evidence, { fact: string }>;

/** How words and numbers of facts are shown; titles of choices and options come from the edition. */
export interface Wording {
  /** Title of a fact, for facts that hold words. */
  title: (fact: string) => string;
  /** Title of an option of a fact. */
  option: (fact: string, id: string) => string;
  number: (value: number) => string;
}

const signs: Partial<Record<Operator, string>> = {
  lessThan: '<',
  lessThanInclusive: '≤',
  greaterThan: '>',
  greaterThanInclusive: '≥',
  equal: '=',
  notEqual: '≠',
};
const opposite: Partial<Record<Operator, Operator>> = {
  lessThan: 'greaterThanInclusive',
  lessThanInclusive: 'greaterThan',
  greaterThan: 'lessThanInclusive',
  greaterThanInclusive: 'lessThan',
};

const isSeen = (evidence: Evidence): evidence is Seen => 'fact' in evidence;

/** The comparisons that decided: those that hold in a group that holds, or fail in one that fails. */
function deciding(evidence: Evidence): Seen[] {
  if (isSeen(evidence)) return [evidence];
  if (evidence.group === 'not') return evidence.of.flatMap(deciding);
  return evidence.of.filter((child) => child.holds === evidence.holds).flatMap(deciding);
}

interface Bound {
  operator: Operator;
  value: number;
}

/** "72 < h = 245 ≤ 300": the tightest bounds around a number. */
function range(fact: string, actual: number, bounds: readonly Bound[], wording: Wording): string {
  const lower = bounds
    .filter((b) => b.operator.startsWith('greaterThan'))
    .sort((a, b) => b.value - a.value)[0];
  const upper = bounds.filter((b) => b.operator.startsWith('lessThan')).sort((a, b) => a.value - b.value)[0];
  const below = lower
    ? `${wording.number(lower.value)} ${lower.operator === 'greaterThan' ? '<' : '≤'} `
    : '';
  const above = upper ? ` ${signs[upper.operator] ?? ''} ${wording.number(upper.value)}` : '';
  return `${below}${fact} = ${wording.number(actual)}${above}`;
}

function inWords(seen: Seen, wording: Wording): string {
  const { fact, actual, operator, value } = seen;
  if (typeof actual === 'string') {
    const is = `${wording.title(fact)} is ${wording.option(fact, actual)}`;
    if (operator === 'notEqual' || operator === 'notIn') {
      const others = (Array.isArray(value) ? value : [value]).map((v) => wording.option(fact, String(v)));
      return seen.holds ? `${is}, not ${others.join(' or ')}` : is;
    }
    return is;
  }
  if (typeof actual === 'number') {
    const sign = typeof value === 'number' ? `${signs[operator] ?? operator} ${wording.number(value)}` : '';
    return `${fact} = ${wording.number(actual)} ${sign}`.trim();
  }
  return `${wording.title(fact)} is not given`;
}

/**
 * Why a case was chosen, in words: the facts that its condition and the failed conditions before it looked
 * at. Bounds on the same number are joined, so that a piecewise rule reads as a range.
 */
export function choosingInWords(choosing: Choosing, wording: Wording): string {
  const bounds = new Map<string, { actual: number; bounds: Bound[] }>();
  const words: string[] = [];
  for (const { holds, evidence } of choosing.tried) {
    for (const seen of deciding(evidence)) {
      const { fact, actual, operator, value } = seen;
      const counter = opposite[operator];
      if (typeof actual === 'number' && typeof value === 'number' && counter) {
        const entry = bounds.get(fact) ?? { actual, bounds: [] };
        entry.bounds.push({ operator: seen.holds ? operator : counter, value });
        bounds.set(fact, entry);
      } else if (holds || choosing.tried.every((t) => !t.holds)) {
        words.push(inWords(seen, wording));
      }
    }
  }
  const ranges = [...bounds].map(([fact, { actual, bounds: list }]) => range(fact, actual, list, wording));
  return [...new Set([...words, ...ranges])].join('; ');
}
