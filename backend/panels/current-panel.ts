import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import type { PanelBlock } from '../compute/parse-messages';

/** The newest version of a panel with its rows. */
export interface CurrentPanel {
  readonly version: PanelVersionRow;
  readonly block: PanelBlock;
}

/** The newest version of the panel of this name; undefined for a name that no panel has. */
export async function currentPanel(
  tx: WorkspaceRepositories,
  panelName: string,
): Promise<CurrentPanel | undefined> {
  const version = await tx.panels.findLatestByName(panelName);
  if (version === undefined) return undefined;
  const rows = await tx.panelRows.block(version.id, version.columns.length);
  const { companies, company, year, values } = rows;
  return { version, block: { companies, company, year, columns: version.columns, values } };
}
