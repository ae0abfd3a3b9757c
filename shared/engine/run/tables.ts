import type { PreparedTable } from '#shared/basis/table/lookUp.ts';
import type { TableValue } from './clause.ts';

/** Most look-ups remembered for one use of a table. */
const REMEMBERED = 512;

/** A table for use by a clause: look-ups are remembered by their keys. */
export function readTable({ table, lookUp, explain }: PreparedTable) {
  const known = new Map<string | number, TableValue>();
  return {
    table: table.id,
    explain,
    lookUp: (keys: readonly (number | string)[]): TableValue => {
      const key = keys.length === 1 ? (keys[0] as number | string) : keys.join('|');
      const remembered = known.get(key);
      if (remembered) return remembered;
      const value = lookUp(keys);
      if (known.size >= REMEMBERED) known.clear();
      known.set(key, value);
      return value;
    },
  };
}
