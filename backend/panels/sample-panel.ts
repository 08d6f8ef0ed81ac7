import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { PanelMapping } from './import-service';

export interface SamplePanel {
  readonly name: string;
  readonly bytes: Buffer;
  readonly mapping: PanelMapping;
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
      currency: 'EUR',
      unit: 'millions',
    },
  };
}
