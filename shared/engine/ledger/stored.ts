import type { Edition } from '#shared/basis/schema/index.ts';
import type { RunSymbol } from '../run/runtime.ts';
import type { EntryKind, LedgerEntry } from '../types.ts';
import { entryOf, type Uses } from './entry.ts';
import type { Recorder } from './recorder.ts';

/** Entry of a symbol's value where the evaluation stands, or of why it has none. */
export function symbolEntry(
  recorder: Recorder,
  { slot, symbol, title, unit }: RunSymbol,
  kind: EntryKind,
  uses: Uses,
  where: LedgerEntry['in'],
  pointer: string,
): LedgerEntry {
  const entry = entryOf(kind, symbol, title, recorder.env.value(slot), unit, uses, where, pointer);
  if (entry.value === null) entry.refused = recorder.env.problem(slot)?.message ?? '';
  return entry;
}

/** An option picked for the member, given by its grade, or taken as the edition's default. */
export function recordChoice(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { edition, given } = recorder.context;
  const { scope, symbol } = edition.choices[known.index] as Edition['choices'][number];
  if (scope === 'grade' && Object.hasOwn(given.grade.choices, symbol)) {
    const pointer = `/grades/rows/${given.gradeIndex}/choices/${symbol}`;
    const entry = symbolEntry(recorder, known, 'grade', {}, 'edition', pointer);
    entry.standing = recorder.standings.of(given.grade.provenance);
    return entry;
  }
  const picked = scope !== 'grade' && Object.hasOwn(given.member.choices, symbol);
  return picked
    ? symbolEntry(recorder, known, 'input', {}, 'member', `/choices/${symbol}`)
    : symbolEntry(recorder, known, 'input', {}, 'edition', `/choices/${known.index}/default`);
}

/** A number entered for the member, a span or a support, or the edition's default. */
export function recordInput(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { edition, given, place } = recorder.context;
  const { scope, symbol } = edition.inputs[known.index] as Edition['inputs'][number];
  const { member } = given;
  let record: Readonly<Record<string, number>> | undefined = member.inputs;
  let base = '/inputs';
  let label = '';
  if (scope === 'span') {
    const span = place?.span ?? 0;
    record = member.spans[span]?.inputs;
    base = `/spans/${span}/inputs`;
    label = `, span ${span + 1}`;
  } else if (scope === 'support') {
    const node = place?.node ?? 0;
    record = member.supports[node]?.inputs;
    base = `/supports/${node}/inputs`;
    label = `, support ${node + 1}`;
  }
  const entered = record !== undefined && Object.hasOwn(record, symbol);
  const entry = entered
    ? symbolEntry(recorder, known, 'input', {}, 'member', `${base}/${symbol}`)
    : symbolEntry(recorder, known, 'input', {}, 'edition', `/inputs/${known.index}/default`);
  entry.title += label;
  return entry;
}

/** A value of the grade table. */
export function recordGradeValue(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { grade, gradeIndex } = recorder.context.given;
  const { symbol } = known;
  const cell = Object.hasOwn(grade.values, symbol) ? grade.values[symbol] : undefined;
  const uses: Uses = {};
  if (typeof cell === 'object') uses[cell.by] = recorder.symbol(cell.by);
  const pointer = `/grades/rows/${gradeIndex}/values/${symbol}`;
  const entry = symbolEntry(recorder, known, 'grade', uses, 'edition', pointer);
  entry.standing = recorder.standings.of(grade.cells?.[symbol] ?? grade.provenance);
  if (typeof cell === 'object') {
    const size = recorder.entries[uses[cell.by] as number]?.value ?? null;
    const found = `the band of ${cell.by} it falls in`;
    entry.lookup = { table: grade.title, keys: size === null ? [] : [size], found };
  }
  return entry;
}

/** A number that an action carries for the combinations. */
export function recordActionValue(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { edition, action } = recorder.context;
  const pointer = `/actions/${action}/values/${known.symbol}`;
  const entry = symbolEntry(recorder, known, 'action', {}, 'edition', pointer);
  const carrying = edition.actions[action];
  if (carrying) {
    entry.title += `: ${carrying.title}`;
    entry.standing = recorder.standings.of(carrying.provenance);
  }
  return entry;
}
