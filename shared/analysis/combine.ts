import { pieceAt } from './pieces.ts';
import { shifted } from './polynomial.ts';
import { SAME_PLACE } from './spanLoads.ts';
import type { Effects, Piece } from './types.ts';

/** Effects of one set of loads, and how many times they count. */
export interface Part {
  effects: Effects;
  factor: number;
}

/**
 * Superposition: the sum of factored effects of the same member. Breaks of all parts are kept, and each
 * part's polynomial is rewritten about the start of its new piece, so nothing is approximated.
 *
 * @throws RangeError without any part, or where the parts don't belong to members of the same nodes.
 */
export function combine(parts: readonly Part[]): Effects {
  const [first] = parts;
  if (!first) throw new RangeError('A combination needs at least one set of effects.');
  const nodes = first.effects.reactions.length;
  const end = endOf(first.effects);
  for (const { effects } of parts) {
    if (effects.reactions.length !== nodes || Math.abs(endOf(effects) - end) > end * SAME_PLACE) {
      throw new RangeError('Only effects of the same member can be combined.');
    }
  }
  const breaks = mergedBreaks(parts, end);
  const sum = (key: 'shear' | 'moment' | 'rotation' | 'deflection') =>
    sumOf(
      breaks,
      parts.map(({ effects, factor }) => ({ pieces: effects[key], factor })),
    );
  const perNode = (key: 'reactions' | 'fixingMoments') =>
    first.effects[key].map((_, node) =>
      parts.reduce((total, { effects, factor }) => total + factor * (effects[key][node] as number), 0),
    );
  return {
    shear: sum('shear'),
    moment: sum('moment'),
    rotation: sum('rotation'),
    deflection: sum('deflection'),
    reactions: perNode('reactions'),
    fixingMoments: perNode('fixingMoments'),
  };
}

function endOf({ shear }: Effects): number {
  return shear[shear.length - 1]?.to ?? 0;
}

/** All four effects of an analysis have the same breaks. */
function mergedBreaks(parts: readonly Part[], end: number): number[] {
  const all = parts.flatMap(({ effects }) => effects.shear.map(({ from }) => from)).sort((a, b) => a - b);
  const kept: number[] = [];
  for (const x of all) {
    const last = kept[kept.length - 1];
    if (last === undefined || x - last > end * SAME_PLACE) kept.push(x);
  }
  return [...kept, end];
}

function sumOf(breaks: readonly number[], parts: readonly { pieces: readonly Piece[]; factor: number }[]) {
  return breaks.slice(1).map((to, i): Piece => {
    const from = breaks[i] as number;
    const coefficients: number[] = [];
    for (const { pieces, factor } of parts) {
      const piece = pieces[pieceAt(pieces, (from + to) / 2, 'left')];
      if (!piece) continue;
      shifted(piece.coefficients, from - piece.from).forEach((c, power) => {
        coefficients[power] = (coefficients[power] ?? 0) + factor * c;
      });
    }
    return { from, to, coefficients };
  });
}
