import { Injectable, inject } from '@angular/core';
import {
  type ComposeEdition,
  EditionHistoryReply,
  EditionPreviewReply,
  EditionReply,
  EditionVerification,
  EditionsReply,
  type PublishEdition,
  type Unit,
  type WriteComment,
  apiRoutes,
} from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient, addressOf } from './api-client';

/** How an edition is taken out. */
export type EditionFormat =
  { readonly format: 'pdf'; readonly paper: 'a4' | 'letter' } | { readonly format: 'xlsx' };

/** Editions of the board. */
@Injectable({ providedIn: 'root' })
export class EditionsApi {
  readonly #client = inject(ApiClient);

  list(): Observable<EditionsReply> {
    return this.#client.call(apiRoutes.listEditions, EditionsReply);
  }

  read(editionId: string): Observable<EditionReply> {
    return this.#client.call(apiRoutes.readEdition, EditionReply, { path: { editionId } });
  }

  /** The standing over the editions that were signed. */
  history(): Observable<EditionHistoryReply> {
    return this.#client.call(apiRoutes.readEditionHistory, EditionHistoryReply);
  }

  /** The edition as publishing would freeze it now; nothing is stored. */
  preview(body: ComposeEdition): Observable<EditionPreviewReply> {
    return this.#client.call(apiRoutes.previewEdition, EditionPreviewReply, { body });
  }

  publish(body: PublishEdition): Observable<EditionReply> {
    return this.#client.call(apiRoutes.publishEdition, EditionReply, { body });
  }

  /** Whether the stored content still has the hashes recorded at publication and signature. */
  verify(editionId: string): Observable<EditionVerification> {
    return this.#client.call(apiRoutes.verifyEdition, EditionVerification, {
      path: { editionId },
    });
  }

  /** Notes that the CFO opened a warning. */
  openWarning(editionId: string, warningId: string): Observable<void> {
    return this.#client.send(apiRoutes.openWarning, { path: { editionId, warningId } });
  }

  comment(editionId: string, body: WriteComment): Observable<EditionReply> {
    return this.#client.call(apiRoutes.commentEdition, EditionReply, { path: { editionId }, body });
  }

  sign(editionId: string, password: string): Observable<EditionReply> {
    return this.#client.call(apiRoutes.signEdition, EditionReply, {
      path: { editionId },
      body: { password },
    });
  }

  sendBack(editionId: string, comment: string): Observable<EditionReply> {
    return this.#client.call(apiRoutes.returnEdition, EditionReply, {
      path: { editionId },
      body: { comment },
    });
  }

  /** Where an edition is had as a file, its figures in `unit`. */
  exportAddress(editionId: string, file: EditionFormat, unit: Unit): string {
    const { format } = file;
    const query = new URLSearchParams({ unit });
    if (file.format === 'pdf') query.set('paper', file.paper);
    return `${addressOf(apiRoutes.exportEdition, { editionId, format })}?${query.toString()}`;
  }
}
