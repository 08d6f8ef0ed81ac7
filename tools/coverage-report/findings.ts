import {
  expectedMeasures,
  nominal,
  rankSetMeasure,
  slopeMeasure,
  standingMeasure,
  usualBand,
  valueMeasures,
  wildMeasure,
} from './measures';
import { lowestShare, statedCompanies } from './promises';
import type { Setting } from './setting';
import { sharePoints } from './share-text';
import type { SettingResult } from './shortfalls';
import { coverageOf } from './tally';

/** What the tables say, a sentence each, the figures read off them; one without its settings is left out. */
export function findings(results: readonly SettingResult[]): string[] {
  const isShared = ({ commonShock }: Setting): boolean => commonShock === 'errors and regressors';
  const shared = results.filter(
    ({ setting }) => isShared(setting) && setting.effects === 'company',
  );
  const byYear = results.filter(
    ({ setting }) => isShared(setting) && setting.effects === 'company,year',
  );
  const independent = results.filter((result) => !shared.includes(result));
  const whole = independent.filter(({ setting }) => isUsual(setting));
  const stated = whole.filter(({ setting }) => setting.companies >= statedCompanies);
  const fewer = whole.filter(({ setting }) => setting.companies < statedCompanies);
  const skewed = whole.filter(({ setting }) => setting.sizes === 'skewed');
  const weak = results.filter(({ setting }) => setting.persistence.kind === 'own apart');
  const varied = results.filter(({ setting }) => setting.persistence.kind === 'varied');
  const short = results.filter(({ setting }) => setting.rows === 'last 5 of the own');
  const ten = results.filter(({ setting }) => setting.rows === 'last 10 of the own');
  const three = results.filter(({ setting }) => setting.rows === 'last 3 of the own');
  const fourteen = results.filter(({ setting }) => setting.rows === 'last 14 of the own');
  return [
    sentence(
      independent,
      [slopeMeasure('cr2')],
      (range) =>
        `\`cr2\` covers the slope in ${range} of samples wherever companies are independent given the regressors and the effects.`,
    ),
    sentence(
      skewed,
      [slopeMeasure('cr1')],
      (range) =>
        `With one company 20 times another, \`cr1\` covers ${range}; \`cr2\` there covers ${rangeOf(skewed, [slopeMeasure('cr2')])}.`,
    ),
    sentence(
      whole,
      [slopeMeasure('classical')],
      (range) =>
        `Classical intervals cover ${range}: they fall with persistence and with unequal sizes.`,
    ),
    sentence(
      shared,
      [slopeMeasure('cr2')],
      (range) =>
        `Where shocks to errors and to regressors are both common to all companies, \`cr2\` covers ${range}, \`two-way\` ${rangeOf(shared, [slopeMeasure('two-way')])}, \`driscoll-kraay\` ${rangeOf(shared, [slopeMeasure('driscoll-kraay')])}; with year effects, \`cr2\` covers ${rangeOf(byYear, [slopeMeasure('cr2')])}.`,
    ),
    sentence(
      results,
      [wildMeasure],
      (range) => `The wild bootstrap keeps the true slope in ${range}.`,
    ),
    sentence(
      stated,
      [standingMeasure],
      (range) =>
        `With like persistence, all rows and ${statedCompanies} companies or more the standing's interval covers ${range}, the expected value's ${rangeOf(stated, expectedMeasures)}.`,
    ),
    sentence(
      fewer,
      [standingMeasure],
      (range) =>
        `With fewer companies, 8 here, nothing is promised of the standing and the rank set: the standing covers ${range}, the expected value ${rangeOf(fewer, expectedMeasures)}, the rank set ${rangeOf(fewer, [rankSetMeasure])}. The warning \`few-companies\` starts below 8, so that 8 to 11 companies get these figures without a word; the list below names where they fall under ${sharePoints(lowestShare)}.`,
    ),
    sentence(
      weak,
      [standingMeasure],
      (range) =>
        `The weak point: where the own company's errors persist far more than its peers' (.85 against .4), the standing covers ${range}, the expected value ${rangeOf(weak, expectedMeasures)}; the warning \`own-persistence\` is there to say so.`,
    ),
    sentence(
      varied,
      [standingMeasure],
      (range) => `Where persistence varies from company to company, the standing covers ${range}.`,
    ),
    sentence(
      short,
      [standingMeasure],
      (range) =>
        `Where only the last 5 of the own company's 20 years are there, the standing covers ${range}, the expected value ${rangeOf(short, expectedMeasures)} and the rank set ${rangeOf(short, [rankSetMeasure])}: the cosines of a company with rows in fewer than two thirds of the years run over its own rows (Cavaliere & Taylor 2007, 2008). By the calendar, as the methods have it, the same intervals cover .88 to .94, .89 to .92 and .92 to .94.`,
    ),
    sentence(
      ten,
      [standingMeasure],
      (range) =>
        `With the last 10 of 20 own rows the standing covers ${range}. By the calendar go the last 14, with ${rangeOf(fourteen, [standingMeasure])}, and the last 3, too few for three cosines, with ${rangeOf(three, [standingMeasure])}.`,
    ),
    sentence(
      stated,
      [rankSetMeasure],
      (range) =>
        `With all companies level, rank sets show nobody wrongly in ${range} with like persistence, in ${rangeOf(weak, [rankSetMeasure])} at the weak point.`,
    ),
    sentence(
      whole,
      valueMeasures(nominal),
      (range) =>
        `With like persistence and all rows the market value itself lies in its 95 % band in ${range}, in its 80 % band in ${rangeOf(whole, valueMeasures(usualBand))}.`,
    ),
  ].flatMap((text) => text ?? []);
}

function isUsual({ persistence, rows, effects }: Setting): boolean {
  return persistence.kind === 'like' && rows === 'all' && effects === 'company';
}

function sentence(
  results: readonly SettingResult[],
  measures: readonly string[],
  words: (range: string) => string,
): string | null {
  const range = rangeOf(results, measures);
  return range === '–' ? null : words(range);
}

/** Smallest and largest share: .936 to .951. */
function rangeOf(results: readonly SettingResult[], measures: readonly string[]): string {
  const shares = results.flatMap(({ tallies }) =>
    measures.flatMap((measure) => coverageOf(tallies, measure)?.share ?? []),
  );
  if (shares.length === 0) return '–';
  const [low, high] = [sharePoints(Math.min(...shares)), sharePoints(Math.max(...shares))];
  return low === high ? low : `${low} to ${high}`;
}
