import type { Specification } from '../../backend/stats';

/** One fit that both sides compute from the same file. */
export interface OutsideCase {
  readonly id: string;
  /** CSV, from the project's root. */
  readonly file: string;
  readonly company: string;
  readonly year: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string;
  readonly effects: Specification['effects'];
  readonly form: Specification['form'];
  readonly lag: Specification['lag'];
  readonly confidence: number;
}

interface DataSet {
  readonly name: string;
  readonly file: string;
  readonly year: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string;
  /** Whether every figure has a logarithm and is not one already. */
  readonly hasLogForm: boolean;
}

const golden = (
  name: string,
  outcome: string,
  options: Pick<DataSet, 'regressors' | 'own'> & { readonly hasLogForm?: boolean },
): DataSet => ({
  name,
  file: `backend/stats/golden/${name}.csv`,
  year: 'year',
  outcome,
  hasLogForm: false,
  ...options,
});

/** The reference panels and the demo panel, each with the company that stands for the own one. */
const dataSets: readonly DataSet[] = [
  golden('grunfeld10', 'inv', { regressors: ['value', 'capital'], own: 'F02', hasLogForm: true }),
  golden('grunfeld11', 'inv', { regressors: ['value', 'capital'], own: 'C03', hasLogForm: true }),
  golden('grunfeld10_unbalanced', 'inv', { regressors: ['value', 'capital'], own: 'F05' }),
  golden('grunfeld10_short_own', 'inv', { regressors: ['value', 'capital'], own: 'F05' }),
  golden('grunfeld10_loglog', 'log_inv', { regressors: ['log_value', 'log_capital'], own: 'F01' }),
  golden('grunfeld11_value_on_inv_capital', 'value', {
    regressors: ['inv', 'capital'],
    own: 'C06',
    hasLogForm: true,
  }),
  golden('usairlines', 'log_cost', {
    regressors: ['log_output', 'log_price', 'load'],
    own: 'A2',
  }),
  golden('instinnovation120', 'log_value', {
    regressors: ['log_sales', 'log_capital'],
    own: 'C003',
  }),
  {
    name: 'demo',
    file: 'backend/panels/sample-panel.csv',
    year: 'fiscal_year',
    outcome: 'market_value',
    regressors: ['capex', 'book_equity'],
    own: 'Velmara',
    hasLogForm: true,
  },
];

/** Every data set with company effects, with year effects beside them and with a lag; in logarithms where it has them. */
export const outsideCases: readonly OutsideCase[] = dataSets.flatMap(({ hasLogForm, ...data }) => {
  const plain = { effects: 'company', form: 'levels', lag: 0 } as const;
  const variants: readonly (readonly [string, Pick<OutsideCase, 'effects' | 'form' | 'lag'>])[] = [
    ['company', plain],
    ['company, year', { ...plain, effects: 'company,year' }],
    ['lag', { ...plain, lag: 1 }],
    ...(hasLogForm
      ? ([
          ['log', { ...plain, form: 'log' }],
          ['log, year, lag', { effects: 'company,year', form: 'log', lag: 1 }],
        ] as const)
      : []),
  ];
  return variants.map(([words, variant]): OutsideCase => {
    const { name, ...columns } = data;
    return {
      id: `${name}: ${words}`,
      ...columns,
      company: 'company',
      ...variant,
      confidence: 0.95,
    };
  });
});
