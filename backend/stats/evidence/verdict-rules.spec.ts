import {
  sound,
  withAlternative,
  withDefault,
  withDifferences,
  withDropped,
  withOwnYears,
  withResult,
  withTest,
  withWarning,
  withStanding,
} from '../testing/verdict-inputs';
import { verdictOf } from './verdict';
import type { VerdictInput } from './verdict-rule';
import { verdictRules } from './verdict-rules';

const opposite = { estimate: -3, standardError: 1, low: -5, high: -1 };

interface RuleCase {
  readonly code: string;
  readonly weight: 'serious' | 'notable';
  /** What the rule is meant for, and a case next to it that it leaves alone. */
  readonly raised: VerdictInput;
  readonly notRaised?: VerdictInput;
  readonly says: string;
}

/** A row a rule. The thresholds are decisions of ours, written out here. */
const cases: readonly RuleCase[] = [
  {
    code: 'no-own-company',
    weight: 'serious',
    raised: withResult({ standing: null }),
    notRaised: withResult({ standing: null, standingReason: 'K00 has one complete row.' }),
    says: 'No own company is named, so there is no standing.',
  },
  {
    code: 'no-standing',
    weight: 'serious',
    raised: withResult({ standing: null, standingReason: 'K00 has one complete row.' }),
    says: 'K00 has one complete row.',
  },
  {
    code: 'no-standing-interval',
    weight: 'serious',
    raised: withStanding({ low: null, high: null, intervalReason: 'Too few years.' }),
    says: 'Too few years.',
  },
  {
    code: 'one-peer',
    weight: 'serious',
    raised: withResult({
      withoutCompany: sound.result.withoutCompany.map((one) =>
        one.company === 'K05' || one.company === 'K07' ? { ...one, standing: -0.5 } : one,
      ),
    }),
    notRaised: {
      ...sound,
      result: {
        ...sound.result,
        standing: { ...sound.result.standing!, low: -1 },
        withoutCompany: sound.result.withoutCompany.map((one) => ({ ...one, standing: -0.5 })),
      },
    },
    says: 'Without any one of K05 and K07, the standing lies on the other side of the peers’ mean.',
  },
  {
    code: 'one-year',
    weight: 'serious',
    raised: {
      ...sound,
      withoutYear: sound.withoutYear.map((one) =>
        one.year === 2008 ? { ...one, standing: -0.5 } : one,
      ),
    },
    notRaised: {
      ...sound,
      withoutYear: sound.withoutYear.map((one) => ({ ...one, standing: null })),
    },
    says: 'Without 2008, the standing lies on the other side of the peers’ mean.',
  },
  {
    code: 'drift',
    weight: 'serious',
    raised: withResult({
      drift: { estimate: -0.25, standardError: 0.1, low: -0.5, high: -0.01, pValue: 0.04 },
    }),
    notRaised: withResult({
      drift: { estimate: -0.25, standardError: 0.2, low: -0.7, high: 0.2, pValue: 0.06 },
    }),
    says: 'The gap to the peers moves by −0.25 in the unit of value a year (p = 0.040): one figure for all years hides where it stands now.',
  },
  {
    code: 'persistence-capped',
    weight: 'serious',
    raised: withWarning('persistence-capped', ['K00']),
    notRaised: withWarning('persistence-capped', ['K01', 'K02', 'K03', 'K04', 'K05', 'K06']),
    says: 'The words of persistence-capped.',
  },
  {
    code: 'peer-persistence-capped',
    weight: 'notable',
    raised: withWarning('persistence-capped', ['K01']),
    notRaised: withWarning('persistence-capped', ['K01', 'K02', 'K03', 'K04', 'K05', 'K06', 'K07']),
    says: 'The words of persistence-capped.',
  },
  {
    code: 'own-persistence',
    weight: 'notable',
    raised: withWarning('own-persistence'),
    says: 'The words of own-persistence.',
  },
  {
    code: 'persistent-errors',
    weight: 'notable',
    raised: withWarning('persistent-errors'),
    says: 'The words of persistent-errors.',
  },
  {
    code: 'few-own-years',
    weight: 'notable',
    raised: withOwnYears(9),
    notRaised: withOwnYears(10),
    says: 'K00 has rows in 9 of 20 years: in simulations the standing’s 95 % interval then holds the truth in about .88 to .94 of samples.',
  },
  {
    code: 'year-effects',
    weight: 'notable',
    raised: withAlternative('year-effects', {
      ...sound.result.standing!,
      estimate: sound.result.standing!.high! + 0.1,
    }),
    notRaised: withAlternative('year-effects', {
      ...sound.result.standing!,
      estimate: sound.result.standing!.high! - 0.1,
    }),
    says: 'With year effects the standing lies outside the interval it has here.',
  },
  {
    code: 'other-model',
    weight: 'notable',
    raised: withAlternative('log-form', opposite),
    notRaised: withAlternative('log-form', { ...opposite, high: 1 }),
    says: 'In log form the standing lies on the other side of the peers’ mean, with an interval that excludes zero.',
  },
  {
    code: 'smear-differs',
    weight: 'notable',
    raised: withWarning('smear-differs'),
    says: 'The words of smear-differs.',
  },
  {
    code: 'perfect-fit',
    weight: 'serious',
    raised: withWarning('perfect-fit'),
    says: 'The words of perfect-fit.',
  },
  {
    code: 'few-companies',
    weight: 'serious',
    raised: withWarning('few-companies'),
    says: 'The words of few-companies.',
  },
  {
    code: 'few-years',
    weight: 'notable',
    raised: withWarning('few-years'),
    says: 'The words of few-years.',
  },
  {
    code: 'single-row',
    weight: 'notable',
    raised: withWarning('single-row'),
    says: 'The words of single-row.',
  },
  {
    code: 'spelling',
    weight: 'notable',
    raised: withWarning('spelling'),
    says: 'The words of spelling.',
  },
  {
    code: 'missing-rows',
    weight: 'notable',
    raised: withDropped(27, 0),
    notRaised: withDropped(26, 0),
    says: '27 of 267 rows (10 %) lack a value and are left out.',
  },
  {
    code: 'dominated-sign',
    weight: 'serious',
    raised: withResult({
      withoutCompany: sound.result.withoutCompany.map((one) =>
        one.company === 'K03' ? { ...one, slopes: [-0.25] } : one,
      ),
    }),
    notRaised: withResult({
      slopes: sound.result.slopes.map((slope) => ({ ...slope, low: -1 })),
      withoutCompany: sound.result.withoutCompany.map((one) => ({ ...one, slopes: [-0.25] })),
    }),
    says: 'A slope whose interval excludes zero changes its sign: without K03 capex goes from',
  },
  {
    code: 'dominated',
    weight: 'notable',
    raised: withWarning('dominated'),
    notRaised: withResult({
      warnings: [{ code: 'dominated', detail: 'Said already.' }],
      withoutCompany: [{ company: 'K03', slopes: [-0.25], standing: 1 }],
    }),
    says: 'The words of dominated.',
  },
  {
    code: 'first-differences-opposite',
    weight: 'serious',
    raised: withDifferences({ estimate: -0.5, low: -0.75, high: -0.25 }),
    notRaised: withDifferences({ estimate: -0.5, low: -2.5, high: 1.5 }),
    says: 'In first differences capex has −0.5 against',
  },
  {
    code: 'first-differences-apart',
    weight: 'notable',
    raised: withDifferences({ estimate: 2, low: 1.75, high: 2.25 }),
    notRaised: withDifferences({ estimate: -0.5, low: -2.5, high: 1.5 }),
    says: 'In first differences capex has 2 against',
  },
  {
    code: 'small-degrees-of-freedom',
    weight: 'notable',
    raised: withWarning('small-degrees-of-freedom'),
    says: 'The words of small-degrees-of-freedom.',
  },
  {
    code: 'ill-conditioned',
    weight: 'notable',
    raised: withWarning('ill-conditioned'),
    says: 'The words of ill-conditioned.',
  },
  {
    code: 'negative-eigenvalues',
    weight: 'notable',
    raised: withWarning('negative-eigenvalues'),
    says: 'The words of negative-eigenvalues.',
  },
  {
    code: 'wild-set-disconnected',
    weight: 'notable',
    raised: withWarning('wild-set-disconnected'),
    says: 'The words of wild-set-disconnected.',
  },
  {
    code: 'covariance-choice',
    weight: 'notable',
    raised: withDefault({ isChosen: false, low: -0.1 }),
    notRaised: withDefault({ isChosen: true, low: -0.1 }),
    says: 'capex: the chosen covariance shows a sign, the default one (cr2) does not.',
  },
  {
    code: 'poolability-kept',
    weight: 'notable',
    raised: withResult({ poolability: { value: 1, df1: 11, df2: 227, pValue: 0.051 } }),
    notRaised: withResult({ poolability: { value: 2, df1: 11, df2: 227, pValue: 0.049 } }),
    says: 'Equal intercepts are not rejected (p = 0.051)',
  },
  {
    code: 'slopes-differ',
    weight: 'notable',
    raised: withTest('slope-homogeneity'),
    notRaised: {
      ...withTest('slope-homogeneity'),
      result: { ...sound.result, standing: { ...sound.result.standing!, persistence: 0.31 } },
    },
    says: 'Slopes differ between companies (p < 0.001)',
  },
  {
    code: 'line-bends',
    weight: 'notable',
    raised: withTest('reset'),
    says: 'A straight line misses a bend (RESET, p < 0.001).',
  },
];

