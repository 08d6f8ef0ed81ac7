import type { NumberFormat } from '../../ui/number-format';
import { exampleLogResult } from '../testing/example-fit';
import { exampleNumbers } from '../testing/example-numbers';
import { outcomeAxis, regressorAxis } from './axis-words';
import { figureChoices } from './figure-choice';
import { withoutEachCompany } from './left-out';
import { leftOutConsequence, leftOutMeaning, leftOutTitle } from './left-out-words';
import { comparedSlopes, linesTitle, oneLineMeaning } from './one-line-words';
import { driftMeaning } from './steady-words';
import { exampleEvidence, judgedResult } from './testing/example-evidence';

describe('the evidence in words', () => {
  let numbers: NumberFormat;
  const panel = { currency: 'EUR', unit: 'millions' } as const;
  const inLogs = {
    ...judgedResult,
    specification: { ...judgedResult.specification, form: 'log' as const },
    standing: judgedResult.standing && {
      ...judgedResult.standing,
      estimate: 0.3,
      low: 0.1,
      high: 0.5,
    },
    withoutCompany: [{ company: 'Sarvane', slopes: [1], standing: Math.log(1.5) }],
  };

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  describe('of one line', () => {
    it('keeps company levels where one line is ruled out, and says what each explains', () => {
      expect(oneLineMeaning(judgedResult, numbers)).toBe(
        'No: company levels differ, so each company keeps its own. One pooled line explains 75.3 % of the variation in market value, company levels with common slopes 96.3 %.',
      );
    });

    it('says that year effects share in what company levels explain', () => {
      expect(oneLineMeaning(exampleLogResult, numbers)).toContain(
        'company levels and year effects with common slopes 96.3 %',
      );
    });

    it('decides at the level of the fit, and calls no companies equal', () => {
      const poolability = { ...judgedResult.poolability, pValue: 0.04 };
      const specification = { ...judgedResult.specification, confidence: 0.99 };
      expect(oneLineMeaning({ ...judgedResult, poolability, specification }, numbers)).toMatch(
        /^The data do not rule it out: company levels are not shown to differ\./,
      );
    });

    it('gives the reason where the test has no p value', () => {
      const poolability = {
        ...judgedResult.poolability,
        pValue: null,
        pValueReason: 'perfect fit',
      };
      expect(oneLineMeaning({ ...judgedResult, poolability }, numbers)).toMatch(
        /^Not decided: perfect fit\./,
      );
    });

    it('puts the slope of the pooled line beside that of the companies', () => {
      expect(linesTitle(exampleEvidence, judgedResult, { index: 0, numbers })).toBe(
        'Against capex companies share a slope of 2.01 (1.20 to 2.82), one line for all has 2.00 (1.00 to 3.00)',
      );
      expect(comparedSlopes(exampleEvidence, judgedResult, numbers)).toEqual([
        { name: 'capex', pooled: '2.000 (1.000 to 3.000)', within: '2.005 (1.195 to 2.815)' },
        {
          name: 'book equity',
          pooled: '1.000 (0.800 to 1.200)',
          within: '\u22120.5080 (\u22121.2000 to 0.1840)',
        },
      ]);
    });
  });

  describe('of what is left out', () => {
    const standing = judgedResult.standing!;

    it('sorts companies by how far they move the standing, without the own one', () => {
      expect(withoutEachCompany(judgedResult, 'standing', standing)).toEqual([
        { name: 'Kesdrin', estimate: 1501 },
        { name: 'Sarvane', estimate: 2121 },
      ]);
      const slope = withoutEachCompany(judgedResult, 0, judgedResult.slopes[0]);
      expect(slope.map(({ name }) => name)).toEqual(['Sarvane', 'Velmara', 'Kesdrin']);
    });

    it('sets the rank set and the range into the title', () => {
      const left = withoutEachCompany(judgedResult, 'standing', standing);
      const picture = { choice: 'standing', left, one: 'company' } as const;
      expect(leftOutTitle(judgedResult, picture, numbers)).toBe(
        'Standing 1,810 (1,170 to 2,450), place 1 to 2 of 3; without any one company from 1,500 to 2,120',
      );
    });

    it('says which moves most, and that nothing leaves the interval', () => {
      const left = withoutEachCompany(judgedResult, 'standing', standing);
      const picture = { choice: 'standing', left, many: 'companies' } as const;
      expect(leftOutMeaning(judgedResult, picture, numbers)).toBe(
        'The standing moves most without Kesdrin: to 1,500 from 1,810 EUR m. Whichever of the companies is left out, the standing stays inside its interval.',
      );
    });

    it('says that a slope leaves its interval, and that a standing turns round', () => {
      const left = withoutEachCompany(judgedResult, 0, judgedResult.slopes[0]);
      expect(leftOutConsequence(judgedResult, { choice: 0, left, many: 'companies' })).toBe(
        'Without Sarvane the slope on capex leaves the interval that it has with all.',
      );
      const turned = [
        { name: 'Kesdrin', estimate: -1 },
        { name: 'Sarvane', estimate: -2 },
      ];
      expect(
        leftOutConsequence(judgedResult, { choice: 'standing', left: turned, many: 'companies' }),
      ).toBe('Without Kesdrin or Sarvane the standing lies on the other side of zero.');
    });

    it('names companies with blanks and “and” in their names one by one, and counts what is known', () => {
      const left = ['Nord Valve', 'Pump and Seal'].map((name) => ({ name, estimate: -1 }));
      const words = leftOutConsequence(judgedResult, {
        choice: 'standing',
        left,
        many: 'companies',
      });
      expect(words).toContain('Without Nord Valve or Pump and Seal the standing');
      const gap = { name: 'Ambrevik', estimate: null, reason: 'none' };
      const known = { name: 'Kesdrin', estimate: judgedResult.standing?.estimate ?? NaN };
      expect(
        leftOutConsequence(judgedResult, {
          choice: 'standing',
          left: [known, gap],
          many: 'companies',
        }),
      ).toBe(
        'For 1 of the 2 companies a figure without it is known: there the standing stays inside its interval.',
      );
    });

    it('counts those that turn it round where they are many', () => {
      const left = Array.from({ length: 7 }, (_, place) => ({ name: `C${place}`, estimate: -1 }));
      expect(leftOutConsequence(judgedResult, { choice: 'standing', left, many: 'years' })).toBe(
        'Without any one of 7 years the standing lies on the other side of zero.',
      );
    });

    it('writes a standing of logs as a share', () => {
      const full = { estimate: Math.expm1(0.3), low: Math.expm1(0.1), high: Math.expm1(0.5) };
      const left = withoutEachCompany(inLogs, 'standing', full);
      expect(leftOutMeaning(inLogs, { choice: 'standing', left, many: 'companies' }, numbers)).toBe(
        'The standing moves most without Sarvane: to 50.0 % from 35.0 %. Whichever of the companies is left out, the standing stays inside its interval.',
      );
    });

    it('says that there is nothing to leave out', () => {
      const picture = { choice: 'standing', left: [], many: 'years' } as const;
      expect(leftOutMeaning(judgedResult, picture, numbers)).toBe(
        'With one of the years left out there is no standing to compare.',
      );
    });
  });

  it('tells a drift from none by its test', () => {
    expect(driftMeaning(judgedResult, numbers)).toBe(
      'The gap moves by 0.49 (\u221262.40 to 63.40) EUR m a year, p 0.980: no drift is shown, so one standing is kept for all years.',
    );
    const drift = { estimate: 84, standardError: 30, low: 12, high: 156, pValue: 0.03 };
    expect(driftMeaning({ ...judgedResult, drift }, numbers)).toMatch(
      /p 0\.030: it drifts, so one standing for all years hides where it is now\.$/,
    );
    const none = { ...judgedResult, drift: null, driftReason: 'Fewer than four years.' };
    expect(driftMeaning(none, numbers)).toBe('Fewer than four years.');
  });

  it('labels axes in the model’s scale', () => {
    expect(outcomeAxis(judgedResult, panel, numbers)).toEqual({
      title: 'market value, EUR m',
      kind: 'money',
    });
    expect(outcomeAxis(inLogs, panel, numbers)).toEqual({
      title: 'log of market value in EUR m',
      kind: 'plain',
    });
    const words = { panel, numbers };
    const further = { ...judgedResult.slopes[0], name: 'employees' };
    const lagged = {
      specification: { ...judgedResult.specification, lag: 1 as const },
      slopes: [...judgedResult.slopes, further],
    };
    expect(regressorAxis(lagged, 0, words).title).toBe('capex of the year before, EUR m');
    expect(regressorAxis(lagged, 2, words)).toEqual({
      title: 'employees of the year before',
      kind: 'plain',
    });
    expect(regressorAxis(inLogs, 1, words).title).toBe('log of book equity in EUR m');
  });

  it('offers the standing first, and slopes alone where there is none', () => {
    expect(figureChoices(judgedResult).map(({ label }) => label)).toEqual([
      'Standing',
      'Slope on capex',
      'Slope on book equity',
    ]);
    expect(figureChoices({ ...judgedResult, standing: null }).map(({ choice }) => choice)).toEqual([
      0, 1,
    ]);
  });
});
