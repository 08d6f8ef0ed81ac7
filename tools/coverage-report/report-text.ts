import { format } from 'prettier';
import { engineVersion } from '../../backend/stats';
import { lengthsTable, slopesTable, standingTable, valueTable, wildTable } from './coverage-tables';
import { findings } from './findings';
import { markdownTable } from './markdown-table';
import { nominal, usualBand, wildMeasure } from './measures';
import { lowestShare, promises } from './promises';
import { settingsTable } from './settings-table';
import { sharePoints } from './share-text';
import { shortfallLine } from './shortfall-line';
import { type SettingResult, shortfallsOf } from './shortfalls';
import { simulatedDraws } from './wild-rejection';

/** The report as Markdown; the same for the same results. */
export async function reportText(
  results: readonly SettingResult[],
  replications: number,
): Promise<string> {
  const shortfalls = shortfallsOf(results);
  const broken = shortfalls.filter((it) => it.broken.length > 0).map(shortfallLine);
  const unpromised = shortfalls.filter((it) => it.broken.length === 0).map(shortfallLine);
  const hasWild = results.some(({ tallies }) => tallies.has(wildMeasure));
  const lowest = sharePoints(lowestShare);
  const paragraphs = [
    '# How often the intervals hold the truth',
    `Simulated by engine ${engineVersion}, ${replications.toLocaleString('en')} replications a setting; written by \`npm run coverage-report\`, which gives the same figures again. Every interval comes from the engine's own code. Figures are shares of intervals that hold the truth, at a nominal ${sharePoints(nominal)} unless told otherwise, ± their Monte Carlo standard error √(p(1 − p)/n). **Bold** figures are promised to reach ${lowest}; the command fails where one does not. A sample in which a method gives no interval, such as a two-way variance below 0, is left out of that method's figure; a dash stands where it never gives one.`,
    '## What it says',
    list(findings(results)),
    `Promised and below ${lowest}:`,
    list(broken.length === 0 ? ['nothing'] : broken),
    `Defaults below ${lowest} where nothing is promised:`,
    list(unpromised.length === 0 ? ['nothing'] : unpromised),
    '## Settings',
    `Outcome y = Σ x_k + s_i·e with x_k = 2 + s_i·z_k; z_k and e are AR(1) with unit variance, started from their stationary distribution; with two regressors z_1 and z_2 correlate at .5. Sizes s_i: all 1, or exp(−1.5) to exp(1.5) in even steps of the exponent. All intercepts are 0: no other interval depends on them, and a rank set can then err about every peer. A common shock makes half the variance the same for all companies in a year, each regressor having its own. Five more years are drawn behind the last one: the plan of year h holds the regressors that come, and the market value is the one that comes; nothing is planned with year effects. Replication r of a setting draws from xoshiro128** seeded with its seed + r.`,
    settingsTable(results.map(({ setting }) => setting)),
    '## Slopes, by covariance',
    'The slope of the first regressor.',
    slopesTable(results),
    'Mean length of the intervals, as a multiple of the default’s:',
    lengthsTable(results),
    ...(hasWild
      ? [
          `The wild bootstrap, without its interval: how often it rejects the true slope. All sign vectors up to 12 companies, ${simulatedDraws} draws beyond, from the seed 100,000,000 + the panel's.`,
          wildTable(results),
        ]
      : []),
    '## Standing, expected value, rank set, drift',
    'Expected values start from the model’s level. Rank set: nobody is shown to be higher or lower, for all are level. Drift: there is none; it needs 8 own rows.',
    standingTable(results),
    `## The market value itself, ${percent(nominal)} % band`,
    valueTable(results, nominal),
    `## The market value itself, ${percent(usualBand)} % band`,
    valueTable(results, usualBand),
    '## What is promised',
    `Each promise with the sentence of the methods that it rests on. A figure of a promised setting that falls below ${lowest} makes the command exit with 1.`,
    markdownTable(
      ['promise', 'where', 'rests on'],
      promises.map(({ name, where, sentence }) => [name, where, sentence]),
    ),
  ];
  return format(paragraphs.join('\n\n'), { parser: 'markdown', printWidth: 100 });
}

function list(items: readonly string[]): string {
  return items.map((item) => `- ${item}`).join('\n');
}

function percent(share: number): string {
  return (100 * share).toFixed(0);
}