const codesOf = (input: VerdictInput): string[] => verdictOf(input).against.map(({ code }) => code);

describe('verdictRules', () => {
  it('find nothing against a large panel of independent noise', () => {
    expect(verdictOf(sound)).toEqual({
      grade: 'carries',
      sentence: 'This fit can carry the statement that K00 lies above its peers’ mean.',
      against: [],
    });
  });

  it('have each a case here', () => {
    expect(cases.map(({ code }) => code)).toEqual(verdictRules.map(({ code }) => code));
  });

  for (const { code, weight, raised, notRaised, says } of cases) {
    it(`raises ${code}, which is ${weight}`, () => {
      const objection = verdictOf(raised).against.find((one) => one.code === code);
      expect(objection?.weight).toBe(weight);
      expect(objection?.detail).toContain(says);
    });

    if (notRaised !== undefined) {
      it(`does not raise ${code} in the case next to it`, () => {
        expect(codesOf(notRaised)).not.toContain(code);
      });
    }
  }

  it('counts no row as missing that a lag takes by construction', () => {
    expect(codesOf(withDropped(38, 1))).not.toContain('missing-rows');
    expect(codesOf(withDropped(39, 1))).toContain('missing-rows');
    const { against } = verdictOf(withDropped(39, 1));
    expect(against.find(({ code }) => code === 'missing-rows')?.detail).toBe(
      '27 of 267 rows (10 %) lack a value of their own or of the year before and are left out, beside each company’s first row.',
    );
  });

  it('says once that first differences have the opposite sign', () => {
    const codes = codesOf(withDifferences({ estimate: -0.5, low: -0.75, high: -0.25 }));
    expect(codes).toEqual(['first-differences-opposite']);
  });

  it('says of year effects that they turn the standing round', () => {
    const { against } = verdictOf(withAlternative('year-effects', { ...opposite, high: 1 }));
    expect(against.map(({ detail }) => detail)).toEqual([
      'With year effects the standing lies on the other side of the peers’ mean.',
    ]);
  });

  it('does not compare year effects of another form', () => {
    const { specification } = sound.result;
    const log = withResult({ specification: { ...specification, form: 'log' } });
    const alternatives = withAlternative('year-effects', { ...opposite, high: 1 }).alternatives;
    expect(codesOf({ ...log, alternatives })).not.toContain('year-effects');
  });

  it('gives a drift in logs as a percentage', () => {
    const { specification } = sound.result;
    const drift = { estimate: Math.log(1.02), standardError: 0.1, low: 0, high: 1, pValue: 0.01 };
    const input = withResult({ specification: { ...specification, form: 'log' }, drift });
    expect(verdictOf(input).against[0].detail).toContain('moves by 2 % a year (p = 0.010)');
  });

  it('gives a drift in logs that no percentage can hold as it is', () => {
    const { specification } = sound.result;
    const drift = { estimate: 705.25, standardError: 1, low: 700, high: 710, pValue: 0.01 };
    const input = withResult({ specification: { ...specification, form: 'log' }, drift });
    expect(verdictOf(input).against[0].detail).toContain(
      'moves by 705.3 in natural logs, beyond what a number can hold as a percentage, a year (p = 0.010)',
    );
    const down = withResult({
      specification: { ...specification, form: 'log' },
      drift: { ...drift, estimate: -705.25, low: -710, high: -700 },
    });
    expect(verdictOf(down).against[0].detail).toContain('moves by −100 % a year');
  });
});
