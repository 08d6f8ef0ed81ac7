import type { PanelCompany } from '../peer-draft';

/** A company of a panel for specs: eleven complete years, measures unknown unless they are given. */
export function panelCompany(
  name: string,
  facts: Partial<Omit<PanelCompany, 'name' | 'measures'>> & {
    readonly measures?: Partial<PanelCompany['measures']>;
  } = {},
): PanelCompany {
  return {
    name,
    rows: 11,
    completeRows: 11,
    firstYear: 2010,
    lastYear: 2020,
    marketValue: null,
    capex: null,
    bookEquity: null,
    attributes: {},
    ...facts,
    measures: {
      logMarketValue: null,
      logBookEquity: null,
      capexToBookEquity: null,
      growth: null,
      volatility: null,
      others: {},
      ...facts.measures,
    },
  };
}

/** A number between 0 and 1 that looks drawn by chance and is the same for the same seed. */
function scattered(seed: number): number {
  const value = Math.sin(seed * 12.9898) * 43758.5453;
  return value - Math.floor(value);
}

/** So many invented companies that scatter over all five measures. */
export function scatteredCompanies(count: number): PanelCompany[] {
  return Array.from({ length: count }, (_, place) => {
    const [a, b, c, d, e] = [1, 2, 3, 4, 5].map((measure) => scattered(place * 7 + measure));
    return panelCompany(`Company ${place + 1}`, {
      marketValue: Math.exp(6 + 3 * a),
      bookEquity: Math.exp(5 + 2 * a + b),
      measures: {
        logMarketValue: 6 + 3 * a,
        logBookEquity: 5 + 2 * a + b,
        capexToBookEquity: 0.05 + 0.2 * c,
        growth: 0.1 * d,
        volatility: 0.1 + 0.3 * e,
      },
    });
  });
}
