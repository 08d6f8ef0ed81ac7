import type { PanelColumns } from '../../backend/stats';

/** A balanced panel of made-up figures, sorted by company and year, the same for the same size. */
export function benchPanel(companies: number, years: number): PanelColumns {
  const rows = companies * years;
  const random = drawsFrom(companies * 31 + years);
  const company = new Int32Array(rows);
  const year = new Int32Array(rows);
  const outcome = new Float64Array(rows);
  const capex = new Float64Array(rows);
  const equity = new Float64Array(rows);
  let error = 0;
  for (let row = 0; row < rows; row += 1) {
    company[row] = Math.floor(row / years);
    year[row] = 2000 + (row % years);
    capex[row] = 100 * random() + 5 * (company[row] % 7);
    equity[row] = 300 * random() + 20 * (company[row] % 5);
    error = (row % years === 0 ? 0 : 0.5 * error) + 40 * (random() - 0.5);
    outcome[row] = 50 * (company[row] % 11) + 2 * capex[row] + 0.5 * equity[row] + error;
  }
  return {
    companies: Array.from(
      { length: companies },
      (_, index) => `C${String(index).padStart(6, '0')}`,
    ),
    company,
    year,
    outcome: { name: 'market value', values: outcome },
    regressors: [
      { name: 'capex', values: capex },
      { name: 'book equity', values: equity },
    ],
    fileRow: Int32Array.from(company, (_, row) => row + 2),
  };
}

/** A linear congruential generator: the same numbers for the same seed. */
function drawsFrom(seed: number): () => number {
  let state = seed % 2147483648;
  return () => {
    state = (state * 1103515245 + 12345) % 2147483648;
    return state / 2147483648;
  };
}
