import type { ShownContext, StaleNotice } from '../ui/page-context';
import type { PeerDraft } from './peer-draft';

import type { PeersGround } from './peers-ground';
import { counted, yearsText } from '../ui/phrases';

/** What the frame shows around the choice of peers. */
export function peersContext(ground: PeersGround, draft: PeerDraft): ShownContext {
  const { saved } = ground;
  const panel = ground.panelVersions.find(({ id }) => id === draft.panelVersionId);
  if (panel === undefined) return {};
  return {
    ownCompany: draft.ownCompany,
    currency: panel.currency,
    unit: panel.unit,
    lineage: [
      {
        label: 'Panel',
        version: `v${panel.number}`,
        detail: yearsText(panel.firstYear, panel.lastYear),
        link: `/panel/${panel.id}`,
      },
      ...(saved === null
        ? []
        : [
            {
              label: 'Peers',
              version: `v${saved.number}`,
              detail: counted(saved.peerCount + 1, 'company', 'companies'),
              link: `/peers/${saved.id}`,
            },
          ]),
    ],
    stale: staleNotice(ground, draft),
  };
}

function staleNotice({ saved, versions, panelVersions }: PeersGround, draft: PeerDraft) {
  const newestGroup = versions[0];
  if (saved !== null && newestGroup !== undefined && newestGroup.id !== saved.id)
    return {
      text: `Peer group has a newer version, v${newestGroup.number}.`,
      action: { label: 'Open it', link: `/peers/${newestGroup.id}` },
    } satisfies StaleNotice;
  const newestPanel = panelVersions[0];
  if (newestPanel !== undefined && newestPanel.id !== draft.panelVersionId)
    return {
      text: `Panel has a newer version, v${newestPanel.number}.`,
      action: { label: 'Use it for these peers', link: '/peers' },
    } satisfies StaleNotice;
  return null;
}
