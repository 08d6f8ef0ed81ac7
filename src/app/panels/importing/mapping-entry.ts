import type { ImportMapping, ImportReply, PanelVersionSummary } from '@contract';

/** The form's entries before they are a mapping: a choice not made yet is ''. */
export type MappingEntry = Omit<ImportMapping, 'unit'> & {
  readonly unit: ImportMapping['unit'] | '';
};

export const columnChoices = [
  { key: 'company', label: 'Company', hint: 'One spelling for each' },
  { key: 'year', label: 'Fiscal year', hint: 'As 2023 or FY2023' },
  { key: 'marketValue', label: 'Market value', hint: 'At the end of the year' },
  { key: 'capex', label: 'Capex', hint: 'Spent over the year' },
  { key: 'bookEquity', label: 'Book equity', hint: 'At the end of the year' },
] as const;

export type ColumnChoiceKey = (typeof columnChoices)[number]['key'];

/**
 * What the form starts from: what was said of the same header before, else the guess made from the file; and
 * currency and unit of the newest panel version, since a workspace rarely changes them.
 */
export function startingEntry(
  draft: ImportReply,
  remembered: ImportMapping | undefined,
  newest: PanelVersionSummary | undefined,
): MappingEntry {
  const known = draft.state === 'mapped' ? (remembered ?? draft.mapping) : draft.mapping;
  return {
    panelName: known.panelName ?? '',
    company: known.company ?? '',
    year: known.year ?? '',
    marketValue: known.marketValue ?? '',
    capex: known.capex ?? '',
    bookEquity: known.bookEquity ?? '',
    others: known.others ?? [],
    currency: known.currency ?? newest?.currency ?? '',
    unit: known.unit ?? newest?.unit ?? '',
  };
}

/** Headers that no choice took and whose first cells are numbers: they can come along. */
export function furtherColumns(
  { headers, firstRows }: Pick<ImportReply, 'headers' | 'firstRows'>,
  entry: Pick<MappingEntry, ColumnChoiceKey>,
): readonly string[] {
  const taken = new Set(columnChoices.map(({ key }) => entry[key]));
  return headers.filter((header, column) => {
    const cells = firstRows.map((row) => row.cells[column] ?? '').filter((cell) => cell !== '');
    return !taken.has(header) && cells.some(looksNumeric);
  });
}

/** The choices that name a column which an earlier one names too. */
export function doubleChoices(
  entry: Pick<MappingEntry, ColumnChoiceKey>,
): readonly ColumnChoiceKey[] {
  const keys = columnChoices.map(({ key }) => key);
  return keys.filter(
    (key, place) =>
      entry[key] !== '' && keys.slice(0, place).some((earlier) => entry[earlier] === entry[key]),
  );
}

/** What the name makes of the import: the next version of a panel, or a new one. */
export function versionWords(panelName: string, versions: readonly PanelVersionSummary[]): string {
  const name = panelName.trim();
  if (name === '') return 'A name that a panel has already makes its next version';
  const number = nextVersion(name, versions);
  return number === 1
    ? 'Becomes a new panel, version 1'
    : `Becomes version ${number}: a panel has this name already`;
}

export function nextVersion(panelName: string, versions: readonly PanelVersionSummary[]): number {
  const numbers = versions
    .filter((version) => version.panelName === panelName.trim())
    .map((version) => version.number);
  return Math.max(0, ...numbers) + 1;
}

/** Whether two sets of entries ask for the same panel. */
export function isSameEntry(left: MappingEntry, right: Partial<ImportMapping>): boolean {
  return (
    columnChoices.every(({ key }) => left[key] === right[key]) &&
    left.panelName.trim() === right.panelName &&
    left.currency === right.currency &&
    left.unit === right.unit &&
    [...left.others].sort().join('\n') === [...(right.others ?? [])].sort().join('\n')
  );
}

function looksNumeric(cell: string): boolean {
  return /^[(+\u2212-]?\s*[\d][\d\s.,'’]*\s*[%)]?$/u.test(cell.trim());
}
