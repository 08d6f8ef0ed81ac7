/** How one invented company of the demo panel behaves. Money in EUR m. */
export interface DemoCompany {
  readonly name: string;
  /** What it makes, and where it has its seat. */
  readonly industry: string;
  readonly country: string;
  /** Book equity of 2008, or of the first year for a late entrant. */
  readonly equity: number;
  /** Yearly growth of book equity at the start and at the end of the panel. */
  readonly growth: readonly [number, number];
  /** Capital expenditure as a share of book equity, before the cycle. */
  readonly capexShare: number;
  /** How strongly capital expenditure follows the industry's cycle. */
  readonly capexSwing: number;
  /** Market value that goes with each 1 of capital expenditure and of book equity. */
  readonly slopes: readonly [number, number];
  /** Market value that its capital expenditure and equity do not account for. */
  readonly lasting: number;
  /** Standard deviation of a year's own shock to market value. */
  readonly noise: number;
  /** Employees for each EUR m of book equity. */
  readonly headcount: number;
  readonly firstYear?: number;
  /** Year of a merger, with the factor by which the company grew that year. */
  readonly merger?: { readonly year: number; readonly factor: number };
}

/** Makers of pumps, valves and metering equipment that exist nowhere. */
export const demoCompanies: readonly DemoCompany[] = [
  {
    name: 'Velmara',
    industry: 'Pumps and valves',
    country: 'Netherlands',
    equity: 1_180,
    growth: [0.085, 0.018],
    capexShare: 0.15,
    capexSwing: 0.9,
    slopes: [2.1, 0.8],
    lasting: 2_950,
    noise: 295,
    headcount: 6.1,
  },
  {
    name: 'Hostavrel',
    industry: 'Pumps and valves',
    country: 'Germany',
    equity: 2_950,
    growth: [0.05, 0.03],
    capexShare: 0.12,
    capexSwing: 0.7,
    slopes: [2.3, 0.72],
    lasting: 4_600,
    noise: 590,
    headcount: 5.2,
  },
  {
    name: 'Ambrevik',
    industry: 'Pumps and valves',
    country: 'Sweden',
    equity: 2_420,
    growth: [0.045, 0.025],
    capexShare: 0.13,
    capexSwing: 0.8,
    slopes: [1.7, 0.86],
    lasting: -500,
    noise: 505,
    headcount: 7.4,
  },
  {
    name: 'Quorlest',
    industry: 'Pumps and valves',
    country: 'Belgium',
    equity: 1_640,
    growth: [0.06, 0.035],
    capexShare: 0.14,
    capexSwing: 1.0,
    slopes: [2.4, 0.7],
    lasting: 2_700,
    noise: 460,
    headcount: 5.8,
  },
  {
    name: 'Sarvane',
    industry: 'Metering',
    country: 'France',
    equity: 1_020,
    growth: [0.07, 0.045],
    capexShare: 0.16,
    capexSwing: 1.1,
    slopes: [1.9, 0.9],
    lasting: 2_350,
    noise: 380,
    headcount: 4.9,
  },
  {
    name: 'Kesdrin',
    industry: 'Pumps',
    country: 'Netherlands',
    equity: 860,
    growth: [0.055, 0.04],
    capexShare: 0.15,
    capexSwing: 1.0,
    slopes: [2.2, 0.75],
    lasting: 720,
    noise: 280,
    headcount: 6.6,
  },
  {
    name: 'Jostrane',
    industry: 'Valves',
    country: 'Germany',
    equity: 780,
    growth: [0.04, 0.03],
    capexShare: 0.13,
    capexSwing: 0.9,
    slopes: [1.8, 0.7],
    lasting: 260,
    noise: 295,
    headcount: 7.1,
    merger: { year: 2016, factor: 1.72 },
  },
  {
    name: 'Lindrask',
    industry: 'Pumps',
    country: 'Poland',
    equity: 640,
    growth: [0.06, 0.05],
    capexShare: 0.17,
    capexSwing: 1.2,
    slopes: [2.5, 0.8],
    lasting: 480,
    noise: 225,
    headcount: 6.3,
  },
  {
    name: 'Bruxolan',
    industry: 'Valves',
    country: 'Italy',
    equity: 1_310,
    growth: [0.02, 0.015],
    capexShare: 0.11,
    capexSwing: 0.8,
    slopes: [1.6, 0.95],
    lasting: -420,
    noise: 310,
    headcount: 8.2,
  },
  {
    name: 'Dorvaleck',
    industry: 'Pumps',
    country: 'Switzerland',
    equity: 410,
    growth: [0.075, 0.05],
    capexShare: 0.18,
    capexSwing: 1.1,
    slopes: [2.3, 0.85],
    lasting: 300,
    noise: 170,
    headcount: 6.9,
  },
  {
    name: 'Imbresk',
    industry: 'Pumps',
    country: 'Austria',
    equity: 320,
    growth: [0.05, 0.06],
    capexShare: 0.15,
    capexSwing: 1.0,
    slopes: [1.9, 0.8],
    lasting: 130,
    noise: 110,
    headcount: 7.8,
  },
  {
    name: 'Fenquora',
    industry: 'Metering',
    country: 'Denmark',
    equity: 175,
    growth: [0.06, 0.05],
    capexShare: 0.16,
    capexSwing: 1.1,
    slopes: [2.1, 0.9],
    lasting: 90,
    noise: 60,
    headcount: 7.0,
  },
  {
    name: 'Yelvarno',
    industry: 'Metering',
    country: 'Germany',
    equity: 520,
    growth: [0.1, 0.06],
    capexShare: 0.2,
    capexSwing: 1.2,
    slopes: [2.6, 0.85],
    lasting: 1_900,
    noise: 335,
    headcount: 3.9,
    firstYear: 2014,
  },
  {
    name: 'Zethorin',
    industry: 'Water concessions',
    country: 'Spain',
    equity: 3_900,
    growth: [0.01, 0.0],
    capexShare: 0.06,
    capexSwing: 0.5,
    slopes: [1.2, 0.6],
    lasting: -600,
    noise: 590,
    headcount: 2.4,
  },
];
