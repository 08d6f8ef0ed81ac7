import type { FitSummary, PeerGroupReply } from '@contract';
import type { SideVersion } from '../compare/compare-store';
import type { PanelCompany } from '../peer-draft';
import { flowControl } from './loaded-peers';
import { panelCompany } from './panel-company';

/** Ids for specs, apart from each other by their last digits. */
export const specId = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

/** A version of Velmara's peer group on the flow control panel; each peer in unless it is among `out`. */
export function peerVersion(
  number: number,
  reasons: Readonly<Record<string, string>>,
  out: readonly string[] = [],
): PeerGroupReply {
  const peers = Object.entries(reasons).map(([company, reason]) => ({
    company,
    isIncluded: !out.includes(company),
    reason,
  }));
  return {
    id: specId(20 + number),
    number,
    panelVersionId: flowControl.id,
    ownCompany: 'Velmara',
    peerCount: peers.filter(({ isIncluded }) => isIncluded).length,
    note: '',
    createdAt: flowControl.createdAt,
    createdBy: 'Ilvo Brenn',
    peers,
  };
}

export function sideVersion(
  group: PeerGroupReply,
  facts: Partial<Omit<SideVersion, 'group'>> = {},
): SideVersion {
  const names = [group.ownCompany, ...group.peers.map(({ company }) => company)];
  return { group, panel: flowControl, companies: sized(names), fits: [], ...facts };
}

/** Companies of market value 1,000, 2,000 … in the panel's unit, in the order given. */
export function sized(names: readonly string[]): PanelCompany[] {
  return names.map((name, place) =>
    panelCompany(name, { marketValue: 1000 * (place + 1), bookEquity: 500 * (place + 1) }),
  );
}

export function doneFit(peerGroupId: string, facts: Partial<FitSummary> = {}): FitSummary {
  return {
    id: specId(60),
    hash: '6f3a91c0',
    state: 'done',
    peerGroupId,
    panelVersionId: flowControl.id,
    ownCompany: 'Velmara',
    regressors: ['capex', 'book_equity'],
    effects: 'company',
    form: 'levels',
    lag: 0,
    slopes: 'cr2',
    confidence: 0.95,
    standing: { estimate: 1811, standardError: 300, low: 1172, high: 2450 },
    rankSet: [2, 5],
    companies: 13,
    createdAt: flowControl.createdAt,
    createdBy: 'Ilvo Brenn',
    ...facts,
  };
}
