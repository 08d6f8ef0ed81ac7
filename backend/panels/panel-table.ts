import type { PanelBlockRows } from '../../db/repositories/panel-rows-repository';
import type { CompanyAttributes, PanelVersionRow } from '../../db/repositories/panels-repository';

/** A panel version as it leaves Kinvale. */
export interface PanelExport {
  readonly version: PanelVersionRow;
  readonly rows: PanelBlockRows;
  readonly attributes: readonly CompanyAttributes[];
}

/** Null where a cell is missing. */
export type TableCell = string | number | null;

export interface PanelTable {
  readonly headers: readonly string[];
  /** By company and year, each made when it is asked for. */
  readonly rows: Iterable<readonly TableCell[]>;
}

const measureHeader = 'amounts in';

/**
 * The long table of a version: company, year, its columns under their own headers, what describes the company, and the
 * measure of its amounts, as `EUR millions`. Read again, it is the same panel.
 */
export function panelTable({ version, rows, attributes }: PanelExport): PanelTable {
  const described = [...new Set(attributes.flatMap((company) => Object.keys(company.attributes)))];
  const hasMeasure = described.includes(measureHeader);
  const measure = hasMeasure ? [] : [measureOf(version)];
  const tails = new Map(
    attributes.map((company) => [
      company.company,
      [...described.map((header) => company.attributes[header] ?? null), ...measure],
    ]),
  );
  const noTexts = [...described.map(() => null), ...measure];
  return {
    headers: [
      ...[version.companyHeader, version.yearHeader],
      ...version.columns.map(({ name }) => name),
      ...described,
      ...(hasMeasure ? [] : [measureHeader]),
    ],
    rows: tableRows(rows, (company) => tails.get(company) ?? noTexts),
  };
}

/** Currency and unit, as `EUR millions`. */
export function measureOf({ currency, unit }: Pick<PanelVersionRow, 'currency' | 'unit'>): string {
  return unit === 'units' ? currency : `${currency} ${unit}`;
}

function* tableRows(
  { companies, company, year, values }: PanelBlockRows,
  tailOf: (company: string) => readonly TableCell[],
): Generator<readonly TableCell[]> {
  for (let row = 0; row < company.length; row++) {
    const name = companies[company[row]];
    const cells = values.map((column) => (Number.isNaN(column[row]) ? null : column[row]));
    yield [name, year[row], ...cells, ...tailOf(name)];
  }
}
