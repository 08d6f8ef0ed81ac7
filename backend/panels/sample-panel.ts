import { readFileSync } from 'node:fs';
import { join } from 'node:path';

export interface SamplePanel {
  readonly name: string;
  readonly bytes: Buffer;
  /** An import's mapping as a request gives it. */
  readonly mapping: object;
}

/** The invented panel that an empty workspace can open; written by `npm run write-sample`. */
export function readSamplePanel(backendFolder: string): SamplePanel {
  return {
    name: 'sample-panel.csv',
    bytes: readFileSync(join(backendFolder, 'panels', 'sample-panel.csv')),
    mapping: {
      panelName: 'Sample panel',
      company: 'company',
      year: 'fiscal_year',
      marketValue: 'market_value',
      capex: 'capex',
      bookEquity: 'book_equity',
      others: ['employees'],
      attributes: ['industry', 'country'],
      currency: 'EUR',
      unit: 'millions',
    },
  };
}
