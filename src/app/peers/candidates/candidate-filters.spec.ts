import { TestBed } from '@angular/core/testing';
import { Router, convertToParamMap } from '@angular/router';
import { panelCompany } from '../testing/panel-company';
import {
  type CandidateFilters,
  attributeFacets,
  isAskedFor,
  isNarrowed,
  noFilters,
} from './candidate-filters';
import { filtersFrom, paramsOf } from './filters-in-address';

const pumps = panelCompany('Kesdrin', {
  marketValue: 800,
  rows: 11,
  attributes: { Industry: 'Pumps', Country: 'NL' },
});
const valves = panelCompany('Sarvane', {
  marketValue: 2000,
  rows: 6,
  attributes: { Industry: 'Valves', Country: 'NL' },
});
const unknown = panelCompany('Tolvane', { rows: 3, attributes: { Country: 'DE' } });
const all = [pumps, valves, unknown];

function names(filters: Partial<CandidateFilters>): string[] {
  return all
    .filter((company) => isAskedFor(company, { ...noFilters, ...filters }))
    .map(({ name }) => name);
}

describe('the filters of candidates', () => {
  it('let all through where nothing is asked', () => {
    expect(names({})).toEqual(['Kesdrin', 'Sarvane', 'Tolvane']);
    expect(isNarrowed(noFilters)).toBeFalse();
  });

  it('go by name, attributes, size and years, all of them at once', () => {
    expect(names({ name: ' VANE' })).toEqual(['Sarvane', 'Tolvane']);
    expect(names({ attributes: { Industry: ['Pumps', 'Valves'], Country: ['NL'] } })).toEqual([
      'Kesdrin',
      'Sarvane',
    ]);
    expect(names({ attributes: { Industry: [] } })).toEqual(['Kesdrin', 'Sarvane', 'Tolvane']);
    expect(names({ sizeFrom: 800, sizeTo: 1999 })).toEqual(['Kesdrin']);
    expect(names({ years: 6 })).toEqual(['Kesdrin', 'Sarvane']);
    expect(names({ attributes: { Country: ['NL'] }, years: 7 })).toEqual(['Kesdrin']);
  });

  it('offer what is not known as a value of its own', () => {
    expect(names({ attributes: { Industry: [''] } })).toEqual(['Tolvane']);
    expect(attributeFacets(all)).toEqual([
      {
        header: 'Industry',
        values: [
          { value: '', count: 1 },
          { value: 'Pumps', count: 1 },
          { value: 'Valves', count: 1 },
        ],
      },
      {
        header: 'Country',
        values: [
          { value: 'NL', count: 2 },
          { value: 'DE', count: 1 },
        ],
      },
    ]);
  });

  it('come back from the address as they were written into it', () => {
    const filters: CandidateFilters = {
      name: 'vane',
      attributes: { Industry: ['Pumps', ''], from: ['NL'] },
      sizeFrom: 0.5,
      sizeTo: null,
      years: 6,
    };
    const address = TestBed.inject(Router).createUrlTree([], {
      queryParams: paramsOf(filters, noFilters),
    });
    expect(address.toString()).toContain('years=6');
    expect(filtersFrom(address.queryParamMap)).toEqual(filters);
  });

  it('leave the address where they are taken away, and ignore what is no number', () => {
    const before = { ...noFilters, attributes: { Industry: ['Pumps'] }, years: 3 };
    expect(paramsOf(noFilters, before)).toEqual({
      name: null,
      from: null,
      to: null,
      years: null,
      'with.Industry': null,
    });
    expect(filtersFrom(convertToParamMap({ years: 'many', from: '' }))).toEqual(noFilters);
  });
});
