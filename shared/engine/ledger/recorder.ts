import type { Context } from '../run/context.ts';
import type { Env } from '../run/env.ts';
import type { Runtime, RunSymbol } from '../run/runtime.ts';
import type { LedgerEntry } from '../types.ts';
import type { Uses } from './entry.ts';
import type { Standings } from './standing.ts';
import { substitute, type Template, templateOf, written } from './substitute.ts';

/** Makes the entry of a symbol's value where the evaluation stands, recording first what it rests on. */
export type WriteSymbol = (recorder: Recorder, known: RunSymbol) => LedgerEntry;

/** What ledgers of one plan have in common. */
export interface Stationery {
  templates: Map<string, Template>;
  standings: Standings;
}

/**
 * Writes the ledger while the evaluation stands at the place concerned. An entry is written after those
 * it uses, and once for each value, however many checks look at it.
 */
export class Recorder {
  readonly entries: LedgerEntry[] = [];
  readonly runtime: Runtime;
  readonly env: Env;
  readonly context: Context;
  readonly #known = new Map<string, number>();
  /** Entries of what is the same all over the member, by slot. */
  readonly #ofMember: number[] = [];
  readonly #templates: Map<string, Template>;
  /** Values of the entries as they stand inside formulas. */
  readonly #texts: string[] = [];
  readonly standings: Standings;

  readonly #write: WriteSymbol;

  constructor(
    runtime: Runtime,
    env: Env,
    context: Context,
    { templates, standings }: Stationery,
    write: WriteSymbol,
  ) {
    this.#write = write;
    this.runtime = runtime;
    this.env = env;
    this.context = context;
    this.#templates = templates;
    this.standings = standings;
  }

  /** Entry under a key, made on first use. */
  once(key: string, make: () => LedgerEntry): number {
    const known = this.#known.get(key);
    if (known !== undefined) return known;
    const n = this.add(make());
    this.#known.set(key, n);
    return n;
  }

  add(entry: LedgerEntry): number {
    entry.n = this.entries.length;
    this.entries.push(entry);
    return entry.n;
  }

  /** Entry of a symbol's value where the evaluation stands. */
  symbol(symbol: string): number {
    const slot = this.runtime.slotOf.get(symbol);
    const known = slot === undefined ? undefined : this.runtime.symbols[slot];
    if (!known) throw new RangeError(`The edition has no symbol ${symbol}.`);
    if (known.level === 'member' || known.level === 'edition') {
      return (this.#ofMember[known.slot] ??= this.add(this.#write(this, known)));
    }
    return this.once(`${symbol}${this.scopeOf(known)}`, () => this.#write(this, known));
  }

  /** Entries of several symbols, by name. */
  symbols(symbols: readonly string[], into: Uses = {}): Uses {
    for (const symbol of symbols) into[symbol] ??= this.symbol(symbol);
    return into;
  }

  /** Sets a formula on an entry, as written and with the numbers of the entries it uses. */
  formula(entry: LedgerEntry, text: string): LedgerEntry {
    let template = this.#templates.get(text);
    if (!template) {
      template = templateOf(text);
      this.#templates.set(text, template);
    }
    const { uses } = entry;
    entry.formula = text;
    entry.substituted = substitute(template, (symbol) => this.#textOf(uses[symbol], symbol));
    return entry;
  }

  #textOf(n: number | undefined, symbol: string): string {
    if (n === undefined) return symbol;
    return (this.#texts[n] ??= written((this.entries[n] as LedgerEntry).value));
  }

  /** What tells values of a symbol at different places apart. */
  scopeOf({ level, symbol, origin, index }: RunSymbol): string {
    const { combination, place, action, edition } = this.context;
    if (level === 'combination') return `@${combination?.id ?? ''}`;
    if (level === 'term') return `@${combination?.id ?? ''}@${action}`;
    if (origin === 'input') {
      return edition.inputs[index]?.scope === 'span'
        ? `@span${place?.span ?? -1}`
        : `@node${place?.node ?? -1}`;
    }
    if (origin === 'builtIn' && bySpan.has(symbol)) return `@span${place?.span ?? -1}`;
    if (origin === 'builtIn' && byNode.has(symbol)) return `@node${place?.node ?? -1}`;
    return `@${combination?.id ?? ''}@${place?.kind ?? ''}${place?.ordinal ?? -1}`;
  }
}

const bySpan = new Set(['L', 'span_kind']);
const byNode = new Set(['l_b', 'support_kind', 'end_distance']);
