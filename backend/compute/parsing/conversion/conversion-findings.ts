import type { FileCheck } from '../../parse-messages';
import { findingAt, type FindingList } from '../finding-list';
import type { Table } from '../table';
import type { LackingRate } from './apply-rates';
import type { LackingIndices } from './real-terms';

/** One finding a currency and year, at the first row that they stand in. */
export function findLackingRates(
  table: Table,
  column: number,
  lacking: readonly LackingRate[],
  findings: FindingList,
): void {
  for (const { currency, year, firstRow, flows, stocks } of lacking) {
    const wanted = [
      ...(flows > 0 ? [`an average rate (${figures(flows)})`] : []),
      ...(stocks > 0 ? [`a year-end rate (${figures(stocks)})`] : []),
    ].join(' and ');
    const detail = `${currency} needs ${wanted} for ${year}.`;
    findings.add(findingAt(table, firstRow, column, { code: 'no-rate', detail, isBlocking: true }));
  }
}

/** One finding a year, at the first row that it stands in. */
export function findLackingIndices(
  table: Table,
  tableRow: Int32Array,
  column: number,
  lacking: LackingIndices,
  findings: FindingList,
): void {
  for (const [year, row] of lacking) {
    const detail = `Real terms need a price index for ${year}.`;
    findings.add(
      findingAt(table, tableRow[row], column, { code: 'no-price-index', detail, isBlocking: true }),
    );
  }
}

/** Currencies by name, each with its years in order. */
export function missingRates(lacking: readonly LackingRate[]): FileCheck['missingRates'] {
  const years = new Map<string, number[]>();
  for (const { currency, year } of lacking) {
    years.set(currency, [...(years.get(currency) ?? []), year]);
  }
  return [...years]
    .map(([currency, list]) => ({ currency, years: list.sort((left, right) => left - right) }))
    .sort((left, right) => (left.currency < right.currency ? -1 : 1));
}

function figures(count: number): string {
  return count === 1 ? '1 figure' : `${count} figures`;
}
