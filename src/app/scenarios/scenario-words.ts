import type { DeskReply, FitReply } from '@contract';
import type { ShownContext, StaleNotice } from '../ui/page-context';
import type { ScenarioGround } from './scenario-ground';

const hashLength = 6;

export function shortHash(fit: FitReply): string {
  return (fit.fit.hash ?? '').slice(0, hashLength);
}

/** What the frame shows around a plan: whose figures, and panel › peers › fit › scenario. */
export function contextOf({ fit, saved, desk }: ScenarioGround, name: string): ShownContext {
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
        detail: `${peerGroup.peerCount} peers`,
        link: `/peers/${peerGroup.id}`,
      },
      { label: 'Fit', version: shortHash(fit), link: `/fit/${fit.fit.id}` },
      ...(saved === null ? [] : [{ label: name, link: `/scenarios/${saved.id}` }]),
    ],
    stale: staleNotice(fit, desk),
  };
}

function staleNotice(fit: FitReply, desk: DeskReply): StaleNotice | null {
  const { panelVersion, peerGroup } = desk;
  const refit = { label: 'Refit', link: '/fit' };
  if (panelVersion !== null && panelVersion.number > fit.panelVersion.number)
    return { text: `Panel has a newer version, v${panelVersion.number}.`, action: refit };
  if (peerGroup !== null && peerGroup.number > fit.peerGroup.number)
    return { text: `Peers have a newer version, v${peerGroup.number}.`, action: refit };
  return null;
}
