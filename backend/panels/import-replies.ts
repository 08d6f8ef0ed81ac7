import type { OpenImportRow } from '../../db/repositories/imports-repository';
import type { ImportReply, OpenImportsReply } from '../contract';
import type { ImportDraft } from './import-draft';

export function toImportReply(draft: ImportDraft): ImportReply {
  const { preview, mapping, check } = draft;
  return mutableCopy({
    id: draft.id,
    fileName: draft.fileName,
    byteSize: draft.byteSize,
    state: draft.state,
    sheets: preview.sheets,
    reading: preview.reading,
    headers: preview.headers,
    firstRows: preview.firstRows,
    rowCount: preview.rowCount,
    topLines: preview.topLines,
    mapping,
    check,
    progress: draft.progress,
    failure: draft.failure,
    panelVersionId: draft.panelVersionId,
  });
}

export function toOpenImportsReply(imports: readonly OpenImportRow[]): OpenImportsReply {
  return {
    imports: imports.map(({ id, fileName, state, createdAt, createdBy }) => ({
      id,
      fileName,
      state,
      at: createdAt.toISOString(),
      by: createdBy,
    })),
  };
}

type Mutable<T> = T extends object ? { -readonly [Key in keyof T]: Mutable<T[Key]> } : T;

/** A copy may be changed by whoever gets it, so its type says so. */
function mutableCopy<T>(value: T): Mutable<T> {
  return structuredClone(value) as Mutable<T>;
}
