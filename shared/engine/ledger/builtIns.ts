import type { RunSymbol } from '../run/runtime.ts';
import type { EntryKind } from '../types.ts';
import { recordSpan, recordSum, type SummedEffect } from './effects.ts';
import { placeName } from './places.ts';
import type { Draft, Recorder, Uses } from './recorder.ts';
import { headOf } from './stored.ts';

/** Where a fact of the member stands in its document. */
const memberPointers: Readonly<Record<string, string>> = {
  b: '/section/b',
  b_1: '/section/b',
  h: '/section/h',
  b_nominal: '/section/nominal/b',
  h_nominal: '/section/nominal/h',
  pieces: '/section/pieces',
  spacing: '/carries/width',
  tributary: '/carries/width',
  spans: '/spans',
  L_max: '/spans',
  slope: '/slope',
  grade: '/grade',
};

const fromAnalysis = new Set(['M', 'M_variable', 'V', 'V_d', 'V_variable', 'R', 'R_up', 'R_variable', 'w']);

/** A fact that every member has. */
export function recordBuiltIn(recorder: Recorder, known: RunSymbol): Draft {
  const { symbol } = known;
  const head = headOf(recorder, known);
  const { place, combination, geometry, given } = recorder.context;
  const where = place ? `, ${placeName(place, geometry?.nodes.length ?? 0)}` : '';
  if (head.value !== null && fromAnalysis.has(symbol)) {
    return { ...head, title: `${head.title}${where}`, ...summed(recorder, symbol, known.unit) };
  }
  switch (symbol) {
    case 'b': {
      if (given.section.pieces === 1) break;
      const uses = recorder.symbols(['b_1', 'pieces']);
      return { ...head, kind: 'input', uses, ...recorder.formula('b_1 * pieces', uses), ...memberAt(symbol) };
    }
    case 'L': {
      const span = place?.span ?? 0;
      const uses: Uses = { [`L_${span + 1}`]: recordSpan(recorder, span) };
      return {
        ...head,
        title: `${head.title} ${span + 1}`,
        kind: 'quantity',
        uses,
        ...recorder.formula(`L_${span + 1}`, uses),
        in: 'edition',
        pointer: '/analysis/span',
      };
    }
    case 'L_max': {
      const uses: Uses = {};
      geometry?.spans.forEach((_, span) => {
        uses[`L_${span + 1}`] = recordSpan(recorder, span);
      });
      const formula = `max(${Object.keys(uses).join(', ')})`;
      return { ...head, kind: 'quantity', uses, ...recorder.formula(formula, uses), ...memberAt(symbol) };
    }
    case 'L_0': {
      const uses = recorder.symbols(['M']);
      return { ...head, title: `${head.title}${where}`, kind: 'effect', uses, in: 'edition', pointer: '' };
    }
    default:
  }
  if (known.level === 'member' || known.level === 'edition') {
    return { ...head, kind: 'input', uses: {}, ...memberAt(symbol) };
  }
  if (known.level === 'combination' || known.level === 'term') {
    const pattern = combination?.pattern ?? recorder.context.pattern;
    return { ...head, kind: 'combination', uses: {}, in: 'edition', pointer: `/combinations/${pattern}` };
  }
  const kind: EntryKind = symbol === 'l_b' ? 'input' : 'effect';
  return {
    ...head,
    title: `${head.title}${where}`,
    kind,
    uses: {},
    ...(symbol === 'l_b'
      ? { in: 'member', pointer: `/supports/${place?.node ?? 0}/bearing` }
      : { in: 'edition', pointer: '' }),
  };
}

function memberAt(symbol: string): { in: 'member'; pointer: string } {
  return { in: 'member', pointer: memberPointers[symbol] ?? '' };
}

/** Sum over the actions: size of the whole, or the part from variable actions in its direction. */
function summed(recorder: Recorder, symbol: string, unit: string) {
  const { place, geometry } = recorder.context;
  const onlyVariable = symbol.endsWith('_variable');
  const effect = (
    onlyVariable ? symbol.slice(0, -'_variable'.length) : symbol.replace('_up', '')
  ) as SummedEffect;
  const { sum, uses } = recordSum(recorder, effect, unit, onlyVariable);
  const sloping = effect === 'R' && geometry?.cosine !== 1;
  if (sloping) recorder.symbols(['slope'], uses);
  const whole = sloping ? `(${sum}) / cos(slope * pi / 180)` : sum;
  const formula = written(symbol, whole, (place?.value ?? 0) < 0);
  return {
    kind: 'effect' as const,
    uses,
    ...recorder.formula(formula, uses),
    in: 'edition' as const,
    pointer: '',
  };
}

function written(symbol: string, sum: string, negative: boolean): string {
  if (symbol === 'R') return `max(0, ${sum})`;
  if (symbol === 'R_up') return `max(0, -(${sum}))`;
  if (symbol.endsWith('_variable')) return negative ? `-(${sum})` : sum;
  return `abs(${sum})`;
}
