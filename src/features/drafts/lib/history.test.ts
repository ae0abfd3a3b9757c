import { describe, expect, it } from 'vitest';
import { begin, redone, stepTo, undone } from './history.ts';

describe('history of a draft', () => {
  it('goes back and forth, and a new step drops what could be redone', () => {
    let history = stepTo(stepTo(begin('a'), 'b'), 'c');
    history = undone(history);
    expect(history.now).toBe('b');
    expect(redone(history).now).toBe('c');
    history = stepTo(history, 'd');
    expect(redone(history).now).toBe('d');
    expect(undone(undone(undone(history))).now).toBe('a');
  });

  it('does not count a step that changed nothing', () => {
    expect(stepTo(begin('a'), 'a').past).toEqual([]);
  });
});
