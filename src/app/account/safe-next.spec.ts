import { safeNext } from './safe-next';

const origin = 'https://kinvale.example';

describe('safeNext', () => {
  it('keeps a path of this site with its query and fragment', () => {
    expect(safeNext('/panel/7?row=17#grid', origin)).toBe('/panel/7?row=17#grid');
    expect(safeNext('/', origin)).toBe('/');
  });

  it('resolves dots within the site', () => {
    expect(safeNext('/panel/../board', origin)).toBe('/board');
  });

  const elsewhere = [
    'https://elsewhere.example/panel',
    '//elsewhere.example/panel',
    '/\\elsewhere.example',
    '\\\\elsewhere.example',
    '/\t/elsewhere.example',
    '/\n/elsewhere.example',
    '/x/..//elsewhere.example',
    'javascript:alert(1)',
    'data:text/html,x',
    'panel',
    '',
    undefined,
  ];
  for (const next of elsewhere)
    it(`refuses ${JSON.stringify(next) ?? 'nothing'}`, () => {
      expect(safeNext(next, origin)).toBeNull();
    });

  it('does not lead back to signing in', () => {
    expect(safeNext('/sign-in?next=%2Fpanel', origin)).toBeNull();
    expect(safeNext('/join#token', origin)).toBeNull();
    expect(safeNext('/sign-up', origin)).toBeNull();
  });
});
