/** Text of a formula cut at its symbols, so that numbers can be put in without looking again. */
export interface Template {
  /** Text pieces and symbols in turn; symbols at odd places. */
  parts: readonly string[];
}

/** Numbers (so that the e of 1e-9 is no symbol), then names. */
const token = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?|[A-Za-z][A-Za-z0-9_]*/g;

/** Names in formulas that are no symbols: what the language has, and what slopes need in the ledger. */
const reserved = new Set([
  ...['min', 'max', 'sqrt', 'abs', 'round', 'ceil', 'floor', 'exp', 'log', 'log10'],
  ...['and', 'or', 'not', 'cos', 'pi'],
]);

/** Cuts a formula at its symbols. */
export function templateOf(formula: string): Template {
  const parts: string[] = [];
  let text = '';
  let last = 0;
  for (const match of formula.matchAll(token)) {
    const word = match[0];
    text += formula.slice(last, match.index);
    last = match.index + word.length;
    if (/^[A-Za-z]/.test(word) && !reserved.has(word)) {
      parts.push(text, word);
      text = '';
    } else text += word;
  }
  parts.push(text + formula.slice(last));
  return { parts };
}

/** The formula with a text in place of each of its symbols. */
export function substitute({ parts }: Template, textOf: (symbol: string) => string): string {
  let text = parts[0] as string;
  for (let i = 1; i < parts.length; i += 2) {
    text += textOf(parts[i] as string) + (parts[i + 1] as string);
  }
  return text;
}

/** A value for use inside a formula: exact, negative numbers in brackets. */
export function written(value: number | string | null): string {
  if (typeof value === 'number') return value < 0 ? `(${String(value)})` : String(value);
  return value === null ? '?' : `“${value}”`;
}
