import { TestBed } from '@angular/core/testing';
import type { Flag } from '@panel-data';
import { NumberFormat } from '../../ui/number-format';
import { alike, flagGroups } from './flag-groups';
import { flagLine } from './flag-words';
import { jump, missing, repeated, sameName, slip, titles, yearGap } from './testing/example-flags';

describe('flags in words', () => {
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    numbers.unit.set('millions');
  });

  function line(flag: Flag): string {
    return flagLine(flag, titles, numbers);
  }

  it('tells a jump with the year before and the usual change', () => {
    expect(line(jump)).toBe(
      'Kesdrin FY2016 capex 4,120: 9.80 times the year before (420.4); its usual change is 1.05 times',
    );
  });

  it('follows the unit that is shown', () => {
    numbers.unit.set('billions');
    expect(line(jump)).toContain('capex 4.120: 9.80 times the year before (0.4204)');
  });

  it('tells each kind by what it found', () => {
    expect(line(missing)).toBe('Sarvane FY2010 capex is missing');
    expect(line(yearGap)).toBe('Sarvane FY2012 has no row, between years that have one');
    expect(line(slip(2019))).toBe(
      'Velmara FY2019 book equity 450,000: about 1,000 times its usual 450.0',
    );
    expect(line({ ...missing, value: 0, facts: { code: 'sign' } })).toBe(
      'Sarvane FY2010 capex is zero',
    );
    expect(line({ ...missing, value: -12, facts: { code: 'sign' } })).toContain('is negative');
    expect(line({ ...jump, facts: { code: 'stale-copy', columns: 1 } })).toContain(
      'the figure of the year before, digit by digit',
    );
    expect(
      line({
        ...jump,
        facts: { code: 'peer-outlier', ratio: 4.2, usualRatio: 0.35, score: 5, peers: 11 },
      }),
    ).toContain('4.20 times its book equity; 11 other companies of that year lie around 0.350');
  });

  it('tells what is there twice, a row’s figures or a company', () => {
    expect(line(repeated('Kesdrin', 'Velmara'))).toBe(
      'Kesdrin FY2016 market value 812.0: the figure of Velmara in the same year, as are 2 of this row',
    );
    const three = { ...repeated('Kesdrin', 'Velmara').facts, more: 2 };
    expect(line({ ...jump, facts: three })).toContain('the figure of Velmara and 2 more in');
    expect(line(sameName)).toBe(
      'NORDWERK FY2009 may be the same company as “Nordwerk AG”: nearly the same name, and years that overlap or follow on',
    );
  });

  it('groups by kind, and unit slips by factor and direction, in a fixed order', () => {
    const small: Flag = {
      ...slip(2020),
      facts: {
        code: 'unit-slip',
        factor: 1000,
        isTooLarge: false,
        usual: 450,
        against: 'own-years',
      },
    };
    const twice = [repeated('Kesdrin', 'Velmara'), repeated('Velmara', 'Kesdrin'), sameName];
    const groups = flagGroups([yearGap, jump, ...twice, slip(2018), slip(2019), small, missing]);
    expect(groups.map(({ title }) => title)).toEqual([
      '1 cell is missing',
      '2 figures repeat another company’s',
      '1 company may stand in twice',
      '2 figures look 1,000 times too large',
      '1 figure looks 1,000 times too small',
      '1 figure jumps as the company’s figures rarely do',
      '1 year without a row',
    ]);
  });

  it('finds the others of the same kind and company', () => {
    const flags = [slip(2018), slip(2019), slip(2018, 'Sarvane'), jump];
    expect(alike(flags[0], flags)).toEqual([flags[1]]);
  });

  it('finds those of the row that a row repeats, and of no other', () => {
    const flags = [
      repeated('Kesdrin', 'Velmara'),
      repeated('Kesdrin', 'Velmara', 1),
      repeated('Velmara', 'Kesdrin'),
      repeated('Sarvane', 'Velmara'),
      { ...repeated('Velmara', 'Kesdrin'), year: 2017 },
    ];
    expect(alike(flags[0], flags)).toEqual([flags[1], flags[2]]);
    const other: Flag = {
      ...sameName,
      company: 'Nordwerk AG',
      facts: { code: 'duplicate', of: 'name', company: 'NORDWERK', more: 0 },
    };
    expect(alike(sameName, [sameName, other])).toEqual([other]);
  });
});
