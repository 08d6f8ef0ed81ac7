import type { EditionContent } from '@contract';
import { modelText, placesText, sampleText, shortSha, takenOut } from './edition-words';
import { editionContent, logEditionContent } from './testing/edition-content';

describe('the words of an edition', () => {
  const { standing } = editionContent.fit;
  const withStanding = (change: object): EditionContent => ({
    ...editionContent,
    fit: { ...editionContent.fit, standing: standing && { ...standing, ...change } },
  });

  it('name the model', () => {
    expect(takenOut(logEditionContent)).toBe(
      'capex and book equity of the year before and year effects',
    );
    expect(modelText(logEditionContent.fit.specification)).toBe(
      'in logs, year effects taken out, regressors of the year before',
    );
    expect(modelText(editionContent.fit.specification)).toBe('');
  });

  it('give places out of the companies that can be ranked, never a bare rank', () => {
    expect(placesText(editionContent.fit)).toBe('place 1 to 2 of 3');
    const unranked = withStanding({ rankSet: null, rankReason: 'it has 2 rows' });
    expect(placesText(unranked.fit)).toBe('no place: it has 2 rows');
  });

  it('name the sample and the hash', () => {
    expect(sampleText(editionContent.fit)).toBe('FY2014–FY2025, 36 rows of 3 companies');
    expect(shortSha('0123456789abcdef')).toBe('012345…cdef');
  });
});
