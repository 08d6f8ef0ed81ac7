import { type ResidualRow, nearestPlace, residualScatterLayout } from './residual-scatter-layout';
import { boxOf } from './room-for-names';

const axes = {
  across: { title: 'fitted, EUR m', tick: (value: number) => value.toFixed(0) },
  up: { title: 'residual, EUR m', tick: (value: number) => value.toFixed(0) },
};

function row(
  company: string,
  year: number,
  [fitted, residual, studentised]: [number, number, number | null],
): ResidualRow {
  return { company, year, fileRow: year - 2000, fitted, residual, studentised };
}

const rows = [
  row('Ostrell', 2012, [100, 5, 0.4]),
  row('Velmara', 2013, [300, -40, -3.1]),
  row('Tolvane', 2014, [200, 30, 2.2]),
  row('Kestrane', 2015, [150, 0, null]),
];

function shown(of: readonly ResidualRow[], width = 800) {
  return residualScatterLayout({ rows: of, ownCompany: 'Velmara' }, axes, width);
}

describe('residual scatter layout', () => {
  it('puts the largest studentised first, whatever their sign, and those without last', () => {
    expect(shown(rows).points.map((point) => point.row.company)).toEqual([
      'Velmara',
      'Tolvane',
      'Ostrell',
      'Kestrane',
    ]);
  });

  it('draws what is over the model over the zero line, and nothing left on it', () => {
    const { points, zeroY } = shown(rows);
    expect(points[0].y).toBeGreaterThan(zeroY);
    expect(points[1].y).toBeLessThan(zeroY);
    expect(points[3].y).toBeCloseTo(zeroY, 6);
  });

  it('gathers peers and own company in one path each', () => {
    const { peerMarks, ownMarks } = shown(rows);
    expect(peerMarks.match(/M/g)?.length).toBe(3);
    expect(ownMarks.match(/M/g)?.length).toBe(1);
  });

  it('orders places by fitted value and by residual', () => {
    const { points, byFitted, byResidual } = shown(rows);
    expect(byFitted.map((place) => points[place].row.fitted)).toEqual([100, 150, 200, 300]);
    expect(byResidual.map((place) => points[place].row.residual)).toEqual([30, 5, 0, -40]);
  });

  it('names the largest by company and year, no name on another, fewer where there is less room', () => {
    const crowd = Array.from({ length: 400 }, (_, k) =>
      row('Sundrell', 2000 + (k % 20), [k, Math.sin(k) * 20, Math.sin(k) * 2]),
    );
    const outliers = Array.from({ length: 9 }, (_, k) =>
      row('Tolvane', 2001 + k, [k * 40, 100 + k, 8 - k / 10]),
    );
    for (const width of [360, 640, 1200]) {
      const { names } = shown([...crowd, ...outliers], width);
      expect(names.length).toBeGreaterThan(0);
      expect(names.length).toBeLessThanOrEqual(width < 480 ? 3 : 8);
      expect(names.every(({ text }) => text.startsWith('Tolvane'))).toBeTrue();
      const boxes = names.map(boxOf);
      boxes.forEach((a, place) => {
        expect(a.right).toBeLessThanOrEqual(width + 2);
        boxes.slice(place + 1).forEach((b) => {
          const apart =
            a.right <= b.left || b.right <= a.left || a.bottom <= b.top || b.bottom <= a.top;
          expect(apart).toBeTrue();
        });
      });
    }
  });

  it('stands with 5,000 points, in a path of less than 300,000 letters', () => {
    const many = Array.from({ length: 5000 }, (_, k) =>
      row(k % 40 === 0 ? 'Velmara' : `Company ${k % 120}`, 2000 + (k % 25), [
        1e6 * Math.sin(k),
        1e5 * Math.cos(7 * k),
        3 * Math.cos(7 * k),
      ]),
    );
    const { points, peerMarks } = shown(many);
    expect(points.length).toBe(5000);
    expect(peerMarks.length).toBeLessThan(300_000);
  });

  it('stands empty, with one point, with all equal, and leaves out what is no number', () => {
    expect(shown([]).points).toEqual([]);
    const [one] = shown([row('Velmara', 2012, [0, 0, null])]).points;
    expect(Number.isFinite(one.x) && Number.isFinite(one.y)).toBeTrue();
    const equal = shown([rows[0], rows[0]]).points;
    expect(equal[0].x).toBe(equal[1].x);
    expect(shown([row('Velmara', 2012, [NaN, 1, null])]).points).toEqual([]);
  });
});

describe('the nearest point', () => {
  const points = [
    { x: 10, y: 10 },
    { x: 40, y: 10 },
  ];

  it('is found within reach, and null beyond it', () => {
    expect(nearestPlace(points, { x: 20, y: 10 }, 24)).toBe(0);
    expect(nearestPlace(points, { x: 33, y: 12 }, 24)).toBe(1);
    expect(nearestPlace(points, { x: 100, y: 10 }, 24)).toBeNull();
    expect(nearestPlace([], { x: 0, y: 0 }, 24)).toBeNull();
  });
});
