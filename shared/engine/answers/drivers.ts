import { check } from '../check.ts';
import type { Driver, LedgerEntry, Member, Plan, Result } from '../types.ts';
import { verdict } from '../verdict.ts';

/** Relative size of the step for inputs. */
const STEP = 1e-4;

/**
 * What drives the governing utilisation: each factor behind it, with that utilisation if the factor were
 * 1; each number typed for the member, with the relative change of utilisation per relative change of it
 * (by exact evaluation a ten-thousandth to either side). Strongest first.
 */
export function drivers(plan: Plan, member: Member, known?: Result): Driver[] {
  const result = known ?? check(plan, member);
  const governing = result.checks[0];
  if (!governing || governing.utilisation === null) return [];
  const { id, utilisation } = governing;
  const behind = entriesBehind(result.ledger, governing.entry);
  const utilisationOf = (changed: Member, trial: ReadonlyMap<string, number> | null) =>
    verdict(plan, changed, null, trial).checks.find((each) => each.id === id)?.utilisation ?? null;

  const factors = onePerClause(behind).flatMap((entry): Driver[] => {
    const at1 = utilisationOf(member, new Map([[entry.clause as string, 1]]));
    if (at1 === null) return [];
    return [{ entry: entry.n, symbol: entry.symbol, title: entry.title, kind: 'factor', effect: at1 }];
  });
  const inputs = behind
    .filter((entry) => entry.in === 'member' && entry.kind === 'input' && typeof entry.value === 'number')
    .flatMap((entry): Driver[] => {
      const more = scaled(member, entry.pointer, 1 + STEP);
      const less = scaled(member, entry.pointer, 1 - STEP);
      const above = more && utilisationOf(more, null);
      const below = less && utilisationOf(less, null);
      if (above === null || below === null || utilisation === 0) return [];
      const effect = (above - below) / (utilisation * 2 * STEP);
      return [{ entry: entry.n, symbol: entry.symbol, title: entry.title, kind: 'input', effect }];
    });
  const strength = ({ kind, effect }: Driver) =>
    kind === 'factor' ? Math.abs(Math.log(Math.max(effect, 1e-12) / utilisation)) : Math.abs(effect);
  const ranked = (list: Driver[]) => list.sort((a, b) => strength(b) - strength(a) || a.entry - b.entry);
  return [...ranked(factors), ...ranked(inputs)];
}

/** Entries that one entry rests on, itself left out, in the order of the ledger. */
export function entriesBehind(ledger: readonly LedgerEntry[], n: number): LedgerEntry[] {
  const found = new Set<number>();
  const visit = (index: number): void => {
    for (const used of Object.values(ledger[index]?.uses ?? {})) {
      if (found.has(used)) continue;
      found.add(used);
      visit(used);
    }
  };
  visit(n);
  return ledger.filter((entry) => found.has(entry.n));
}

function onePerClause(entries: readonly LedgerEntry[]): LedgerEntry[] {
  const seen = new Set<string>();
  return entries.filter(({ kind, clause, value }) => {
    if (kind !== 'factor' || clause === undefined || typeof value !== 'number' || seen.has(clause))
      return false;
    seen.add(clause);
    return true;
  });
}

/** The member with the number at a pointer scaled; null where scaling it makes no sense. */
function scaled(member: Member, pointer: string, by: number): Member | null {
  const path = pointer.split('/').slice(1);
  const change = (node: unknown, depth: number): unknown => {
    const key = path[depth];
    if (key === undefined) return typeof node === 'number' ? node * by : null;
    if (Array.isArray(node)) {
      return node.map((each: unknown, i) => (String(i) === key ? change(each, depth + 1) : each));
    }
    if (typeof node !== 'object' || node === null) return null;
    return { ...node, [key]: change((node as Record<string, unknown>)[key], depth + 1) };
  };
  // Pieces are whole, and a load that varies along the member is scaled at both ends.
  if (pointer === '/section/pieces' || pointer === '' || !isNumberAt(member, path)) return null;
  const changed = change(member, 0) as Member;
  const [list, index, field] = path;
  if (list !== 'loads' || field !== 'start') return changed;
  const loads = changed.loads.map((load, i) =>
    String(i) === index && load.kind === 'line' && load.end !== undefined
      ? { ...load, end: load.end * by }
      : load,
  );
  return { ...changed, loads };
}

function isNumberAt(member: Member, path: readonly string[]): boolean {
  let node: unknown = member;
  for (const key of path) {
    if (typeof node !== 'object' || node === null || !Object.hasOwn(node, key)) return false;
    node = (node as Record<string, unknown>)[key];
  }
  return typeof node === 'number';
}
