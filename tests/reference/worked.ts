import { readFileSync } from 'node:fs';
import type { Edition, LoadInput, Member, Outcome, Provenance } from '#shared/basis/schema/index.ts';
import { check, compile, runProofs, type ProofResult } from '#shared/engine/index.ts';
import type { CheckResult, LedgerEntry, Result } from '#shared/engine/types.ts';

/*
 * Helpers for published worked examples: run a member through a starter edition, or through a small
 * variant of it as data, and set what the source printed against what came out.
 */

/** One figure of a worked example. */
interface Figure {
  printed?: string | null;
  recomputed?: number;
}

interface Example {
  id: string;
  source?: { title: string; address: string };
  title?: string;
  results?: Record<string, Figure>;
  rows?: Record<string, number | string | null>[];
  deflection?: Record<string, number>;
  deflection_mm?: Record<string, number>;
}

export interface Examples {
  published: Example[];
  constructed: Example[];
}

/** Reads the worked examples kept beside the tests. */
export const examplesFrom = (name: string): Examples =>
  JSON.parse(readFileSync(new URL(`./data/${name}.json`, import.meta.url), 'utf8')) as Examples;

/** Reads a starter edition. */
export const starter = (slug: string): Edition =>
  JSON.parse(readFileSync(new URL(`../../rules/${slug}/edition.json`, import.meta.url), 'utf8')) as Edition;

/** A copy of an edition, changed as data. */
export function variant(edition: Edition, change: (copy: Edition) => void): Edition {
  const copy = structuredClone(edition);
  change(copy);
  return copy;
}

/** Gives a case of a clause another outcome. */
export function setCase(edition: Edition, clause: string, id: string, gives: Outcome): void {
  const found = edition.clauses.find((c) => c.id === clause)?.cases.find((c) => c.id === id);
  if (!found) throw new Error(`No case ${id} in clause ${clause}.`);
  found.gives = gives;
}

/** Puts other numbers into a row of the grades. */
export function setGrade(edition: Edition, id: string, values: Record<string, number>): void {
  const row = edition.grades.rows.find((r) => r.id === id);
  if (!row) throw new Error(`No grade ${id}.`);
  Object.assign(row.values, values);
}

/** Provenance of a value that only a test uses. */
export const forTest: Provenance = { source: 'starter', standing: 'invented', note: 'For a test.' };

type Given = Pick<Member, 'grade' | 'section' | 'spans'> & Partial<Omit<Member, 'schema' | 'mark'>>;

/** A member document with the usual empty parts filled in; bearings of the given length on pins. */
export function member(units: Member['units'], bearing: number, given: Given): Member {
  return {
    schema: 'member/1',
    mark: 'REF',
    units,
    choices: {},
    spanMeasured: 'centres',
    supports: Array.from({ length: given.spans.length + 1 }, () => ({ restraint: 'pin', bearing })),
    loads: [],
    inputs: {},
    departures: [],
    ...given,
  };
}

/** A uniform load over the whole member. */
export const line = (action: string, start: number): LoadInput => ({
  id: `${action}-line`,
  action,
  kind: 'line',
  start,
});

/** Point loads of one action at several places. */
export const points = (action: string, force: number, ...places: number[]): LoadInput[] =>
  places.map((x, i) => ({ id: `${action}-${i}-${force}`, action, kind: 'point', force, x }));

/** Compiles and runs, with the findings in the message where that is impossible. */
export function run(edition: Edition, given: Member): Result {
  const outcome = compile(edition);
  if (!outcome.ok) {
    throw new Error(outcome.findings.map((f) => `${f.pointer} ${f.message}`).join('\n'));
  }
  return check(outcome.plan, given);
}

/** The proofs of an edition, run. */
export function proofsOf(edition: Edition): ProofResult[] {
  const outcome = compile(edition);
  if (!outcome.ok) throw new Error(outcome.findings.map((f) => `${f.pointer} ${f.message}`).join('\n'));
  return runProofs(outcome.plan);
}

/** A check of a result, by id. */
export function checkOf(result: Result, id: string): CheckResult {
  const found = result.checks.find((c) => c.id === id);
  if (!found) throw new Error(`No check ${id}: ${result.verdict.because ?? 'it does not apply'}.`);
  return found;
}

const number = (value: number | string | null | undefined, what: string): number => {
  if (typeof value !== 'number') throw new Error(`No number for ${what}.`);
  return value;
};

export const demand = (result: Result, id: string) =>
  number(checkOf(result, id).demand?.value, `${id} demand`);
export const limit = (result: Result, id: string) => number(checkOf(result, id).limit?.value, `${id} limit`);

/** Utilisation of a check, governing or under the combinations of one pattern. */
export function utilisation(result: Result, id: string, pattern?: string): number {
  const found = checkOf(result, id);
  if (pattern === undefined) return number(found.utilisation, id);
  const ids = result.combinations.filter((c) => c.pattern === pattern).map((c) => c.id);
  const values = found.instances
    .filter((i) => i.combination !== undefined && ids.includes(i.combination))
    .map((i) => number(i.utilisation, `${id} under ${pattern}`));
  if (values.length === 0) throw new Error(`No instance of ${id} under ${pattern}.`);
  return Math.max(...values);
}

