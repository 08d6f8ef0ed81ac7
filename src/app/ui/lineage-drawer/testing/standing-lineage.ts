import type { LineageReply } from '@contract';
import { panelVersion } from '../../../api/testing/panel-version';

const at = '2026-11-12T09:30:00.000Z';

/** An invented standing with two cells behind it. */
export const standingLineage: LineageReply = {
  figure: 'standing',
  label: 'Standing of Velmara',
  value: { estimate: 2407.091234, standardError: 441.2, low: 1275.2, high: 3538.98 },
  text: null,
  isMoney: true,
  confidence: 0.95,
  formula: 'The own company’s intercept minus the unweighted mean of its peers’ intercepts.',
  inputs: [
    { label: 'Intercept of Velmara', value: 2970.5, isMoney: true, figure: 'intercept.0' },
    { label: 'Peers', value: 13, isMoney: false, figure: null },
  ],
  fit: {
    id: '0198a1f0-0000-7000-8000-000000000001',
    hash: '6f3a91c2d4e5f60718293a4b5c6d7e8f90a1b2c3d4e5f60718293a4b5c6d7e8f',
    engine: '1',
    slopes: 'cr2',
    createdAt: at,
    createdBy: 'M. Oduya',
  },
  peerGroup: {
    id: '0198a1f0-0000-7000-8000-000000000002',
    number: 2,
    panelVersionId: '0198a1f0-0000-7000-8000-000000000003',
    ownCompany: 'Velmara',
    peerCount: 13,
    note: '',
    createdAt: at,
    createdBy: 'M. Oduya',
  },
  panelVersion: panelVersion({
    id: '0198a1f0-0000-7000-8000-000000000003',
    panelName: 'Cold chain',
    number: 4,
    companies: 14,
    rows: 243,
    firstYear: 2008,
    lastYear: 2025,
    createdAt: at,
    createdBy: 'M. Oduya',
    file: {
      id: '0198a1f0-0000-7000-8000-000000000005',
      name: 'cold-chain.csv',
      byteSize: 9120,
      sha256: 'b81d20c04e5f60718293a4b5c6d7e8f90a1b2c3d4e5f60718293a4b5c6d7e8f9',
    },
  }),
  cells: {
    columns: [
      { name: 'mkt_value', role: 'marketValue' },
      { name: 'capex', role: 'capex' },
    ],
    rows: [
      {
        fileRow: 17,
        company: 'Velmara',
        year: 2024,
        values: [9120.5, 1180],
        origins: [null, null],
      },
      { fileRow: 0, company: 'Velmara', year: 2025, values: [9410, null], origins: [null, null] },
    ],
  },
};
