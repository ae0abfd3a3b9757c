import type { RunSymbol } from '../run/runtime.ts';
import type { LedgerEntry } from '../types.ts';
import { recordSpan, recordSum, type SummedEffect } from './effects.ts';
import { placeName } from './places.ts';
import type { Uses } from './entry.ts';
import type { Recorder } from './recorder.ts';
import { symbolEntry } from './stored.ts';

/** Where a fact of the member stands in its document. */
const memberPointers: Readonly<Record<string, string>> = {
  b_1: '/section/b',
  h: '/section/h',
  b_nominal: '/section/nominal/b',
  h_nominal: '/section/nominal/h',
  pieces: '/section/pieces',
  spacing: '/carries/width',
  tributary: '/carries/width',
  spans: '/spans',
  slope: '/slope',
  grade: '/grade',
};

const fromAnalysis = new Set(['M', 'M_variable', 'V', 'V_d', 'V_variable', 'R', 'R_up', 'R_variable', 'w']);

/** A fact that every member has. */
export function recordBuiltIn(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { symbol, slot, level } = known;
  if (fromAnalysis.has(symbol) && recorder.env.value(slot) !== null) return summed(recorder, known);
  if (symbol === 'b' || symbol === 'L' || symbol === 'L_max') return measured(recorder, known);
  if (level === 'member' || level === 'edition') {
    return symbolEntry(recorder, known, 'input', {}, 'member', memberPointers[symbol] ?? '');
  }
  const { place, combination, pattern } = recorder.context;
  if (level === 'combination' || level === 'term') {
    const pointer = `/combinations/${combination?.pattern ?? pattern}`;
    return symbolEntry(recorder, known, 'combination', {}, 'edition', pointer);
  }
  const entry =
    symbol === 'l_b'
      ? symbolEntry(recorder, known, 'input', {}, 'member', `/supports/${place?.node ?? 0}/bearing`)
      : symbolEntry(
          recorder,
          known,
          'effect',
          symbol === 'L_0' ? recorder.symbols(['M']) : {},
          'edition',
          '',
        );
  entry.title += placeSuffix(recorder);
  return entry;
}

function placeSuffix({ context: { place, geometry } }: Recorder): string {
  return place ? `, ${placeName(place, geometry?.nodes.length ?? 0)}` : '';
}

/** Sizes that are worked out from what was typed. */
function measured(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { symbol } = known;
  const { place, geometry, given } = recorder.context;
  if (symbol === 'b') {
    const { pieces } = given.section;
    const uses = pieces === 1 ? {} : recorder.symbols(['b_1', 'pieces']);
    const entry = symbolEntry(recorder, known, 'input', uses, 'member', '/section/b');
    return pieces === 1 ? entry : recorder.formula(entry, 'b_1 * pieces');
  }
  const uses: Uses = {};
  if (symbol === 'L') {
    const span = place?.span ?? 0;
    uses[`L_${span + 1}`] = recordSpan(recorder, span);
    const entry = symbolEntry(recorder, known, 'quantity', uses, 'edition', '/analysis/span');
    entry.title += ` ${span + 1}`;
    return recorder.formula(entry, `L_${span + 1}`);
  }
  geometry?.spans.forEach((_, span) => {
    uses[`L_${span + 1}`] = recordSpan(recorder, span);
  });
  const entry = symbolEntry(recorder, known, 'quantity', uses, 'member', '/spans');
  return geometry ? recorder.formula(entry, `max(${Object.keys(uses).join(', ')})`) : entry;
}

/** Sum over the actions: size of the whole, or the part from variable actions in its direction. */
function summed(recorder: Recorder, known: RunSymbol): LedgerEntry {
  const { place, geometry } = recorder.context;
  const { symbol, unit } = known;
  const onlyVariable = symbol.endsWith('_variable');
  const effect = (
    onlyVariable ? symbol.slice(0, -'_variable'.length) : symbol.replace('_up', '')
  ) as SummedEffect;
  const { sum, uses } = recordSum(recorder, effect, unit, onlyVariable);
  const sloping = effect === 'R' && geometry?.cosine !== 1;
  if (sloping) recorder.symbols(['slope'], uses);
  const whole = sloping ? `(${sum}) / cos(slope * pi / 180)` : sum;
  const entry = symbolEntry(recorder, known, 'effect', uses, 'edition', '');
  entry.title += placeSuffix(recorder);
  return recorder.formula(entry, written(symbol, whole, (place?.value ?? 0) < 0));
}

function written(symbol: string, sum: string, negative: boolean): string {
  if (symbol === 'R') return `max(0, ${sum})`;
  if (symbol === 'R_up') return `max(0, -(${sum}))`;
  if (symbol.endsWith('_variable')) return negative ? `-(${sum})` : sum;
  return `abs(${sum})`;
}
