import type {
  CompanyAttributes,
  PanelLine,
  PanelVersionRow,
} from '../../db/repositories/panels-repository';

/** A panel version as it leaves Kinvale. */
export interface PanelExport {
  readonly version: PanelVersionRow;
  /** In order of company and year, a part at a time, each read when it is asked for. */
  readonly parts: AsyncIterable<readonly PanelLine[]>;
  readonly attributes: readonly CompanyAttributes[];
}

/** Null where a cell is missing. */
export type TableCell = string | number | null;

export interface PanelTable {
  readonly headers: readonly string[];
  /** The rows, a part of some milliseconds of work at a time. */
  readonly parts: AsyncIterable<readonly (readonly TableCell[])[]>;
}

const measureHeader = 'amounts in';

/**
 * The long table of a version: company, year, its columns under their own headers, what describes the company, and the
 * measure of its amounts, as `EUR millions`. Read again, it is the same panel. A measure that came in with an older export
 * is no description: this version's own stands in its place.
 */
export function panelTable({ version, parts, attributes }: PanelExport): PanelTable {
  const headers = new Set(attributes.flatMap((company) => Object.keys(company.attributes)));
  headers.delete(measureHeader);
  const described = [...headers];
  const measure = measureOf(version);
  const tails = new Map(
    attributes.map((company) => [
      company.company,
      [...described.map((header) => company.attributes[header] ?? null), measure],
    ]),
  );
  const noTexts = [...described.map(() => null), measure];
  return {
    headers: [
      ...[version.companyHeader, version.yearHeader],
      ...version.columns.map(({ name }) => name),
      ...described,
      measureHeader,
    ],
    parts: tableParts(parts, (company) => tails.get(company) ?? noTexts),
  };
}

/** Currency and unit, as `EUR millions`. */
export function measureOf({ currency, unit }: Pick<PanelVersionRow, 'currency' | 'unit'>): string {
  return unit === 'units' ? currency : `${currency} ${unit}`;
}

async function* tableParts(
  parts: AsyncIterable<readonly PanelLine[]>,
  tailOf: (company: string) => readonly TableCell[],
): AsyncGenerator<readonly (readonly TableCell[])[]> {
  for await (const part of parts)
    yield part.map(({ company, year, cells }) => [company, year, ...cells, ...tailOf(company)]);
}
