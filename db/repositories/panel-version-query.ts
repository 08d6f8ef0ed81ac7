import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

/** Versions of the panels of a workspace, each with its panel's name, its file, who made it and what it puts back. */
export function panelVersionQuery(db: Kysely<Database>, workspaceId: string) {
  return db
    .selectFrom('panelVersion')
    .innerJoin('panel', (join) =>
      join
        .onRef('panel.workspaceId', '=', 'panelVersion.workspaceId')
        .onRef('panel.id', '=', 'panelVersion.panelId'),
    )
    .innerJoin('storedFile', (join) =>
      join
        .onRef('storedFile.workspaceId', '=', 'panelVersion.workspaceId')
        .onRef('storedFile.id', '=', 'panelVersion.fileId'),
    )
    .innerJoin('person', 'person.id', 'panelVersion.createdBy')
    .leftJoin('panelVersion as restored', (join) =>
      join
        .onRef('restored.workspaceId', '=', 'panelVersion.workspaceId')
        .onRef('restored.id', '=', 'panelVersion.restoredId'),
    )
    .select([
      'panelVersion.id',
      'panelVersion.panelId',
      'panel.name as panelName',
      'panelVersion.number',
      'panelVersion.parentId',
      'panelVersion.origin',
      'restored.number as restoredNumber',
      'panelVersion.currency',
      'panelVersion.unit',
      'panelVersion.companyHeader',
      'panelVersion.yearHeader',
      'panelVersion.columns',
      'panelVersion.note',
      'panelVersion.companies',
      'panelVersion.rowCount',
      'panelVersion.firstYear',
      'panelVersion.lastYear',
      'panelVersion.createdAt',
      'person.name as createdByName',
      'storedFile.id as fileId',
      'storedFile.name as fileName',
      'storedFile.byteSize as fileByteSize',
      'storedFile.sha256 as fileSha256',
    ])
    .where('panelVersion.workspaceId', '=', workspaceId);
}
