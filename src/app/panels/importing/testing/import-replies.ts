import { type ImportCheck, type ImportReply, plainReading } from '@contract';
import { exampleId, panelVersion } from '../../../api/testing/panel-version';

/** The replies of an import that the specs of these screens begin with. */
export const uuid = exampleId;

export const flowVersion = panelVersion();

export const flowDraft: ImportReply = {
  id: uuid(4),
  fileName: 'flow.csv',
  byteSize: 900,
  state: 'mapped',
  sheets: [],
  reading: plainReading,
  headers: ['firm', 'fy', 'mv', 'capex', 'equity', 'staff', 'cur'],
  firstRows: [{ row: 2, cells: ['A', '2010', '1', '2', '', '7', 'EUR'] }],
  rowCount: 33,
  topLines: [
    { row: 1, cells: ['firm', 'fy', 'mv', 'capex', 'equity', 'staff', 'cur'] },
    { row: 2, cells: ['A', '2010', '1', '2', '', '7', 'EUR'] },
  ],
  mapping: {
    panelName: 'Flow control',
    company: 'firm',
    year: 'fy',
    marketValue: 'mv',
    capex: 'capex',
    bookEquity: 'equity',
    others: ['staff'],
  },
  check: null,
  progress: null,
  failure: null,
  panelVersionId: null,
};

export const flowCheck: ImportCheck = {
  companies: 3,
  years: 11,
  firstYear: 2010,
  lastYear: 2020,
  rows: 33,
  completeRows: 32,
  leftOutRows: 0,
  findings: [
    {
      row: 2,
      column: 'equity',
      found: '',
      code: 'missing',
      detail: 'No value.',
      isBlocking: false,
    },
  ],
  findingCount: 1,
  blockingCount: 0,
  reviewRows: [
    {
      row: 2,
      cells: ['A', '2010', '1', '2', '', '7', 'EUR'],
      isTaken: true,
      isExcluded: false,
    },
  ],
  spellings: [],
  missingRates: [],
  formulaCells: 0,
  firstRows: [{ row: 2, company: 'A', year: 2010, values: [1, 2, null, 7] }],
  changes: null,
};
