import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync(new URL('./tokens.css', import.meta.url), 'utf8');
const tokens = [...css.matchAll(/--([\w-]+): light-dark\((#\w{6}), (#\w{6})\)/g)].map(
  ([, name = '', light = '', dark = '']) => ({ name, light, dark }),
);

/** Relative luminance of a colour (WCAG 2.2, definitions). */
function luminance(colour: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const part = parseInt(colour.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Contrast ratio of two colours (WCAG 2.2, definitions). */
function contrast(a: string, b: string): number {
  const [high = 0, low = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (high + 0.05) / (low + 0.05);
}

describe.each(['light', 'dark'] as const)('the colours of the %s theme', (theme) => {
  const colour = (name: string) => {
    const token = tokens.find((each) => each.name === name);
    if (!token) throw new Error(`There is no token ${name}.`);
    return token[theme];
  };

  it('let words be read on paper, on raised paper and on a wash: 4.5 to 1 (WCAG 2.2, 1.4.3)', () => {
    for (const words of ['ink', 'soft', 'accent-ink', 'pass', 'close', 'fail'])
      for (const ground of ['paper', 'raised', 'wash'])
        expect(
          contrast(colour(words), colour(ground)),
          `${words} on ${ground}, ${theme}`,
        ).toBeGreaterThanOrEqual(4.5);
    expect(contrast(colour('on-ink'), colour('ink'))).toBeGreaterThanOrEqual(4.5);
  });

  it('let borders of fields, bars and the focus be seen: 3 to 1 (WCAG 2.2, 1.4.11)', () => {
    for (const line of ['pencil', 'accent', 'pass', 'close', 'fail', 'ink'])
      for (const ground of ['paper', 'raised'])
        expect(
          contrast(colour(line), colour(ground)),
          `${line} on ${ground}, ${theme}`,
        ).toBeGreaterThanOrEqual(3);
  });
});
