import { settings } from './settings';
import { simulateBlock } from './simulate-block';
import { simulatePanel } from './simulate-panel';
import { addTallies } from './tally';

describe('Simulation of the coverage report', () => {
  const [setting] = settings.filter(({ rows }) => rows === 'one in five missing');

  it('draws the same panel for the same replication, and another for the next', () => {
    expect(simulatePanel(setting, 3)).toEqual(simulatePanel(setting, 3));
    expect(simulatePanel(setting, 3).data.outcome).not.toEqual(
      simulatePanel(setting, 4).data.outcome,
    );
  });

  it('counts the same in one stretch and in two', () => {
    const total = simulateBlock({ setting, from: 0, to: 2 });
    addTallies(total, simulateBlock({ setting, from: 2, to: 5 }));
    const whole = simulateBlock({ setting, from: 0, to: 5 });
    expect([...total.keys()]).toEqual([...whole.keys()]);
    for (const [measure, { given, held, length }] of whole) {
      expect(total.get(measure)).toEqual(jasmine.objectContaining({ given, held }));
      expect(total.get(measure)?.length).toBeCloseTo(length, 9);
    }
  });

  it('leaves the own company its last five years, or its last year, where rows are missing', () => {
    for (const { rows, ...rest } of settings.filter((it) => it.rows !== 'all')) {
      const { data, own, ahead } = simulatePanel({ ...rest, rows }, 11);
      const years = Array.from(data.year).filter(
        (_, row) => data.companies[data.company[row]] === own,
      );
      expect(years.at(-1)).toBe(2000 + rest.years);
      expect(ahead[0].year).toBe(2001 + rest.years);
      if (rows === 'last 5 of the own') expect(years.length).toBe(5);
    }
  });

  it('gives every setting its own seeds and name', () => {
    expect(new Set(settings.map(({ seed }) => seed)).size).toBe(settings.length);
    expect(new Set(settings.map(({ name }) => name)).size).toBe(settings.length);
    expect(settings.filter(({ hasWild }) => hasWild).length).toBe(6);
  });
});
