import { counted, yearsText } from '../ui/phrases';
import type { PeerNearness } from './nearness/peer-nearness-of';
import { type PanelCompany, type PeerDraft, reasonOf } from './peer-draft';
import { peersFinding } from './peer-words';
import type { PeersGround } from './peers-ground';
import type { PeerRow } from './table/peer-table';

const mostShown = 200;
/** So many candidates stand beside the members until more are asked for. */
const nearestShown = 20;

/** Members and candidates in the order in which they are to be listed. */
export interface ListedPeers {
  readonly members: readonly PanelCompany[];
  readonly candidates: readonly PanelCompany[];
  /** Lists more than the nearest candidates. */
  readonly hasAllCandidates: boolean;
}

export interface PeersShown {
  readonly finding: string;
  readonly source: string;
  /** The members listed, at most 200. */
  readonly inside: readonly PeerRow[];
  /** The nearest candidates listed: 20, or at most 200. */
  readonly outside: readonly PeerRow[];
  readonly inCount: number;
  readonly outCount: number;
  /** How many members and candidates are beyond what can be listed. */
  readonly notShown: number;
  /** How many candidates are listed on request. */
  readonly onRequest: number;
  /** Companies without a written reason. */
  readonly missing: readonly string[];
  readonly own: PanelCompany | undefined;
  /** Everybody who is in, listed or not. */
  readonly members: readonly PanelCompany[];
}

/** What the page shows of a choice of peers. */
export function peersShown(
  ground: PeersGround,
  draft: PeerDraft,
  listed: ListedPeers,
  nearness: PeerNearness,
): PeersShown {
  const { companies, panelVersions, without } = ground;
  const own = companies.find(({ name }) => name === draft.ownCompany);
  const others = companies.filter((company) => company !== own);
  const reason = ({ name }: PanelCompany): string => {
    const choice = draft.choices.get(name);
    return choice === undefined ? '' : reasonOf(choice);
  };
  const isInside = ({ name }: PanelCompany): boolean =>
    draft.choices.get(name)?.isIncluded ?? false;
  const toRow = (company: PanelCompany): PeerRow => ({
    company,
    reason: reason(company),
    nearness: nearness.byCompany.get(company.name) ?? null,
    whyNone: nearness.without.get(company.name) ?? '',
    ...(without === null ? {} : { standingWithout: without.byCompany.get(company.name) ?? null }),
  });
  const candidatesShown = listed.hasAllCandidates ? mostShown : nearestShown;
  const members = others.filter(isInside);
  const inCount = members.length;
  const outCount = others.length - inCount;
  const panel = panelVersions.find(({ id }) => id === draft.panelVersionId);
  return {
    finding: peersFinding(draft.ownCompany, inCount, outCount),
    source:
      panel === undefined
        ? ''
        : `${panel.panelName} v${panel.number} · ${counted(panel.companies, 'company', 'companies')}, ${yearsText(panel.firstYear, panel.lastYear)}`,
    inside: listed.members.slice(0, mostShown).map(toRow),
    outside: listed.candidates.slice(0, candidatesShown).map(toRow),
    inCount,
    outCount,
    notShown:
      Math.max(0, listed.members.length - mostShown) +
      Math.max(0, listed.candidates.length - mostShown),
    onRequest: Math.max(0, Math.min(listed.candidates.length, mostShown) - candidatesShown),
    missing: [...members, ...others.filter((company) => !isInside(company))]
      .filter((company) => reason(company).trim() === '')
      .map(({ name }) => name),
    own,
    members,
  };
}
