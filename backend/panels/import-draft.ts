import type { ImportRow } from '../../db/repositories/imports-repository';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import type { FileRecipe } from '../compute/file-recipe';
import type { FileCheck, FilePreview } from '../compute/parse-messages';
import { Conflict, NotFound } from '../errors/app-error';

/** What the analyst says of a file. */
export interface PanelMapping extends FileRecipe {
  readonly panelName: string;
}

/** What a check found, with the version that its changes are changes of. */
export interface ImportCheck extends Omit<FileCheck, 'changes'> {
  readonly changes:
    | (NonNullable<FileCheck['changes']> & {
        readonly panelVersionId: string;
        readonly number: number;
      })
    | null;
}

export interface ImportDraft {
  readonly id: string;
  readonly fileName: string;
  readonly byteSize: number;
  readonly state: ImportRow['state'];
  readonly preview: FilePreview;
  readonly mapping: Partial<PanelMapping>;
  readonly check: ImportCheck | null;
  readonly progress: ImportRow['progress'];
  readonly failure: string | null;
  readonly panelVersionId: string | null;
}

export interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

/** @throws {NotFound} */
export async function findImport(tx: WorkspaceRepositories, importId: string): Promise<ImportRow> {
  const found = await tx.imports.find(importId);
  if (found === undefined) throw new NotFound('There is no such import.');
  return found;
}

export function toDraft(row: ImportRow): ImportDraft {
  return {
    id: row.id,
    fileName: row.fileName,
    byteSize: row.byteSize,
    state: row.state,
    preview: row.preview as FilePreview,
    mapping: row.mapping,
    check: row.findings as ImportCheck | null,
    progress: row.progress,
    failure: row.failure,
    panelVersionId: row.panelVersionId,
  };
}

/** @throws {Conflict} for an import whose rows are being written, or that is a panel version already. */
export function assertOpen({ state }: Pick<ImportRow, 'state'>): void {
  if (state === 'committed') throw new Conflict('This import is a panel version already.');
  if (state === 'committing')
    throw new Conflict('This import is being made a panel version. Wait for it, or cancel it.');
}
