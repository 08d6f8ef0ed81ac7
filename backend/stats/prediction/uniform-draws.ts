import { randomWords, seededWords } from './random-words';

/**
 * Uniform numbers between 0 and 1, neither of them included: the middles of 2³² equal stretches.
 *
 * @param seed  a whole number from 0 that a double holds exactly; the same numbers for the same seed.
 */
export function uniformDraws(seed: number): () => number {
  const word = randomWords(seededWords(seed));
  return () => (word() + 0.5) / 2 ** 32;
}
