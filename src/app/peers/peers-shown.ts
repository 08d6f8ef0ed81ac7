import { nearestFirst } from './nearness';
import { type PanelCompany, type PeerDraft, reasonOf } from './peer-draft';
import type { PeerRow } from './peer-table';
import { peersFinding } from './peer-words';
import type { PeersGround } from './peers-store';
import { counted, yearsText } from '../ui/phrases';

const mostShown = 200;

export interface PeersShown {
  readonly finding: string;
  readonly source: string;
  /** Every peer by name; at most 200 of those that the search finds. */
  readonly inside: readonly PeerRow[];
  /** Nearest to the own company in size first; at most 200 of those that the search finds. */
  readonly outside: readonly PeerRow[];
  readonly inCount: number;
  readonly outCount: number;
  readonly notShown: number;
  /** Companies without a written reason. */
  readonly missing: readonly string[];
  readonly own: PanelCompany | undefined;
  readonly needsSearch: boolean;
}

const manyCompanies = 30;

/** What the page shows of a choice of peers. */
export function peersShown(ground: PeersGround, draft: PeerDraft, search: string): PeersShown {
  const { companies, panelVersions } = ground;
  const own = companies.find(({ name }) => name === draft.ownCompany);
  const others = companies.filter((company) => company !== own);
  const isInside = ({ name }: PanelCompany): boolean =>
    draft.choices.get(name)?.isIncluded ?? false;
  const inside = others.filter(isInside);
  const outside = nearestFirst(
    others.filter((company) => !isInside(company)),
    own,
  );
  const toRow = (company: PanelCompany): PeerRow => {
    const choice = draft.choices.get(company.name);
    return {
      company,
      reason: choice === undefined ? '' : reasonOf(choice),
      ...(ground.without === null
        ? {}
        : { standingWithout: ground.without.byCompany.get(company.name) ?? null }),
    };
  };
  const missing = [...inside, ...outside]
    .map(toRow)
    .filter(({ reason }) => reason.trim() === '')
    .map(({ company }) => company.name);
  const wanted = search.trim().toLowerCase();
  const found = (list: readonly PanelCompany[]): readonly PanelCompany[] =>
    list.filter(({ name }) => name.toLowerCase().includes(wanted));
  const [shownInside, shownOutside] = [found(inside), found(outside)];
  const panel = panelVersions.find(({ id }) => id === draft.panelVersionId);
  return {
    finding: peersFinding(draft.ownCompany, inside.length, outside.length),
    source:
      panel === undefined
        ? ''
        : `${panel.panelName} v${panel.number} · ${counted(panel.companies, 'company', 'companies')}, ${yearsText(panel.firstYear, panel.lastYear)}`,
    inside: shownInside.slice(0, mostShown).map(toRow),
    outside: shownOutside.slice(0, mostShown).map(toRow),
    inCount: inside.length,
    outCount: outside.length,
    notShown:
      Math.max(0, shownInside.length - mostShown) + Math.max(0, shownOutside.length - mostShown),
    missing,
    own,
    needsSearch: companies.length > manyCompanies,
  };
}
