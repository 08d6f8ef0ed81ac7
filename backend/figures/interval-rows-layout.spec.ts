import type { FigureFormats } from './figure-types';
import { type IntervalRow, intervalRowsLayout } from './interval-rows-layout';
import { wordsWidth } from './text-width';

const formats: FigureFormats = {
  value: (value) => value.toFixed(2),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(2)} to ${high.toFixed(2)}`,
  tick: (value) => value.toFixed(0),
};
const figure = { estimate: 2100, low: 700, high: 3400 };

describe('interval rows layout', () => {
  it('puts the figures on one scale with zero and keeps the reason of a missing one', () => {
    const { rows, zeroX } = intervalRowsLayout(
      [
        { name: 'fixed effects', figure, isMarked: true },
        { name: 'log form', figure: null, reason: 'in percent: 12.0 (4.0 to 20.0)' },
      ],
      760,
      formats,
    );
    expect(rows[0].figures).toBe('2100.00 (700.00 to 3400.00)');
    expect(rows[0].isMarked).toBeTrue();
    expect(rows[0].x! - zeroX).toBeCloseTo(3 * (rows[0].interval!.from - zeroX), 6);
    expect(rows[1].x).toBeNull();
    expect(rows[1].figures).toBe('in percent: 12.0 (4.0 to 20.0)');
    expect(rows[1].isMarked).toBeFalse();
  });

  it('draws equal figures at equal places, in any width', () => {
    for (const width of [320, 360, 760, 1200]) {
      const { rows } = intervalRowsLayout(
        ['a', 'b'].map((name) => ({ name, figure })),
        width,
        formats,
      );
      expect(rows[0].x).toBe(rows[1].x);
      expect(rows[0].interval!.to).toBeLessThanOrEqual(width);
    }
  });

  it('runs an open end to the edge of the plot, with an arrow at it', () => {
    const open = (unbounded: 'low' | 'high' | 'both'): IntervalRow => ({
      name: unbounded,
      figure: {
        estimate: 2,
        low: unbounded === 'high' ? 1 : null,
        high: unbounded === 'low' ? 3 : null,
        unbounded,
      },
    });
    const { rows, plot } = intervalRowsLayout(
      [open('low'), open('high'), open('both'), { name: 'closed', figure }],
      760,
      formats,
    );
    expect(rows[0].interval!.from).toBe(plot.left);
    expect(rows[0].interval!.to).toBeLessThan(plot.right);
    expect(rows[1].interval!.to).toBe(plot.right);
    expect(rows[1].interval!.from).toBeGreaterThan(plot.left);
    expect(rows[2].interval).toEqual({ from: plot.left, to: plot.right });
    expect(rows.map(({ arrows }) => arrows.length)).toEqual([1, 1, 2, 0]);
  });

  it('folds figures under the names where one line has no room for both', () => {
    const wide = intervalRowsLayout([{ name: 'fixed effects', figure }], 760, formats);
    const narrow = intervalRowsLayout([{ name: 'fixed effects', figure }], 360, formats);
    expect(wide.rows[0].figureLines[0].y).toBe(wide.rows[0].textY);
    expect(narrow.rows[0].figureLines[0].y).toBeGreaterThan(narrow.rows[0].textY);
    expect(narrow.rows[0].y).toBeGreaterThan(narrow.rows[0].figureLines[0].y);
  });

  it('cuts no word of a note or a reason: what has no room in a line goes on in the next', () => {
    const reason =
      'Effects drawn from one distribution are no figure of any company, so they place none.';
    const note = 'default, of this fit, negative variance set to 0';
    const given: IntervalRow[] = [
      { name: 'by company and by year', note, figure },
      { name: 'random effects', figure: null, reason },
      { name: 'fixed effects', figure },
    ];
    for (const width of [312, 360, 760, 1000]) {
      const { rows, plot } = intervalRowsLayout(given, width, formats);
      const said = (lines: readonly { readonly text: string }[]) =>
        lines.map(({ text }) => text).join(' ');
      expect(said(rows[1].figureLines)).toBe(reason);
      expect(rows[1].figures).toBe(reason);
      if (rows[0].noteLines.length > 0) expect(said(rows[0].noteLines)).toBe(note);
      for (const { text } of [...rows[0].noteLines, ...rows[1].figureLines])
        expect(wordsWidth(text)).toBeLessThanOrEqual(width);
      for (const [place, row] of rows.entries()) {
        const ys = [row.textY, ...[...row.noteLines, ...row.figureLines].map(({ y }) => y)];
        expect(Math.max(...ys)).toBeLessThan(row.top + row.height);
        expect(row.top + row.height).toBe(rows.at(place + 1)?.top ?? plot.bottom);
      }
    }
    expect(intervalRowsLayout(given, 312, formats).rows[0].noteLines.length).toBeGreaterThan(0);
  });

  it('makes room for the note behind a name', () => {
    const plain = intervalRowsLayout([{ name: 'cr2', figure }], 900, formats);
    const noted = intervalRowsLayout([{ name: 'cr2', note: 'default here', figure }], 900, formats);
    expect(noted.plot.left).toBeGreaterThan(plain.plot.left + 50);
    expect(noted.rows[0].label).toBe('cr2');
    expect(noted.rows[0].note).toBe('default here');
  });

  it('stands without rows, with one that is zero, and with nothing but reasons', () => {
    expect(intervalRowsLayout([], 640, formats).rows).toEqual([]);
    const zero = { estimate: 0, low: null, high: null };
    const [row] = intervalRowsLayout([{ name: 'a', figure: zero }], 640, formats).rows;
    expect(row.interval).toBeNull();
    expect(Number.isFinite(row.x)).toBeTrue();
    const { rows, zeroX } = intervalRowsLayout([{ name: 'a', figure: null }], 640, formats);
    expect(rows[0].figures).toBe('none');
    expect(Number.isFinite(zeroX)).toBeTrue();
  });
});
