import type { CellDifference, PanelDifferencesReply } from '@contract';
import { companyChanges } from './change-words';

function difference(company: string, kind: CellDifference['kind'], year = 2019): CellDifference {
  return {
    company,
    year,
    kind,
    column: kind === 'changed-cell' ? 'capex' : null,
    before: 1,
    after: 2,
  };
}

const reply: PanelDifferencesReply = {
  columns: [{ name: 'capex', role: 'capex' }],
  renamed: [],
  money: { currency: 'EUR', unit: 'millions' },
  addedRows: 1,
  removedRows: 1,
  changedCells: 3,
  listed: [
    difference('Kesdrin', 'changed-cell'),
    difference('Sarvane', 'changed-cell', 2018),
    difference('Sarvane', 'changed-cell'),
    difference('Sarvane', 'added-row', 2020),
    difference('Nobody', 'removed-row'),
  ],
};

describe('what a newer panel changed of the chosen companies', () => {
  it('is counted by company, the most changed first, others left aside', () => {
    expect(companyChanges(reply, ['Kesdrin', 'Sarvane', 'Velmara'])).toEqual({
      changes: [
        { company: 'Sarvane', words: '2 cells changed and 1 year added' },
        { company: 'Kesdrin', words: '1 cell changed' },
      ],
      isWhole: true,
    });
  });

  it('says when the list is not whole', () => {
    expect(companyChanges({ ...reply, changedCells: 9000 }, ['Velmara'])).toEqual({
      changes: [],
      isWhole: false,
    });
  });
});
