import type { EditionContent, EditionReply, EditionSummary, Sentence } from '@contract';
import { logBasis, planBasis } from '../../ui/plan/testing/plan-basis';

const interval = (estimate: number, low: number, high: number) => ({
  estimate,
  standardError: (high - low) / 4,
  low,
  high,
});
const test = (value: number, pValue: number) => ({ value, df1: 2, df2: 31, pValue });
const uuid = (last: number) => `00000000-0000-4000-8000-00000000000${last}`;

type Figure = Extract<Sentence[number], { kind: unknown }>;

/** `1,800 (1,170 to 2,430)`, each number tied to the figure. */
function estimate(
  figure: string,
  kind: Figure['kind'],
  [value, low, high]: readonly [number, number, number],
  digits: number,
  isSize = false,
): Sentence {
  const part = (number: number): Figure => ({ figure, kind, value: number, digits, isSize });
  return [part(value), { text: ' (' }, part(low), { text: ' to ' }, part(high), { text: ')' }];
}

const count = (value: number): Figure => ({
  figure: null,
  kind: 'count',
  value,
  digits: 0,
  isSize: false,
});

/** An edition of three companies, all figures made up. */
export const editionContent: EditionContent = {
  schema: 2,
  number: 7,
  workspaceName: 'Velmara Finance',
  ownCompany: 'Velmara',
  publishedBy: 'M. Oduya',
  publishedAt: '2026-11-14T09:00:00.000Z',
  confidentiality: 'confidential',
  comment: 'For the November meeting.',
  fitId: uuid(1),
  fitCreatedAt: '2026-11-12T09:00:00.000Z',
  fitCreatedBy: 'M. Oduya',
  panelVersion: {
    id: uuid(2),
    panelId: uuid(3),
    panelName: 'Pumps',
    number: 4,
    currency: 'EUR',
    unit: 'millions',
    note: '',
    companies: 3,
    rows: 36,
    firstYear: 2014,
    lastYear: 2025,
    createdAt: '2026-11-10T09:00:00.000Z',
    createdBy: 'M. Oduya',
    file: { id: uuid(4), name: 'pumps.csv', byteSize: 1200, sha256: 'f'.repeat(64) },
  },
  regressorRoles: ['capex', 'bookEquity'],
  peerGroup: {
    id: uuid(5),
    number: 2,
    panelVersionId: uuid(2),
    ownCompany: 'Velmara',
    peerCount: 2,
    note: '',
    createdAt: '2026-11-11T09:00:00.000Z',
    createdBy: 'M. Oduya',
    peers: [
      { company: 'Zethorin', isIncluded: false, reason: 'Concessions at revalued amounts.' },
      { company: 'Sarvane', isIncluded: true, reason: 'Same end markets.' },
      { company: 'Kesdrin', isIncluded: true, reason: 'Same products.' },
    ],
  },
  fit: {
    engine: '1.0.0',
    hash: '6f3a91'.padEnd(64, '0'),
    specification: {
      effects: 'company',
      form: 'levels',
      lag: 0,
      slopes: 'cr2',
      confidence: 0.95,
      seed: null,
    },
    outcome: 'market_value',
    members: ['Kesdrin', 'Sarvane', 'Velmara'],
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
    slopes: [
      {
        name: 'capex',
        ...interval(2, 1.2, 2.8),
        statistic: 5,
        degreesOfFreedom: 8,
        pValue: 0.001,
      },
      {
        name: 'book_equity',
        ...interval(-0.5, -0.8, -0.2),
        statistic: -4,
        degreesOfFreedom: 7,
        pValue: 0.004,
      },
    ],
    slopeCovariance: (planBasis.slopeCovariance ?? []).map((row) => [...row]),
    intercepts: [
      { company: 'Kesdrin', ...interval(900, 700, 1100), deviation: -900, rows: 12 },
      { company: 'Sarvane', ...interval(1500, 1300, 1700), deviation: -300, rows: 12 },
      { company: 'Velmara', ...interval(3000, 2600, 3400), deviation: 1200, rows: 12 },
    ],
    yearEffects: null,
    smearing: null,
    standing: {
      company: 'Velmara',
      ...interval(1800, 1170, 2430),
      calibration: 1.2,
      cosines: 3,
      persistence: 0.4,
      ownPersistence: 0.3,
      rank: 1,
      rankSet: [1, 2],
    },
    pairs: [
      { company: 'Kesdrin', ...interval(2100, 1500, 2700), shown: -1 },
      { company: 'Sarvane', ...interval(1500, -100, 3100), shown: 0 },
    ],
    gapPath: [{ year: 2025, gap: 1850, peers: 2 }],
    drift: { ...interval(10, -20, 40), pValue: 0.4 },
    goodness: {
      withinRSquared: 0.6,
      rSquared: 0.96,
      adjustedRSquared: 0.95,
      residualStandardError: 40,
      f: test(200, 1e-9),
      fSlopes: test(30, 1e-6),
    },
    pooled: {
      constant: 100,
      slopes: { capex: 3, book_equity: 0.2 },
      rSquared: 0.7,
      f: test(30, 1e-6),
    },
    poolability: test(115.9, 1e-7),
    withoutCompany: [
      { company: 'Kesdrin', slopes: [2.1, -0.5], standing: 1670 },
      { company: 'Sarvane', slopes: [1.9, -0.4], standing: 2120 },
    ],
    ownYears: [
      {
        year: 2024,
        fileRow: 12,
        actual: 2690,
        fitted: 2700,
        residual: -10,
        regressors: [105, 1010],
      },
      { ...planBasis.last, regressors: [...planBasis.last.regressors] },
    ],
    prediction: structuredClone(planBasis) as EditionContent['fit']['prediction'],
    warnings: [],
  },
  scenarios: [
    {
      id: uuid(6),
      name: 'Build-out',
      note: 'New hall in 2027.',
      version: 2,
      plan: [
        { year: 2026, values: [120, 1000] },
        { year: 2027, values: [190, 1000] },
      ],
      years: [
        {
          year: 2026,
          expected: interval(2740, 2600, 2880),
          difference: interval(20, 12, 28),
          familiar: 'inside',
        },
        {
          year: 2027,
          expected: interval(2880, 2700, 3060),
          difference: interval(160, 96, 224),
          familiar: 'edge',
        },
      ],
    },
  ],
  peerGroupsTried: 3,
  cautions: ['Associations, not causes.'],
  unit: 'millions',
  headline: [
    { text: 'The market values ' },
    { own: 'Velmara' },
    { text: ' ' },
    ...estimate('standing', 'money', [1800, 1170, 2430], 0, true),
    { text: ' ' },
    { unit: true },
    { text: ' above what capex and book equity alone would suggest against its peers' },
  ],
  isHeadlineEdited: false,
  evidence: [
    {
      kind: 'fine',
      sentence: [{ text: 'Company levels differ, so company effects are kept.' }],
      figure: 'poolability',
    },
    {
      kind: 'caution',
      sentence: [count(3), { text: ' peer group versions were saved up to this edition.' }],
      figure: null,
    },
  ],
  slopesInWords: [
    {
      kind: 'fine',
      sentence: [
        { text: 'Each extra 1 of capex goes with ' },
        ...estimate('slope.0', 'plain', [2, 1.2, 2.8], 2),
        { text: ' of market value.' },
      ],
      figure: 'slope.0',
    },
  ],
  warnings: [
    {
      id: 'few-companies',
      code: 'few-companies',
      isSerious: true,
      title: 'Few companies',
      sentence: [{ text: 'The peer group has ' }, count(3), { text: ' companies with figures.' }],
    },
    {
      id: 'sign-change',
      code: 'sign-change',
      isSerious: true,
      title: 'A sign that hangs on one company',
      sentence: [{ text: 'The sign changes without Sarvane.' }],
    },
    {
      id: 'fit.unbalanced.0',
      code: 'fit',
      isSerious: false,
      title: 'From the fit',
      sentence: [{ text: 'Two rows were dropped.' }],
    },
  ],
  changes: {
    since: { id: uuid(8), number: 6, signedAt: '2026-10-15T09:00:00.000Z' },
    figures: [
      {
        label: 'standing',
        figure: 'standing',
        kind: 'money',
        before: interval(1500, 900, 2100),
        after: interval(1800, 1170, 2430),
        beforeText: null,
        afterText: null,
      },
      {
        label: 'rank set',
        figure: 'rank-set',
        kind: 'text',
        before: null,
        after: null,
        beforeText: 'place 1 to 3 of 3',
        afterText: 'place 1 to 2 of 3',
      },
    ],
    peersAdded: ['Kesdrin'],
    peersRemoved: ['Zethorin'],
    panelCells: {
      addedRows: 0,
      removedRows: 0,
      changedCells: 1,
      listed: [],
    },
    specification: [{ what: 'years', before: 'FY2014–FY2024', after: 'FY2014–FY2025' }],
  },
  answers: null,
};

