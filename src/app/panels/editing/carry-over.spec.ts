import type { PanelColumn } from '@contract';
import { type EditedVersion, carriedDraft, carriedEdits, carryOver } from './carry-over';
import {
  type PanelEdits,
  addRow,
  cellKey,
  countEdits,
  editedRows,
  noEdits,
  removeRows,
  savedRows,
  setCells,
} from './panel-edits';
import { emptyDraft } from './save-lines';

const capex: PanelColumn = { name: 'inv', role: 'capex' };
const staff: PanelColumn = { name: 'staff', role: 'other' };
const equity: PanelColumn = { name: 'equity', role: 'bookEquity' };

type Rows = Readonly<Record<string, readonly (number | null)[]>>;

function version(columns: readonly PanelColumn[], rows: Rows): EditedVersion {
  const places = Object.entries(rows).map(([name, values], row) => {
    const [company, year] = name.split(' ');
    return { fileRow: row + 2, company, year: Number(year), values };
  });
  return { columns, saved: savedRows(places), edits: noEdits };
}

const base = version([capex, staff], {
  'Arvo 2020': [10, 1],
  'Arvo 2021': [11, 2],
  'Kesdrin 2020': [20, null],
});

function place(company: string, year: number, column: number) {
  return { company, year, column };
}

function changed(...cells: readonly (readonly [string, number, number, number | null])[]) {
  const changes = cells.map(([company, year, column, value]) => ({
    place: place(company, year, column),
    value,
  }));
  return { ...base, edits: setCells(noEdits, base.saved, changes) };
}

function rowsOf({ columns, saved }: EditedVersion, edits: PanelEdits) {
  return editedRows([...saved.values()], saved, columns.length, edits).map(
    ({ company, year, values }) => [company, year, ...values],
  );
}

