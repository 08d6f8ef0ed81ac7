import { fitOf, goldenPanel, panelOf } from '../testing/golden-panels';
import { randomNumbers } from '../testing/random-panels';

describe('what is left without each company', () => {
  const data = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);

  it('says beside every missing standing why it is missing', () => {
    const none = 'No company of two complete rows or more is the own one, so there is no standing.';
    for (const { slopes, standing, reason } of fitOf(data).withoutCompany) {
      expect(slopes).not.toBeNull();
      expect(standing).toBeNull();
      expect(reason).toBe(none);
    }
    const random = randomNumbers(5);
    const rows = Array.from({ length: 25 }, (_, index) => ({
      company: `K${Math.floor(index / 12)}`,
      year: 2000 + (index % 12),
      outcome: random(),
      regressors: [random()],
    }));
    const single = fitOf(panelOf(rows, { outcome: 'y', regressors: ['x'] }), 'K2');
    expect(single.withoutCompany.map(({ reason }) => reason)).toEqual([none, none]);
    const two = fitOf(data, 'F01', {}, ['F02']);
    expect(two.withoutCompany.map(({ standing, reason }) => [standing, reason])).toEqual([
      [null, 'Without the own company there is no standing.'],
      [null, 'Without the only peer there is no standing.'],
    ]);
  });
});
