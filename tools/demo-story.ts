export interface DemoPeerReason {
  readonly included: boolean;
  readonly reason: string;
}

export interface DemoScenario {
  readonly name: string;
  readonly note: string;
  /** Plan values in the panel's unit, EUR m. */
  readonly years: readonly {
    readonly year: number;
    readonly capex: number;
    readonly bookEquity: number;
  }[];
}

export interface DemoPerson {
  readonly role: 'analyst' | 'cfo' | 'reader' | 'billing_admin';
  readonly name: string;
  readonly email: string;
}

/** What the demo's analyst wrote down about each company beside the own one. */
export const demoPeerReasons: Readonly<Record<string, DemoPeerReason>> = {
  Hostavrel: {
    included: true,
    reason:
      'Closest in product mix: process pumps and control valves are 70 % of sales, as with us. ' +
      'About twice our size, so watch how much it drives the slopes.',
  },
  Ambrevik: {
    included: true,
    reason:
      'Same customers in water and chemicals, own foundries like ours. Larger and more capital ' +
      'intensive; kept because it bids against us in most large tenders.',
  },
  Quorlest: {
    included: true,
    reason:
      'Control valves and actuators, two thirds of sales in Europe, fiscal year ends in December. ' +
      'Service share close to ours.',
  },
  Sarvane: {
    included: true,
    reason:
      'Metering and dosing equipment. Fewer foundries and more electronics than we have, but the ' +
      'same end markets, and most sell-side notes name it beside us.',
  },
  Kesdrin: {
    included: true,
    reason:
      'Mid-sized maker of centrifugal pumps, Europe and North America. Reports by the same ' +
      'standards; capex for 2010 was never published and is left empty.',
  },
  Jostrane: {
    included: true,
    reason:
      'Valves for energy and chemicals. Merged with a compressor maker in 2016: equity and capex ' +
      'jump that year. Kept, since the business mix before and after is still ours.',
  },
  Lindrask: {
    included: true,
    reason:
      'Sealing systems and metering pumps. Smaller, but the order cycle follows ours to the ' +
      'quarter, and capex is spent on the same kind of machining lines.',
  },
  Bruxolan: {
    included: true,
    reason:
      'Cast valves for water utilities. Low margins, but the asset base is comparable. Restated ' +
      'book equity for 2019 is still open with its auditor, so that cell stays empty.',
  },
  Dorvaleck: {
    included: true,
    reason:
      'Specialist for cryogenic pumps, listed throughout. Sells to the same plant builders, and ' +
      'leases are on the balance sheet as with us.',
  },
  Imbresk: {
    included: true,
    reason:
      'Pump maker for food and pharma, mostly Europe. Small, but the service business is built ' +
      'like ours. No market value for 2008: trading was suspended at year end.',
  },
  Fenquora: {
    included: true,
    reason:
      'Smallest of the group: flow meters only. Included for coverage at the low end. Capex for ' +
      '2012 was reported net of grants and could not be restated, so we leave it out.',
  },
  Yelvarno: {
    included: true,
    reason:
      'Connected metering, listed since 2014. Shorter history and asset-light, but it has taken ' +
      'tenders from us since 2017; leaving it out would flatter our place.',
  },
  Zethorin: {
    included: false,
    reason:
      'Most of its book equity is long-term service concessions in Asia and South America, ' +
      'carried at revalued amounts. Equity is not comparable with historical cost, and capex ' +
      'excludes work paid for by grantors.',
  },
};

/** The two plans of the demo: one within what the group has shown, one at its edge. */
export const demoScenarios: readonly DemoScenario[] = [
  {
    name: 'Steady course',
    note: 'Budget as approved in November: replacement and debottlenecking, payout unchanged.',
    years: [
      { year: 2026, capex: 420, bookEquity: 2_510 },
      { year: 2027, capex: 425, bookEquity: 2_575 },
      { year: 2028, capex: 430, bookEquity: 2_640 },
    ],
  },
  {
    name: 'Second foundry',
    note: 'New foundry from 2026, on stream in 2028; payout halved for two years to fund it.',
    years: [
      { year: 2026, capex: 490, bookEquity: 2_560 },
      { year: 2027, capex: 570, bookEquity: 2_700 },
      { year: 2028, capex: 540, bookEquity: 2_840 },
    ],
  },
];

/** One invented person for each role; the seeder supplies the password. */
export const demoPeople: readonly DemoPerson[] = [
  { role: 'analyst', name: 'Ilka Vandresson', email: 'ilka.vandresson@velmara.example' },
  { role: 'cfo', name: 'Torvald Emmerquist', email: 'torvald.emmerquist@velmara.example' },
  { role: 'reader', name: 'Nadja Orlebeck', email: 'nadja.orlebeck@velmara.example' },
  { role: 'billing_admin', name: 'Bram Kestelloo', email: 'bram.kestelloo@velmara.example' },
];
