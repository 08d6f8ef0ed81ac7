import type { DeskReply, FitReply } from '@contract';
import { formatDate } from '@angular/common';
import type { ShownContext, StaleNotice } from './page-context';
import { counted, shortHash, yearsText } from './phrases';

/** What the frame shows around a fit. */
export function fitContext(reply: FitReply, desk: DeskReply, locale: string): ShownContext {
  const { fit, panelVersion, peerGroup } = reply;
  return {
    ownCompany: fit.ownCompany,
    currency: panelVersion.currency,
    unit: panelVersion.unit,
    lineage: [
      {
        label: 'Panel',
        version: `v${panelVersion.number}`,
        detail: yearsText(panelVersion.firstYear, panelVersion.lastYear),
        link: `/panel/${panelVersion.id}`,
      },
      {
        label: 'Peers',
        version: `v${peerGroup.number}`,
        detail: counted(peerGroup.peerCount + 1, 'company', 'companies'),
        link: `/peers/${peerGroup.id}`,
      },
      {
        label: 'Fit',
        ...(fit.hash === null ? {} : { version: shortHash(fit.hash) }),
        detail: formatDate(fit.createdAt, 'd MMM y', locale),
        link: `/fit/${fit.id}`,
      },
    ],
    stale: staleNotice(reply, desk),
  };
}

/** What has a newer version than the fit stands on, and where to go on from there. */
export function staleNotice(
  { newerPanelVersion, peerGroup }: Pick<FitReply, 'newerPanelVersion' | 'peerGroup'>,
  desk: DeskReply,
): StaleNotice | null {
  const newest = desk.peerGroup;
  if (newerPanelVersion !== null) {
    const text = `Panel has a newer version, v${newerPanelVersion.number}.`;
    // Peers are chosen on a panel version: a refit on newer data starts with them.
    return newest?.panelVersionId === newerPanelVersion.id
      ? { text, action: { label: 'Refit', link: `/fit/from/${newest.id}` } }
      : { text, action: { label: 'Take the peers to it and refit', link: '/peers' } };
  }
  if (newest !== null && newest.id !== peerGroup.id)
    return {
      text: `Peer group has a newer version, v${newest.number}.`,
      action: { label: 'Refit', link: `/fit/from/${newest.id}` },
    };
  return null;
}
