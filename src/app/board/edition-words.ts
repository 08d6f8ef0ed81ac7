import type { EditionContent, EditionSummary, FitResult } from '@contract';
import { type Bounded, asDifference, differenceKind, modelNotes } from '../ui/model-form';
import type { NumberFormat } from '../ui/number-format';
import { regressorLabels } from '../ui/plan/regressor-labels';
import { lagText, listed } from '../ui/phrases';

/** An edition's regressors in words. */
export function labelsOf(content: EditionContent): readonly string[] {
  return regressorLabels(
    content.fit.slopes.map(({ name }) => name),
    content.regressorRoles,
  );
}

/** What the company levels are net of: `capex and book equity of the year before and year effects`. */
export function takenOut(content: EditionContent): string {
  const { effects, lag } = content.fit.specification;
  const years = effects === 'company' ? '' : ' and year effects';
  return listed(labelsOf(content)) + lagText(lag) + years;
}

/** What of the model is not the plain one, for the line of facts; empty where nothing is. */
export function modelText(
  specification: Pick<FitResult['specification'], 'effects' | 'form' | 'lag'>,
): string {
  const lag = specification.lag === 1 ? ['regressors of the year before'] : [];
  return [...modelNotes(specification), ...lag].join(', ');
}

/** The one sentence of an edition: where the market values the own company against its peers. */
export function editionHeadline(content: EditionContent, numbers: NumberFormat): string {
  const { standing, specification } = content.fit;
  const regressors = listed(labelsOf(content)) + lagText(specification.lag);
  const suggestion = `what ${regressors} alone would suggest against its peers`;
  if (standing === null) return `${content.ownCompany} has no standing in this fit`;
  const shown = asDifference(standing, specification.form);
  const kind = differenceKind(specification.form);
  const { estimate, low, high } = shown;
  if (low !== null && high !== null && low <= 0 && high >= 0)
    return `Nothing shows that the market values ${content.ownCompany} otherwise than ${suggestion}: ${numbers.interval(shown, kind, 3)}`;
  const isAbove = estimate >= 0;
  const size: Bounded = isAbove
    ? shown
    : { estimate: -estimate, low: negated(high), high: negated(low) };
  return `The market values ${content.ownCompany} ${numbers.interval(size, kind, 3)} ${isAbove ? 'above' : 'below'} ${suggestion}`;
}

function negated(value: number | null): number | null {
  return value === null ? null : -value;
}

/** `place 2 to 5 of 14`; with the reason where no place can be given. */
export function placesText({ standing, intercepts }: FitResult): string {
  if (standing === null) return 'no place';
  if (standing.rankSet === null)
    return `no place: ${standing.rankReason ?? 'no rank set in this fit'}`;
  const ranked = intercepts.filter(({ deviation }) => deviation !== null).length;
  return `${placeText(standing.rankSet)} of ${ranked}`;
}

export function placeText([first, last]: readonly [number, number]): string {
  return first === last ? `place ${first}` : `place ${first} to ${last}`;
}

/** `95 %`. */
export function shareText(share: number): string {
  return `${Math.round(share * 1000) / 10} %`;
}

/** `FY2008–FY2025, 243 rows of 14 companies`. */
export function sampleText({ sample }: FitResult): string {
  return `FY${sample.firstYear}–FY${sample.lastYear}, ${sample.observations} rows of ${sample.companies} companies`;
}

export const confidentialityWords: Readonly<Record<EditionContent['confidentiality'], string>> = {
  confidential: 'confidential',
  'inside-information': 'inside information',
};

export const stateWords: Readonly<Record<EditionSummary['state'], string>> = {
  waiting: 'waits for a signature',
  signed: 'signed',
  returned: 'returned',
  superseded: 'superseded',
};

export function shortSha(sha256: string): string {
  return `${sha256.slice(0, 6)}…${sha256.slice(-4)}`;
}
