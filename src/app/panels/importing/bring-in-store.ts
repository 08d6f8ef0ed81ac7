import { Injectable, inject, signal } from '@angular/core';
import { Router } from '@angular/router';
import type { ImportReply } from '@contract';
import { type Observable, firstValueFrom } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';

export type BringInView =
  | { readonly kind: 'idle' }
  | { readonly kind: 'sending'; readonly what: string }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Takes a file, or the sample, and leads to where its columns are named. */
@Injectable()
export class BringInStore {
  readonly #api = inject(PanelsApi);
  readonly #router = inject(Router);
  readonly #view = signal<BringInView>({ kind: 'idle' });

  readonly view = this.#view.asReadonly();

  upload(file: File): Promise<void> {
    return this.#begin(file.name, this.#api.upload(file));
  }

  /** Takes a mended file in the place of an import, which is discarded once the file is there. */
  replace(importId: string, file: File): Promise<void> {
    return this.#begin(file.name, this.#api.upload(file), importId);
  }

  openSample(): Promise<void> {
    return this.#begin('the sample panel', this.#api.openSample());
  }

  async #begin(what: string, call: Observable<ImportReply>, replacedId?: string): Promise<void> {
    if (this.#view().kind === 'sending') return;
    this.#view.set({ kind: 'sending', what });
    try {
      const { id } = await firstValueFrom(call);
      if (replacedId !== undefined) await firstValueFrom(this.#api.discard(replacedId));
      await this.#router.navigate(['/panel/import', id], { replaceUrl: replacedId !== undefined });
      this.#view.set({ kind: 'idle' });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#view.set({ kind: 'failed', problem: error });
    }
  }
}
