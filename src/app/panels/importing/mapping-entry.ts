import {
  type Conversion,
  type CurrencyRate,
  type ImportMapping,
  type ImportReply,
  type PanelVersionSummary,
  type Unit,
  noConversion,
  noMending,
} from '@contract';

/** A rate as it is being typed. */
export type RateEntry = Readonly<Record<keyof CurrencyRate, string>>;

/** A year's price index as it is being typed. */
export interface IndexEntry {
  readonly year: string;
  readonly value: string;
}

/** The entries of the page before they are a mapping: a choice not made yet is '', and numbers are as typed. */
export interface MappingEntry extends Omit<ImportMapping, 'unit' | 'reading' | 'conversion'> {
  readonly unit: Unit | '';
  readonly columns: Conversion['columns'];
  /** '' where all figures are in the panel's currency. */
  readonly currencyColumn: string;
  readonly rates: readonly RateEntry[];
  readonly isReal: boolean;
  readonly baseYear: string;
  readonly index: readonly IndexEntry[];
  readonly fiscalYears: Conversion['fiscalYears'];
}

export const columnChoices = [
  { key: 'company', label: 'Company', hint: 'One spelling for each' },
  { key: 'year', label: 'Fiscal year', hint: 'As 2023, FY2023, 2022/23 or a date' },
  { key: 'marketValue', label: 'Market value', hint: 'At the end of the year' },
  { key: 'capex', label: 'Capex', hint: 'Spent over the year' },
  { key: 'bookEquity', label: 'Book equity', hint: 'At the end of the year' },
] as const;

export type ColumnChoiceKey = (typeof columnChoices)[number]['key'];

/**
 * What the page starts from: what was said of the same header before, else the guess made from the file; and currency
 * and unit of the newest panel version, since a workspace rarely changes them.
 *
 * @param before  entries of the same import while it was read another way: its name, currency and unit stay.
 */
export function startingEntry(
  draft: ImportReply,
  remembered: ImportMapping | undefined,
  newest: PanelVersionSummary | undefined,
  before?: Pick<MappingEntry, 'panelName' | 'currency' | 'unit'>,
): MappingEntry {
  const isOpen = draft.check === null;
  const known: Partial<ImportMapping> = isOpen
    ? { ...(remembered ?? draft.mapping), mending: noMending }
    : draft.mapping;
  const conversion = known.conversion ?? noConversion;
  const { prices } = conversion;
  return {
    panelName: firstGiven(before?.panelName, known.panelName),
    company: known.company ?? '',
    year: known.year ?? '',
    marketValue: known.marketValue ?? '',
    capex: known.capex ?? '',
    bookEquity: known.bookEquity ?? '',
    others: known.others ?? [],
    attributes: known.attributes ?? [],
    currency: firstGiven(before?.currency, known.currency, newest?.currency),
    unit: firstGiven(before?.unit, known.unit, newest?.unit),
    columns: conversion.columns,
    currencyColumn: conversion.currencies?.column ?? '',
    rates: (conversion.currencies?.rates ?? []).map(toRateEntry),
    isReal: prices !== null,
    baseYear: prices === null ? '' : String(prices.baseYear),
    index: (prices?.index ?? []).map(({ year, value }) => ({
      year: String(year),
      value: String(value),
    })),
    fiscalYears: conversion.fiscalYears,
    mending: known.mending ?? noMending,
  };
}

/** Headers that none of the five choices took. */
export function freeColumns(
  headers: readonly string[],
  entry: Pick<MappingEntry, ColumnChoiceKey>,
): readonly string[] {
  const taken = new Set<string>(columnChoices.map(({ key }) => entry[key]));
  return headers.filter((header) => !taken.has(header));
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

function firstGiven<T extends string>(...texts: readonly (T | '' | undefined)[]): T | '' {
  return texts.find((text) => text !== undefined && text !== '') ?? '';
}

function toRateEntry({ currency, year, average, yearEnd }: CurrencyRate): RateEntry {
  return {
    currency,
    year: String(year),
    average: average === null ? '' : String(average),
    yearEnd: yearEnd === null ? '' : String(yearEnd),
  };
}
