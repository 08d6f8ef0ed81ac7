import { randomWords, seededWords } from '../../backend/stats/prediction';

/** Random numbers of one replication, the same for the same seed. */
export interface Draws {
  /** Uniform between 0 and 1, neither of them included. */
  readonly uniform: () => number;
  /** Standard normal. */
  readonly normal: () => number;
}

/**
 * Pairs of independent normal numbers from pairs of uniform ones.
 *
 * @see Box & Muller (1958), Annals of Mathematical Statistics 29, 610–611.
 */
export function drawsFrom(seed: number): Draws {
  const word = randomWords(seededWords(seed));
  const uniform = (): number => (word() + 0.5) / 2 ** 32;
  let kept: number | null = null;
  return {
    uniform,
    normal: () => {
      if (kept !== null) {
        const second = kept;
        kept = null;
        return second;
      }
      const radius = Math.sqrt(-2 * Math.log(uniform()));
      const angle = 2 * Math.PI * uniform();
      kept = radius * Math.sin(angle);
      return radius * Math.cos(angle);
    },
  };
}
