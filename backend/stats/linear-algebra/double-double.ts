/**
 * A running sum kept in two doubles, about 32 digits: what iterative refinement needs for its residuals.
 * @see Dekker (1971), Numerische Mathematik 18, 224–242; Knuth (1998), TAOCP vol. 2, §4.2.2.
 */
export class DoubleDouble {
  #high = 0;
  #low = 0;

  reset(value: number): void {
    this.#high = value;
    this.#low = 0;
  }

  add(value: number): void {
    const sum = this.#high + value;
    const virtual = sum - this.#high;
    this.#low += this.#high - (sum - virtual) + (value - virtual);
    this.#high = sum;
  }

  /** Adds a·b without rounding the product; |a| and |b| below 1e150. */
  addProduct(a: number, b: number): void {
    const product = a * b;
    const aHigh = upperHalf(a);
    const bHigh = upperHalf(b);
    const aLow = a - aHigh;
    const bLow = b - bHigh;
    this.add(product);
    this.#low += aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
  }

  get value(): number {
    return this.#high + this.#low;
  }
}

/** 2²⁷ + 1 splits a 53-bit significand into two halves. */
const splitter = 134217729;

function upperHalf(value: number): number {
  const shifted = splitter * value;
  return shifted - (shifted - value);
}
