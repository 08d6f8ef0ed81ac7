import type { EditionBlock, EditionContent, EditionSummary, FitResult } from '@contract';
import { modelNotes } from '../ui/model-form';
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

/** What the confidentiality asks of whoever holds the edition. */
export const confidentialityMeaning: Readonly<Record<EditionContent['confidentiality'], string>> = {
  confidential: 'Confidential: for those it was given to.',
  'inside-information':
    'May be inside information: share it only with those allowed to have it, and ask counsel before any outside use.',
};

/** What choosing it does, for whoever publishes. */
export const confidentialityEffect: Readonly<Record<EditionContent['confidentiality'], string>> = {
  confidential: 'Marked on the sheet and on what is exported; who reads it is listed on it.',
  'inside-information':
    'The same, and everybody is asked to mind what it is before they export it. Mail never holds a figure.',
};

/** The parts of an edition that are spoken of. */
export const blockWords: Readonly<Record<EditionBlock, string>> = {
  headline: 'the headline',
  standing: 'the standing',
  path: 'actual against expected',
  slopes: 'the slopes',
  scenarios: 'the scenarios',
  evidence: 'the evidence',
  warnings: 'the warnings',
  peers: 'the peers',
  changes: 'what changed',
  edition: 'the edition as a whole',
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
