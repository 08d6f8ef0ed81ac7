import type { PanelVersionSummary } from '@contract';
import type { ShownContext, StaleNotice } from '../ui/page-context';
import { yearsText } from '../ui/phrases';
import { newestOf } from './versions/version-words';

/** What the frame shows around a panel version. */
export function panelContext(
  version: PanelVersionSummary,
  versions: readonly PanelVersionSummary[],
  ownCompany: string | null,
): ShownContext {
  return {
    currency: version.currency,
    unit: version.unit,
    lineage: [
      {
        label: 'Panel',
        version: `v${version.number}`,
        detail: yearsText(version.firstYear, version.lastYear),
        link: `/panel/${version.id}`,
      },
    ],
    stale: staleNotice(version, versions),
    ...(ownCompany === null ? {} : { ownCompany }),
  };
}

/** Said where the panel that is shown has a newer version. */
function staleNotice(
  shown: PanelVersionSummary,
  versions: readonly PanelVersionSummary[],
): StaleNotice | null {
  const newest = newestOf(shown, versions);
  if (newest.id === shown.id) return null;
  return {
    text: `This panel has a newer version, v${newest.number}.`,
    action: { label: 'Open it', link: `/panel/${newest.id}` },
  };
}

/** Where a version's figures come from, as a line under what leaves the page. */
export function versionSource(version: PanelVersionSummary | undefined): string {
  if (version === undefined) return '';
  const { panelName, number, origin, file } = version;
  const changed = origin === 'import' ? '' : ' and later changes';
  return `${panelName} v${number}: file ${file.name}, SHA-256 ${file.sha256}${changed}`;
}
