import type { FitReply, FitResult } from '@contract';
import { type NumberFormat, headlineDigits } from '../ui/number-format';
import { covarianceName } from '../ui/covariance-words';
import { regressorWord } from './fit-words';
import { standingOf } from './panel-money';
import { confidenceText, listed, shortHash } from '../ui/phrases';

/** A fit that is done, as the comparison takes it. */
export interface FinishedFit {
  readonly reply: FitReply;
  readonly result: FitResult;
}

/** One line of the comparison: what each fit says, and whether they say the same. */
export interface ComparedLine {
  readonly label: string;
  readonly a: string;
  readonly b: string;
  readonly isSame: boolean;
}

/** What the two fits were made from, line by line. */
export function specificationLines(a: FinishedFit, b: FinishedFit): readonly ComparedLine[] {
  const line = (label: string, of: (fit: FinishedFit) => string): ComparedLine => {
    const [first, second] = [of(a), of(b)];
    return { label, a: first, b: second, isSame: first === second };
  };
  return [
    line('Own company', ({ reply }) => reply.fit.ownCompany),
    line(
      'Panel',
      ({ reply: { panelVersion } }) => `${panelVersion.panelName} v${panelVersion.number}`,
    ),
    line('Peer group', ({ reply: { peerGroup } }) => `v${peerGroup.number}`),
    line('Regressors', ({ result }) =>
      listed(result.slopes.map(({ name }, index) => regressorWord(name, index))),
    ),
    line('Held fixed', ({ reply }) =>
      reply.fit.effects === 'company' ? 'company levels' : 'company levels and year effects',
    ),
    line('Measure', ({ reply }) => (reply.fit.form === 'levels' ? 'amounts' : 'logs')),
    line('Regressors of', ({ reply }) =>
      reply.fit.lag === 0 ? 'the same year' : 'the year before',
    ),
    line('Slope intervals', ({ reply }) => covarianceName(reply.fit.slopes)),
    line('Confidence', ({ reply }) => confidenceText(reply.fit.confidence)),
    line('Engine', ({ result }) => result.engine),
  ];
}

export interface MemberDifference {
  /** Members of the first fit alone. */
  readonly onlyA: readonly string[];
  /** Members of the second fit alone. */
  readonly onlyB: readonly string[];
  readonly both: number;
}

export function memberDifference(a: FitResult, b: FitResult): MemberDifference {
  const [first, second] = [new Set(a.members), new Set(b.members)];
  return {
    onlyA: a.members.filter((company) => !second.has(company)),
    onlyB: b.members.filter((company) => !first.has(company)),
    both: a.members.filter((company) => second.has(company)).length,
  };
}

/** The comparison's finding: what the standing is under each, and in what they differ. */
export function comparisonFinding(a: FinishedFit, b: FinishedFit, numbers: NumberFormat): string {
  const different = specificationLines(a, b)
    .filter(({ isSame }) => !isSame)
    .map(({ label }) => label.toLowerCase());
  const cause =
    different.length === 0 ? 'made from the same' : `they differ in ${listed(different)}`;
  const standing = ({ reply, result }: FinishedFit): string => {
    const name = `fit ${shortHash(reply.fit.hash)}`;
    const of = { form: reply.fit.form, panel: reply.panelVersion };
    return result.standing === null
      ? `none under ${name}`
      : `${standingOf(result.standing, of, numbers, headlineDigits)} under ${name}`;
  };
  return `Standing ${standing(a)}, ${standing(b)}: ${cause}`;
}

/** Why no scale can show the standings of both; empty where one can. */
export function incomparableReason(a: FinishedFit, b: FinishedFit): string {
  if (a.reply.fit.form !== b.reply.fit.form)
    return 'One fit is in logs, the other in amounts: a percentage and an amount are not comparable, so one scale cannot show both.';
  const isOneCurrency = a.reply.panelVersion.currency === b.reply.panelVersion.currency;
  // Percentages have no currency.
  return isOneCurrency || a.reply.fit.form === 'log'
    ? ''
    : 'The panels are in different currencies, so one scale cannot show both.';
}

/** Names of slopes of either fit, each once, those of the first first. */
export function slopeNames(a: FitResult, b: FitResult): readonly string[] {
  return [...new Set([...a.slopes, ...b.slopes].map(({ name }) => name))];
}
