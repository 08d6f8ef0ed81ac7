import { unitRatio } from '@figures';
import type { NumberFormat } from '../../ui/number-format';
import { yearsText } from '../../ui/phrases';
import type { PanelCompany } from '../peer-draft';
import type { SideVersion } from './compare-store';

/** One line of facts about two versions. */
export interface FactLine {
  readonly label: string;
  readonly a: string;
  readonly b: string;
}

/** The own company and the peers that are in, as the version's panel has them. */
export function membersOf({ group, companies }: SideVersion): readonly PanelCompany[] {
  const inside = new Set(
    group.peers.filter(({ isIncluded }) => isIncluded).map(({ company }) => company),
  );
  return companies.filter(({ name }) => inside.has(name) || name === group.ownCompany);
}

/** What two versions are made of: panel, members, sizes, coverage. Money in the shown unit, each in its own currency. */
export function versionFacts(
  a: SideVersion,
  b: SideVersion,
  numbers: NumberFormat,
): readonly FactLine[] {
  const line = (label: string, say: (side: SideVersion) => string): FactLine => ({
    label,
    a: say(a),
    b: say(b),
  });
  const money = (side: SideVersion, value: number): string => {
    const text = numbers.figure(value * unitRatio(side.panel.unit, a.panel.unit));
    return a.panel.currency === b.panel.currency ? text : `${text} ${side.panel.currency}`;
  };
  const sizes = (valueOf: (company: PanelCompany) => number | null) => (side: SideVersion) => {
    const values = peersOf(side)
      .map(valueOf)
      .filter((value) => value !== null)
      .sort((left, right) => left - right);
    if (values.length === 0) return numbers.figure(null);
    const [low, high] = [values[0], values[values.length - 1]];
    return `${money(side, medianOf(values))} (${money(side, low)} to ${money(side, high)})`;
  };
  const unit = numbers.unitLabel();
  return [
    line('Panel', ({ panel }) => `${panel.panelName} v${panel.number}`),
    line('Own company', ({ group }) => group.ownCompany),
    line('Peers that are in', ({ group }) => String(group.peerCount)),
    line('Companies that are out', ({ group }) => String(group.peers.length - group.peerCount)),
    line('Without a reason', ({ group }) =>
      String(group.peers.filter(({ reason }) => reason === '').length),
    ),
    line(
      `Market value of the peers, middle (range), ${unit}`,
      sizes((each) => each.marketValue),
    ),
    line(
      `Book equity of the peers, middle (range), ${unit}`,
      sizes((each) => each.bookEquity),
    ),
    line('Fiscal years', yearsCovered),
    line('Complete rows', (side) => coverage(side, numbers)),
    line('Note', ({ group }) => group.note || '–'),
  ];
}

function peersOf(side: SideVersion): readonly PanelCompany[] {
  return membersOf(side).filter(({ name }) => name !== side.group.ownCompany);
}

function yearsCovered(side: SideVersion): string {
  const members = membersOf(side);
  if (members.length === 0) return '–';
  return yearsText(
    Math.min(...members.map(({ firstYear }) => firstYear)),
    Math.max(...members.map(({ lastYear }) => lastYear)),
  );
}

/** `228 of 230 (99.1 %)`: of the rows of own company and peers. */
function coverage(side: SideVersion, numbers: NumberFormat): string {
  const members = membersOf(side);
  const rows = members.reduce((sum, each) => sum + each.rows, 0);
  const complete = members.reduce((sum, each) => sum + each.completeRows, 0);
  if (rows === 0) return '–';
  const counts = [complete, rows].map((count) => numbers.headline(count, 'count'));
  return `${counts.join(' of ')} (${numbers.figure(complete / rows, 'percent')})`;
}

/** Of sorted values. */
function medianOf(values: readonly number[]): number {
  const half = values.length / 2;
  return Number.isInteger(half) ? (values[half - 1] + values[half]) / 2 : values[Math.floor(half)];
}
