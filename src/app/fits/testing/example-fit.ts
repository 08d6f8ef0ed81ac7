import type { DeskReply, FitReply, FitResult } from '@contract';
import { exampleId, panelVersion } from '../../api/testing/panel-version';

const test = { value: 115.9, df1: 2, df2: 28, pValue: 0.0000002 };

/** A fit of three invented companies, figures made up but of one piece: the own company leads by 1,811. */
export const exampleResult: FitResult = {
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
    years: 11,
    observations: 32,
    balanced: false,
    firstYear: 2010,
    lastYear: 2020,
    dropped: [{ company: 'Kesdrin', year: 2016, row: 17, column: 'capex', reason: 'missing' }],
    singleRow: [],
  },
  slopes: [
    {
      name: 'capex',
      estimate: 2.005,
      standardError: 0.34,
      low: 1.195,
      high: 2.815,
      statistic: 5.9,
      degreesOfFreedom: 6.7,
      pValue: 0.0006,
    },
    {
      name: 'equity',
      estimate: -0.508,
      standardError: 0.4,
      low: -1.2,
      high: 0.184,
      statistic: -1.27,
      degreesOfFreedom: 2.07,
      pValue: 0.31,
    },
  ],
  slopeCovariance: [
    [0.1156, 0],
    [0, 0.16],
  ],
  intercepts: [
    {
      company: 'Kesdrin',
      estimate: 818,
      standardError: 200,
      low: 215,
      high: 1421,
      deviation: -604,
      rows: 10,
    },
    {
      company: 'Velmara',
      estimate: 2939,
      standardError: 300,
      low: 2017,
      high: 3861,
      deviation: 1207,
      rows: 11,
    },
    {
      company: 'Sarvane',
      estimate: 1438,
      standardError: 140,
      low: 993,
      high: 1883,
      deviation: -603,
      rows: 11,
    },
  ],
  yearEffects: null,
  smearing: null,
  standing: {
    company: 'Velmara',
    estimate: 1811,
    standardError: 200,
    low: 1172,
    high: 2450,
    calibration: 1.2,
    cosines: 3,
    persistence: 0.4,
    ownPersistence: 0.5,
    rank: 1,
    rankSet: [1, 2],
  },
  pairs: [
    { company: 'Kesdrin', estimate: 2121, standardError: 200, low: 1616, high: 2627, shown: -1 },
    { company: 'Sarvane', estimate: 1501, standardError: 400, low: -4, high: 3006, shown: 0 },
  ],
  gapPath: [
    { year: 2010, gap: 2100, peers: 2 },
    { year: 2011, gap: 1500, peers: 1 },
  ],
  drift: { estimate: 0.4893, standardError: 20, low: -62.4, high: 63.4, pValue: 0.98 },
  goodness: {
    withinRSquared: 0.6952,
    rSquared: 0.9626,
    adjustedRSquared: 0.9603,
    residualStandardError: 325.2,
    f: { ...test, value: 443.7 },
    fSlopes: { ...test, value: 238.4 },
  },
  pooled: { constant: 100, slopes: { capex: 2, equity: 1 }, rSquared: 0.753, f: test },
  poolability: test,
  withoutCompany: [],
  ownYears: null,
  prediction: null,
  warnings: [],
};

/** The same companies in logs, with year effects and the year before: all differences are of logs. */
export const exampleLogResult: FitResult = {
  ...exampleResult,
  specification: {
    ...exampleResult.specification,
    effects: 'company,year',
    form: 'log',
    lag: 1,
    slopes: 'wild',
    seed: 1,
  },
  slopes: [
    {
      name: 'capex',
      estimate: 0.42,
      standardError: 0.14,
      low: 0.1,
      high: 0.7,
      statistic: 3,
      degreesOfFreedom: null,
      pValue: 0.012,
    },
    {
      name: 'equity',
      estimate: 0.3,
      standardError: 0.2,
      low: 0.05,
      high: null,
      unbounded: 'high',
      statistic: 1.5,
      degreesOfFreedom: null,
      pValue: 0.04,
    },
  ],
  slopeCovariance: null,
  slopeCovarianceReason: 'The bootstrap has no covariance.',
  intercepts: exampleResult.intercepts.map((row, index) => ({
    ...row,
    estimate: 1 + index / 10,
    low: 0.5,
    high: 1.5,
  })),
  yearEffects: [
    { year: 2010, estimate: -0.1 },
    { year: 2011, estimate: 0.1 },
  ],
  smearing: { factor: 1.02, own: 1.03 },
  standing: exampleResult.standing && {
    ...exampleResult.standing,
    estimate: 0.294,
    low: 0.113,
    high: 0.472,
    percent: { estimate: 0.3418, low: 0.1196, high: 0.6032 },
  },
  pairs: [
    { company: 'Kesdrin', estimate: 0.5, standardError: 0.1, low: 0.2, high: 0.8, shown: -1 },
    { company: 'Sarvane', estimate: 0.1, standardError: 0.1, low: -0.2, high: 0.4, shown: 0 },
  ],
  gapPath: [
    { year: 2010, gap: 0.4, peers: 2 },
    { year: 2011, gap: 0.2, peers: 1 },
  ],
  drift: { estimate: 0.02, standardError: 0.005, low: 0.005, high: 0.035, pValue: 0.02 },
  goodness: { ...exampleResult.goodness, residualStandardError: 0.21 },
  withoutCompany: [{ company: 'Kesdrin', slopes: [0.4, 0.3], standing: 0.1 }],
};

export const examplePanelVersion = panelVersion({ panelId: exampleId(0) });

export const exampleFit: FitReply = {
  fit: {
    id: '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0014',
    hash: exampleResult.hash,
    state: 'done',
    peerGroupId: '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0013',
    panelVersionId: examplePanelVersion.id,
    ownCompany: 'Velmara',
    regressors: ['capex', 'equity'],
    effects: 'company',
    form: 'levels',
    lag: 0,
    slopes: 'cr2',
    confidence: 0.95,
    standing: exampleResult.standing,
    rankSet: [1, 2],
    companies: 3,
    createdAt: '2026-03-05T12:00:00.000Z',
    createdBy: 'Ilvo Brenn',
  },
  progress: null,
  failure: null,
  result: exampleResult,
  panelVersion: examplePanelVersion,
  newerPanelVersion: null,
  peerGroup: {
    id: '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0013',
    number: 2,
    panelVersionId: examplePanelVersion.id,
    ownCompany: 'Velmara',
    peerCount: 2,
    note: '',
    createdAt: '2026-03-04T13:00:00.000Z',
    createdBy: 'Ilvo Brenn',
  },
};

/** A desk on which the example fit is the newest of everything. */
export const exampleDesk: DeskReply = {
  panelVersion: examplePanelVersion,
  peerGroup: exampleFit.peerGroup,
  fit: exampleFit.fit,
  editionsWaiting: 0,
};

export const exampleLogFit: FitReply = {
  ...exampleFit,
  fit: {
    ...exampleFit.fit,
    hash: 'a41b7c09d3e2',
    effects: 'company,year',
    form: 'log',
    lag: 1,
    slopes: 'wild',
    standing: exampleLogResult.standing,
  },
  result: { ...exampleLogResult, hash: 'a41b7c09d3e2' },
};
