import { nameKey } from './name-key';
import { nearNames } from './near-names';

describe('nameKey', () => {
  for (const [one, other] of [
    ['Nordwerk AG', 'NORDWERK'],
    ['Nordwerk AG', 'Nordwerk A.G.'],
    ['Nord Werk', 'Werk, Nord'],
    ['Tallow & Reed plc', 'Tallow Reed'],
    ['Tallow-Reed Ltd.', 'Tallow Reed Limited'],
    ['Brückner GmbH & Co. KG', 'Bruckner'],
    ['Straßer SE', 'Strasser'],
    ['Ostrova S.A.', 'Ostrova N.V.'],
    ['Pell’s Mill Inc.', "Pell's Mill Corp"],
  ]) {
    it(`is the same of “${one}” and “${other}”`, () => {
      expect(nameKey(one)).toBe(nameKey(other));
    });
  }

  it('keeps what tells companies apart', () => {
    expect(nameKey('Nordwerk 1')).not.toBe(nameKey('Nordwerk 2'));
    expect(nameKey('SE AG')).toBe('ag se');
    expect(nameKey('東京')).toBe('東京');
  });
});

describe('nearNames', () => {
  it('takes one letter in seven, not one in six', () => {
    expect(nearNames(['abcdefg', 'abcdefx'])).toEqual([[0, 1]]);
    expect(nearNames(['abcdef', 'abcdex'])).toEqual([]);
    expect(nearNames(['abcdefg', 'abcdef'])).toEqual([[1, 0]]);
    expect(nearNames(['abcdefg', 'xbcdefg'])).toEqual([[0, 1]]);
    expect(nearNames(['abcdefghijklmn', 'abcdefghijklxy'])).toEqual([[0, 1]]);
    expect(nearNames(['abcd', 'abce'])).toEqual([]);
  });

  it('takes no two names with different digits', () => {
    expect(nearNames(['company 0017', 'company 0018'])).toEqual([]);
  });

  it('looks through 8,000 names of one length in little time', () => {
    const letters = 'abcdefghijklmnopqrstuvwxyz';
    let state = 1;
    const next = (): number => (state = (state * 48_271) % 2_147_483_647);
    const names = Array.from({ length: 8000 }, () =>
      Array.from({ length: 14 }, () => letters[next() % 26]).join(''),
    );
    const start = performance.now();
    expect(nearNames(names)).toEqual([]);
    expect(performance.now() - start).toBeLessThan(3000);
  });
});
