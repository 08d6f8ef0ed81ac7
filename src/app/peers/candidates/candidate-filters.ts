import type { PanelCompany } from '../peer-draft';

/** Which candidates are shown; empty and null let all through. */
export interface CandidateFilters {
  /** Part of the name. */
  readonly name: string;
  /** By header of the attribute: the values that are let through; none lets all. */
  readonly attributes: Readonly<Record<string, readonly string[]>>;
  /** Bounds of the last market value, in the panel's unit. */
  readonly sizeFrom: number | null;
  readonly sizeTo: number | null;
  /** Fewest years covered. */
  readonly years: number | null;
}

export const noFilters: CandidateFilters = {
  name: '',
  attributes: {},
  sizeFrom: null,
  sizeTo: null,
  years: null,
};

/** An attribute of the panel with its values. */
export interface AttributeFacet {
  readonly header: string;
  /** The most frequent first, with how many candidates have it. */
  readonly values: readonly { readonly value: string; readonly count: number }[];
}

/** Stands for a company of which the attribute is not known. */
export const unknownValue = '';

export function hasName({ name }: PanelCompany, part: string): boolean {
  return name.toLowerCase().includes(part.trim().toLowerCase());
}

/** Whether the company is among those asked for; one without a market value is within no range of sizes. */
export function isAskedFor(company: PanelCompany, filters: CandidateFilters): boolean {
  const { sizeFrom, sizeTo, years } = filters;
  const size = company.marketValue;
  return (
    hasName(company, filters.name) &&
    (sizeFrom === null || (size !== null && size >= sizeFrom)) &&
    (sizeTo === null || (size !== null && size <= sizeTo)) &&
    (years === null || company.rows >= years) &&
    Object.entries(filters.attributes).every(
      ([header, values]) => values.length === 0 || values.includes(attributeOf(company, header)),
    )
  );
}

/** The attributes of the companies given, in the order of first appearance. */
export function attributeFacets(companies: readonly PanelCompany[]): readonly AttributeFacet[] {
  const headers = new Set(companies.flatMap(({ attributes }) => Object.keys(attributes)));
  return [...headers].map((header) => {
    const counts = new Map<string, number>();
    for (const company of companies) {
      const value = attributeOf(company, header);
      counts.set(value, (counts.get(value) ?? 0) + 1);
    }
    const values = [...counts]
      .map(([value, count]) => ({ value, count }))
      .sort((a, b) => b.count - a.count || a.value.localeCompare(b.value, 'en'));
    return { header, values };
  });
}

function attributeOf({ attributes }: PanelCompany, header: string): string {
  return attributes[header] ?? unknownValue;
}

/** Whether anything but the name narrows the candidates. */
export function isNarrowed({ attributes, sizeFrom, sizeTo, years }: CandidateFilters): boolean {
  const hasValues = Object.values(attributes).some((values) => values.length > 0);
  return hasValues || sizeFrom !== null || sizeTo !== null || years !== null;
}
