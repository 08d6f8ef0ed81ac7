import { reportOptions, usualReplications } from './report-options';
import { settings } from './settings';

describe('Options of the coverage report', () => {
  it('takes every setting and the usual replications, and keeps that report alone', () => {
    expect(reportOptions([])).toEqual({ settings, replications: usualReplications, isWhole: true });
    expect(reportOptions(['--replications', '50']).isWhole).toBeFalse();
    expect(reportOptions(['--settings', settings[0].name]).isWhole).toBeFalse();
  });

  it('takes the settings that are named, in their order', () => {
    const names = [settings[3].name, settings[1].name];
    const options = reportOptions(['--settings', names.join(','), '--replications', '20']);
    expect(options.settings.map(({ name }) => name)).toEqual(names);
    expect(options.replications).toBe(20);
  });

  it('refuses a setting it does not have, other options, and no replications', () => {
    expect(() => reportOptions(['--settings', 'n13'])).toThrowError(RangeError, /found n13$/);
    expect(() => reportOptions(['--replications', '0'])).toThrowError(RangeError, /found 0$/);
    expect(() => reportOptions(['--seed', '1'])).toThrowError(TypeError);
  });
});
