import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { findPanelVersion } from './find-panel-version';
import type { Actor } from './import-draft';
import type { PanelExport } from './panel-table';

export type ExportFormat = 'csv' | 'xlsx';

/** Takes panel versions out of Kinvale. */
export class PanelExportService {
  constructor(private readonly repositories: Repositories) {}

  /** Records who took it. @throws {NotFound} */
  async export(actor: Actor, versionId: string, format: ExportFormat): Promise<PanelExport> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const version = await findPanelVersion(tx, versionId);
      const rows = await tx.panelRows.block(versionId, version.columns.length);
      const attributes = await tx.panels.companyAttributes(versionId);
      await record(tx, actor.personId, 'panel-exported', versionId, { format });
      return { version, rows, attributes };
    });
  }

  /** What an export would be of. @throws {NotFound} */
  async version(workspaceId: string, versionId: string): Promise<PanelVersionRow> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findPanelVersion(tx, versionId));
  }
}
