import { type CompanyMultiplesData, companyMultiplesLayout } from './company-multiples-layout';

const data: CompanyMultiplesData = {
  rows: [
    { company: 'Ostrell', year: 2020, values: [100, 10] },
    { company: 'Ostrell', year: 2021, values: [200, null] },
    { company: 'Ostrell', year: 2023, values: [400, 30], flagged: [0] },
    { company: 'Velmara', year: 2021, values: [10, null] },
    { company: 'Velmara', year: 2022, values: [20, null] },
  ],
  variables: ['market value, EUR m', 'capex, EUR m'],
  ownCompany: 'Velmara',
  years: [2020, 2023],
  scale: 'own',
};
const look = { width: 900, value: (value: number) => String(value) };

describe('company multiples layout', () => {
  it('puts the own company first, with its mark at its last figure', () => {
    const { rows } = companyMultiplesLayout(data, look);
    expect(rows.map(({ company }) => company)).toEqual(['Velmara', 'Ostrell']);
    const [own, peer] = rows;
    expect(own.lines[0].mark).toContain(`M${Math.round(own.lines[0].points[2].at.x * 10) / 10},`);
    expect(own.lines[1].mark).toBe('');
    expect(peer.lines[0].mark).toBe('');
  });

  it('breaks a line where a year or a figure is missing, and draws what stands alone as a dot', () => {
    const [, ostrell] = companyMultiplesLayout(data, look).rows;
    const [values, capex] = ostrell.lines;
    expect(values.path.match(/M/g)?.length).toBe(1);
    expect(values.path.match(/L/g)?.length).toBe(1);
    expect(values.dots.match(/M/g)?.length).toBe(1);
    expect(capex.path).toBe('');
    expect(capex.dots.match(/M/g)?.length).toBe(2);
    expect(values.points.map(({ value }) => value)).toEqual([100, 200, null, 400]);
    expect(values.flags.match(/M/g)?.length).toBe(1);
  });

  it('gives every line the same years, and each its own height or all of a variable one', () => {
    const heights = (scale: 'common' | 'own') => {
      const [velmara, ostrell] = companyMultiplesLayout({ ...data, scale }, look).rows;
      expect(velmara.lines[0].points[1].at.x).toBe(ostrell.lines[0].points[1].at.x);
      const y = (row: typeof velmara, place: number) => row.lines[0].points[place].at.y - row.top;
      return { own: y(velmara, 1) - y(velmara, 2), peer: y(ostrell, 0) - y(ostrell, 3) };
    };
    const own = heights('own');
    expect(own.own).toBeCloseTo(own.peer, 6);
    const common = heights('common');
    expect(common.peer / common.own).toBeCloseTo(30, 6);
  });

  it('writes first and last figure beside the line, and none where there are none', () => {
    const [velmara, ostrell] = companyMultiplesLayout(data, look).rows;
    expect(ostrell.lines[0].labels.map(({ text }) => text)).toEqual(['100', '400']);
    expect(velmara.lines[1].labels).toEqual([]);
    const [before, after] = ostrell.lines[0].labels;
    expect(before.x).toBeLessThan(ostrell.lines[0].points[0].at.x);
    expect(after.x).toBeGreaterThan(ostrell.lines[0].points[3].at.x);
  });

  it('stacks the lines under the name where there is little room', () => {
    const layout = companyMultiplesLayout(data, { ...look, width: 328 });
    const [velmara] = layout.rows;
    expect(layout.heads).toEqual([]);
    expect(velmara.lines.map(({ name }) => name?.text)).toEqual(data.variables);
    expect(companyMultiplesLayout(data, look).rows[0].lines[0].name).toBeNull();
    expect(velmara.lines[1].points[0].at.x).toBe(velmara.lines[0].points[0].at.x);
    expect(velmara.lines[1].points[0].at.y).toBeGreaterThan(velmara.lines[0].points[0].at.y);
    for (const { lines } of layout.rows)
      for (const { labels } of lines)
        for (const { x } of labels) expect(x).toBeLessThanOrEqual(layout.width);
  });

  it('stands without rows, with one year, and with equal figures', () => {
    expect(companyMultiplesLayout({ ...data, rows: [] }, look).rows).toEqual([]);
    const one = companyMultiplesLayout(
      { ...data, rows: [data.rows[0]], years: [2020, 2020] },
      look,
    );
    expect(Number.isFinite(one.rows[0].lines[0].points[0].at.x)).toBeTrue();
    const rows = [2020, 2021].map((year) => ({ company: 'Ostrell', year, values: [5, 5] }));
    const equal = companyMultiplesLayout({ ...data, rows }, look).rows[0].lines[0];
    expect(equal.points[0].at.y).toBe(equal.points[1].at.y);
  });
});
