import type { Case, Provenance } from '#shared/basis/schema/index.ts';
import { evidenceOf } from '../decide/evidence.ts';
import { choose, fillClause, type RunCase, type RunClause, type RunKey } from '../run/clause.ts';
import { evaluate } from '../run/formula.ts';
import type { RunSymbol } from '../run/runtime.ts';
import type { Choosing, LedgerEntry } from '../types.ts';
import type { Draft, Recorder, Uses } from './recorder.ts';
import { headOf } from './stored.ts';

/** A clause's value: the case that gave it, what that case looked at, and how the value came about. */
export function recordClause(recorder: Recorder, known: RunSymbol): Draft {
  const { env, runtime, context } = recorder;
  const run = runtime.clauseAt.get(known.slot) as RunClause;
  const { clause } = run;
  const uses: Uses = {};
  const chosen = choose(run, env);
  const choosing = chosenBy(recorder, run, chosen, uses);
  const draft: Draft = {
    ...headOf(recorder, known),
    kind: clause.kind,
    reference: clause.reference,
    clause: clause.id,
    ...(choosing ? { choosing } : {}),
    uses,
    in: 'edition',
    pointer: `/clauses/${run.index}`,
  };
  const made =
    typeof chosen === 'number' ? Object.assign(draft, outcome(recorder, run, chosen, uses)) : draft;
  return context.overrides?.has(known.slot) ? departed(recorder, known, run, made) : made;
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

function outcome(recorder: Recorder, run: RunClause, chosen: number, uses: Uses): Partial<Draft> {
  const { edition } = recorder.context;
  const { gives } = run.cases[chosen] as RunCase;
  const { provenance } = run.clause.cases[chosen] as Case;
  const pointer = `/clauses/${run.index}/cases/${chosen}`;
  const base = { standing: recorder.standings.of(provenance), pointer };
  if (gives.kind === 'formula') return { ...base, ...recorder.run(gives.formula, uses) };
  if (gives.kind === 'spanLimit') {
    recorder.symbols(['L'], uses);
    return { ...base, ...recorder.formula(gives.formula, uses), uses };
  }
  if (gives.kind !== 'table') return base;
  for (const key of gives.keys) {
    if (key.kind === 'fact') recorder.symbols([key.symbol], uses);
    else if (key.kind === 'formula') recorder.symbols(key.formula.symbols, uses);
  }
  const table = edition.tables.find(({ id }) => id === gives.table);
  const keys = keysOf(recorder, gives.keys);
  const looked = keys && gives.explain(keys);
  const cell = looked?.cell === undefined ? undefined : table?.cells?.[String(looked.cell)];
  const stored: Provenance = cell ?? table?.provenance ?? provenance;
  return {
    standing: recorder.standings.of(stored),
    pointer,
    uses,
    lookup: { table: table?.title ?? gives.table, keys: keys ?? [], found: looked?.found ?? '' },
  };
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

/** A clause departed from: the departure's value, with what the edition would give and the reason. */
function departed(recorder: Recorder, known: RunSymbol, run: RunClause, made: Draft): Draft {
  const { env, context } = recorder;
  const departure = context.given.departures.get(run.clause.id);
  if (!departure) return made;
  const value = env.value(known.slot);
  fillClause(run, env);
  const stored = env.value(known.slot);
  env.setNumber(known.slot, value as number);
  const index = context.given.member.departures.indexOf(departure);
  // How the edition would come to its value is not how this one came about.
  const rest = { ...made };
  delete rest.formula;
  delete rest.substituted;
  delete rest.lookup;
  delete rest.refused;
  return {
    ...rest,
    value,
    departure: {
      stored: typeof stored === 'number' ? stored : null,
      reason: departure.reason,
      ...(departure.approvedBy === undefined ? {} : { approvedBy: departure.approvedBy }),
    },
    in: 'member',
    pointer: `/departures/${index}`,
  };
}
