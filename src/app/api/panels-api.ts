import { Injectable, inject } from '@angular/core';
import {
  type ImportMapping,
  ImportReply,
  PanelCompaniesReply,
  PanelVersionReply,
  PanelVersionSummary,
  PanelVersionsReply,
  apiRoutes,
} from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient, addressOf } from './api-client';

/** Imports and panel versions. */
@Injectable({ providedIn: 'root' })
export class PanelsApi {
  readonly #client = inject(ApiClient);

  upload(file: File): Observable<ImportReply> {
    const body = new FormData();
    body.append('file', file, file.name);
    return this.#client.call(apiRoutes.uploadFile, ImportReply, { body });
  }

  openSample(): Observable<ImportReply> {
    return this.#client.call(apiRoutes.useSample, ImportReply);
  }

  readImport(importId: string): Observable<ImportReply> {
    return this.#client.call(apiRoutes.readImport, ImportReply, { path: { importId } });
  }

  check(importId: string, mapping: ImportMapping): Observable<ImportReply> {
    return this.#client.call(apiRoutes.checkImport, ImportReply, {
      path: { importId },
      body: mapping,
    });
  }

  commit(importId: string, note: string): Observable<PanelVersionSummary> {
    return this.#client.call(apiRoutes.commitImport, PanelVersionSummary, {
      path: { importId },
      body: { note },
    });
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

  /** Where the file can be downloaded as it was uploaded. */
  fileAddress(fileId: string): string {
    return addressOf(apiRoutes.downloadFile, { fileId });
  }
}
