/**
 * SplitMix64: the next state's 64 random bits.
 * @see Steele, Lea & Flood (2014), OOPSLA ’14, 453–472.
 */
export function splitMix64(state: bigint): { readonly state: bigint; readonly value: bigint } {
  const next = BigInt.asUintN(64, state + 0x9e3779b97f4a7c15n);
  let value = next;
  value = BigInt.asUintN(64, (value ^ (value >> 30n)) * 0xbf58476d1ce4e5b9n);
  value = BigInt.asUintN(64, (value ^ (value >> 27n)) * 0x94d049bb133111ebn);
  return { state: next, value: value ^ (value >> 31n) };
}

/** The four words of a state of xoshiro128** from a seed, by SplitMix64 as its authors advise. */
export function seededWords(seed: number): Uint32Array {
  const first = splitMix64(BigInt(seed));
  const second = splitMix64(first.state);
  const words = [first.value, first.value >> 32n, second.value, second.value >> 32n];
  return Uint32Array.from(words, (word) => Number(BigInt.asUintN(32, word)));
}

/**
 * xoshiro128**: 32 random bits a call.
 *
 * @param state  four words, not all 0; changed by every call.
 * @see Blackman & Vigna (2021), ACM Transactions on Mathematical Software 47, 36.
 */
export function randomWords(state: Uint32Array): () => number {
  return () => {
    const word = Math.imul(rotated(Math.imul(state[1], 5), 7), 9) >>> 0;
    const shifted = state[1] << 9;
    state[2] ^= state[0];
    state[3] ^= state[1];
    state[1] ^= state[2];
    state[0] ^= state[3];
    state[2] ^= shifted;
    state[3] = rotated(state[3], 11);
    return word;
  };
}

function rotated(word: number, by: number): number {
  return (word << by) | (word >>> (32 - by));
}
