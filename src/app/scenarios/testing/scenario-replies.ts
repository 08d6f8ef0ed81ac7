import type {
  DeskReply,
  FitReply,
  FitSummary,
  Plan,
  Role,
  ScenarioReply,
  SessionReply,
} from '@contract';
import { panelVersion } from '../../api/testing/panel-version';
import { heldAsked } from '../../ui/plan/asked-plan';
import { readPlan } from '../../ui/plan/read-plan';
import { tQuantile } from '../../ui/plan/t-quantile';
import { planBasis } from '../../ui/plan/testing/plan-basis';

const uuid = (last: number) => `00000000-0000-4000-8000-00000000000${last}`;
export const fitId = uuid(1);

const pumps = panelVersion({
  id: uuid(2),
  panelName: 'Pumps',
  number: 4,
  rows: 36,
  firstYear: 2014,
  lastYear: 2025,
});

const peerGroup: FitReply['peerGroup'] = {
  id: uuid(5),
  number: 2,
  panelVersionId: uuid(2),
  ownCompany: 'Velmara',
  peerCount: 2,
  note: '',
  createdAt: '2026-11-11T09:00:00.000Z',
  createdBy: 'M. Oduya',
};

const fit: FitSummary = {
  id: fitId,
  hash: '6f3a91bc52d0',
  state: 'done',
  peerGroupId: uuid(5),
  panelVersionId: uuid(2),
  ownCompany: 'Velmara',
  regressors: ['capex', 'book_equity'],
  effects: 'company',
  form: 'levels',
  lag: 0,
  slopes: 'cr2',
  confidence: 0.95,
  standing: null,
  rankSet: null,
  companies: 3,
  createdAt: '2026-11-12T09:00:00.000Z',
  createdBy: 'M. Oduya',
};

const noTest = { value: null, df1: 1, df2: 1, pValue: null };

/** A fit with nothing but what a plan is read through; figures made up. */
export const fitReply: FitReply = {
  fit,
  progress: null,
  failure: null,
  panelVersion: pumps,
  newerPanelVersion: null,
  peerGroup,
  result: {
    engine: '1.0.0',
    hash: '6f3a91bc52d0',
    specification: {
      effects: 'company',
      form: 'levels',
      lag: 0,
      slopes: 'cr2',
      confidence: 0.95,
      seed: null,
    },
    outcome: 'market_value',
    members: ['Velmara', 'Sarvane', 'Kesdrin'],
    sample: {
      companies: 3,
      years: 12,
      observations: 36,
      balanced: true,
      firstYear: 2014,
      lastYear: 2025,
      dropped: [],
      singleRow: [],
    },
    slopes: [],
    slopeCovariance: [],
    intercepts: [],
    yearEffects: null,
    smearing: null,
    standing: null,
    pairs: null,
    gapPath: null,
    drift: null,
    goodness: {
      withinRSquared: 0.6,
      rSquared: 0.9,
      adjustedRSquared: 0.9,
      residualStandardError: 40,
      f: noTest,
      fSlopes: noTest,
    },
    pooled: { constant: 0, slopes: {}, rSquared: 0.5, f: noTest },
    poolability: noTest,
    withoutCompany: [],
    ownYears: [{ ...planBasis.last, regressors: [...planBasis.last.regressors] }],
    prediction: structuredClone(planBasis) as NonNullable<FitReply['result']>['prediction'],
    warnings: [],
  },
};

export const deskReply: DeskReply = { panelVersion: pumps, peerGroup, fit, editionsWaiting: 0 };

export function sessionOf(role: Role): SessionReply {
  return {
    session: {
      person: { id: uuid(8), name: 'M. Oduya', email: 'm.oduya@velmara.example' },
      workspace: { id: uuid(7), name: 'Velmara Finance' },
      roles: [role],
      preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
    },
  };
}

const held = heldAsked(planBasis, 1);

/** How a plan of one year is read for which nothing was chosen. */
export const heldReading: Pick<ScenarioReply, 'outlook' | 'rules' | 'uncertainty'> = {
  outlook: held.outlook,
  rules: [...held.rules],
  uncertainty: held.uncertainty,
};

/** The figures of a plan as the server stores them. */
export function storedYears(
  plan: Plan,
  outlook: ScenarioReply['outlook'] = held.outlook,
): ScenarioReply['years'] {
  return readPlan(planBasis, plan, tQuantile, outlook).years.map(
    ({ year, expected, difference, familiar, band }) => ({
      year,
      expected: { ...expected },
      difference: { ...difference },
      familiar: familiar.kind,
      band: { ...band },
    }),
  );
}
