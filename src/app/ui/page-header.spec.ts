import { namedParts } from './page-header';

describe('page header', () => {
  it('finds the own company wherever the finding names it', () => {
    expect(namedParts('Plan B lifts Velmara by 1,040', 'Velmara')).toEqual([
      { text: 'Plan B lifts ', isOwn: false },
      { text: 'Velmara', isOwn: true },
      { text: ' by 1,040', isOwn: false },
    ]);
    expect(namedParts('Velmara stands above', 'Velmara')[0]).toEqual({
      text: 'Velmara',
      isOwn: true,
    });
  });

  it('leaves a sentence whole that names nobody', () => {
    expect(namedParts('Seats', '')).toEqual([{ text: 'Seats', isOwn: false }]);
  });
});
