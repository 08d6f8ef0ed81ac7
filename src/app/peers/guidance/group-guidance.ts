import { counted, listed } from '../../ui/phrases';
import { type PeerMeasure, modelMeasures } from '../nearness/peer-measures';
import type { PanelCompany } from '../peer-draft';

/** With fewer companies the engine warns of every fit, and likewise with fewer fiscal years. */
const fewest = 8;
/** A company with fewer complete rows counts in no slope. */
const fewestRows = 2;
/** One company with more of the group's market value than all others together. */
const largestShare = 0.5;
/** So few measures at an edge say nothing yet. */
const fewestMeasures = 2;
const mostNamed = 5;

/**
 * What should be known of a group before it is saved: that it is too small, too short, dominated by one company, or
 * chosen so that the own company stands at an edge of every measure. Empty where none of it holds.
 *
 * @param own  undefined until one is chosen.
 * @param peers  those that are in.
 */
export function groupGuidance(
  own: PanelCompany | undefined,
  peers: readonly PanelCompany[],
): readonly string[] {
  if (own === undefined || peers.length === 0) return [];
  const all = [own, ...peers];
  return [...smallness(all), ...shortness(own, all), ...dominance(all, own), ...edge(own, peers)];
}

function smallness(all: readonly PanelCompany[]): readonly string[] {
  const counting = all.filter(({ completeRows }) => completeRows >= fewestRows).length;
  const idle = all.filter(({ completeRows }) => completeRows < fewestRows);
  return [
    ...(counting < fewest
      ? [
          `Small: ${counted(counting, 'company', 'companies')} with the own one. With fewer than ${fewest} the intervals of the slopes rest on very few independent cases: take in more, or say in the note why there are no more.`,
        ]
      : []),
    ...(idle.length === 0
      ? []
      : [
          `${named(idle)} ${idle.length === 1 ? 'has' : 'have'} fewer than ${fewestRows} complete years and ${idle.length === 1 ? 'counts' : 'count'} in no slope and no mean.`,
        ]),
  ];
}

function shortness(own: PanelCompany, all: readonly PanelCompany[]): readonly string[] {
  const first = Math.min(...all.map(({ firstYear }) => firstYear));
  const last = Math.max(...all.map(({ lastYear }) => lastYear));
  const years = last - first + 1;
  if (years < fewest)
    return [
      `Short: ${counted(years, 'fiscal year')} from FY${first} to FY${last}. With fewer than ${fewest} the variation over time is hardly known: bring in earlier years.`,
    ];
  const median = medianOf(all.map(({ completeRows }) => completeRows));
  if (median < fewest)
    return [
      `Short: half of the companies have ${counted(median, 'complete year')} or fewer. With fewer than ${fewest} the variation over time is hardly known: fill gaps in the panel, or prefer companies with a longer history.`,
    ];
  return own.completeRows < fewest
    ? [
        `Short: ${own.name} itself has ${counted(own.completeRows, 'complete year')}. Its own standing rests on these alone.`,
      ]
    : [];
}

function dominance(all: readonly PanelCompany[], own: PanelCompany): readonly string[] {
  const sized = all.filter(({ marketValue }) => (marketValue ?? 0) > 0);
  if (sized.length < 3) return [];
  const total = sized.reduce((sum, { marketValue }) => sum + (marketValue ?? 0), 0);
  const largest = sized.reduce((most, each) =>
    (each.marketValue ?? 0) > (most.marketValue ?? 0) ? each : most,
  );
  const share = (largest.marketValue ?? 0) / total;
  if (share <= largestShare) return [];
  const how = `${Math.round(100 * share)} % of the group’s last market values`;
  return [
    largest === own
      ? `Dominated: ${own.name} itself is ${how}. Peers nearer to its size would bear the comparison better.`
      : `Dominated: ${largest.name} alone is ${how}, so it alone can decide the slopes. See what leaving it out changes, or fit in logs.`,
  ];
}

function edge(own: PanelCompany, peers: readonly PanelCompany[]): readonly string[] {
  const places = modelMeasures.flatMap((measure) => {
    const place = placeOf(measure, own, peers);
    return place === undefined ? [] : [{ measure, place }];
  });
  if (places.length < fewestMeasures || places.some(({ place }) => place === 'between')) return [];
  const at = (side: 'highest' | 'lowest') =>
    places.filter(({ place }) => place === side).map(({ measure }) => measure.label);
  const parts = (['highest', 'lowest'] as const).flatMap((side) =>
    at(side).length === 0 ? [] : [`the ${side} ${listed(at(side))}`],
  );
  return [
    `At the edge: ${own.name} has ${listed(parts)} of the group. With no peer beyond it on any measure, the comparison reaches past what its peers have shown: take in companies on its other side.`,
  ];
}

/** Where the own company stands among peers that have the measure; undefined where that cannot be said. */
function placeOf(
  measure: PeerMeasure,
  own: PanelCompany,
  peers: readonly PanelCompany[],
): 'highest' | 'lowest' | 'between' | undefined {
  const value = measure.valueOf(own);
  const others = peers.map(measure.valueOf).filter((each) => each !== null);
  if (value === null || others.length < 2) return undefined;
  if (others.every((other) => other < value)) return 'highest';
  return others.every((other) => other > value) ? 'lowest' : 'between';
}

/** The lower one of two in the middle. */
function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor((sorted.length - 1) / 2)];
}

function named(companies: readonly PanelCompany[]): string {
  const names = companies.slice(0, mostNamed).map(({ name }) => name);
  const more = companies.length - names.length;
  return listed(more === 0 ? names : [...names, `${more} more`]);
}
