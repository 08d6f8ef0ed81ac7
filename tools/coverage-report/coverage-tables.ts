import { markdownTable } from './markdown-table';
import {
  driftMeasure,
  expectedMeasure,
  matrixCovariances,
  rankSetMeasure,
  slopeMeasure,
  standingMeasure,
  startingPoints,
  valueMeasure,
  wildMeasure,
} from './measures';
import { lowestShare, promisesFor } from './promises';
import { coverageText, sharePoints } from './share-text';
import type { SettingResult } from './shortfalls';
import { horizons } from './simulate-panel';
import { coverageOf } from './tally';

interface Column {
  readonly head: string;
  readonly measure: string;
}

/** Slopes by every covariance without draws. */
export function slopesTable(results: readonly SettingResult[]): string {
  return coverageTable(
    results,
    matrixCovariances.map((name) => ({ head: `\`${name}\``, measure: slopeMeasure(name) })),
  );
}

/** Mean lengths of the slopes' intervals, the default's being 1. */
export function lengthsTable(results: readonly SettingResult[]): string {
  const lengthOf = ({ tallies }: SettingResult, index: number): number | undefined =>
    coverageOf(tallies, slopeMeasure(matrixCovariances[index]))?.meanLength;
  const rows = results.map((result) => {
    const usual = lengthOf(result, 0);
    const ratios = matrixCovariances.map((_, index) => {
      const length = lengthOf(result, index);
      return length === undefined || usual === undefined ? '–' : (length / usual).toFixed(2);
    });
    return [result.setting.name, ...ratios];
  });
  return markdownTable(['setting', ...matrixCovariances.map((name) => `\`${name}\``)], rows);
}

export function standingTable(results: readonly SettingResult[]): string {
  return coverageTable(results, [
    { head: 'standing', measure: standingMeasure },
    ...horizons.map((steps) => ({
      head: `expected value, h = ${steps}`,
      measure: expectedMeasure(steps),
    })),
    { head: 'rank set', measure: rankSetMeasure },
    { head: 'drift', measure: driftMeasure },
  ]);
}

/** The market value itself, from both starting points. */
export function valueTable(results: readonly SettingResult[], confidence: number): string {
  return coverageTable(
    results,
    startingPoints.flatMap((start) =>
      horizons.map((steps) => ({
        head: `${start.replaceAll('-', ' ')}, h = ${steps}`,
        measure: valueMeasure(start, steps, confidence),
      })),
    ),
  );
}

/** How often the wild bootstrap rejects the true slope. */
export function wildTable(results: readonly SettingResult[]): string {
  const rows = results.flatMap(({ setting, tallies }): string[][] => {
    const coverage = coverageOf(tallies, wildMeasure);
    if (coverage === null) return [];
    const { share, standardError } = coverage;
    return [[setting.name, `${sharePoints(1 - share)} ±${sharePoints(standardError)}`]];
  });
  return markdownTable(['setting', 'rejected at .05'], rows);
}

function coverageTable(results: readonly SettingResult[], columns: readonly Column[]): string {
  const rows = results.map((result) => [
    result.setting.name,
    ...columns.map(({ measure }) => cell(result, measure)),
  ]);
  return markdownTable(['setting', ...columns.map(({ head }) => head)], rows);
}

/** Promised figures stand out; a broken promise says so. */
function cell({ setting, tallies }: SettingResult, measure: string): string {
  const coverage = coverageOf(tallies, measure);
  const text = coverageText(coverage);
  if (promisesFor(setting, measure).length === 0) return text;
  const isKept = coverage !== null && coverage.share >= lowestShare;
  return isKept ? `**${text}**` : `**${text}** short`;
}
