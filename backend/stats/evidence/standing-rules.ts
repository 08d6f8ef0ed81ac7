import type { Standing } from '../fit-result';
import type { AlternativeCode } from './evidence';
import { heldNumber } from '../prediction';
import { pInWords, listInWords, shortNumber } from './in-words';
import {
  areOpposite,
  excludesZero,
  isInside,
  type VerdictInput,
  type VerdictRule,
  warningRule,
  warningsOfCode,
} from './verdict-rule';

/** What speaks against a statement on the own company's standing. */
export const standingRules: readonly VerdictRule[] = [
  {
    code: 'no-own-company',
    weight: 'serious',
    leavesNothing: true,
    when: ({ result }) =>
      result.standing === null && result.standingReason === undefined
        ? 'No own company is named, so there is no standing.'
        : null,
  },
  {
    code: 'no-standing',
    weight: 'serious',
    leavesNothing: true,
    when: ({ result }) => (result.standing === null ? (result.standingReason ?? null) : null),
  },
  {
    code: 'no-standing-interval',
    weight: 'serious',
    leavesNothing: true,
    when: ({ result: { standing } }) =>
      standing?.low === null ? (standing.intervalReason ?? null) : null,
  },
  { code: 'one-peer', weight: 'serious', when: onePeer },
  { code: 'one-year', weight: 'serious', when: oneYear },
  { code: 'drift', weight: 'serious', when: drift },
  { code: 'persistence-capped', weight: 'serious', when: ownCapped },
  { code: 'peer-persistence-capped', weight: 'notable', when: peersCapped },
  warningRule('own-persistence', 'notable'),
  warningRule('persistent-errors', 'notable'),
  { code: 'few-own-years', weight: 'notable', when: fewOwnYears },
  { code: 'year-effects', weight: 'notable', when: yearEffects },
  { code: 'other-model', weight: 'notable', when: otherModel },
  warningRule('smear-differs', 'notable'),
];

/** The standing where its interval says on which side of the peers the own company lies. */
function decided({ result: { standing } }: VerdictInput): Standing | null {
  return standing !== null && excludesZero(standing) ? standing : null;
}

function onePeer(input: VerdictInput): string | null {
  const standing = decided(input);
  if (standing === null) return null;
  const peers = input.result.withoutCompany.filter(
    (one) => one.standing !== null && areOpposite(one.standing, standing.estimate),
  );
  if (peers.length === 0) return null;
  return otherSide(peers.map(({ company }) => company));
}

function oneYear(input: VerdictInput): string | null {
  const standing = decided(input);
  if (standing === null) return null;
  const years = input.withoutYear.filter(
    (one) => one.standing !== null && areOpposite(one.standing, standing.estimate),
  );
  if (years.length === 0) return null;
  return otherSide(years.map(({ year }) => String(year)));
}

function otherSide(left: readonly string[]): string {
  const without = left.length === 1 ? left[0] : `any one of ${listInWords(left)}`;
  return `Without ${without}, the standing lies on the other side of the peers’ mean.`;
}

function drift({ result }: VerdictInput): string | null {
  const pValue = result.drift?.pValue ?? null;
  if (result.drift === null || pValue === null) return null;
  if (pValue >= 1 - result.specification.confidence) return null;
  const by =
    result.specification.form === 'log'
      ? byOfLogs(result.drift.estimate)
      : `${shortNumber(result.drift.estimate)} in the unit of ${result.outcome}`;
  return `The gap to the peers moves by ${by} a year (${pInWords(pValue)}): one figure for all years hides where it stands now.`;
}

/** A change of logs as percent; as it is where a double cannot hold that. */
function byOfLogs(change: number): string {
  const percent = heldNumber(100 * Math.expm1(change));
  return percent === null
    ? `${shortNumber(change)} in natural logs, beyond what a number can hold as a percentage,`
    : `${shortNumber(percent)} %`;
}

/** Own errors at the bound, or those of most companies, make the interval of the standing itself too narrow. */
function ownCapped(input: VerdictInput): string | null {
  const [warning] = warningsOfCode(input, 'persistence-capped');
  return warning !== undefined && concernsStanding(input, warning.subjects) ? warning.detail : null;
}

function peersCapped(input: VerdictInput): string | null {
  const [warning] = warningsOfCode(input, 'persistence-capped');
  return warning !== undefined && !concernsStanding(input, warning.subjects)
    ? warning.detail
    : null;
}

function concernsStanding({ result }: VerdictInput, capped: readonly string[] = []): boolean {
  const own = result.standing?.company;
  return (own !== undefined && capped.includes(own)) || 2 * capped.length > result.sample.companies;
}

/**
 * The share of intervals that held the truth where the own company had the last 5 of 20 years alone: settings
 * n12-t20-rho…-own-last-5 of backend/stats/COVERAGE.md, standing, at a nominal .95.
 */
const ownLastFive = { from: '.88', to: '.94' };

/** Fewer of the sample's years than this and the own company counts as one of few rows. */
const enoughYears = 0.5;

function fewOwnYears({ result: { standing, ownYears, sample } }: VerdictInput): string | null {
  if (typeof standing?.low !== 'number' || ownYears === null) return null;
  if (ownYears.length >= enoughYears * sample.years) return null;
  return `${standing.company} has rows in ${ownYears.length} of ${sample.years} years: in simulations the standing’s 95 % interval then holds the truth in about ${ownLastFive.from} to ${ownLastFive.to} of samples.`;
}

function yearEffects({ result, alternatives }: VerdictInput): string | null {
  const { standing, specification } = result;
  const other = alternatives.find(({ code }) => code === 'year-effects');
  if (typeof standing?.low !== 'number' || !other?.standing || other.isThisFit) return null;
  if (other.form !== specification.form || other.lag !== specification.lag) return null;
  const value = other.standing.estimate;
  if (areOpposite(value, standing.estimate)) {
    return 'With year effects the standing lies on the other side of the peers’ mean.';
  }
  return isInside(value, standing)
    ? null
    : 'With year effects the standing lies outside the interval it has here.';
}

/** Another model that is as sure of the opposite. */
function otherModel(input: VerdictInput): string | null {
  const standing = decided(input);
  if (standing === null) return null;
  const found = input.alternatives.filter(
    (one) =>
      one.standing !== null &&
      excludesZero(one.standing) &&
      areOpposite(one.standing.estimate, standing.estimate),
  );
  if (found.length === 0) return null;
  const models = listInWords(found.map(({ code }) => modelsInWords[code]));
  return `${models[0].toUpperCase()}${models.slice(1)} the standing lies on the other side of the peers’ mean, with an interval that excludes zero.`;
}

const modelsInWords: Readonly<Record<AlternativeCode, string>> = {
  'this-fit': 'in this fit',
  pooled: 'in the pooled regression',
  'fixed-effects': 'with company effects in levels',
  'year-effects': 'with year effects',
  'log-form': 'in log form',
  lag: 'with regressors of the year before',
  'random-effects': 'with random effects',
};
