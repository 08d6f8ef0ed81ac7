import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { flowControl } from '../testing/loaded-peers';
import { doneFit, peerVersion, sideVersion, sized } from '../testing/peer-version';
import { versionFacts } from './version-facts';
import { versionFits } from './version-fits';

describe('two versions side by side', () => {
  const all = { Kesdrin: 'Pumps', Sarvane: '', Tolvane: 'Valves' };
  const first = sideVersion(peerVersion(1, all));
  const second = sideVersion(peerVersion(2, all, ['Tolvane']));
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
  });

  function facts(a = first, b = second): Record<string, readonly [string, string]> {
    return Object.fromEntries(
      versionFacts(a, b, numbers).map((line) => [line.label, [line.a, line.b]]),
    );
  }

  it('say members, reasons, sizes and coverage of each', () => {
    expect(facts()).toEqual({
      Panel: ['Flow control v1', 'Flow control v1'],
      'Own company': ['Velmara', 'Velmara'],
      'Peers that are in': ['3', '2'],
      'Companies that are out': ['0', '1'],
      'Without a reason': ['1', '1'],
      'Market value of the peers, middle (range), EUR m': [
        '3,000 (2,000 to 4,000)',
        '2,500 (2,000 to 3,000)',
      ],
      'Book equity of the peers, middle (range), EUR m': [
        '1,500 (1,000 to 2,000)',
        '1,250 (1,000 to 1,500)',
      ],
      'Fiscal years': ['FY2010–FY2020', 'FY2010–FY2020'],
      'Complete rows': ['44 of 44 (100.0 %)', '33 of 33 (100.0 %)'],
      Note: ['–', '–'],
    });
  });

  it('bring amounts of another panel to one unit and name another currency', () => {
    const panel = { ...flowControl, unit: 'thousands' as const, currency: 'USD' };
    const companies = sized(['Velmara', 'Kesdrin', 'Sarvane', 'Tolvane']);
    const other = sideVersion(second.group, { panel, companies });
    const label = 'Market value of the peers, middle (range), EUR m';
    expect(facts(first, other)[label]).toEqual([
      '3,000 EUR (2,000 EUR to 4,000 EUR)',
      '2.500 USD (2.000 USD to 3.000 USD)',
    ]);
  });

  it('list the fits of both with model, standing, its interval and its place', () => {
    const plain = sideVersion(first.group, { fits: [doneFit(first.group.id)] });
    const logs = doneFit(second.group.id, {
      hash: 'a1b2c3d4',
      form: 'log',
      regressors: ['capex', 'book_equity', 'employees'],
      standing: { estimate: Math.log(1.342), standardError: null, low: 0.1, high: 0.5 },
      rankSet: [1, 1],
    });
    const { unit, lines } = versionFits(
      plain,
      sideVersion(second.group, { fits: [logs] }),
      numbers,
    );
    expect(unit).toBe('');
    expect(
      lines.map(({ name, version, standing, places }) => [name, version, standing, places]),
    ).toEqual([
      ['6f3a91', 1, '1,811 (1,172 to 2,450) EUR m', '2 to 5 of 13'],
      ['a1b2c3', 2, '34.2 % (10.5 to 64.9 %)', '1 of 13'],
    ]);
    expect(lines[0].model).toBe('capex and book equity, CR2 at 95 %');
    expect(lines[1].model).toBe('capex and book equity, with employees, in logs, CR2 at 95 %');
    const alone = versionFits(plain, plain, numbers);
    expect(alone.unit).toBe('EUR m');
    expect(alone.lines.map(({ standing }) => standing)).toEqual(['1,811 (1,172 to 2,450)']);
  });
});