export const editionSummary: EditionSummary = {
  id: uuid(7),
  number: 7,
  state: 'waiting',
  publishedBy: 'M. Oduya',
  publishedAt: '2026-11-14T09:00:00.000Z',
  sha256: 'b81d20'.padEnd(64, 'e'),
  confidentiality: 'confidential',
  decision: null,
  supersededBy: null,
};

/** As the CFO reads it while it waits. */
export const editionReply: EditionReply = {
  edition: editionSummary,
  content: editionContent,
  maySign: true,
  mayReturn: true,
  newerPanelVersion: null,
  whyNot: null,
  openedWarnings: [],
  comments: [],
  access: [],
};

/** The same edition on a fit in logs with year effects and regressors of the year before. */
export const logEditionContent: EditionContent = {
  ...editionContent,
  fit: {
    ...editionContent.fit,
    specification: {
      ...editionContent.fit.specification,
      effects: 'company,year',
      form: 'log',
      lag: 1,
    },
    slopes: editionContent.fit.slopes.map((slope) => ({
      ...slope,
      ...interval(0.42, 0.1, 0.7),
    })),
    intercepts: editionContent.fit.intercepts.map((row, index) => ({
      ...row,
      ...interval(1 + index / 10, 0.5, 1.5),
    })),
    standing: editionContent.fit.standing && {
      ...editionContent.fit.standing,
      ...interval(Math.log(1.34), Math.log(1.12), Math.log(1.6)),
    },
    gapPath: [{ year: 2025, gap: Math.log(1.5), peers: 2 }],
    drift: { ...interval(Math.log(1.02), Math.log(1.01), Math.log(1.03)), pValue: 0.01 },
    yearEffects: [
      { year: 2024, estimate: -0.1 },
      { year: 2025, estimate: 0.1 },
    ],
    smearing: { factor: 1.02, own: 1.01 },
    withoutCompany: [
      { company: 'Kesdrin', slopes: [0.4, 0.4], standing: Math.log(1.25) },
      { company: 'Sarvane', slopes: [0.4, 0.4], standing: Math.log(1.4) },
    ],
    prediction: {
      ...(structuredClone(logBasis) as NonNullable<EditionContent['fit']['prediction']>),
      lag: 1,
      yearEffects: { ownMean: 0, last: 0.1, lastYear: 2025, lastThree: 0, ownLast: 0.1 },
      lambdas: logBasis.lambdas.map((row) => [...row, 0, 0.001, 0, 0.001]),
      a: withYears(logBasis.a),
      d: withYears(logBasis.d),
    },
  },
  scenarios: editionContent.scenarios.map((scenario) => ({
    ...scenario,
    years: scenario.years.map((year) => ({
      ...year,
      difference: interval(Math.log(1.1), Math.log(1.05), Math.log(1.15)),
    })),
  })),
  headline: [
    { text: 'The market values ' },
    { own: 'Velmara' },
    { text: ' ' },
    ...estimate('standing', 'percent', [0.34, 0.12, 0.6], 1, true),
    { text: ' above what capex and book equity of the year before alone would suggest' },
  ],
  slopesInWords: [
    {
      kind: 'fine',
      sentence: [
        { text: '1 % more capex of the year before goes with ' },
        ...estimate('slope.0', 'plain', [0.42, 0.1, 0.7], 4),
        { text: ' % of market value.' },
      ],
      figure: 'slope.0',
    },
  ],
};

/** A form of the basis with four year effects more, which weigh nothing but by themselves. */
function withYears(form: readonly (readonly number[])[]): number[][] {
  const size = form.length + 4;
  return Array.from({ length: size }, (_, row) =>
    Array.from(
      { length: size },
      (_cell, column) => form.at(row)?.at(column) ?? (row === column ? 0.001 : 0),
    ),
  );
}
