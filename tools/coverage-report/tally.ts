/** An interval as the engine gives it; ends are null where there is none. */
export interface Ends {
  readonly low: number | null;
  readonly high: number | null;
}

/** How often one measure's interval held the truth. */
export interface Tally {
  /** Replications with an interval. */
  given: number;
  /** Of these, with the truth inside. */
  held: number;
  /** Sum of the intervals' lengths; 0 where a measure has no length. */
  length: number;
}

/** By the names of `measures.ts`. */
export type Tallies = Map<string, Tally>;

/** Counts one interval; one that is not given counts for nothing. */
export function judgeInterval(
  tallies: Tallies,
  measure: string,
  { low, high }: Ends,
  truth: number,
): void {
  if (low === null || high === null) return;
  count(tallies, measure, { isHeld: low <= truth && truth <= high, length: high - low });
}

/** Counts one replication of a measure without ends. */
export function judge(tallies: Tallies, measure: string, isHeld: boolean): void {
  count(tallies, measure, { isHeld, length: 0 });
}

/** Adds what another stretch of replications counted. */
export function addTallies(total: Tallies, more: Tallies): void {
  for (const [measure, { given, held, length }] of more) {
    const tally = tallyOf(total, measure);
    tally.given += given;
    tally.held += held;
    tally.length += length;
  }
}

/** Share of intervals that held the truth, and its Monte Carlo standard error √(p(1 − p)/n). */
export interface Coverage {
  readonly share: number;
  readonly standardError: number;
  readonly meanLength: number;
  readonly given: number;
}

/** Null where no replication gave an interval. */
export function coverageOf(tallies: Tallies, measure: string): Coverage | null {
  const tally = tallies.get(measure);
  if (tally === undefined) return null;
  const { given, held, length } = tally;
  const share = held / given;
  return {
    share,
    standardError: Math.sqrt((share * (1 - share)) / given),
    meanLength: length / given,
    given,
  };
}

function count(
  tallies: Tallies,
  measure: string,
  { isHeld, length }: { readonly isHeld: boolean; readonly length: number },
): void {
  const tally = tallyOf(tallies, measure);
  tally.given += 1;
  tally.held += isHeld ? 1 : 0;
  tally.length += length;
}

function tallyOf(tallies: Tallies, measure: string): Tally {
  const found = tallies.get(measure);
  if (found !== undefined) return found;
  const tally = { given: 0, held: 0, length: 0 };
  tallies.set(measure, tally);
  return tally;
}
