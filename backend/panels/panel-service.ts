import type { PanelRows, PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { NotFound } from '../errors/app-error';
import type { Actor } from './import-service';

export interface CompanySummary {
  readonly name: string;
  readonly rows: number;
  readonly completeRows: number;
  readonly firstYear: number;
  readonly lastYear: number;
  readonly marketValue: number | null;
  readonly capex: number | null;
  readonly bookEquity: number | null;
}

/** Panel versions and what is in them. */
export class PanelService {
  constructor(private readonly repositories: Repositories) {}

  async list(workspaceId: string): Promise<readonly PanelVersionRow[]> {
    return this.repositories.inWorkspace(workspaceId, (tx) => tx.panels.listVersions());
  }

  /** @throws {NotFound} */
  async version(workspaceId: string, id: string): Promise<PanelVersionRow> {
    const found = await this.repositories.inWorkspace(workspaceId, (tx) =>
      tx.panels.findVersion(id),
    );
    if (found === undefined) throw new NotFound('There is no such panel version.');
    return found;
  }

  /** @throws {NotFound} */
  async rows(
    workspaceId: string,
    id: string,
    companies?: readonly string[],
  ): Promise<{ readonly version: PanelVersionRow; readonly rows: PanelRows }> {
    const version = await this.version(workspaceId, id);
    const rows = await this.repositories.inWorkspace(workspaceId, (tx) =>
      tx.panels.rows(id, companies),
    );
    return { version, rows };
  }

  /** One summary a company, in order of name. @throws {NotFound} */
  async companies(workspaceId: string, id: string): Promise<readonly CompanySummary[]> {
    const { rows } = await this.rows(workspaceId, id);
    const byName = new Map<string, number[]>();
    rows.company.forEach((name, row) => {
      const known = byName.get(name);
      if (known === undefined) byName.set(name, [row]);
      else known.push(row);
    });
    return [...byName].map(([name, indices]) => summarise(name, indices, rows));
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

/** The model's three columns come first in a panel's cells. */
const modelColumns = [0, 1, 2] as const;

function summarise(name: string, indices: readonly number[], rows: PanelRows): CompanySummary {
  const last = (column: number): number | null => {
    for (const row of [...indices].reverse()) {
      const value = rows.cells[row][column];
      if (value !== null) return value;
    }
    return null;
  };
  return {
    name,
    rows: indices.length,
    completeRows: indices.filter((row) =>
      modelColumns.every((column) => rows.cells[row][column] !== null),
    ).length,
    firstYear: rows.year[indices[0]],
    lastYear: rows.year[indices[indices.length - 1]],
    marketValue: last(0),
    capex: last(1),
    bookEquity: last(2),
  };
}
