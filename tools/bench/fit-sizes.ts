/** Companies, years and rounds of the benchmark; the fourth is the largest import. R takes minutes for the last. */
export const fitSizes = [
  { companies: 12, years: 20, rounds: 400, isForR: true },
  { companies: 100, years: 20, rounds: 120, isForR: true },
  { companies: 1000, years: 20, rounds: 30, isForR: true },
  { companies: 8000, years: 25, rounds: 15, isForR: true },
  { companies: 40000, years: 25, rounds: 5, isForR: false },
] as const;
