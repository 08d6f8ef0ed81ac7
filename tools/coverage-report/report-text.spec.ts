import { slopeMeasure, standingMeasure } from './measures';
import { reportText } from './report-text';
import { settings } from './settings';
import { judge, type Tallies } from './tally';

describe('Text of the coverage report', () => {
  const tallies: Tallies = new Map();
  for (let replication = 0; replication < 200; replication += 1) {
    judge(tallies, standingMeasure, replication < 180);
    judge(tallies, slopeMeasure('cr2'), replication < 190);
  }
  const results = [{ setting: settings[1], tallies }];

  it('marks what is promised, says what falls short, and names seed and command', async () => {
    const text = await reportText(results, 200);
    expect(text).toContain('**.950 ±.015**');
    expect(text).toContain('**.900 ±.021** short');
    expect(text).toContain('- n12-t20-rho0.5: standing .900 (s.e. .021), promised: standing and');
    expect(text).toMatch(/\| n12-t20-rho0\.5 +\| 200000 +\|/);
    expect(text).toContain('npm run coverage-report');
  });

  it('is the same for the same results, and leaves out what was not simulated', async () => {
    const text = await reportText(results, 200);
    expect(await reportText(results, 200)).toBe(text);
    expect(text).not.toContain('The weak point');
    expect(text).not.toContain('wild bootstrap, without');
  });
});
