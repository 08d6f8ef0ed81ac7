import type { ParamMap, Params } from '@angular/router';
import { type CandidateFilters, noFilters } from './candidate-filters';

/** Before the header of an attribute, so that no header is taken for another parameter. */
const prefix = 'with.';

/** The filters that the address names; what is no number is left out. */
export function filtersFrom(address: Pick<ParamMap, 'get' | 'getAll' | 'keys'>): CandidateFilters {
  return {
    name: address.get('name') ?? noFilters.name,
    attributes: Object.fromEntries(
      address.keys
        .filter((key) => key.startsWith(prefix))
        .map((key) => [key.slice(prefix.length), address.getAll(key)]),
    ),
    sizeFrom: numberFrom(address.get('from')),
    sizeTo: numberFrom(address.get('to')),
    years: numberFrom(address.get('years')),
  };
}

/** The address' parameters for the filters; null takes one of `before` out of it. */
export function paramsOf(filters: CandidateFilters, before: CandidateFilters): Params {
  const headers = new Set([...Object.keys(before.attributes), ...Object.keys(filters.attributes)]);
  return {
    name: filters.name === '' ? null : filters.name,
    from: filters.sizeFrom,
    to: filters.sizeTo,
    years: filters.years,
    ...Object.fromEntries(
      [...headers].map((header) => {
        const values = filters.attributes[header] ?? [];
        return [prefix + header, values.length === 0 ? null : values];
      }),
    ),
  };
}

function numberFrom(text: string | null): number | null {
  const value = text === null || text.trim() === '' ? NaN : Number(text);
  return Number.isFinite(value) ? value : null;
}
