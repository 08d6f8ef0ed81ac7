import type { PanelVersionSummary } from '@contract';

/** What made a version, and who: `from a file by Ilvo Brenn`, `version 1 put back by Mira Oduya, after v2`. */
export function originWords(
  version: PanelVersionSummary,
  versions: readonly PanelVersionSummary[],
): string {
  const parent = versions.find(({ id }) => id === version.parentId);
  const by = `by ${version.createdBy}`;
  const after = parent === undefined ? '' : `, after v${parent.number}`;
  switch (version.origin) {
    case 'import':
      return `from a file ${by}${after}`;
    case 'correction':
      return parent === undefined ? `corrections ${by}` : `corrections of v${parent.number} ${by}`;
    case 'restore':
      return `version ${version.restoredNumber} put back ${by}${after}`;
  }
}

/** The newest version of the same panel. */
export function newestOf(
  version: PanelVersionSummary,
  versions: readonly PanelVersionSummary[],
): PanelVersionSummary {
  return versions
    .filter(({ panelId }) => panelId === version.panelId)
    .reduce((latest, other) => (other.number > latest.number ? other : latest), version);
}

/** The two versions with the older one first; null until there are two of the same panel. */
export function orderedPair(
  chosen: readonly PanelVersionSummary[],
): readonly [PanelVersionSummary, PanelVersionSummary] | null {
  const [older, newer] = [...chosen].sort((left, right) => left.number - right.number);
  return newer?.panelId === older?.panelId && newer !== undefined ? [older, newer] : null;
}
