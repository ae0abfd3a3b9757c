import type { Case } from '#shared/basis/schema/index.ts';
import { evidenceOf } from '../decide/evidence.ts';
import { choose, fillClause, type RunCase, type RunClause, type RunKey } from '../run/clause.ts';
import { evaluate } from '../run/formula.ts';
import type { RunSymbol } from '../run/runtime.ts';
import type { Choosing, LedgerEntry } from '../types.ts';
import type { Uses } from './entry.ts';
import type { Recorder } from './recorder.ts';
import { symbolEntry } from './stored.ts';

/** A clause's value: the case that gave it, what that case looked at, and how the value came about. */
export function recordClause(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { env, runtime, context } = recorder;
  const run = runtime.clauseAt.get(known.slot) as RunClause;
  const { clause } = run;
  const uses: Uses = {};
  const chosen = choose(run, env);
  const choosing = chosenBy(recorder, run, chosen, uses);
  if (typeof chosen === 'number') recordLookedAt(recorder, run, chosen, uses);
  const entry = symbolEntry(recorder, known, clause.kind, uses, 'edition', `/clauses/${run.index}`);
  entry.reference = clause.reference;
  entry.clause = clause.id;
  if (choosing) entry.choosing = choosing;
  if (context.overrides?.has(known.slot)) depart(recorder, known, run, entry);
  else if (typeof chosen === 'number') setOutcome(recorder, run, chosen, entry);
  return entry;
}

/** The conditions that were tried, in order, with what each comparison saw. */
function chosenBy(
  recorder: Recorder,
  { cases, clause }: RunClause,
  chosen: number | object,
  uses: Uses,
): Choosing | null {
  const last = typeof chosen === 'number' ? chosen : cases.length - 1;
  const tried: Choosing['tried'][number][] = [];
  for (let i = 0; i <= last; i += 1) {
    const { when, id } = clause.cases[i] as Case;
    if (!when) continue;
    recorder.symbols((cases[i] as RunCase).symbols, uses);
    const evidence = evidenceOf(when, (symbol) => {
      const n = uses[symbol];
      return n === undefined ? null : (recorder.entries[n] as LedgerEntry).value;
    });
    tried.push({ case: id, holds: evidence.holds, evidence });
    // An open condition ends the search: what comes after it was never asked.
    if (evidence.holds === null) break;
  }
  const by = typeof chosen === 'number' ? (clause.cases[chosen] as Case) : null;
  if (!by) return { case: '', tried };
  return { case: by.id, ...(by.title === undefined ? {} : { title: by.title }), tried };
}

/** Records what the formula or the table keys of the chosen case look at. */
function recordLookedAt(recorder: Recorder, run: RunClause, chosen: number, uses: Uses): void {
  const { gives } = run.cases[chosen] as RunCase;
  if (gives.kind === 'formula') recorder.symbols(gives.formula.symbols, uses);
  else if (gives.kind === 'spanLimit') recorder.symbols(['L'], uses);
  else if (gives.kind === 'table') {
    for (const key of gives.keys) {
      if (key.kind === 'fact') recorder.symbols([key.symbol], uses);
      else if (key.kind === 'formula') recorder.symbols(key.formula.symbols, uses);
    }
  }
}

/** How the chosen case came to its value, and where that is stored. */
function setOutcome(recorder: Recorder, run: RunClause, chosen: number, entry: LedgerEntry): void {
  const { edition } = recorder.context;
  const { gives } = run.cases[chosen] as RunCase;
  const { provenance } = run.clause.cases[chosen] as Case;
  entry.pointer = `/clauses/${run.index}/cases/${chosen}`;
  entry.standing = recorder.standings.of(provenance);
  if (gives.kind === 'formula') recorder.formula(entry, gives.formula.text);
  else if (gives.kind === 'spanLimit') recorder.formula(entry, gives.formula);
  else if (gives.kind === 'table') {
    const table = edition.tables.find(({ id }) => id === gives.table);
    const keys = keysOf(recorder, gives.keys);
    const looked = keys && gives.explain(keys);
    const cell = looked?.cell === undefined ? undefined : table?.cells?.[String(looked.cell)];
    entry.standing = recorder.standings.of(cell ?? table?.provenance ?? provenance);
    entry.lookup = { table: table?.title ?? gives.table, keys: keys ?? [], found: looked?.found ?? '' };
  }
}

/** Exact keys of a look-up; null where one has no value. */
function keysOf(recorder: Recorder, keys: readonly RunKey[]): (number | string)[] | null {
  const values: (number | string)[] = [];
  for (const key of keys) {
    const value =
      key.kind === 'word'
        ? key.value
        : key.kind === 'fact'
          ? recorder.env.value(key.slot)
          : evaluate(key.formula, recorder.env);
    if (value === null || Number.isNaN(value)) return null;
    values.push(value);
  }
  return values;
}

/** A clause departed from: what the edition would give, the reason, and who approved. */
function depart(recorder: Recorder, { slot }: RunSymbol, run: RunClause, entry: LedgerEntry): void {
  const { env, context } = recorder;
  const departure = context.given.departures.get(run.clause.id);
  if (!departure) return;
  fillClause(run, env);
  const stored = env.value(slot);
  env.setNumber(slot, entry.value as number);
  const { reason, approvedBy } = departure;
  entry.departure = { stored: typeof stored === 'number' ? stored : null, reason };
  if (approvedBy !== undefined) entry.departure.approvedBy = approvedBy;
  entry.in = 'member';
  entry.pointer = `/departures/${context.given.member.departures.indexOf(departure)}`;
}
