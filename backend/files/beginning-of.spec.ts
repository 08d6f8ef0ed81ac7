import { beginningOf } from './beginning-of';

describe('the beginning of a text', () => {
  it('is the text itself where it is short enough', () => {
    expect(beginningOf('Größe 😀', 8)).toBe('Größe 😀');
  });

  it('ends before a character that would be cut in two', () => {
    expect(beginningOf('Größe 😀', 7)).toBe('Größe ');
    expect(beginningOf('Größe 😀', 3)).toBe('Grö');
  });
});
