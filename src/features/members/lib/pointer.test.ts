import { describe, expect, it } from 'vitest';
import { valueAt, withValue } from './pointer.ts';

const document = { spans: [{ length: 1 }, { length: 2 }], inputs: { 'a/b': 3 }, title: 'x' };

describe('JSON pointers', () => {
  it('reads through lists and escaped keys', () => {
    expect(valueAt(document, '/spans/1/length')).toBe(2);
    expect(valueAt(document, '/inputs/a~1b')).toBe(3);
    expect(valueAt(document, '/nothing/here')).toBeUndefined();
  });

  it('writes a copy and shares what did not change', () => {
    const next = withValue(document, '/spans/0/length', 5);
    expect(next.spans[0]).toEqual({ length: 5 });
    expect(next.spans[1]).toBe(document.spans[1]);
    expect(document.spans[0]?.length).toBe(1);
  });

  it('makes missing objects on the way and removes with undefined', () => {
    expect(withValue(document, '/spans/0/inputs/notch', 20).spans[0]).toEqual({
      length: 1,
      inputs: { notch: 20 },
    });
    expect(withValue(document, '/title', undefined)).not.toHaveProperty('title');
    expect(withValue(document, '/spans/0', undefined).spans).toEqual([{ length: 2 }]);
  });
});
