const bitsPerWord = 32;
const firstRows = 1024;

/** A set of cells of one sheet, a bit a cell; rows and columns count from 0. */
export class CellMarks {
  readonly #wordsPerRow: number;
  #words: Uint32Array;
  #isEmpty = true;

  /** @param columns  of the widest row. */
  constructor(columns: number) {
    this.#wordsPerRow = Math.ceil(columns / bitsPerWord);
    this.#words = new Uint32Array(firstRows * this.#wordsPerRow);
  }

  get isEmpty(): boolean {
    return this.#isEmpty;
  }

  add(row: number, column: number): void {
    const word = this.#wordOf(row, column);
    if (word >= this.#words.length) this.#grow(word);
    this.#words[word] |= 1 << (column % bitsPerWord);
    this.#isEmpty = false;
  }

  readonly has = (row: number, column: number): boolean => {
    const word = this.#wordOf(row, column);
    return word < this.#words.length && (this.#words[word] & (1 << (column % bitsPerWord))) !== 0;
  };

  #wordOf(row: number, column: number): number {
    return row * this.#wordsPerRow + Math.floor(column / bitsPerWord);
  }

  #grow(word: number): void {
    const longer = new Uint32Array(2 * Math.max(word, this.#words.length));
    longer.set(this.#words);
    this.#words = longer;
  }
}
