import { similarNames } from './similar-names';

const names = ['Arvo', 'Kesdrin Holding AG', 'Velmara Fund 1', 'Tessaline', 'Été Works'];

describe('names like a name', () => {
  it('differ in case, blanks, accents, the order of words or a legal form', () => {
    expect(similarNames('arvo', names)).toEqual(['Arvo']);
    expect(similarNames('  ARVO ', names)).toEqual(['Arvo']);
    expect(similarNames('holding kesdrin', names)).toEqual(['Kesdrin Holding AG']);
    expect(similarNames('Works, Ete', names)).toEqual(['Été Works']);
  });

  it('are spelt nearly alike, with the same digits', () => {
    expect(similarNames('Tesaline', names)).toEqual(['Tessaline']);
    expect(similarNames('Velmara Fund 2', names)).toEqual([]);
    expect(similarNames('Arva', names)).toEqual([]);
  });

  it('are not the name itself', () => {
    expect(similarNames('Arvo', names)).toEqual([]);
    expect(similarNames('Arvo', [...names, 'ARVO'])).toEqual(['ARVO']);
  });
});
