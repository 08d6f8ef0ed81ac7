import type { Alternative } from '@contract';
import type { NumberFormat } from '../../ui/number-format';
import { exampleNumbers } from '../testing/example-numbers';
import {
  covarianceLines,
  covarianceRows,
  intervalsMeaning,
  intervalsTitle,
} from './interval-choice-words';
import { modelRows, modelsMeaning, modelsTitle } from './model-words';
import { residualMeaning, scatterTitle, widestTitle } from './residual-words';
import { exampleEvidence, judgedResult } from './testing/example-evidence';
import { testLines, testsMeaning } from './test-words';
import { trendMeaning, trendRows, trendTitle } from './trend-words';

describe('the choices behind a fit in words', () => {
  let numbers: NumberFormat;
  const persistent = {
    ...judgedResult,
    warnings: [{ code: 'persistent-errors' as const, detail: 'Errors persist.' }],
  };

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  describe('of trends', () => {
    it('sets changes from year to year beside the fit', () => {
      expect(
        trendRows(exampleEvidence, judgedResult, 0).map(({ figure }) => figure?.estimate),
      ).toEqual([2.005, 1.6]);
      expect(trendTitle(exampleEvidence, judgedResult, { index: 0, numbers })).toBe(
        'Slope on capex 2.01 (1.20 to 2.82), in changes from year to year 1.60 (1.00 to 2.20)',
      );
    });

    it('says that trends alone do not make slopes that changes confirm', () => {
      expect(trendMeaning(exampleEvidence, judgedResult)).toBe(
        'Changes from year to year give slopes inside the intervals of this fit, so trends alone do not make them.',
      );
      expect(trendMeaning(exampleEvidence, persistent)).toMatch(
        /Errors still persist from year to year: keep intervals that allow for it\.$/,
      );
    });

    it('names the slope that changes do not confirm, and what to do', () => {
      const slopes = [{ ...judgedResult.slopes[0], low: 1.8 }, judgedResult.slopes[1]];
      expect(trendMeaning(exampleEvidence, { ...judgedResult, slopes })).toBe(
        'In changes from year to year the slope on capex lies outside this fit’s interval, so common trends may make part of it. State both figures, and compare year effects below.',
      );
    });

    it('claims nothing of slopes without any interval, and sees what lies beyond an open one', () => {
      const without = judgedResult.slopes.map((slope) => ({ ...slope, low: null, high: null }));
      expect(trendMeaning(exampleEvidence, { ...judgedResult, slopes: without })).toMatch(
        /^The slopes of this fit have no interval/,
      );
      const open = judgedResult.slopes.map((slope) => ({ ...slope, low: 1e6, high: null }));
      expect(trendMeaning(exampleEvidence, { ...judgedResult, slopes: open })).toContain('outside');
    });

    it('says why there are no first differences', () => {
      const estimators = exampleEvidence.estimators.map((one) =>
        one.code === 'first-differences'
          ? { ...one, slopes: null, reason: 'no company has two years in a row.' }
          : one,
      );
      expect(trendMeaning({ estimators }, judgedResult)).toBe(
        'First differences cannot be taken: no company has two years in a row.',
      );
      expect(trendRows({ estimators }, judgedResult, 0)[1]).toEqual({
        name: 'First differences',
        figure: null,
        reason: 'no company has two years in a row.',
      });
    });
  });

  describe('of intervals', () => {
    it('marks the default and says what has not been run', () => {
      const rows = covarianceRows(exampleEvidence, judgedResult, 0);
      expect(rows.map(({ name, note }) => [name, note])).toEqual([
        ['CR2', 'default, of this fit'],
        ['wild bootstrap', ''],
        ['classical', ''],
        ['two-way', 'negative variance set to 0'],
      ]);
      expect(rows[1].reason).toMatch(/^Not run yet/);
    });

    it('counts in how many ways zero lies outside', () => {
      expect(intervalsTitle(exampleEvidence, judgedResult, { index: 0, numbers })).toBe(
        'Slope on capex 2.01 (1.20 to 2.82): the interval excludes zero in 2 of 3 ways',
      );
    });

    it('says why the default is the default here, and whether the choice matters', () => {
      expect(intervalsMeaning(exampleEvidence, judgedResult, { index: 0, numbers })).toBe(
        'CR2 is the default here: errors of one company persist over the years (estimated persistence 0.400, where 0 is none and 1 never fades), which row-by-row intervals overlook, and CR2 corrects for having 3 companies. The choice matters: zero lies inside the interval under two-way, not under the others.',
      );
      const covariances = exampleEvidence.covariances.filter(({ code }) => code !== 'two-way');
      expect(intervalsMeaning({ covariances }, judgedResult, { index: 0, numbers })).toMatch(
        /Every way says the same of zero: it lies outside the interval\.$/,
      );
    });

    it('says that errors may persist where these are not seen to, or nothing is known', () => {
      const meaning = (persistence: number | null) =>
        intervalsMeaning(
          exampleEvidence,
          {
            ...judgedResult,
            standing: judgedResult.standing && { ...judgedResult.standing, persistence },
          },
          { index: 0, numbers },
        );
      expect(meaning(-0.12)).toContain(
        'may persist over the years, though these are not seen to (estimated persistence \u22120.120, where',
      );
      expect(meaning(null)).toContain('may persist over the years, which row-by-row');
    });

    it('tells what stands behind each', () => {
      const [cr2, wild, , twoWay] = covarianceLines(exampleEvidence, 0, numbers);
      expect([cr2.standardError, cr2.degreesOfFreedom, cr2.pValue]).toEqual([
        '0.4050',
        '2.07',
        '0.030',
      ]);
      expect([wild.standardError, wild.degreesOfFreedom, wild.pValue]).toEqual([
        'n/a',
        'n/a',
        'n/a',
      ]);
      expect(twoWay.remarks).toEqual(['One eigenvalue was negative.']);
    });
  });

  describe('of models', () => {
    const { alternatives } = exampleEvidence;

    it('sets the standing in each model beside this one, on another scale in words', () => {
      const rows = modelRows(judgedResult, alternatives, { choice: 'standing', numbers });
      expect(rows.map(({ note, figure, reason }) => [note, figure?.estimate, reason])).toEqual([
        ['', undefined, 'One constant places none.'],
        ['this fit, place 1 to 2', 1811, undefined],
        ['place 1 to 3', 1500, undefined],
        ['', undefined, '34.5 % (12.1 to 58.9 %)'],
        ['', undefined, 'Too few rows have a year before them.'],
      ]);
    });

    it('says of slopes of another form what they are of', () => {
      const rows = modelRows(judgedResult, alternatives, { choice: 0, numbers });
      expect(rows[3].reason).toBe('0.400 (0.200 to 0.600), of logs');
    });

    it('says beside slopes what they are without, and once where there are none', () => {
      const pooled = {
        ...alternatives[0],
        observations: 29,
        slopesNote: 'Classical intervals.',
        reason: 'Without the year effects of this fit.',
      };
      const noteAndReason = (of: Alternative, choice: 'standing' | 0) =>
        modelRows(judgedResult, [of], { choice, numbers }).map(({ note, reason }) => [
          note,
          reason,
        ]);
      expect(noteAndReason(pooled, 0)).toEqual([
        ['29 rows, classical intervals, without the year effects of this fit', undefined],
      ]);
      expect(noteAndReason(pooled, 'standing')).toEqual([['29 rows', 'One constant places none.']]);
      const refused = { ...pooled, slopes: null, slopesNote: undefined, reason: 'Too large.' };
      expect(noteAndReason(refused, 0)).toEqual([['29 rows', 'Too large.']]);
    });

    it('keeps the capitals of an abbreviation in a note', () => {
      const noted = { ...alternatives[0], slopesNote: 'CR2 here: it is run alone.' };
      expect(modelRows(judgedResult, [noted], { choice: 0, numbers })[0].note).toBe(
        'CR2 here: it is run alone',
      );
    });

    it('counts models on one side, and how far apart those in the same unit are', () => {
      expect(modelsTitle(judgedResult, alternatives, { choice: 'standing', numbers })).toBe(
        'Standing above zero in 3 of 3 models that give one, from 1,500 to 1,810',
      );
      expect(modelsMeaning(judgedResult, alternatives, 'standing')).toBe(
        'The standing lies on the same side of zero in every model that gives one. In 2 of 3 models the interval excludes zero.',
      );
    });

    it('names the models that turn it round', () => {
      const turned = alternatives.map((one) =>
        one.code === 'year-effects' && one.standing !== null
          ? { ...one, standing: { ...one.standing, estimate: -10 } }
          : one,
      );
      expect(modelsMeaning(judgedResult, turned, 'standing')).toMatch(
        /^The choice of model matters: the standing lies on the other side of zero under “with year effects”\./,
      );
    });
  });

  describe('of tests', () => {
    it('writes statistic, degrees of freedom, p and whether it rejects among all', () => {
      const lines = testLines(exampleEvidence.tests, numbers).map(
        ({ statistic, degreesOfFreedom, pValue, holm }) => [
          statistic,
          degreesOfFreedom,
          pValue,
          holm,
        ],
      );
      expect(lines).toEqual([
        ['F 115.9', '2 and 28', '< 0.001', 'rejects'],
        ['z \u22121.200', '–', '0.230', 'not judged'],
        ['n/a', '–', '–', '–'],
      ]);
    });

    it('says how many were looked at, and that persistence makes some reject too often', () => {
      expect(testsMeaning(exampleEvidence.tests, judgedResult)).toBe(
        '3 tests looked at, 1 of them judged together by Holm’s correction at 5 %: 1 rejects what it assumes.',
      );
      expect(testsMeaning(exampleEvidence.tests, persistent)).toMatch(
        /Errors persist here, so tests that assume independent errors reject too often\.$/,
      );
    });
  });

  describe('of residuals', () => {
    const { residuals } = exampleEvidence;

    it('names the row that stands out most, and counts those far away', () => {
      expect(residualMeaning(residuals, judgedResult, numbers)).toBe(
        'Velmara 2014 stands out most: 600 EUR m above what is expected. 1 of 32 rows lies more than 3 times the usual spread away: check its cells.',
      );
      expect(scatterTitle(residuals)).toBe('1 of 32 rows has a studentised residual beyond ±3');
    });

    it('gives a residual of logs as a share', () => {
      const specification = { ...judgedResult.specification, form: 'log' as const };
      const [most] = residuals.largest;
      const inLogs = { ...residuals, largest: [{ ...most, residual: Math.log(1.25) }] };
      expect(residualMeaning(inLogs, { specification }, numbers)).toMatch(
        /^Velmara 2014 stands out most: 25\.0 % above what is expected\./,
      );
    });

    it('says that none is far away', () => {
      const near = { ...residuals, points: [] };
      expect(scatterTitle(near)).toBe('None of 32 rows has a studentised residual beyond ±3');
      expect(residualMeaning({ ...near, largest: [] }, judgedResult, numbers)).toBe(
        'Every row lies where the model expects it.',
      );
    });

    it('names where they scatter most', () => {
      expect(widestTitle(residuals.byYear, judgedResult, numbers)).toBe(
        'Residuals scatter most in 2014, standard deviation 310',
      );
    });
  });
});
