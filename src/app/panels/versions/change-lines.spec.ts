import { panelVersion } from '../../api/testing/panel-version';
import { moneyWords, versionChanges } from './change-lines';
import { historyLines } from './history-lines';

const older = panelVersion({ unit: 'thousands' });
const newer = panelVersion({ number: 2 });

describe('what changed that is no figure', () => {
  it('is a header of a column of the model, one line', () => {
    const renamed = [{ role: 'capex' as const, before: 'inv', after: 'Capex, EUR' }];
    const money = { currency: 'EUR', unit: 'millions' as const };
    expect(versionChanges(newer, newer, { renamed, money })).toEqual([
      'Capex: the column “inv” is called “Capex, EUR” in v2.',
    ]);
  });

  it('is the unit, with what the figures are counted in', () => {
    const money = { currency: 'EUR', unit: 'millions' as const };
    expect(versionChanges(older, newer, { renamed: [], money })).toEqual([
      'The unit changed from EUR k to EUR m: figures of v1 are counted in EUR m here.',
    ]);
    expect(moneyWords(older, newer, money)).toBe('Money in EUR m, every digit');
  });

  it('is the currency, in which each version keeps its figures', () => {
    const dollars = { ...newer, currency: 'USD' };
    expect(versionChanges(older, dollars, { renamed: [], money: null })).toEqual([
      'The currency changed: v1 is in EUR k, v2 in USD m.',
    ]);
    expect(moneyWords(older, dollars, null)).toBe('As saved: v1 in EUR k, v2 in USD m');
  });
});

describe('the history of a cell', () => {
  const entry = {
    ...{ panelVersionId: older.id, number: 1, value: 7, hasRow: true, header: 'inv' },
    ...{ at: older.createdAt, by: 'Mira Oduya', note: '', reason: null, source: null },
    ...{ currency: 'EUR', unit: 'thousands' as const },
  };
  const later = { ...entry, number: 3, header: 'Capex', unit: 'millions' as const };

  it('says once that the unit or the header changed', () => {
    expect(historyLines([entry, later, { ...later, number: 4, value: 8 }], true)).toEqual([
      'v3 is in EUR m, what came before in EUR k.',
      'The column “inv” is called “Capex” from v3 on.',
    ]);
  });

  it('says nothing of the unit where the figure is no money', () => {
    expect(historyLines([entry, { ...later, header: 'inv' }], false)).toEqual([]);
  });
});
