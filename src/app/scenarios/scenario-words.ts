import { formatDate } from '@angular/common';
import type { DeskReply, FitReply } from '@contract';
import type { ShownContext, StaleNotice } from '../ui/page-context';
import type { ScenarioGround } from './scenario-ground';

const hashLength = 6;

export function shortHash(fit: FitReply): string {
  return (fit.fit.hash ?? '').slice(0, hashLength);
}

/** What the frame shows around a plan: whose figures, and panel › peers › fit › scenario. */
export function contextOf(
  { fit, saved, desk }: Pick<ScenarioGround, 'fit' | 'saved' | 'desk'>,
  locale: string,
): ShownContext {
  const { panelVersion, peerGroup } = fit;
  return {
    ownCompany: fit.fit.ownCompany,
    currency: panelVersion.currency,
    unit: panelVersion.unit,
    lineage: [
      {
        label: 'Panel',
        version: `v${panelVersion.number}`,
        detail: `FY${panelVersion.firstYear}–FY${panelVersion.lastYear}`,
        link: `/panel/${panelVersion.id}`,
      },
      {
        label: 'Peers',
        version: `v${peerGroup.number}`,
        detail: `${peerGroup.peerCount + 1} companies`,
        link: `/peers/${peerGroup.id}`,
      },
      {
        label: 'Fit',
        version: shortHash(fit),
        detail: formatDate(fit.fit.createdAt, 'd MMM y', locale),
        link: `/fit/${fit.fit.id}`,
      },
      ...(saved === null
        ? []
        : [{ label: saved.name, version: `v${saved.version}`, link: `/scenarios/${saved.id}` }]),
    ],
    stale: staleNotice(fit, desk),
  };
}

/** What has a newer version than the plan's fit, and where to go on from there. */
function staleNotice(
  { panelVersion, peerGroup, fit }: FitReply,
  desk: DeskReply,
): StaleNotice | null {
  const peers = desk.peerGroup;
  if (desk.panelVersion !== null && desk.panelVersion.id !== panelVersion.id) {
    const text = `Panel has a newer version, v${desk.panelVersion.number}.`;
    // Peers are chosen on a panel version: a refit on newer data starts with them.
    return peers?.panelVersionId === desk.panelVersion.id
      ? { text, action: { label: 'Refit', link: `/fit/from/${peers.id}` } }
      : { text, action: { label: 'Take the peers to it and refit', link: '/peers' } };
  }
  if (peers !== null && peers.id !== peerGroup.id)
    return {
      text: `Peer group has a newer version, v${peers.number}.`,
      action: { label: 'Refit', link: `/fit/from/${peers.id}` },
    };
  if (desk.fit !== null && desk.fit.id !== fit.id)
    return { text: 'A newer fit is done.', action: { label: 'Plan on it', link: '/scenarios' } };
  return null;
}
