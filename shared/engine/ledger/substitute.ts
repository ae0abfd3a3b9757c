/** Text of a formula cut at its symbols, so that numbers can be put in without looking again. */
export interface Template {
  /** Text pieces and symbols in turn; symbols at odd places. */
  parts: readonly string[];
}

/** Numbers (so that the e of 1e-9 is no symbol), then names. */
const token = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?|[A-Za-z][A-Za-z0-9_]*/g;

/** Cuts a formula at the symbols given; functions and anything else stay text. */
export function templateOf(formula: string, symbols: readonly string[]): Template {
  const parts: string[] = [];
  let text = '';
  let last = 0;
  for (const match of formula.matchAll(token)) {
    const word = match[0];
    text += formula.slice(last, match.index);
    last = match.index + word.length;
    if (symbols.includes(word)) {
      parts.push(text, word);
      text = '';
    } else text += word;
  }
  parts.push(text + formula.slice(last));
  return { parts };
}

/** The formula with exact numbers in place of its symbols; negative ones in brackets. */
export function substitute({ parts }: Template, valueOf: (symbol: string) => number | string | null): string {
  let text = parts[0] as string;
  for (let i = 1; i < parts.length; i += 2) {
    text += written(valueOf(parts[i] as string)) + (parts[i + 1] as string);
  }
  return text;
}

function written(value: number | string | null): string {
  if (typeof value === 'number') return value < 0 ? `(${String(value)})` : String(value);
  return value === null ? '?' : `“${value}”`;
}
