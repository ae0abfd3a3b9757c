import type { Edition } from '#shared/basis/schema/index.ts';
import type { RunSymbol } from '../run/runtime.ts';
import type { Draft, Recorder } from './recorder.ts';

/** What every entry of a symbol says first. */
export function headOf(recorder: Recorder, { slot, symbol, title, unit }: RunSymbol) {
  const problem = recorder.env.problem(slot);
  return {
    symbol,
    title,
    value: recorder.env.value(slot),
    unit,
    ...(problem ? { refused: problem.message } : {}),
  };
}

/** An option picked for the member, given by its grade, or taken as the edition's default. */
export function recordChoice(recorder: Recorder, known: RunSymbol): Draft {
  const { edition, given } = recorder.context;
  const choice = edition.choices[known.index] as Edition['choices'][number];
  const head = headOf(recorder, known);
  if (choice.scope === 'grade' && Object.hasOwn(given.grade.choices, choice.symbol)) {
    return {
      ...head,
      kind: 'grade',
      uses: {},
      standing: recorder.standings.of(given.grade.provenance),
      in: 'edition',
      pointer: `/grades/rows/${given.gradeIndex}/choices/${choice.symbol}`,
    };
  }
  const picked = choice.scope !== 'grade' && Object.hasOwn(given.member.choices, choice.symbol);
  return {
    ...head,
    kind: 'input',
    uses: {},
    ...(picked
      ? { in: 'member', pointer: `/choices/${choice.symbol}` }
      : { in: 'edition', pointer: `/choices/${known.index}/default` }),
  };
}

/** A number entered for the member, a span or a support, or the edition's default. */
export function recordInput(recorder: Recorder, known: RunSymbol): Draft {
  const { edition, given, place } = recorder.context;
  const input = edition.inputs[known.index] as Edition['inputs'][number];
  const { member } = given;
  const [record, base, label] =
    input.scope === 'member'
      ? [member.inputs, '/inputs', '']
      : input.scope === 'span'
        ? [
            member.spans[place?.span ?? 0]?.inputs,
            `/spans/${place?.span ?? 0}/inputs`,
            `, span ${(place?.span ?? 0) + 1}`,
          ]
        : [
            member.supports[place?.node ?? 0]?.inputs,
            `/supports/${place?.node ?? 0}/inputs`,
            `, support ${(place?.node ?? 0) + 1}`,
          ];
  const entered = record !== undefined && Object.hasOwn(record, input.symbol);
  const head = headOf(recorder, known);
  return {
    ...head,
    kind: 'input',
    title: `${head.title}${label}`,
    uses: {},
    ...(entered
      ? { in: 'member', pointer: `${base}/${input.symbol}` }
      : { in: 'edition', pointer: `/inputs/${known.index}/default` }),
  };
}

/** A value of the grade table. */
export function recordGradeValue(recorder: Recorder, known: RunSymbol): Draft {
  const { grade, gradeIndex } = recorder.context.given;
  const cell = Object.hasOwn(grade.values, known.symbol) ? grade.values[known.symbol] : undefined;
  const provenance = grade.cells?.[known.symbol] ?? grade.provenance;
  const draft: Draft = {
    ...headOf(recorder, known),
    kind: 'grade',
    uses: {},
    standing: recorder.standings.of(provenance),
    in: 'edition',
    pointer: `/grades/rows/${gradeIndex}/values/${known.symbol}`,
  };
  if (typeof cell !== 'object') return draft;
  const by = recorder.symbol(cell.by);
  const size = recorder.entries[by]?.value ?? null;
  return {
    ...draft,
    uses: { [cell.by]: by },
    lookup: {
      table: grade.title,
      keys: size === null ? [] : [size],
      found: `the band of ${cell.by} it falls in`,
    },
  };
}

/** A number that an action carries for the combinations. */
export function recordActionValue(recorder: Recorder, known: RunSymbol): Draft {
  const { edition, action } = recorder.context;
  const carrying = edition.actions[action];
  const head = headOf(recorder, known);
  return {
    ...head,
    kind: 'action',
    title: `${head.title}: ${carrying?.title ?? ''}`,
    uses: {},
    ...(carrying ? { standing: recorder.standings.of(carrying.provenance) } : {}),
    in: 'edition',
    pointer: `/actions/${action}/values/${known.symbol}`,
  };
}
