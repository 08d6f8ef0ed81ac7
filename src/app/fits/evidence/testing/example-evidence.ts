import type {
  Alternative,
  CovarianceSummary,
  Evidence,
  FitResult,
  IntervalEstimate,
  ResidualPoint,
  TestResult,
} from '@contract';
import { exampleResult } from '../../testing/example-fit';

/** An estimate without what its fit says beside it. */
function plain<T extends IntervalEstimate>({ estimate, standardError, low, high }: T) {
  return { estimate, standardError, low, high };
}

const [capex, equity] = exampleResult.slopes.map((slope) => ({
  name: slope.name,
  ...plain(slope),
}));
const standing = exampleResult.standing === null ? null : plain(exampleResult.standing);

/** The example fit with what it would be without each of its companies. */
export const judgedResult: FitResult = {
  ...exampleResult,
  withoutCompany: [
    { company: 'Kesdrin', slopes: [2.1, -0.4], standing: 1501 },
    { company: 'Sarvane', slopes: [1.1, -0.45], standing: 2121 },
    { company: 'Velmara', slopes: [1.9, -0.5], standing: null, reason: 'It is the own company.' },
  ],
};

function covariance(
  code: CovarianceSummary['code'],
  half: readonly [number, number] | null,
): CovarianceSummary {
  const interval = (slope: typeof capex, width: number) => ({
    name: slope.name,
    standardError: width / 2,
    degreesOfFreedom: code === 'cr2' ? 2.07 : 27,
    pValue: 0.03,
    low: slope.estimate - width,
    high: slope.estimate + width,
  });
  return {
    code,
    definition: `Definition of ${code}.`,
    source: `Source of ${code}.`,
    isChosen: code === 'cr2',
    isDefault: code === 'cr2',
    slopes: half === null ? null : [interval(capex, half[0]), interval(equity, half[1])],
    ...(half === null
      ? { reason: 'Not run yet: with 13 companies it takes 9,999 random draws.' }
      : {}),
    notes: code === 'two-way' ? ['One eigenvalue was negative.'] : [],
  };
}

function alternative(code: Alternative['code'], own: Partial<Alternative>): Alternative {
  return {
    code,
    isThisFit: false,
    effects: 'company',
    form: 'levels',
    lag: 0,
    observations: 32,
    slopes: [capex, equity],
    standing: null,
    standingUnit: 'level',
    rankSet: null,
    ...own,
  };
}

function test(code: string, own: Partial<TestResult>): TestResult {
  return {
    code,
    name: `Test ${code}`,
    definition: `Definition of ${code}.`,
    source: `Source of ${code}.`,
    statistic: 115.9,
    distribution: 'F',
    degreesOfFreedom: [2, 28],
    pValue: 0.0000002,
    holm: 'rejects',
    reading: `Reading of ${code}.`,
    ...own,
  };
}

function residual(company: string, year: number, own: Partial<ResidualPoint>): ResidualPoint {
  return {
    company,
    year,
    fileRow: 5,
    regressors: [120, 800],
    actual: 3000,
    fitted: 2400,
    residual: 600,
    leverage: 0.2,
    studentised: 3.4,
    cook: 0.5,
    ...own,
  };
}

const points: readonly ResidualPoint[] = [
  residual('Velmara', 2014, {}),
  residual('Sarvane', 2012, {
    fileRow: 0,
    actual: 900,
    fitted: 1100,
    residual: -200,
    studentised: -1,
  }),
];

