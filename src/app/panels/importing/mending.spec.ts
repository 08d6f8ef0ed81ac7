import { noMending } from '@contract';
import {
  mendedText,
  openSpellings,
  readApart,
  readAsOne,
  renamedGroups,
  withCell,
  withLine,
  withoutCell,
  withoutLine,
} from './mending';

const place = { row: 4, column: 'mv' };

describe('what is mended in a file', () => {
  it('holds the last text of a cell, and forgets it', () => {
    const mended = withCell(withCell(noMending, place, '1'), place, '2');
    expect(mended.cells).toEqual([{ row: 4, column: 'mv', text: '2' }]);
    expect(mendedText(mended, place)).toBe('2');
    expect(mendedText(mended, { ...place, row: 5 })).toBeUndefined();
    expect(withoutCell(mended, place)).toEqual(noMending);
  });

  it('leaves a line out once, and takes it again', () => {
    const mended = withoutLine(withoutLine(noMending, 3), 3);
    expect(mended.excludedRows).toEqual([3]);
    expect(withLine(mended, 3)).toEqual(noMending);
  });

  it('reads spellings as one, under a name that can be chosen again, and takes it back', () => {
    const names = ['Aldren SE', 'Aldren S.E.', 'ALDREN SE'];
    const first = readAsOne(noMending, names, 'Aldren S.E.');
    const mended = readAsOne(first, names, 'Aldren SE');
    expect(renamedGroups(mended)).toEqual([
      { to: 'Aldren SE', from: ['Aldren S.E.', 'ALDREN SE'] },
    ]);
    expect(readApart(mended, 'Aldren SE')).toEqual(noMending);
  });

  it('offers the groups that are not decided', () => {
    const group = [
      { company: 'Aldren SE', rows: 9 },
      { company: 'Aldren S.E.', rows: 1 },
    ];
    expect(openSpellings([group], noMending)).toEqual([group]);
    const mended = readAsOne(noMending, ['Aldren SE', 'Aldren S.E.'], 'Aldren SE');
    expect(openSpellings([group], mended)).toEqual([]);
    const known = [{ company: 'ALDREN', rows: 0 }, ...group.map((each) => ({ ...each, rows: 0 }))];
    expect(openSpellings([[...known, { company: 'aldren', rows: 2 }]], noMending).length).toBe(1);
    const decided = readAsOne(noMending, ['aldren'], 'ALDREN');
    expect(openSpellings([[...known, { company: 'aldren', rows: 2 }]], decided)).toEqual([]);
  });
});
