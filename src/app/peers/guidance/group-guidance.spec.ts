import type { PanelCompany } from '../peer-draft';
import { panelCompany, scatteredCompanies } from '../testing/panel-company';
import { groupGuidance } from './group-guidance';

/** Companies of equal size and eleven complete years whose measures lie around those of the first. */
function balanced(count: number): PanelCompany[] {
  return scatteredCompanies(count).map((company, place) => ({
    ...company,
    marketValue: 1000,
    measures: { ...company.measures, growth: place === 0 ? 0.05 : place % 2 === 0 ? 0 : 0.1 },
  }));
}

describe('guidance on a group', () => {
  const [own, ...peers] = balanced(9);

  it('says nothing of a large, long and balanced group, nor before there is one', () => {
    expect(groupGuidance(own, peers)).toEqual([]);
    expect(groupGuidance(undefined, peers)).toEqual([]);
    expect(groupGuidance(own, [])).toEqual([]);
  });

  it('says that a group is too small, counting who has two complete years alone', () => {
    expect(groupGuidance(own, peers.slice(0, 7))).toEqual([]);
    const [small] = groupGuidance(own, peers.slice(0, 6));
    expect(small).toContain('Small: 7 companies with the own one. With fewer than 8');
    const idle = { ...peers[0], completeRows: 1 };
    const words = groupGuidance(own, [idle, ...peers.slice(1, 7)]);
    expect(words[0]).toContain('Small: 7 companies');
    expect(words[1]).toBe(
      'Company 2 has fewer than 2 complete years and counts in no slope and no mean.',
    );
  });

  it('says that a group is too short: by its years, by half of it, or by the own company', () => {
    const from = (firstYear: number) =>
      [own, ...peers].map((company) => ({
        ...company,
        firstYear,
        completeRows: 2020 - firstYear + 1,
      }));
    const [shortOwn, ...shortPeers] = from(2014);
    expect(groupGuidance(shortOwn, shortPeers)[0]).toContain(
      'Short: 7 fiscal years from FY2014 to FY2020.',
    );
    const gaps = peers.map((peer, place) => (place < 5 ? { ...peer, completeRows: 6 } : peer));
    expect(groupGuidance(own, gaps)[0]).toContain('half of the companies have 6 complete years');
    expect(groupGuidance({ ...own, completeRows: 7 }, peers)[0]).toContain(
      'Short: Company 1 itself has 7 complete years.',
    );
  });

  it('names the one company that is more than all others together', () => {
    const giant = { ...peers[2], marketValue: 8500 };
    const [words] = groupGuidance(own, [...peers.slice(0, 2), giant, ...peers.slice(3)]);
    expect(words).toContain('Dominated: Company 4 alone is 52 % of the group’s last market values');
    expect(groupGuidance({ ...own, marketValue: 8500 }, peers)[0]).toContain('Company 1 itself');
    expect(groupGuidance({ ...own, marketValue: 7900 }, peers)).toEqual([]);
  });

  it('says that the own company is at an edge of every measure, and at which', () => {
    const edge = {
      ...own,
      measures: {
        logMarketValue: 99,
        logBookEquity: 99,
        capexToBookEquity: -1,
        growth: 9,
        volatility: null,
        others: {},
      },
    };
    expect(groupGuidance(edge, peers)).toEqual([
      'At the edge: Company 1 has the highest market value, book equity and growth and the lowest capex ÷ book equity of the group. With no peer beyond it on any measure, the comparison reaches past what its peers have shown: take in companies on its other side.',
    ]);
    const within = { ...edge, measures: { ...edge.measures, growth: 0.05 } };
    expect(groupGuidance(within, peers)).toEqual([]);
    const bare = panelCompany('Aldren', { measures: { growth: 9 } });
    expect(groupGuidance(bare, peers)).toEqual([]);
  });
});
