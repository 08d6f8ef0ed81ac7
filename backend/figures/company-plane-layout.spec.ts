import { type PlaneCompany, companyPlaneLayout, placesWithin } from './company-plane-layout';
import { boxOf } from './room-for-names';
import { figuresWidth } from './text-width';

const plain = { title: 'growth', isLog: false, tick: (value: number) => value.toFixed(2) };
const log = { title: 'market value, EUR m', isLog: true, tick: (value: number) => String(value) };

function scattered(count: number): PlaneCompany[] {
  return Array.from({ length: count }, (_, k) => ({
    company: `Company ${k}`,
    side: k === 0 ? 'own' : k % 3 === 0 ? 'in' : 'out',
    x: Math.exp(6 + 3 * Math.sin(7 * k)),
    y: 0.1 * Math.cos(11 * k),
  }));
}

function shown(companies: readonly PlaneCompany[], width = 800) {
  return companyPlaneLayout({ companies }, { across: log, up: plain }, width);
}

describe('company plane layout', () => {
  it('puts equal ratios at equal distances on a logarithmic axis, and round values under it', () => {
    const { points, xTicks } = shown([
      { company: 'Velmara', side: 'own', x: 100, y: 0 },
      { company: 'Kesdrin', side: 'in', x: 1000, y: 0.1 },
      { company: 'Sarvane', side: 'out', x: 10_000, y: 0.05 },
    ]);
    expect(points[1].x - points[0].x).toBeCloseTo(points[2].x - points[1].x, 9);
    expect(xTicks.map(({ value }) => value)).toEqual([100, 200, 500, 1000, 2000, 5000, 10_000]);
    expect(points[1].y).toBeLessThan(points[2].y);
  });

  it('has marks on a logarithmic axis whatever its span', () => {
    for (const [low, high] of [
      [410, 470],
      [90, 130],
      [1, 3],
      [900, 8900],
      [1, 1e5],
      [1e-3, 1e12],
      [50, 50],
    ]) {
      for (const width of [360, 800, 1200]) {
        const { xTicks, plot } = shown(
          [
            { company: 'Velmara', side: 'own', x: low, y: 0 },
            { company: 'Kesdrin', side: 'in', x: high, y: 1 },
          ],
          width,
        );
        const words = `${low} to ${high} at ${width}`;
        expect(xTicks.length).withContext(words).toBeGreaterThan(1);
        expect(xTicks.length).withContext(words).toBeLessThan(16);
        for (const { position } of xTicks) {
          expect(position)
            .withContext(words)
            .toBeGreaterThanOrEqual(plot.left - 1e-6);
          expect(position)
            .withContext(words)
            .toBeLessThanOrEqual(plot.right + 1e-6);
        }
        xTicks.slice(1).forEach(({ position, label }, place) => {
          const room = (figuresWidth(label) + figuresWidth(xTicks[place].label)) / 2;
          expect(position - xTicks[place].position)
            .withContext(words)
            .toBeGreaterThan(room);
        });
      }
    }
  });

  it('tells own company, peers and candidates apart by their marks', () => {
    const { own, peerMarks, candidateMarks, points } = shown(scattered(12));
    expect(own?.row.company).toBe('Company 0');
    expect(peerMarks.match(/M/g)?.length).toBe(3);
    expect(candidateMarks.match(/M/g)?.length).toBe(2 * 8);
    expect(points.length).toBe(12);
  });

  it('orders places from left to right and from the top down', () => {
    const { points, byX, byY } = shown(scattered(60));
    const across = byX.map((place) => points[place].row.x);
    expect(across).toEqual([...across].sort((a, b) => a - b));
    const up = byY.map((place) => points[place].row.y);
    expect(up).toEqual([...up].sort((a, b) => b - a));
  });

  it('names the own company always, and others only where no two names lie on each other', () => {
    for (const count of [12, 60, 120, 500]) {
      for (const width of [360, 800, 1200]) {
        const { names } = shown(scattered(count), width);
        expect(names[0].text).toBe('Company 0');
        expect(names[0].isOwn).toBeTrue();
        const boxes = names.slice(1).map(boxOf);
        boxes.forEach((a, place) => {
          boxes.slice(place + 1).forEach((b) => {
            const apart =
              a.right <= b.left || b.right <= a.left || a.bottom <= b.top || b.bottom <= a.top;
            expect(apart).toBeTrue();
          });
        });
      }
    }
    expect(shown(scattered(12)).names.length).toBeGreaterThan(6);
  });

  it('leaves out what has no place, and stands empty and with one company', () => {
    const { points } = shown([
      { company: 'Velmara', side: 'own', x: 10, y: 0 },
      { company: 'Kesdrin', side: 'in', x: 0, y: 0 },
      { company: 'Sarvane', side: 'in', x: 4, y: NaN },
    ]);
    expect(points.map(({ row }) => row.company)).toEqual(['Velmara']);
    expect(Number.isFinite(points[0].x) && Number.isFinite(points[0].y)).toBeTrue();
    expect(shown([]).own).toBeNull();
  });
});

describe('the companies within a rectangle', () => {
  it('are found whichever corner it was begun at', () => {
    const points = [
      { x: 1, y: 1 },
      { x: 5, y: 5 },
      { x: 9, y: 2 },
    ];
    expect(placesWithin(points, { x: 0, y: 0 }, { x: 6, y: 6 })).toEqual([0, 1]);
    expect(placesWithin(points, { x: 10, y: 3 }, { x: 4, y: 0 })).toEqual([2]);
  });
});
