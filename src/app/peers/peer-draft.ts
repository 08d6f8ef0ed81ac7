import type { PanelCompaniesReply, PeerChoice, PeerGroupReply, SavePeerGroup } from '@contract';

export type PanelCompany = PanelCompaniesReply['companies'][number];

/** What is chosen for one company; the reason of the other side is kept, so that moving back loses nothing. */
export interface DraftChoice {
  readonly isIncluded: boolean;
  readonly reasonIn: string;
  readonly reasonOut: string;
}

/** A choice of peers as it stands on the screen, before it is saved. */
export interface PeerDraft {
  readonly panelVersionId: string;
  /** Empty until one is chosen. */
  readonly ownCompany: string;
  /** By company; the own company's entry is kept and not counted. */
  readonly choices: ReadonlyMap<string, DraftChoice>;
}

const allIn: DraftChoice = { isIncluded: true, reasonIn: '', reasonOut: '' };
const notYetIn: DraftChoice = { isIncluded: false, reasonIn: '', reasonOut: '' };
/** A panel of more companies is a pool to choose from: the first choice starts with nobody in. */
const mostStartingIn = 30;

/**
 * The choice to start from: the saved version's on the panel version given. Where none is saved yet, everybody is in, or
 * nobody in a panel of more than 30 companies. A company that the saved version does not know starts outside, without a reason.
 */
export function startDraft(
  panelVersionId: string,
  companies: readonly PanelCompany[],
  saved: PeerGroupReply | null,
): PeerDraft {
  const known = new Map(saved?.peers.map((peer) => [peer.company, peer]));
  const atFirst = saved === null && companies.length <= mostStartingIn ? allIn : notYetIn;
  const isThere = companies.some(({ name }) => name === saved?.ownCompany);
  return {
    panelVersionId,
    ownCompany: isThere ? (saved?.ownCompany ?? '') : '',
    choices: new Map(
      companies.map(({ name }) => {
        const peer = known.get(name);
        return [name, peer === undefined ? atFirst : toDraftChoice(peer)];
      }),
    ),
  };
}

/** The same choices on another panel version: its new companies start outside, lost ones fall away. */
export function moveDraft(
  draft: PeerDraft,
  panelVersionId: string,
  companies: readonly PanelCompany[],
): PeerDraft {
  return {
    panelVersionId,
    ownCompany: companies.some(({ name }) => name === draft.ownCompany) ? draft.ownCompany : '',
    choices: new Map(companies.map(({ name }) => [name, draft.choices.get(name) ?? notYetIn])),
  };
}

export function changeChoice(
  draft: PeerDraft,
  company: string,
  change: Partial<DraftChoice>,
): PeerDraft {
  const choices = new Map(draft.choices);
  choices.set(company, { ...(choices.get(company) ?? notYetIn), ...change });
  return { ...draft, choices };
}

/**
 * Puts several companies on one side with one reason; `replaces` writes it also where another reason of that side
 * stands.
 */
export function changeChoices(
  draft: PeerDraft,
  companies: readonly string[],
  to: { readonly isIncluded: boolean; readonly reason: string; readonly replaces: boolean },
): PeerDraft {
  const { isIncluded, reason } = to;
  return companies.reduce((changed, company) => {
    const before = changed.choices.get(company) ?? notYetIn;
    const written = isIncluded ? before.reasonIn : before.reasonOut;
    const kept = written.trim() === '' || to.replaces ? reason : written;
    return changeChoice(changed, company, {
      isIncluded,
      ...(isIncluded ? { reasonIn: kept } : { reasonOut: kept }),
    });
  }, draft);
}

/** How many of the companies have a reason for standing on that side. */
export function writtenCount(
  draft: PeerDraft,
  companies: readonly string[],
  isIncluded: boolean,
): number {
  return companies.filter((company) => {
    const choice = draft.choices.get(company) ?? notYetIn;
    return (isIncluded ? choice.reasonIn : choice.reasonOut).trim() !== '';
  }).length;
}

/** The reason that counts: of the side the company is on. */
export function reasonOf(choice: DraftChoice): string {
  return choice.isIncluded ? choice.reasonIn : choice.reasonOut;
}

/** Every company but the own one, as it is sent to be saved. */
export function chosenPeers(draft: PeerDraft): PeerChoice[] {
  return [...draft.choices]
    .filter(([company]) => company !== draft.ownCompany)
    .map(([company, choice]) => ({
      company,
      isIncluded: choice.isIncluded,
      reason: reasonOf(choice).trim(),
    }));
}

export function toSavePeerGroup(
  draft: PeerDraft,
  note: string,
  parentId: string | null,
): SavePeerGroup {
  return {
    panelVersionId: draft.panelVersionId,
    ownCompany: draft.ownCompany,
    note: note.trim(),
    parentId,
    peers: chosenPeers(draft),
  };
}

/** Whether saving would make a version that says anything else than the saved one. */
export function isChanged(draft: PeerDraft, saved: PeerGroupReply | null): boolean {
  if (saved === null) return true;
  if (draft.panelVersionId !== saved.panelVersionId || draft.ownCompany !== saved.ownCompany)
    return true;
  const before = new Map(saved.peers.map((peer) => [peer.company, peer]));
  const now = chosenPeers(draft);
  return (
    now.length !== before.size ||
    now.some((peer) => {
      const old = before.get(peer.company);
      return old?.isIncluded !== peer.isIncluded || old.reason !== peer.reason;
    })
  );
}

/** Whether two drafts say the same, kept reasons of the other side included. */
export function isSameDraft(a: PeerDraft, b: PeerDraft): boolean {
  if (a.panelVersionId !== b.panelVersionId || a.ownCompany !== b.ownCompany) return false;
  return [...a.choices].every(([company, choice]) => {
    const other = b.choices.get(company);
    return (
      other?.isIncluded === choice.isIncluded &&
      other.reasonIn === choice.reasonIn &&
      other.reasonOut === choice.reasonOut
    );
  });
}

/** Companies of the saved version that the panel version in use no longer has. */
export function lostCompanies(
  saved: PeerGroupReply | null,
  companies: readonly PanelCompany[],
): readonly string[] {
  const present = new Set(companies.map(({ name }) => name));
  return (saved?.peers ?? []).map(({ company }) => company).filter((name) => !present.has(name));
}

/** Each reason once, in the order of first use. */
export function reasonsWritten(draft: PeerDraft): readonly string[] {
  const reasons = [...draft.choices.values()]
    .flatMap(({ reasonIn, reasonOut }) => [reasonIn.trim(), reasonOut.trim()])
    .filter((reason) => reason !== '');
  return [...new Set(reasons)];
}

function toDraftChoice({ isIncluded, reason }: PeerChoice): DraftChoice {
  return {
    isIncluded,
    reasonIn: isIncluded ? reason : '',
    reasonOut: isIncluded ? '' : reason,
  };
}
