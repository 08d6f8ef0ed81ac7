/** One thing that is timed. */
export interface Subject {
  readonly name: string;
  /** Milliseconds of one run. */
  readonly time: () => number | Promise<number>;
  /** Takes part in every so many rounds: what takes seconds needs few. */
  readonly every: number;
}

/** What the rounds of one subject took, in milliseconds. */
export interface Times {
  readonly median: number;
  /** The least is the one that the machine's other work disturbed least. */
  readonly least: number;
}

/** Results of the subjects' last runs: whoever measures work has to need it. */
const kept = new Map<string, unknown>();

/** A subject of this process; its result is kept from being optimised away. */
export function subject(name: string, run: () => unknown): Subject {
  const time = (): number => {
    const start = performance.now();
    kept.set(name, run());
    return performance.now() - start;
  };
  return { name, time, every: 1 };
}

/**
 * Runs the subjects in turn, round after round, so that whatever else the machine does falls on all of them alike.
 *
 * @param rounds  after as many warm-up rounds as a fifth of them, at least two.
 * @returns in the subjects' order.
 */
export async function interleavedTimes(
  subjects: readonly Subject[],
  rounds: number,
): Promise<Times[]> {
  const times = subjects.map((): number[] => []);
  const warm = Math.max(2, Math.round(rounds / 5));
  for (let round = -warm; round < rounds; round += 1) {
    for (const [index, { time, every }] of subjects.entries()) {
      if (round % every !== 0) continue;
      const taken = await time();
      if (round >= 0) times[index].push(taken);
    }
  }
  return times.map((values) => ({ median: medianOf(values), least: Math.min(...values) }));
}

function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((left, right) => left - right);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
