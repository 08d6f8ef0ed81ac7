import { groupsFitted } from './trial-words';

describe('the words of the trials', () => {
  it('say which groups are fitted, one company or several', () => {
    const words = (peers: number, candidates: number) =>
      groupsFitted({ peers: Array(peers).fill('A'), candidates: Array(candidates).fill('B') });
    expect(words(4, 2)).toBe(
      'as it is, without each of its 4 members, and with each of the nearest 2 candidates',
    );
    expect(words(1, 1)).toBe('as it is, without its only member, and with the nearest candidate');
    expect(words(2, 0)).toBe('as it is, and without each of its 2 members');
  });
});