/** Value of a symbol behind a check, found by walking the ledger down from the check's own entry. */
export function behind(result: Result, id: string, symbol: string): number {
  const waiting = [checkOf(result, id).entry];
  const visited = new Set<number>();
  for (let n = waiting.pop(); n !== undefined; n = waiting.pop()) {
    if (visited.has(n)) continue;
    visited.add(n);
    const entry = result.ledger[n] as LedgerEntry;
    if (entry.symbol === symbol) return number(entry.value, symbol);
    waiting.push(...Object.values(entry.uses));
  }
  throw new Error(`${symbol} is not behind ${id}.`);
}

/** A computed figure set against a worked example. */
export interface Comparison {
  example: string;
  quantity: string;
  computed: number;
  unit: string;
  /** Allowed difference; left out: half a unit in the last place that the source gives. */
  tolerance?: number;
  /** Expected figure where the example's own data holds none. */
  expected?: number;
  /** Why the tolerance is wider, or which slip of the source this row explains. */
  why?: string;
}

export interface Row {
  example: string;
  source: string;
  quantity: string;
  unit: string;
  given: string;
  expected: number;
  computed: number;
  tolerance: number;
  why: string;
}

const halfUnit = (text: string): number => {
  const decimals = /\.(\d+)/.exec(text)?.[1]?.length ?? 0;
  return 0.5 * 10 ** -decimals * (1 + 1e-9);
};

/** Figures of our own drop their last zeros, so that the last place says too little of the short ones. */
const ownTolerance = (text: string): number => Math.min(halfUnit(text), 5e-4 * Math.abs(Number(text)));

/** Sets comparisons against the data of the examples. */
export function rowsFor(examples: Examples, comparisons: readonly Comparison[]): Row[] {
  return comparisons.map(({ example, quantity, computed, unit, tolerance, expected, why }) => {
    const found = [...examples.published, ...examples.constructed].find(({ id }) => id === example);
    if (!found) throw new Error(`No example ${example}.`);
    const figure = figureOf(found, quantity);
    const printed = figure?.printed?.match(/-?[\d,]*\.?\d+/)?.[0].replaceAll(',', '');
    const recomputed = figure?.recomputed === undefined ? undefined : String(figure.recomputed);
    const text = expected === undefined ? (printed ?? recomputed) : String(expected);
    if (text === undefined) throw new Error(`Nothing to compare ${example} ${quantity} with.`);
    const isPrinted = expected === undefined && printed !== undefined;
    return {
      example,
      source: found.source?.title ?? 'Worked by hand',
      quantity,
      unit,
      given: isPrinted ? printed : `${text} (not printed)`,
      expected: Number(text),
      computed,
      tolerance: tolerance ?? (isPrinted ? halfUnit(text) : ownTolerance(text)),
      why: why ?? '',
    };
  });
}

/** A figure by name: of the results, or `combination/quantity` of the rows, or of the deflections. */
function figureOf(example: Example, quantity: string): Figure | undefined {
  const result = example.results?.[quantity];
  if (result) return result;
  const [combination, name] = quantity.split('/');
  const row = example.rows?.find((r) => r.combination === combination);
  const value = name === undefined ? undefined : row?.[name];
  const other = example.deflection?.[quantity] ?? example.deflection_mm?.[quantity];
  const figure = typeof value === 'number' ? value : other;
  return figure === undefined ? undefined : { recomputed: figure };
}

const shown = (value: number) => String(Number(value.toPrecision(7)));

/** The comparison as a table in Markdown. */
export function tableOf(title: string, examples: Examples, rows: readonly Row[]): string {
  const head = [
    `# ${title}`,
    '',
    'Written by the tests beside it; `npx vitest run tests/reference -u` writes it anew.',
    'Printed: as in the source. Tolerance: half a unit in the last printed place, unless the remark says why not;',
    'where the source prints nothing, half a unit in the last place of the hand figure and 0.05 % at most.',
    '',
    '| example | quantity | unit | printed | computed | tolerance | remark |',
    '| --- | --- | --- | --- | --- | --- | --- |',
  ];
  const body = rows.map((r) =>
    [
      r.example,
      r.quantity,
      r.unit,
      r.given,
      shown(r.computed),
      String(Number(r.tolerance.toPrecision(3))),
      r.why,
    ]
      .map((cell) => ` ${cell.replaceAll('|', '\\|')} `)
      .join('|'),
  );
  const used = [...examples.published, ...examples.constructed].filter(({ id }) =>
    rows.some((r) => r.example === id),
  );
  const sources = used.map(({ id, source, title: own }) =>
    source ? `- ${id}: ${source.title}. <${source.address}>` : `- ${id}: worked by hand. ${own ?? ''}`,
  );
  return [...head, ...body.map((b) => `|${b}|`), '', '## Sources', '', ...sources, ''].join('\n');
}
