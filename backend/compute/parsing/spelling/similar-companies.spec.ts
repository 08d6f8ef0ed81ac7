import { similarCompanies } from './similar-companies';

function groupsOf(rows: readonly (readonly [string, number])[]): unknown[] {
  const companies = [...new Set(rows.map(([name]) => name))];
  return similarCompanies({
    companies,
    company: Int32Array.from(rows, ([name]) => companies.indexOf(name)),
    year: Int32Array.from(rows, ([, year]) => year),
  }).map(({ names }) => names.map(({ company, rows: count }) => [company, count]));
}

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
