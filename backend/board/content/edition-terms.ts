import type { EditionContentBefore } from '../../contract';

/** What sentences are made from: what every edition froze, of whichever schema. */
export type EditionFacts = Omit<EditionContentBefore, 'schema'>;

/** The regressors in words: capex and book equity by what they are, others by their name in the panel. */
export function labelsOf({ fit, regressorRoles }: EditionFacts): readonly string[] {
  return fit.slopes.map(({ name }, index) => {
    if (regressorRoles[index] === 'capex') return 'capex';
    return regressorRoles[index] === 'bookEquity' ? 'book equity' : name;
  });
}

export function listed(words: readonly string[]): string {
  return words.length < 2
    ? words.join('')
    : `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
}

/** What is said of regressors that the model reads a year late. */
export function lagText(lag: 0 | 1): string {
  return lag === 1 ? ' of the year before' : '';
}

export function yearsListed(years: readonly number[]): string {
  return listed(years.map((year) => `FY${year}`));
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** `place 2 to 5`. */
export function placeText([first, last]: readonly [number, number]): string {
  return first === last ? `place ${first}` : `place ${first} to ${last}`;
}

/** Companies with a rank. */
export function rankedCount({ fit }: EditionFacts): number {
  return fit.intercepts.filter(({ deviation }) => deviation !== null).length;
}

/** The year that a plan is judged by: the last one that differs from the base, or else its last. */
export function decidingYear<T extends { readonly difference: { readonly estimate: number } }>(
  years: readonly T[],
): T | undefined {
  return years.findLast(({ difference }) => difference.estimate !== 0) ?? years.at(-1);
}
