import { exampleFit, exampleResult } from '../testing/example-fit';
import { companyAddress } from './company-address';

describe('where a selected company leads', () => {
  const { panelVersion, peerGroup, fit } = exampleFit;

  it('leads from a peer to its reason in the peer group of the fit', () => {
    expect(companyAddress(exampleFit, exampleResult, 'Sarvane')).toEqual([
      ['/peers', peerGroup.id],
      { queryParams: { company: 'Sarvane' } },
    ]);
  });

  it('leads from the own company to its newest row of the panel', () => {
    const ownYears = [
      { year: 2013, fileRow: 4 },
      { year: 2014, fileRow: 4 },
    ].map((place) => ({ ...place, actual: 1, fitted: 1, residual: 0, regressors: [1, 1] }));
    expect(companyAddress(exampleFit, { ...exampleResult, ownYears }, fit.ownCompany)).toEqual([
      ['/panel', panelVersion.id],
      { queryParams: { company: fit.ownCompany, year: 2014 } },
    ]);
  });

  it('leads to the peer group where no row of the own company is known', () => {
    const result = { ...exampleResult, ownYears: null };
    const [commands] = companyAddress(exampleFit, result, fit.ownCompany);
    expect(commands).toEqual(['/peers', peerGroup.id]);
  });
});
