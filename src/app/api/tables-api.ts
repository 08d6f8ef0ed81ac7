import { Injectable, inject } from '@angular/core';
import { type TableFile, apiRoutes } from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

export type TableFormat = 'csv' | 'xlsx';

/** Tables of a page as files. */
@Injectable({ providedIn: 'root' })
export class TablesApi {
  readonly #client = inject(ApiClient);

  fileOf(table: TableFile, format: TableFormat): Observable<Blob> {
    return this.#client.file(apiRoutes.makeTableFile, { path: { format }, body: table });
  }
}
