import { Injectable, inject, signal } from '@angular/core';
import { Router } from '@angular/router';
import { type Observable, firstValueFrom, lastValueFrom, map, tap } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import type { ShownProblem } from '../../ui/problem';
import { refusalWords, refusedHere } from './refusal-words';

export type BringInView =
  | { readonly kind: 'idle' }
  /** `share` of the file that has been sent, 0 to 1; null while nobody knows. */
  | { readonly kind: 'sending'; readonly what: string; readonly share: number | null }
  | { readonly kind: 'failed'; readonly problem: ShownProblem };

/** Takes a file, or the sample, and leads to where its columns are named. */
@Injectable()
export class BringInStore {
  readonly #api = inject(PanelsApi);
  readonly #router = inject(Router);
  readonly #view = signal<BringInView>({ kind: 'idle' });

  readonly view = this.#view.asReadonly();

  upload(file: File): Promise<void> {
    const refused = refusedHere(file);
    if (refused !== null) {
      this.#view.set({ kind: 'failed', problem: refused });
      return Promise.resolve();
    }
    return this.#begin(file.name, this.#sent(file));
  }

  /** Takes a mended file in the place of an import, which is discarded once the file is there. */
  replace(importId: string, file: File): Promise<void> {
    return this.#begin(file.name, this.#sent(file), importId);
  }

  openSample(): Promise<void> {
    const call = this.#api.openSample().pipe(map(({ id }) => id));
    return this.#begin('the sample panel', call);
  }

  /** @returns the import's id, after the views of the way there. */
  #sent(file: File): Observable<string> {
    return this.#api.upload(file).pipe(
      tap((sending) => {
        if (sending.kind === 'sending')
          this.#view.set({ kind: 'sending', what: file.name, share: sending.share });
      }),
      map((sending) => (sending.kind === 'answered' ? sending.reply.id : '')),
    );
  }

  async #begin(what: string, call: Observable<string>, replacedId?: string): Promise<void> {
    if (this.#view().kind === 'sending') return;
    this.#view.set({ kind: 'sending', what, share: null });
    try {
      const id = await lastValueFrom(call);
      if (replacedId !== undefined) await firstValueFrom(this.#api.discard(replacedId));
      await this.#router.navigate(['/panel/import', id], { replaceUrl: replacedId !== undefined });
      this.#view.set({ kind: 'idle' });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#view.set({ kind: 'failed', problem: refusalWords(error) });
    }
  }
}
