import { planeFinding } from './plane-finding';

function nearness(...distances: number[]) {
  return {
    byCompany: new Map(
      distances.map((distance, place) => [`Company ${place}`, { distance, parts: [] }]),
    ),
  };
}

describe('the finding of the picture of companies', () => {
  it('counts those that lie near', () => {
    expect(planeFinding('Velmara', 60, nearness(0.4, 1.5, 1.6))).toBe(
      '2 of 60 companies lie within 1.5 standard deviations of Velmara',
    );
    expect(planeFinding('Velmara', 12, nearness(0.4))).toBe(
      '1 of 12 companies lies within 1.5 standard deviations of Velmara',
    );
  });

  it('names the nearest where none lies near', () => {
    expect(planeFinding('Velmara', 3, nearness(4, 2.306))).toBe(
      'None of 3 companies lies within 1.5 standard deviations of Velmara: Company 1, the nearest, is 2.31 away',
    );
  });

  it('claims nothing where there are no distances', () => {
    expect(planeFinding('', 3, nearness())).toBe('3 companies side by side');
  });
});
