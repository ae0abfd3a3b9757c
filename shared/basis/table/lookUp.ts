import { naturalLogarithm } from '#shared/numbers/arithmetic.ts';
import type { Table, TableKey } from '../schema/index.ts';

export type LookUpKey = number | string;
export type LookUpOutcome = { ok: true; value: number | string } | { ok: false; message: string };

/** Where a key falls on an axis: one point, or between two with a share of the second. */
type Position = { ok: true; index: number; share: number; found: string } | { ok: false; message: string };

/** Number of values along an axis: bands have one edge more than values. */
export function sizeOf({ match, points }: TableKey): number {
  return match === 'band' ? points.length - 1 : points.length;
}

const edgeText = (edge: string | number | null | undefined, unbounded: string) =>
  edge === null || edge === undefined ? unbounded : String(edge);

function locate(axis: TableKey, key: LookUpKey): Position {
  const outside = (): Position => ({
    ok: false,
    message: `${axis.title} ${String(key)} is outside the table, which has ${describe(axis)}.`,
  });
  if (axis.match === 'exact') {
    const index = axis.points.indexOf(key);
    return index < 0 ? outside() : { ok: true, index, share: 0, found: `${axis.title} ${String(key)}` };
  }
  if (typeof key !== 'number' || !Number.isFinite(key)) {
    return { ok: false, message: `${axis.title} needs a number here, not “${String(key)}”.` };
  }
  return axis.match === 'band' ? locateBand(axis, key, outside) : locatePoint(axis, key, outside);
}

function locateBand(axis: TableKey, key: number, outside: () => Position): Position {
  const bands = axis.points.length - 1;
  for (let index = 0; index < bands; index += 1) {
    const low = (axis.points[index] as number | null) ?? -Infinity;
    const high = (axis.points[index + 1] as number | null) ?? Infinity;
    const inside = axis.edge === 'above' ? key >= low && key < high : key > low && key <= high;
    if (inside) return band(axis, index);
  }
  if (axis.outside === 'refuse') return outside();
  const first = (axis.points[0] as number | null) ?? -Infinity;
  return band(axis, key <= first ? 0 : bands - 1);
}

function band(axis: TableKey, index: number): Position {
  const low = edgeText(axis.points[index], '−∞');
  const high = edgeText(axis.points[index + 1], '∞');
  const owner = axis.edge === 'above' ? `${low} ≤ … < ${high}` : `${low} < … ≤ ${high}`;
  return { ok: true, index, share: 0, found: `${axis.title} in the band ${owner}` };
}

function locatePoint(axis: TableKey, key: number, outside: () => Position): Position {
  const points = axis.points as readonly number[];
  const last = points.length - 1;
  const at = (index: number, how = ''): Position => ({
    ok: true,
    index,
    share: 0,
    found: `${axis.title} ${String(points[index])}${how}`,
  });
  const exact = points.indexOf(key);
  if (exact >= 0) return at(exact);
  const above = points.findIndex((point) => point > key);
  if (axis.match === 'stepDown') {
    if (above === 0) return axis.outside === 'clamp' ? at(0, ', the first') : outside();
    return at(above < 0 ? last : above - 1, ', the next below');
  }
  if (axis.match === 'stepUp') {
    if (above < 0) return axis.outside === 'clamp' ? at(last, ', the last') : outside();
    return at(above, ', the next above');
  }
  if (above === 0 || above < 0) {
    if (axis.outside === 'refuse') return outside();
    return above === 0 ? at(0, ', the first') : at(last, ', the last');
  }
  const low = points[above - 1] as number;
  const high = points[above] as number;
  const share =
    axis.match === 'log'
      ? (naturalLogarithm(key) - naturalLogarithm(low)) / (naturalLogarithm(high) - naturalLogarithm(low))
      : (key - low) / (high - low);
  const how = axis.match === 'log' ? ' in the logarithm' : '';
  return { ok: true, index: above - 1, share, found: `${axis.title} between ${low} and ${high}${how}` };
}

function describe({ points, match }: TableKey): string {
  if (match === 'exact') return points.map(String).join(', ');
  return `${edgeText(points[0], 'no lower bound')} to ${edgeText(points[points.length - 1], 'no upper bound')}`;
}

/** A table made ready for look-ups. */
export interface PreparedTable {
  table: Table;
  /** Value at the keys, or why there is none. */
  lookUp: (keys: readonly LookUpKey[]) => LookUpOutcome;
  /** How the value was found, in words; `cell` where it is one cell's, not interpolated. */
  explain: (keys: readonly LookUpKey[]) => { found: string; cell?: number };
}

/** Makes a table ready. Its shape has been checked by the compiler. */
export function prepareTable(table: Table): PreparedTable {
  const sizes = table.keys.map(sizeOf);
  const strides = sizes.map((_, i) => sizes.slice(i + 1).reduce((product, size) => product * size, 1));
  const positions = (keys: readonly LookUpKey[]) => table.keys.map((axis, i) => locate(axis, keys[i] ?? ''));
  return {
    table,
    lookUp: (keys) => {
      const found = positions(keys);
      for (const position of found) if (!position.ok) return position;
      return valueAt(table, strides, found as Extract<Position, { ok: true }>[]);
    },
    explain: (keys) => {
      const found = positions(keys);
      const words = found.map((position) => (position.ok ? position.found : position.message)).join('; ');
      const single = found.every((position) => position.ok && position.share === 0);
      if (!single) return { found: words };
      const cell = found.reduce((sum, p, i) => sum + (p.ok ? p.index : 0) * (strides[i] as number), 0);
      return { found: words, cell };
    },
  };
}

/** Interpolates along each axis that has a share, in turn. */
function valueAt(
  table: Table,
  strides: readonly number[],
  positions: readonly Extract<Position, { ok: true }>[],
): LookUpOutcome {
  const at = (axis: number, offset: number): LookUpOutcome => {
    const position = positions[axis];
    if (!position) return cellAt(table, offset);
    const stride = strides[axis] as number;
    const low = at(axis + 1, offset + position.index * stride);
    if (position.share === 0 || !low.ok) return low;
    const high = at(axis + 1, offset + (position.index + 1) * stride);
    if (!high.ok) return high;
    if (typeof low.value !== 'number' || typeof high.value !== 'number') {
      return { ok: false, message: `${table.title} holds words, which can’t be interpolated.` };
    }
    return { ok: true, value: low.value + (high.value - low.value) * position.share };
  };
  return at(0, 0);
}

function cellAt(table: Table, offset: number): LookUpOutcome {
  const cell = table.values[offset];
  if (cell === null || cell === undefined) {
    return { ok: false, message: `${table.title} has no value at this place.` };
  }
  return { ok: true, value: cell };
}
