import type { PanelRow } from '../panel-rows';
import { noHistory, redo, step, undo } from './edit-history';
import {
  addRow,
  countEdits,
  editedRows,
  noEdits,
  removeRows,
  savedRows,
  setCells,
  toSaveCorrections,
} from './panel-edits';

const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Kesdrin', year: 2020, values: [10, 1, null] },
  { fileRow: 3, company: 'Kesdrin', year: 2021, values: [11, 2, 5] },
  { fileRow: 4, company: 'Velmara', year: 2020, values: [20, 3, 6] },
];
const saved = savedRows(rows);
const cell = (company: string, year: number, column: number) => ({ company, year, column });

describe('edits of a panel', () => {
  it('change cells and leave the rest the very same', () => {
    const edits = setCells(noEdits, saved, [{ place: cell('Kesdrin', 2020, 2), value: 4 }]);
    const now = editedRows(rows, saved, 3, edits);
    expect(now[0].values).toEqual([10, 1, 4]);
    expect(now[1]).toBe(rows[1]);
    expect(countEdits(edits)).toBe(1);
  });

  it('are none any more when a cell gets its value back', () => {
    const there = setCells(noEdits, saved, [{ place: cell('Kesdrin', 2021, 0), value: null }]);
    const back = setCells(there, saved, [{ place: cell('Kesdrin', 2021, 0), value: 11 }]);
    expect(countEdits(back)).toBe(0);
    expect(editedRows(rows, saved, 3, back)).toBe(rows);
  });

  it('set no cell of a row that is not there or was taken out', () => {
    const nowhere = setCells(noEdits, saved, [{ place: cell('Nobody', 2020, 0), value: 1 }]);
    expect(countEdits(nowhere)).toBe(0);
    const removed = removeRows(noEdits, saved, [{ company: 'Velmara', year: 2020 }]);
    const after = setCells(removed, saved, [{ place: cell('Velmara', 2020, 0), value: 1 }]);
    expect(after.cells.size).toBe(0);
  });

  it('put a new row in its place with what is typed into it', () => {
    const added = addRow(noEdits, saved, { company: 'Kesdrin', year: 2022 });
    const filled = setCells(added, saved, [{ place: cell('Kesdrin', 2022, 1), value: 7 }]);
    const now = editedRows(rows, saved, 3, filled);
    expect(now.map(({ company, year }) => `${company} ${year}`)).toEqual([
      'Kesdrin 2020',
      'Kesdrin 2021',
      'Kesdrin 2022',
      'Velmara 2020',
    ]);
    expect(now[2]).toEqual({ fileRow: 0, company: 'Kesdrin', year: 2022, values: [null, 7, null] });
    expect(addRow(filled, saved, { company: 'Kesdrin', year: 2022 })).toBe(filled);
  });

  it('take a row out with what was typed into it, and put it back as it was', () => {
    const typed = setCells(noEdits, saved, [{ place: cell('Kesdrin', 2021, 0), value: 12 }]);
    const removed = removeRows(typed, saved, [{ company: 'Kesdrin', year: 2021 }]);
    expect(editedRows(rows, saved, 3, removed).length).toBe(2);
    const back = addRow(removed, saved, { company: 'Kesdrin', year: 2021 });
    expect(editedRows(rows, saved, 3, back)).toEqual(rows);
    const added = addRow(noEdits, saved, { company: 'New', year: 2020 });
    expect(countEdits(removeRows(added, saved, [{ company: 'New', year: 2020 }]))).toBe(0);
  });

  it('are sent with the ground of each cell', () => {
    const edits = setCells(noEdits, saved, [{ place: cell('Kesdrin', 2020, 2), value: 4 }]);
    const body = toSaveCorrections(edits, ' annual report ', () => ({
      reason: 'Was missing',
      source: 'Annual report 2020, p. 81',
    }));
    expect(body).toEqual({
      note: 'annual report',
      cells: [
        {
          company: 'Kesdrin',
          year: 2020,
          column: 2,
          value: 4,
          reason: 'Was missing',
          source: 'Annual report 2020, p. 81',
        },
      ],
      addedRows: [],
      removedRows: [],
    });
  });
});

describe('the history of edits', () => {
  const first = setCells(noEdits, saved, [{ place: cell('Kesdrin', 2020, 2), value: 4 }]);
  const second = setCells(first, saved, [{ place: cell('Kesdrin', 2021, 2), value: 6 }]);

  it('goes back and forth step by step', () => {
    const done = step(step(noHistory, first, '1 cell typed'), second, '1 cell pasted');
    expect(done.now).toBe(second);
    const back = undo(done);
    expect(back.now).toBe(first);
    expect(back.future.at(-1)?.words).toBe('1 cell pasted');
    expect(undo(undo(back)).now).toBe(noEdits);
    expect(redo(back).now).toBe(second);
    expect(redo(done)).toBe(done);
  });

  it('forgets what could be done again at a new step, and takes nothing for a step that changes nothing', () => {
    const back = undo(step(noHistory, first, 'typed'));
    expect(step(back, second, 'pasted').future).toEqual([]);
    expect(step(back, back.now, 'nothing')).toBe(back);
  });
});
