import { TestBed } from '@angular/core/testing';
import type { EditionContent } from '@contract';
import { NumberFormat } from '../ui/number-format';
import {
  editionHeadline,
  modelText,
  placesText,
  sampleText,
  shortSha,
  takenOut,
} from './edition-words';
import { editionContent, logEditionContent } from './testing/edition-content';

describe('the words of an edition', () => {
  let numbers: NumberFormat;
  const { standing } = editionContent.fit;
  const withStanding = (change: object): EditionContent => ({
    ...editionContent,
    fit: { ...editionContent.fit, standing: standing && { ...standing, ...change } },
  });

  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    numbers.unit.set('millions');
  });

  it('say how far above or below its peers the market values the own company', () => {
    expect(editionHeadline(editionContent, numbers)).toBe(
      'The market values Velmara 1,800 (1,170 to 2,430) above what capex and book equity alone would suggest against its peers',
    );
    const below = withStanding({ estimate: -1800, low: -2430, high: -1170 });
    expect(editionHeadline(below, numbers)).toContain('Velmara 1,800 (1,170 to 2,430) below what');
  });

  it('claim nothing where the interval holds zero', () => {
    const unclear = withStanding({ estimate: 300, low: -400, high: 1000 });
    expect(editionHeadline(unclear, numbers)).toBe(
      'Nothing shows that the market values Velmara otherwise than what capex and book equity alone would suggest against its peers: 300 (−400 to 1,000)',
    );
  });

  it('give a standing in logs as a percentage, whatever the unit, and name the model', () => {
    numbers.unit.set('billions');
    expect(editionHeadline(logEditionContent, numbers)).toBe(
      'The market values Velmara 34.0 % (12.0 to 60.0 %) above what capex and book equity of the year before alone would suggest against its peers',
    );
    expect(takenOut(logEditionContent)).toBe(
      'capex and book equity of the year before and year effects',
    );
    expect(modelText(logEditionContent.fit.specification)).toBe(
      'in logs, year effects taken out, regressors of the year before',
    );
    expect(modelText(editionContent.fit.specification)).toBe('');
  });

  it('follow the unit that the reader chose', () => {
    numbers.unit.set('billions');
    expect(editionHeadline(editionContent, numbers)).toContain('1.80 (1.17 to 2.43)');
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
