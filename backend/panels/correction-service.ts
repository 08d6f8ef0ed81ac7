import { randomUUID } from 'node:crypto';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, Invalid } from '../errors/app-error';
import { correctedRows, type Corrections, rowsNamed } from './corrected-rows';
import { findPanelVersion } from './find-panel-version';
import type { Actor } from './import-draft';

/** Makes the next version of a panel by mending the newest one, or by putting an older one back. */
export class CorrectionService {
  constructor(private readonly repositories: Repositories) {}

  /**
   * All of the corrections become the next version, or none of them.
   *
   * @throws {NotFound}; {Conflict} `stale-version` when a newer version exists; {Invalid} for a row or cell that is not
   *   as the corrections say, and when no row would be left.
   */
  async save(actor: Actor, versionId: string, corrections: Corrections): Promise<PanelVersionRow> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const { version, newest } = await lockPanel(tx, versionId);
      if (newest.id !== versionId) throw overtaken(newest);
      const columns = version.columns.map(({ name }) => name);
      const held = await tx.panelCopies.rowsAt(versionId, rowsNamed(corrections));
      const rows = await correctedRows(columns, held, corrections);
      const extent = await tx.panelCopies.extentAfter(versionId, rows);
      if (extent === undefined)
        throw new Invalid('A panel needs at least one row; none would stay.');
      const { note, cells } = corrections;
      const id = randomUUID();
      await tx.panelCopies.insertVersion({
        ...{ id, note, ...extent },
        origin: 'correction',
        sourceId: versionId,
        parentId: versionId,
        number: version.number + 1,
        createdBy: actor.personId,
      });
      await tx.panelCopies.copyRows(versionId, id, [...rows.changed, ...rows.removed]);
      await tx.panelCopies.copyChanged(versionId, id, rows.changed);
      await tx.panelCopies.insertTyped(id, rows.added);
      await tx.panelCopies.copyCompanies(versionId, id);
      const reasons = cells.map(({ column, ...cell }) => ({ ...cell, columnIndex: column }));
      await tx.panelCorrections.insert(id, reasons);
      await record(tx, actor.personId, 'panel-corrected', id, {
        cells: cells.length,
        addedRows: rows.added.length,
        removedRows: rows.removed.length,
      });
      return findPanelVersion(tx, id);
    });
  }

  /**
   * The next version holds what an older one holds, with that one's columns, currency and unit.
   *
   * @throws {NotFound}; {Conflict} for the newest version.
   */
  async restore(actor: Actor, versionId: string, note: string): Promise<PanelVersionRow> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const { version, newest } = await lockPanel(tx, versionId);
      if (newest.id === versionId)
        throw new Conflict(`Version ${version.number} is the newest one; it holds already.`);
      const { companies, rowCount, firstYear, lastYear } = version;
      const id = randomUUID();
      await tx.panelCopies.insertVersion({
        ...{ id, note, companies, rowCount, firstYear, lastYear },
        origin: 'restore',
        sourceId: versionId,
        parentId: newest.id,
        number: newest.number + 1,
        createdBy: actor.personId,
      });
      await tx.panelCopies.copyRows(versionId, id);
      await tx.panelCopies.copyCompanies(versionId, id);
      await record(tx, actor.personId, 'panel-restored', id, { restored: versionId });
      return findPanelVersion(tx, id);
    });
  }
}

/** Nobody else adds a version to the panel until the transaction ends. @throws {NotFound} */
async function lockPanel(
  tx: WorkspaceRepositories,
  versionId: string,
): Promise<{ readonly version: PanelVersionRow; readonly newest: PanelVersionRow }> {
  const version = await findPanelVersion(tx, versionId);
  await tx.panels.lockName(version.panelName);
  return { version, newest: (await tx.panels.findLatest(version.panelId)) ?? version };
}

function overtaken(newest: PanelVersionRow): Conflict {
  return new Conflict(
    `${newest.createdByName} made version ${newest.number} of this panel meanwhile.`,
    'stale-version',
    { latestId: newest.id },
  );
}
