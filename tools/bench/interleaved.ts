/** One thing that is timed; its result is kept from being optimised away. */
export interface Subject {
  readonly name: string;
  run(): unknown;
}

/** Results of the subjects' last runs: whoever measures work has to need it. */
export const kept: unknown[] = [];

/**
 * Runs the subjects in turn, round after round, so that whatever else the machine does falls on all of them alike.
 *
 * @param rounds  after as many warm-up rounds as a fifth of them, at least two.
 * @returns the median of each in milliseconds, in the subjects' order.
 */
export function interleavedMedians(subjects: readonly Subject[], rounds: number): number[] {
  const times = subjects.map((): number[] => []);
  const warm = Math.max(2, Math.round(rounds / 5));
  for (let round = -warm; round < rounds; round += 1) {
    subjects.forEach((subject, index) => {
      const start = performance.now();
      kept[index] = subject.run();
      const time = performance.now() - start;
      if (round >= 0) times[index].push(time);
    });
  }
  return times.map(medianOf);
}

export function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((left, right) => left - right);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