/** Evidence beside the example fit, figures made up but of one piece: nothing turns its lead round. */
export const exampleEvidence: Evidence = {
  engine: exampleResult.engine,
  hash: exampleResult.hash,
  verdict: {
    grade: 'carries-with-care',
    sentence:
      'This fit can carry the statement that Velmara lies above its peers’ mean, with care: two points speak against it.',
    against: [
      { code: 'few-companies', weight: 'serious', detail: 'Only 3 companies.' },
      { code: 'persistent-errors', weight: 'notable', detail: 'Errors persist by 0.4.' },
    ],
  },
  lines: ['capex', 'equity'].map((regressor) => ({
    regressor,
    companies: [
      { company: 'Velmara', from: [100, 3100], to: [200, 3300] },
      { company: 'Sarvane', from: [50, 1500], to: [150, 1700] },
      { company: 'Kesdrin', from: [20, 850], to: [90, 1000] },
    ],
    of: 3,
    pooled: { from: [20, 900], to: [200, 2600] },
  })),
  withoutYear: [
    { year: 2010, slopes: [2, -0.5], standing: 1700 },
    { year: 2011, slopes: [2.2, -0.6], standing: 1950 },
    { year: 2012, slopes: null, standing: null, reason: 'One company would be left.' },
  ],
  estimators: [
    {
      code: 'fixed-effects',
      slopes: [capex, equity],
      constant: null,
      observations: 32,
      degreesOfFreedom: 27,
    },
    {
      code: 'pooled',
      slopes: [
        { name: 'capex', estimate: 2, standardError: 0.5, low: 1, high: 3 },
        { name: 'equity', estimate: 1, standardError: 0.1, low: 0.8, high: 1.2 },
      ],
      constant: 100,
      observations: 32,
      degreesOfFreedom: 29,
    },
    {
      code: 'first-differences',
      slopes: [
        { name: 'capex', estimate: 1.6, standardError: 0.3, low: 1, high: 2.2 },
        { name: 'equity', estimate: 0.1, standardError: 0.2, low: -0.3, high: 0.5 },
      ],
      constant: null,
      observations: 29,
      degreesOfFreedom: 27,
    },
  ],
  covariances: [
    covariance('cr2', [0.81, 0.692]),
    covariance('wild', null),
    covariance('classical', [0.4, 0.3]),
    covariance('two-way', [2.4, 0.9]),
  ],
  alternatives: [
    alternative('pooled', { effects: null, standingReason: 'One constant places none.' }),
    alternative('fixed-effects', {
      isThisFit: true,
      standing,
      rankSet: [1, 2],
    }),
    alternative('year-effects', {
      effects: 'company,year',
      standing: { estimate: 1500, standardError: 300, low: -100, high: 3100 },
      rankSet: [1, 3],
    }),
    alternative('log-form', {
      form: 'log',
      slopes: [{ ...capex, estimate: 0.4, low: 0.2, high: 0.6 }],
      standing: { estimate: 34.5, standardError: null, low: 12.1, high: 58.9 },
      standingUnit: 'percent',
    }),
    alternative('lag', {
      lag: 1,
      observations: null,
      slopes: null,
      reason: 'Too few rows have a year before them.',
    }),
  ],
  tests: {
    lookedAt: 3,
    inHolm: 1,
    level: 0.05,
    list: [
      test('poolability', {}),
      test('pesaran-cd', {
        statistic: -1.2,
        distribution: 'normal',
        degreesOfFreedom: [],
        pValue: 0.23,
        holm: 'shown-only',
        caution: 'Assumes many companies.',
      }),
      test('hausman', {
        statistic: null,
        distribution: null,
        degreesOfFreedom: [],
        pValue: null,
        holm: 'none',
        reason: 'There are too few companies.',
      }),
    ],
  },
  residuals: {
    byCompany: [
      { label: 'Velmara', count: 11, standardDeviation: 300, largest: 600 },
      { label: 'Sarvane', count: 11, standardDeviation: 120, largest: -200 },
    ],
    byYear: [
      { label: '2012', count: 3, standardDeviation: 100, largest: -200, mean: -20 },
      { label: '2014', count: 3, standardDeviation: 310, largest: 600, mean: 40 },
    ],
    points: [...points],
    of: 32,
    largest: [...points],
    varianceInflation: [
      { name: 'capex', value: 1.3 },
      { name: 'equity', value: 1.3 },
    ],
  },
};
