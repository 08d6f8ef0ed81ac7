import { nameKey } from './name-key';
import { nearNames } from './near-names';
import { similarCompanies } from './similar-companies';

function groupsOf(rows: readonly (readonly [string, number])[]): unknown[] {
  const companies = [...new Set(rows.map(([name]) => name))];
  return similarCompanies({
    companies,
    company: Int32Array.from(rows, ([name]) => companies.indexOf(name)),
    year: Int32Array.from(rows, ([, year]) => year),
  }).map(({ names }) => names.map(({ code, rows: count }) => [companies[code], count]));
}

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

describe('similarCompanies', () => {
  it('puts the name with the most rows first', () => {
    expect(
      groupsOf([
        ['NORDWERK', 2019],
        ['Nordwerk AG', 2020],
        ['Nordwerk AG', 2021],
        ['Tallow Reed', 2020],
        ['Nordwrek AG', 2022],
      ]),
    ).toEqual([
      [
        ['Nordwerk AG', 2],
        ['NORDWERK', 1],
      ],
    ]);
    expect(
      groupsOf([
        ['Tallowreed', 2019],
        ['Talowreed', 2020],
        ['Tallowreed plc', 2021],
        ['Talowreed', 2022],
      ]),
    ).toEqual([
      [
        ['Talowreed', 2],
        ['Tallowreed', 1],
        ['Tallowreed plc', 1],
      ],
    ]);
  });

  it('puts names that share a year last', () => {
    const groups = groupsOf([
      ['Alpha', 2019],
      ['ALPHA', 2019],
      ['ALPHA', 2020],
      ['Gamma', 2019],
      ['GAMMA', 2020],
    ]);
    expect(groups).toEqual([
      [
        ['Gamma', 1],
        ['GAMMA', 1],
      ],
      [
        ['ALPHA', 2],
        ['Alpha', 1],
      ],
    ]);
  });

  it('has nothing to say of names that differ', () => {
    expect(
      groupsOf([
        ['F01', 2020],
        ['F02', 2020],
        ['Nordwerk', 2020],
      ]),
    ).toEqual([]);
  });
});
