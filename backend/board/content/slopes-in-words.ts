import type { EditionLine } from '../../contract';
import { type EditionFacts, labelsOf, lagText } from './edition-terms';
import { estimateParts, words } from './sentence';

/** What 1 more of each regressor goes with; in log form what 1 % more does, in percent of market value. */
export function slopesInWords(facts: EditionFacts): readonly EditionLine[] {
  const { slopes, specification } = facts.fit;
  const isLog = specification.form === 'log';
  const labels = labelsOf(facts);
  return slopes.map((slope, index): EditionLine => {
    const more = isLog ? '1 % more' : 'Each extra 1 of';
    const holdsZero =
      slope.low !== null && slope.high !== null && slope.low <= 0 && slope.high >= 0;
    return {
      kind: holdsZero || slope.low === null ? 'caution' : 'fine',
      sentence: [
        words(`${more} ${labels[index]}${lagText(specification.lag)} goes with `),
        ...estimateParts(`slope.${index}`, 'plain', slope),
        words(isLog ? ' % of market value' : ' of market value'),
        words(holdsZero ? '; nothing shows that it is not zero.' : '.'),
      ],
      figure: `slope.${index}`,
    };
  });
}
