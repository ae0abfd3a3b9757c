import type { Grade } from '#shared/basis/schema/index.ts';
import type { Env, Problem } from './env.ts';
import { NUMBER } from './env.ts';

/** Puts a property of the member's grade into its slot, in the edition's coherent unit. */
export function fillGradeValue(
  env: Env,
  slot: number,
  symbol: string,
  title: string,
  grade: Grade,
  factor: number,
  slotOf: (symbol: string) => number,
): void {
  const cell = Object.hasOwn(grade.values, symbol) ? grade.values[symbol] : undefined;
  if (cell === undefined) {
    env.setProblem(slot, {
      kind: 'missing',
      symbol,
      message: `Grade ${grade.title} has no ${title.toLowerCase()} (${symbol}).`,
    });
    return;
  }
  if (typeof cell === 'number') {
    env.setNumber(slot, cell * factor);
    return;
  }
  const by = slotOf(cell.by);
  if (env.fill(by) !== NUMBER) {
    env.setProblem(slot, env.problem(by) ?? wordBand(symbol, cell.by));
    return;
  }
  const value = bandValue(cell, env.numbers[by] as number);
  if (value === null) {
    env.setProblem(slot, {
      kind: 'refused',
      symbol,
      message: `Grade ${grade.title} has no ${title.toLowerCase()} (${symbol}) for ${cell.by} = ${String(env.numbers[by])}.`,
    });
  } else env.setNumber(slot, value * factor);
}

function wordBand(symbol: string, by: string): Problem {
  return { kind: 'failed', symbol, message: `${symbol} depends on the size ${by}, which is a word.` };
}

/** Value of the band that holds a size; an edge belongs to the band below or above it as the bands say. */
function bandValue(
  { edges, values, edge }: Extract<Grade['values'][string], object>,
  size: number,
): number | null {
  for (let i = 0; i < values.length; i += 1) {
    const from = edges[i] ?? -Infinity;
    const to = edges[i + 1] ?? Infinity;
    const inside = edge === 'below' ? size > from && size <= to : size >= from && size < to;
    if (inside) return values[i] as number;
  }
  return null;
}
