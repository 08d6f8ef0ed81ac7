import type { PanelLine, PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { findPanelVersion } from './find-panel-version';
import type { Actor } from './import-draft';
import type { PanelExport } from './panel-table';

export type ExportFormat = 'csv' | 'xlsx';

/** Some milliseconds of work. */
const rowsInPart = 300;

/** Takes panel versions out of Kinvale. */
export class PanelExportService {
  constructor(private readonly repositories: Repositories) {}

  /** Records who took it. @throws {NotFound} */
  async export(actor: Actor, versionId: string, format: ExportFormat): Promise<PanelExport> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const version = await findPanelVersion(tx, versionId);
      const attributes = await tx.panels.companyAttributes(versionId);
      await record(tx, actor.personId, 'panel-exported', versionId, { format });
      return { version, attributes, parts: this.#parts(actor.workspaceId, versionId) };
    });
  }

  /** A transaction a part: no version ever changes, and whoever reads slowly holds no connection. */
  async *#parts(workspaceId: string, versionId: string): AsyncGenerator<readonly PanelLine[]> {
    let last: PanelLine | undefined;
    do {
      const part = await this.repositories.inWorkspace(workspaceId, (tx) =>
        tx.panels.rowsAfter(versionId, last, rowsInPart),
      );
      if (part.length > 0) yield part;
      last = part.length < rowsInPart ? undefined : part[part.length - 1];
    } while (last !== undefined);
  }

  /** What an export would be of. @throws {NotFound} */
  async version(workspaceId: string, versionId: string): Promise<PanelVersionRow> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findPanelVersion(tx, versionId));
  }
}
