import type { PanelVersionSummary } from '@contract';

/** An id of examples; of the last number, one or two digits. */
export function exampleId(last: number): string {
  return `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;
}

/** The version of a panel that specs begin with: the first one of three companies in eleven years, but for what is given. */
export function panelVersion(given: Partial<PanelVersionSummary> = {}): PanelVersionSummary {
  return {
    id: exampleId(1),
    panelId: exampleId(2),
    parentId: null,
    origin: 'import',
    restoredNumber: null,
    panelName: 'Flow control',
    number: 1,
    currency: 'EUR',
    unit: 'millions',
    note: '',
    companies: 3,
    rows: 33,
    firstYear: 2010,
    lastYear: 2020,
    createdAt: '2026-03-04T12:00:00.000Z',
    createdBy: 'Ilvo Brenn',
    file: { id: exampleId(3), name: 'flow.csv', byteSize: 900, sha256: 'ab'.repeat(32) },
    ...given,
  };
}
