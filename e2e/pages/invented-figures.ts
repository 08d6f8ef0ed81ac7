/** A row of an invented panel, money in millions. */
export interface InventedRow {
  readonly company: string;
  readonly year: number;
  readonly marketValue: number;
  readonly capex: number;
  readonly bookEquity: number;
}

/**
 * Figures of companies that grow at paces of their own, without a flaw: no cell is missing, none stands out. The same
 * arguments give the same figures, with one digit after the point.
 */
export function inventedRows(
  companies: readonly string[],
  firstYear: number,
  years: number,
): InventedRow[] {
  return companies.flatMap((company, place) =>
    Array.from({ length: years }, (_, step) => {
      const bookEquity = (400 + 37 * place) * 1.05 ** step * wobble(place, step, 0.05);
      const capex = 0.12 * bookEquity * wobble(place + 5, step, 0.12);
      const marketValue = 1.3 * bookEquity + 2.5 * capex + 60 + 11 * (place % 4);
      return {
        company,
        year: firstYear + step,
        marketValue: oneDigit(marketValue * wobble(place + 9, step, 0.04)),
        capex: oneDigit(capex),
        bookEquity: oneDigit(bookEquity),
      };
    }),
  );
}

const header = ['Company', 'Year', 'Market value', 'Capex', 'Book equity'];

/** Lines of a CSV file, the header first. */
export function csvLines(rows: readonly InventedRow[]): string[] {
  return [
    header.join(','),
    ...rows.map(({ company, year, marketValue, capex, bookEquity }) =>
      [company, year, marketValue, capex, bookEquity].join(','),
    ),
  ];
}

/** About 1, up and down by this share, unlike for every company and year. */
function wobble(place: number, step: number, share: number): number {
  return 1 + share * Math.sin(12.9898 * (place + 1) + 78.233 * (step + 1));
}

function oneDigit(value: number): number {
  return Math.round(value * 10) / 10;
}