describe('edits carried onto a newer version', () => {
  it('go along where the cell is as it was, also where its column has moved', () => {
    const newer = version([equity, staff, capex], {
      'Arvo 2020': [5, 1, 10],
      'Arvo 2021': [6, 2, 99],
      'Kesdrin 2020': [7, 3, 20],
    });
    const carrying = carryOver(changed(['Arvo', 2020, 0, 12], ['Arvo', 2021, 1, null]), newer);
    expect(carrying.conflicts).toEqual([]);
    expect(rowsOf(newer, carriedEdits(carrying, new Set(), newer))).toEqual([
      ['Arvo', 2020, 5, 1, 12],
      ['Arvo', 2021, 6, null, 99],
      ['Kesdrin', 2020, 7, 3, 20],
    ]);
  });

  it('are in conflict where the cell changed otherwise, and settled where it changed just so', () => {
    const newer = version([capex, staff], {
      'Arvo 2020': [13, 1],
      'Arvo 2021': [14, 2],
      'Kesdrin 2020': [20, 8],
    });
    const carrying = carryOver(
      changed(['Arvo', 2020, 0, 12], ['Arvo', 2021, 0, 14], ['Kesdrin', 2020, 1, 7]),
      newer,
    );
    expect(carrying.settled).toBe(1);
    expect(carrying.cells).toEqual([]);
    expect(carrying.conflicts).toEqual([
      {
        ...{ kind: 'cell', key: cellKey(place('Arvo', 2020, 0)), place: place('Arvo', 2020, 0) },
        ...{ before: 10, mine: 12, theirs: 13 },
      },
      {
        ...{
          kind: 'cell',
          key: cellKey(place('Kesdrin', 2020, 1)),
          place: place('Kesdrin', 2020, 1),
        },
        ...{ before: null, mine: 7, theirs: 8 },
      },
    ]);
    const mine = new Set([cellKey(place('Kesdrin', 2020, 1))]);
    expect([...carriedEdits(carrying, mine, newer).cells.values()]).toEqual([
      { place: place('Kesdrin', 2020, 1), value: 7 },
    ]);
  });

  it('bring a row back only where the person says so', () => {
    const newer = version([capex, staff], { 'Arvo 2020': [10, 1], 'Kesdrin 2020': [20, null] });
    const carrying = carryOver(changed(['Arvo', 2021, 0, 12]), newer);
    expect(carrying.conflicts.map((each) => each.kind === 'cell' && each.theirs)).toEqual([
      undefined,
    ]);
    expect(countEdits(carriedEdits(carrying, new Set(), newer))).toBe(0);
    const mine = new Set([cellKey(place('Arvo', 2021, 0))]);
    expect(rowsOf(newer, carriedEdits(carrying, mine, newer))).toContain(['Arvo', 2021, 12, null]);
  });

  it('add and take out rows where the newer version has them as before', () => {
    const added = addRow(base.edits, base.saved, { company: 'Arvo', year: 2022 });
    const filled = setCells(added, base.saved, [{ place: place('Arvo', 2022, 0), value: 12 }]);
    const edits = removeRows(filled, base.saved, [
      { company: 'Arvo', year: 2020 },
      { company: 'Kesdrin', year: 2020 },
    ]);
    const newer = version([capex, staff], {
      'Arvo 2020': [10, 1],
      'Arvo 2021': [11, 2],
      'Kesdrin 2020': [21, null],
    });
    const carrying = carryOver({ ...base, edits }, newer);
    expect(carrying.conflicts.map(({ kind, key }) => [kind, key])).toEqual([
      ['row', '2020\u0000Kesdrin'],
    ]);
    expect(rowsOf(newer, carriedEdits(carrying, new Set(), newer))).toEqual([
      ['Arvo', 2021, 11, 2],
      ['Arvo', 2022, 12, null],
      ['Kesdrin', 2020, 21, null],
    ]);
    const mine = carriedEdits(carrying, new Set(['2020\u0000Kesdrin']), newer);
    expect(rowsOf(newer, mine).length).toBe(2);
  });

  it('find a row that both have added, cell by cell', () => {
    const added = addRow(base.edits, base.saved, { company: 'Arvo', year: 2022 });
    const edits = setCells(added, base.saved, [
      { place: place('Arvo', 2022, 0), value: 12 },
      { place: place('Arvo', 2022, 1), value: 4 },
    ]);
    const newer = version([capex, staff], { 'Arvo 2020': [10, 1], 'Arvo 2022': [13, null] });
    const carrying = carryOver({ ...base, edits }, newer);
    expect(carrying.added).toEqual([]);
    expect(carrying.conflicts.length).toBe(1);
    expect(carrying.cells).toEqual([{ place: place('Arvo', 2022, 1), value: 4 }]);
  });

  it('stay behind where the newer version has no such column', () => {
    const newer = version([capex], { 'Arvo 2020': [10], 'Arvo 2021': [11], 'Kesdrin 2020': [20] });
    const from = changed(['Arvo', 2020, 1, 5], ['Arvo', 2021, 0, 12]);
    const carrying = carryOver(from, newer);
    expect([...carrying.left.cells.values()]).toEqual([
      { place: place('Arvo', 2020, 1), value: 5 },
    ]);
    expect(countEdits(carriedEdits(carrying, new Set(), newer))).toBe(1);
  });

  it('meet what the person has begun in the newer version already', () => {
    const there = setCells(noEdits, base.saved, [
      { place: place('Arvo', 2020, 0), value: 15 },
      { place: place('Kesdrin', 2020, 0), value: 25 },
    ]);
    const newer = { ...base, edits: there };
    const carrying = carryOver(changed(['Arvo', 2020, 0, 12], ['Arvo', 2021, 0, 14]), newer);
    expect(carrying.conflicts.map((each) => each.kind === 'cell' && each.theirs)).toEqual([15]);
    const values = [...carriedEdits(carrying, new Set(), newer).cells.values()];
    expect(values.map(({ value }) => value)).toEqual([15, 25, 14]);
  });

  it('take note, reasons and sources with them', () => {
    const newer = version([staff, capex], { 'Arvo 2020': [1, 10] });
    const from = changed(['Arvo', 2020, 0, 12]);
    const draft = {
      note: 'Second look',
      common: { reason: 'Misread', source: '' },
      own: new Map([[cellKey(place('Arvo', 2020, 0)), { source: 'p. 9' }]]),
    };
    const carrying = carryOver(from, newer);
    const carried = carriedDraft(draft, carrying, from.columns, newer.columns, emptyDraft);
    expect(carried).toEqual({
      ...draft,
      own: new Map([[cellKey(place('Arvo', 2020, 1)), { source: 'p. 9' }]]),
    });
  });
});
