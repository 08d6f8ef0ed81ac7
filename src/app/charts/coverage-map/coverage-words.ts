import type { CoverageEntry, CoverageSpan, CoverageTable } from '@figures';

/** `no capex, flagged: market value`: what a company has in a year. */
export function entryWords({ state, missing, flagged }: CoverageEntry): string {
  const words = state === 'some' ? `no ${missing.join(', no ')}` : state;
  return flagged.length === 0 ? words : `${words}, flagged: ${flagged.join(', ')}`;
}

export function summaryWords(
  { companies, years, counts }: CoverageTable,
  variable: string | null,
): string {
  const { complete, some, none, flagged } = counts;
  return [
    `${companies.length} companies in ${years.length} years.`,
    `${variable ?? 'all values'}: complete in ${complete} company years, partly missing in ${some}, none in ${none}.`,
    ...(flagged === 0 ? [] : [`Flagged in ${flagged}.`]),
  ].join(' ');
}

/** What a picture and a table of a large panel hold; empty where both hold every company. */
export function partWords(companies: number, drawn: CoverageSpan, told: CoverageSpan): string {
  if (drawn.end - drawn.first === companies) return '';
  return `Of ${companies.toLocaleString('en')} companies, a picture holds ${spanWords(drawn)}, a table ${spanWords(told)}.`;
}

function spanWords({ first, end }: CoverageSpan): string {
  return `${(first + 1).toLocaleString('en')} to ${end.toLocaleString('en')}`;
}
