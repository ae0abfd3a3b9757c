import type { Context } from '../run/context.ts';
import type { Env } from '../run/env.ts';
import type { Runtime, RunSymbol } from '../run/runtime.ts';
import type { LedgerEntry } from '../types.ts';
import { recordBuiltIn } from './builtIns.ts';
import { recordClause } from './clauses.ts';
import { Recorder, type Stationery } from './recorder.ts';
import { recordActionValue, recordChoice, recordGradeValue, recordInput } from './stored.ts';

/** An empty ledger, ready to be written where the evaluation stands. */
export function openLedger(runtime: Runtime, env: Env, context: Context, stationery: Stationery): Recorder {
  return new Recorder(runtime, env, context, stationery, writeSymbol);
}

function writeSymbol(recorder: Recorder, known: RunSymbol): LedgerEntry {
  switch (known.origin) {
    case 'builtIn':
      return recordBuiltIn(recorder, known);
    case 'choice':
      return recordChoice(recorder, known);
    case 'input':
      return recordInput(recorder, known);
    case 'gradeColumn':
      return recordGradeValue(recorder, known);
    case 'actionValue':
      return recordActionValue(recorder, known);
    default:
      return recordClause(recorder, known);
  }
}
