import type { Sentence } from '../../contract';
import { type EditionFacts, labelsOf, lagText, listed } from './edition-terms';
import { estimateParts, type SentencePart, unitPart, words } from './sentence';
import { differenceKind, shownDifference } from './shown-difference';

/** The one sentence of an edition, made from its figures: where the market values the own company against its peers. */
export function madeHeadline(facts: EditionFacts): Sentence {
  const { fit, ownCompany } = facts;
  const { standing, specification } = fit;
  const own: SentencePart = { own: ownCompany };
  if (standing === null) return [own, words(' has no standing in this fit')];
  const regressors = listed(labelsOf(facts)) + lagText(specification.lag);
  const suggestion = `what ${regressors} alone would suggest against its peers`;
  const shown = shownDifference(standing, specification.form);
  const kind = differenceKind(specification.form);
  const unit = kind === 'money' ? [words(' '), unitPart] : [];
  const { estimate, low, high } = shown;
  if (low !== null && high !== null && low <= 0 && high >= 0)
    return [
      words('Nothing shows that the market values '),
      own,
      words(` otherwise than ${suggestion}: `),
      ...estimateParts('standing', kind, shown),
      ...unit,
    ];
  return [
    words('The market values '),
    own,
    words(' '),
    ...estimateParts('standing', kind, shown, true),
    ...unit,
    words(` ${estimate >= 0 ? 'above' : 'below'} ${suggestion}`),
  ];
}
