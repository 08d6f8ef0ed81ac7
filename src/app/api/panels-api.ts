import { Injectable, inject } from '@angular/core';
import {
  CellHistoryReply,
  type DismissFlag,
  FlagDismissal,
  FlagDismissalsReply,
  type ImportMapping,
  ImportReply,
  OpenImportsReply,
  PanelCompaniesReply,
  PanelDifferencesReply,
  PanelVersionReply,
  PanelVersionSummary,
  PanelVersionsReply,
  type SaveCorrections,
  type TableReading,
  apiRoutes,
} from '@contract';
import { type Observable, exhaustMap, takeWhile, timer } from 'rxjs';
import { ApiClient, type Sending, addressOf } from './api-client';

const lookEveryMs = 300;

/** Imports and panel versions. */
@Injectable({ providedIn: 'root' })
export class PanelsApi {
  readonly #client = inject(ApiClient);

  /** How far the file is sent, then the import that it became. */
  upload(file: File): Observable<Sending<ImportReply>> {
    const body = new FormData();
    body.append('file', file, file.name);
    return this.#client.sendFile(apiRoutes.uploadFile, ImportReply, body);
  }

  openSample(): Observable<ImportReply> {
    return this.#client.call(apiRoutes.useSample, ImportReply);
  }

  /** The imports that are not a panel version yet, newest first. */
  openImports(): Observable<OpenImportsReply> {
    return this.#client.call(apiRoutes.listImports, OpenImportsReply);
  }

  readImport(importId: string): Observable<ImportReply> {
    return this.#client.call(apiRoutes.readImport, ImportReply, { path: { importId } });
  }

  /** Reads the file another way; the columns are recognised anew. */
  readAs(importId: string, reading: TableReading): Observable<ImportReply> {
    return this.#client.call(apiRoutes.readImportAs, ImportReply, {
      path: { importId },
      body: reading,
    });
  }

  check(importId: string, mapping: ImportMapping): Observable<ImportReply> {
    return this.#client.call(apiRoutes.checkImport, ImportReply, {
      path: { importId },
      body: mapping,
    });
  }

  /** Begins to make the import a panel version; `follow` tells how far that is. */
  commit(importId: string, note: string): Observable<ImportReply> {
    return this.#client.call(apiRoutes.commitImport, ImportReply, {
      path: { importId },
      body: { note },
    });
  }

  /** The import as it is now, and again while its rows are written; completes with the end of that. */
  follow(importId: string): Observable<ImportReply> {
    return timer(0, lookEveryMs).pipe(
      exhaustMap(() => this.readImport(importId)),
      takeWhile(({ state }) => state === 'committing', true),
    );
  }

  /** Ends the writing of an import's rows; what was written goes. */
  cancelCommit(importId: string): Observable<void> {
    return this.#client.send(apiRoutes.cancelCommit, { path: { importId } });
  }

  discard(importId: string): Observable<void> {
    return this.#client.send(apiRoutes.discardImport, { path: { importId } });
  }

  versions(): Observable<PanelVersionsReply> {
    return this.#client.call(apiRoutes.listPanelVersions, PanelVersionsReply);
  }

  version(panelVersionId: string): Observable<PanelVersionReply> {
    return this.#client.call(apiRoutes.readPanelVersion, PanelVersionReply, {
      path: { panelVersionId },
    });
  }

  companies(panelVersionId: string): Observable<PanelCompaniesReply> {
    return this.#client.call(apiRoutes.readPanelCompanies, PanelCompaniesReply, {
      path: { panelVersionId },
    });
  }

  /** Makes the corrections the next version of the panel: all of them or none. */
  saveCorrections(panelVersionId: string, body: SaveCorrections): Observable<PanelVersionSummary> {
    return this.#client.call(apiRoutes.saveCorrections, PanelVersionSummary, {
      path: { panelVersionId },
      body,
    });
  }

  /** Makes the next version hold what this older one holds. */
  restore(panelVersionId: string, note: string): Observable<PanelVersionSummary> {
    return this.#client.call(apiRoutes.restorePanelVersion, PanelVersionSummary, {
      path: { panelVersionId },
      body: { note },
    });
  }

  /** What changed from one version to another. */
  differences(panelVersionId: string, otherId: string): Observable<PanelDifferencesReply> {
    return this.#client.call(apiRoutes.readPanelDifferences, PanelDifferencesReply, {
      path: { panelVersionId, otherId },
    });
  }

  /** One cell through all versions of its panel; `column` is its position in this version. */
  cellHistory(
    panelVersionId: string,
    cell: { readonly company: string; readonly year: number; readonly column: number },
  ): Observable<CellHistoryReply> {
    return this.#client.call(apiRoutes.readCellHistory, CellHistoryReply, {
      path: { panelVersionId },
      query: { company: cell.company, year: String(cell.year), column: String(cell.column) },
    });
  }

  dismissals(panelId: string): Observable<FlagDismissalsReply> {
    return this.#client.call(apiRoutes.listFlagDismissals, FlagDismissalsReply, {
      path: { panelId },
    });
  }

  dismissFlag(panelId: string, flag: DismissFlag): Observable<FlagDismissal> {
    return this.#client.call(apiRoutes.dismissFlag, FlagDismissal, {
      path: { panelId },
      body: flag,
    });
  }

  takeBackDismissal(panelId: string, dismissalId: string): Observable<void> {
    return this.#client.send(apiRoutes.takeBackDismissal, { path: { panelId, dismissalId } });
  }

  /** Where the file can be downloaded as it was uploaded. */
  fileAddress(fileId: string): string {
    return addressOf(apiRoutes.downloadFile, { fileId });
  }

  /** Where the browser finds the panel version as a file; a CSV file has a decimal point unless told otherwise. */
  exportAddress(panelVersionId: string, format: 'csv' | 'xlsx', decimalSign?: '.' | ','): string {
    const address = addressOf(apiRoutes.exportPanelVersion, { panelVersionId, format });
    return decimalSign === undefined
      ? address
      : `${address}?decimalSign=${encodeURIComponent(decimalSign)}`;
  }

  /** Where the browser finds an empty table to fill in. */
  templateAddress(format: 'csv' | 'xlsx'): string {
    return addressOf(apiRoutes.downloadTemplate, { format });
  }
}
