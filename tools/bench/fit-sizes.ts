/**
 * Companies, years and rounds of the benchmark; the fourth is the largest import. R takes part in every so many rounds,
 * and in none of the last size, which takes it minutes.
 */
export const fitSizes = [
  { companies: 12, years: 20, rounds: 400, everyForR: 20 },
  { companies: 100, years: 20, rounds: 120, everyForR: 10 },
  { companies: 1000, years: 20, rounds: 60, everyForR: 10 },
  { companies: 8000, years: 25, rounds: 30, everyForR: 6 },
  { companies: 40000, years: 25, rounds: 10, everyForR: null },
] as const;
