import type { PanelVersionSummary } from '@contract';

/** What made a version: `from a file`, `corrections of v2`, `an older version put back`. */
export function originWords(
  version: PanelVersionSummary,
  versions: readonly PanelVersionSummary[],
): string {
  const parent = versions.find(({ id }) => id === version.parentId);
  const before = parent === undefined ? '' : ` v${parent.number}`;
  switch (version.origin) {
    case 'import':
      return parent === undefined ? 'from a file' : `from a file, after${before}`;
    case 'correction':
      return parent === undefined ? 'corrections' : `corrections of${before}`;
    case 'restore':
      return parent === undefined
        ? 'an older version put back'
        : `an older version put back, after${before}`;
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
