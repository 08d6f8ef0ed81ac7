import type { PanelBlockRows } from '../../db/repositories/panel-rows-repository';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { NotFound } from '../errors/app-error';
import { type CompanySummary, companySummaries } from './company-summaries';
import { findPanelVersion } from './find-panel-version';
import type { Actor } from './import-draft';

/** Panel versions and what is in them. */
export class PanelService {
  constructor(private readonly repositories: Repositories) {}

  async list(workspaceId: string): Promise<readonly PanelVersionRow[]> {
    return this.repositories.inWorkspace(workspaceId, (tx) => tx.panels.listVersions());
  }

  /** @throws {NotFound} */
  async version(workspaceId: string, id: string): Promise<PanelVersionRow> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findPanelVersion(tx, id));
  }

  /** In order of company and year. @throws {NotFound} */
  async rows(
    workspaceId: string,
    id: string,
  ): Promise<{ readonly version: PanelVersionRow; readonly rows: PanelBlockRows }> {
    const version = await this.version(workspaceId, id);
    const rows = await this.repositories.inWorkspace(workspaceId, (tx) =>
      tx.panelRows.block(id, version.columns.length),
    );
    return { version, rows };
  }

  /** One summary a company, in order of name. @throws {NotFound} */
  async companies(workspaceId: string, id: string): Promise<readonly CompanySummary[]> {
    const version = await this.version(workspaceId, id);
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const rows = await tx.panelRows.block(id, version.columns.length);
      const described = await tx.panels.companyAttributes(id);
      const attributes = new Map(described.map((row) => [row.company, row.attributes]));
      return companySummaries(version, rows, attributes);
    });
  }

  /** The file as it was uploaded. @throws {NotFound} */
  async download(
    actor: Actor,
    fileId: string,
  ): Promise<{ readonly name: string; readonly content: Buffer }> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const file = await tx.files.find(fileId);
      if (file === undefined) throw new NotFound('There is no such file.');
      await record(tx, actor.personId, 'file-downloaded', fileId);
      return { name: file.name, content: file.content };
    });
  }
}
