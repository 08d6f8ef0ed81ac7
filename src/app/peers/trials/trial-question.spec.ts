import type { FitSummary } from '@contract';
import { flowControl } from '../testing/loaded-peers';
import { panelCompany } from '../testing/panel-company';
import { isSameGroup, specificationLike } from './trial-question';

const fit: FitSummary = {
  id: flowControl.id,
  hash: 'ab',
  state: 'done',
  peerGroupId: flowControl.id,
  panelVersionId: flowControl.id,
  ownCompany: 'A',
  regressors: ['outlay', 'equity', 'staff', 'stores'],
  effects: 'company,year',
  form: 'log',
  lag: 1,
  slopes: 'wild',
  confidence: 0.9,
  standing: null,
  rankSet: null,
  companies: 5,
  createdAt: flowControl.createdAt,
  createdBy: 'Ilvo Brenn',
};

describe('what a trial is asked for', () => {
  it('is the newest fit’s specification, less columns that the panel has no more', () => {
    const companies = [panelCompany('A', { measures: { others: { staff: 12 } } })];
    expect(specificationLike(fit, companies)).toEqual({
      effects: 'company,year',
      form: 'log',
      lag: 1,
      slopes: 'wild',
      confidence: 0.9,
      furtherRegressors: ['staff'],
    });
    expect(specificationLike(null, companies)).toEqual({});
  });

  it('is the same group whoever is named first', () => {
    const group = { panelVersionId: 'v', ownCompany: 'A', peers: ['B', 'C'], candidates: [] };
    expect(isSameGroup(group, { ...group, peers: ['C', 'B'], candidates: ['D'] })).toBeTrue();
    expect(isSameGroup(group, { ...group, peers: ['B'] })).toBeFalse();
    expect(isSameGroup(group, { ...group, peers: ['B', 'D'] })).toBeFalse();
    expect(isSameGroup(group, { ...group, ownCompany: 'E' })).toBeFalse();
    expect(isSameGroup(group, { ...group, panelVersionId: 'w' })).toBeFalse();
  });
});
