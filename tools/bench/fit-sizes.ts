/** Companies, years and rounds of the benchmark; the fourth is the largest import. */
export const fitSizes = [
  { companies: 12, years: 20, rounds: 400 },
  { companies: 100, years: 20, rounds: 120 },
  { companies: 1000, years: 20, rounds: 30 },
  { companies: 8000, years: 25, rounds: 9 },
  { companies: 40000, years: 25, rounds: 5 },
] as const;
