import { type CompanyLinesData, companyLinesLayout } from './company-lines-layout';
import { boxOf } from './room-for-names';

const axes = {
  across: { title: 'capex, EUR m', tick: (value: number) => value.toFixed(0) },
  up: { title: 'market value, EUR m', tick: (value: number) => value.toFixed(0) },
};

function line(company: string, x: number, y: number, slope = 2, long = 20) {
  return { company, from: [x, y] as const, to: [x + long, y + slope * long] as const };
}

const three: CompanyLinesData = {
  companies: [line('Ostrell', 0, 100), line('Velmara', 10, 400), line('Kestrane', 20, 250)],
  pooled: { from: [0, 120], to: [40, 420] },
  points: [
    { company: 'Velmara', x: 12, y: 420 },
    { company: 'Velmara', x: 28, y: 430 },
    { company: 'Ostrell', x: 5, y: 90 },
  ],
  ownCompany: 'Velmara',
};

function manyCompanies(count: number): CompanyLinesData {
  const companies = Array.from({ length: count }, (_, k) =>
    line(`Company ${k}`, k % 30, (k * 37) % 900),
  );
  const points = companies.flatMap(({ company, from }) =>
    Array.from({ length: 8 }, (_, k) => ({ company, x: from[0] + k, y: from[1] + 2 * k })),
  );
  return { ...three, companies, points, ownCompany: 'Company 40' };
}

describe('company lines layout', () => {
  it('puts lines and points on the same two scales', () => {
    const { lines, ownPoints, peerPoints, plot } = companyLinesLayout(three, axes, 800);
    const own = lines.find(({ isOwn }) => isOwn)!;
    const share = (420 - 400) / 40;
    expect(ownPoints[0].y).toBeCloseTo(own.from.y + share * (own.to.y - own.from.y), 1);
    expect(ownPoints.length).toBe(2);
    expect(peerPoints.length).toBe(1);
    for (const { x, y } of [...ownPoints, ...peerPoints]) {
      expect(x).toBeGreaterThanOrEqual(plot.left);
      expect(x).toBeLessThanOrEqual(plot.right);
      expect(y).toBeGreaterThanOrEqual(plot.top);
      expect(y).toBeLessThanOrEqual(plot.bottom);
    }
  });

  it('draws peers as one path and the own company as another, highest first for the keys', () => {
    const { peerLines, ownLine, lines } = companyLinesLayout(three, axes, 800);
    expect(peerLines.match(/M/g)?.length).toBe(2);
    expect(ownLine.match(/M/g)?.length).toBe(1);
    expect(lines.map(({ company }) => company)).toEqual(['Velmara', 'Kestrane', 'Ostrell']);
  });

  it('names every company where there is room, and no name on another', () => {
    const { ownName, peerNames, pooled, lines } = companyLinesLayout(three, axes, 800);
    expect(ownName?.text).toBe('Velmara');
    expect(peerNames.map(({ text }) => text)).toEqual(['Kestrane', 'Ostrell']);
    expect(pooled?.label.text).toBe('one line for all');
    expect(lines.every(({ askedName }) => askedName === null)).toBeTrue();
    const boxes = [ownName!, ...peerNames, pooled!.label].map(boxOf);
    boxes.forEach((a, place) =>
      boxes.slice(place + 1).forEach((b) => {
        const apart =
          a.right <= b.left || b.right <= a.left || a.bottom <= b.top || b.bottom <= a.top;
        expect(apart).toBeTrue();
      }),
    );
  });

  it('leaves 120 companies to their lines: only the own one is named, the rows of peers are not drawn', () => {
    for (const width of [360, 1200]) {
      const chart = companyLinesLayout(manyCompanies(120), axes, width);
      expect(chart.peerNames).toEqual([]);
      expect(chart.ownName?.text).toBe('Company 40');
      expect(chart.peerPoints).toEqual([]);
      expect(chart.ownPoints.length).toBe(8);
      expect(chart.hiddenPoints).toBe(119 * 8);
      expect(chart.lines.filter(({ askedName }) => askedName !== null).length).toBe(119);
    }
  });

  it('keeps every name inside the width', () => {
    for (const width of [360, 800]) {
      const { lines, ownName } = companyLinesLayout(manyCompanies(120), axes, width);
      for (const name of [ownName!, ...lines.flatMap(({ askedName }) => askedName ?? [])]) {
        expect(boxOf(name).left).toBeGreaterThanOrEqual(-2);
        expect(boxOf(name).right).toBeLessThanOrEqual(width + 2);
      }
    }
  });

  it('points at 300 lines at most, the own one among them, and draws all', () => {
    const { lines, peerLines } = companyLinesLayout(
      { ...manyCompanies(2000), ownCompany: 'Company 1999' },
      axes,
      800,
    );
    expect(lines.length).toBe(300);
    expect(lines.some(({ isOwn }) => isOwn)).toBeTrue();
    expect(peerLines.match(/M/g)?.length).toBe(1999);
  });

  it('leaves out lines and points that are not numbers', () => {
    const { lines, ownPoints } = companyLinesLayout(
      {
        ...three,
        companies: [...three.companies, line('Quellix', NaN, 1)],
        points: [{ company: 'Velmara', x: Infinity, y: 1 }],
      },
      axes,
      800,
    );
    expect(lines.length).toBe(3);
    expect(ownPoints).toEqual([]);
  });

  it('stands empty, with one company of one row, and with all equal', () => {
    const none = { companies: [], pooled: null, points: [], ownCompany: 'Velmara' };
    const empty = companyLinesLayout(none, axes, 640);
    expect([empty.lines.length, empty.peerLines, empty.ownLine]).toEqual([0, '', '']);
    expect(empty.ownName).toBeNull();
    const one = companyLinesLayout(
      { ...none, companies: [line('Velmara', 5, 5, 0, 0)], pooled: { from: [5, 5], to: [5, 5] } },
      axes,
      640,
    );
    expect(one.ownLine).not.toContain('NaN');
    expect(one.pooled?.label.x).toBeGreaterThan(one.plot.left);
    expect(one.lines[0].to.x).toBeCloseTo((one.plot.left + one.plot.right) / 2, 0);
  });
});
