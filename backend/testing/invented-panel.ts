const years = 25;

/** A panel of invented figures as CSV, 5 columns: company, year, market value, capex, book equity. */
export function inventedPanelCsv(rows: number): string {
  const lines = ['company,year,market_value,capex,book_equity'];
  for (let row = 0; row < rows; row++) {
    const company = `Company ${String(Math.floor(row / years)).padStart(5, '0')}`;
    const size = 1000 + ((row * 7919) % 100_003);
    const cells = [size * 1.37, size * 0.061, size * 0.83].map((value) => value.toFixed(3));
    lines.push([company, 2001 + (row % years), ...cells].join(','));
  }
  return `${lines.join('\n')}\n`;
}

export function inventedPanelMapping(panelName: string): object {
  return {
    panelName,
    company: 'company',
    year: 'year',
    marketValue: 'market_value',
    capex: 'capex',
    bookEquity: 'book_equity',
    others: [],
    currency: 'EUR',
    unit: 'millions',
  };
}
