/** A set of small whole numbers, for the situations that a case takes. */
export class Bits {
  readonly #words: Uint32Array;
  size = 0;

  constructor(length: number) {
    this.#words = new Uint32Array(Math.ceil(length / 32));
  }

  /** Adds a number that is not in the set yet. */
  add(index: number): void {
    const word = index >>> 5;
    this.#words[word] = (this.#words[word] as number) | (1 << (index & 31));
    this.size += 1;
  }

  /** How many numbers are in both sets. */
  common(other: Bits): number {
    let count = 0;
    for (let i = 0; i < this.#words.length; i += 1) {
      count += ones((this.#words[i] as number) & (other.#words[i] as number));
    }
    return count;
  }
}

function ones(word: number): number {
  let left = word;
  let count = 0;
  while (left !== 0) {
    left &= left - 1;
    count += 1;
  }
  return count;
}
