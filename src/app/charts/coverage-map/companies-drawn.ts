import type { CoverageSpan } from '@figures';

/** So many companies are drawn, and told in a table, all at once. */
const mostAtOnce = 200;
/** More than the map's box is high: those in view lie within two such parts. */
const part = 30;

/** The companies that are drawn: all, or of a large panel those in view and the ones that scrolling brings next. */
export function companiesDrawn(companies: number, firstInView: number): CoverageSpan {
  if (companies <= mostAtOnce) return { first: 0, end: companies };
  const parts = Math.floor(Math.max(0, Math.min(firstInView, companies - 1)) / part);
  return {
    first: Math.max(0, (parts - 1) * part),
    end: Math.min(companies, (parts + 2) * part),
  };
}

/** The companies that the table tells: all, or of a large panel as many as can be read from the first drawn one on. */
export function companiesTold(companies: number, drawn: CoverageSpan): CoverageSpan {
  const first = Math.max(0, Math.min(drawn.first, companies - mostAtOnce));
  return { first, end: Math.min(companies, first + mostAtOnce) };
}
