import { describe, expect, it } from 'vitest';
import { blockOf, moved } from './selection.ts';

const size = { row: 4, column: 3 };
const at = (row: number, column: number) => ({ anchor: { row, column }, head: { row, column } });
const key = (name: string, shift = false, jump = false) => ({ key: name, shift, jump });

describe('moving in a grid', () => {
  it('steps, and stops at the edges', () => {
    expect(moved(at(0, 0), key('ArrowDown'), size, 2)?.head).toEqual({ row: 1, column: 0 });
    expect(moved(at(0, 0), key('ArrowUp'), size, 2)?.head).toEqual({ row: 0, column: 0 });
    expect(moved(at(3, 2), key('PageDown'), size, 2)?.head).toEqual({ row: 3, column: 2 });
  });

  it('jumps to the edge with the modifier', () => {
    expect(moved(at(1, 1), key('ArrowRight', false, true), size, 2)?.head).toEqual({ row: 1, column: 2 });
    expect(moved(at(1, 1), key('End', false, true), size, 2)?.head).toEqual({ row: 3, column: 2 });
  });

  it('stretches with shift and keeps the anchor', () => {
    const stretched = moved(at(2, 2), key('ArrowLeft', true), size, 2);
    expect(stretched?.anchor).toEqual({ row: 2, column: 2 });
    expect(stretched && blockOf(stretched)).toEqual({ top: 2, bottom: 2, left: 1, right: 2 });
  });

  it('walks on with Tab to the next row and leaves at the end', () => {
    expect(moved(at(0, 2), key('Tab'), size, 2)?.head).toEqual({ row: 1, column: 0 });
    expect(moved(at(3, 2), key('Tab'), size, 2)).toBeUndefined();
    expect(moved(at(0, 0), key('Tab', true), size, 2)).toBeUndefined();
  });

  it('leaves other keys alone', () => {
    expect(moved(at(0, 0), key('a'), size, 2)).toBeUndefined();
  });
});
