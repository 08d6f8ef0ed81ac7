import type { PanelCompany } from './peer-draft';

const measures = ['marketValue', 'capex', 'bookEquity'] as const;

/**
 * How far a company's size lies from another's: the mean of |ln(a/b)| over last market value, capex and book equity,
 * as far as both are positive. 0 for equal sizes, ln 2 for one twice as large; Infinity where nothing can be compared.
 */
export function sizeDistance(a: PanelCompany, b: PanelCompany): number {
  const ratios = measures.flatMap((measure) => {
    const [one, other] = [a[measure], b[measure]];
    return one !== null && other !== null && one > 0 && other > 0
      ? [Math.abs(Math.log(one / other))]
      : [];
  });
  if (ratios.length === 0) return Number.POSITIVE_INFINITY;
  return ratios.reduce((sum, ratio) => sum + ratio, 0) / ratios.length;
}

/** The companies, nearest to `own` in size first; by name where nothing tells them apart. */
export function nearestFirst(
  companies: readonly PanelCompany[],
  own: PanelCompany | undefined,
): readonly PanelCompany[] {
  const distance = new Map(
    companies.map((company) => [
      company.name,
      own === undefined ? Number.POSITIVE_INFINITY : sizeDistance(company, own),
    ]),
  );
  return [...companies].sort((a, b) => {
    const [first, second] = [distance.get(a.name) ?? 0, distance.get(b.name) ?? 0];
    return first === second ? a.name.localeCompare(b.name) : first - second;
  });
}
