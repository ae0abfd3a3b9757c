/**
 * The values of one evaluation, by symbol slot. Plain typed slots, filled on first use: the hot path
 * neither looks anything up by name nor allocates.
 */

/** What a slot holds. */
export const EMPTY = 0;
export const NUMBER = 1;
export const WORD = 2;
export const PROBLEM = 3;

/** Why a symbol has no value; travels through everything that needs it, so the root cause is shown. */
export interface Problem {
  /**
   * `refused`: the edition does not allow this member (a guard, or a table without a value there);
   * `missing`: something was not given; `failed`: the arithmetic has no answer.
   */
  kind: 'refused' | 'missing' | 'failed';
  message: string;
  /** Symbol where it began. */
  symbol: string;
}

/** Puts the value of one slot, reading others as it needs them. */
export type Filler = (env: Env) => void;

export class Env {
  readonly numbers: Float64Array;
  readonly words: string[];
  readonly state: Uint8Array;
  readonly problems: (Problem | null)[];
  readonly fillers: readonly Filler[];

  constructor(fillers: readonly Filler[]) {
    const size = fillers.length;
    this.fillers = fillers;
    this.numbers = new Float64Array(size);
    this.state = new Uint8Array(size);
    this.words = new Array<string>(size).fill('');
    this.problems = new Array<Problem | null>(size).fill(null);
  }

  /** State of a slot after making sure that it is filled. */
  fill(slot: number): number {
    const known = this.state[slot] as number;
    if (known !== EMPTY) return known;
    (this.fillers[slot] as Filler)(this);
    return this.state[slot] as number;
  }

  setNumber(slot: number, value: number): void {
    this.numbers[slot] = value;
    this.state[slot] = NUMBER;
  }

  setWord(slot: number, value: string): void {
    this.words[slot] = value;
    this.state[slot] = WORD;
  }

  setProblem(slot: number, problem: Problem): void {
    this.problems[slot] = problem;
    this.state[slot] = PROBLEM;
  }

  /** Value of a slot, null where it has none. */
  value(slot: number): number | string | null {
    const state = this.fill(slot);
    if (state === NUMBER) return this.numbers[slot] as number;
    return state === WORD ? (this.words[slot] as string) : null;
  }

  /** The problem of a slot, null where it has a value. */
  problem(slot: number): Problem | null {
    return this.fill(slot) === PROBLEM ? (this.problems[slot] as Problem) : null;
  }

  /** Empties slots, so that they are worked out anew at the next place or combination. */
  clear(slots: Int32Array): void {
    const { state } = this;
    for (let i = 0; i < slots.length; i += 1) state[slots[i] as number] = EMPTY;
  }
}
