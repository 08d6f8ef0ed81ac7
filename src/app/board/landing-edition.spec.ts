import { landingEdition } from './landing-edition';
import { editionSummary } from './testing/edition-content';

describe('where a reader of editions lands', () => {
  const edition = (number: number, state: 'waiting' | 'signed' | 'returned' | 'superseded') => ({
    ...editionSummary,
    number,
    state,
  });
  const all = [
    edition(1, 'superseded'),
    edition(2, 'signed'),
    edition(3, 'returned'),
    edition(4, 'waiting'),
    edition(5, 'waiting'),
  ];

  it('is the newest edition that waits, for the CFO', () => {
    expect(landingEdition(all, ['cfo'])?.number).toBe(5);
    expect(landingEdition(all, ['cfo', 'analyst'])?.number).toBe(5);
  });

  it('is the newest signed one where none waits, and for readers', () => {
    expect(landingEdition(all.slice(0, 3), ['cfo'])?.number).toBe(2);
    expect(landingEdition(all, ['reader'])?.number).toBe(2);
  });

  it('is the list for analysts, and where nothing is signed', () => {
    expect(landingEdition(all, ['analyst'])).toBeUndefined();
    expect(landingEdition([], ['reader'])).toBeUndefined();
  });
});
