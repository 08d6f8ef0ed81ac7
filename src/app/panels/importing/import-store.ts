import { Injectable, inject, signal } from '@angular/core';
import type { ImportMapping, ImportReply, PanelVersionSummary } from '@contract';
import { firstValueFrom, forkJoin } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { RememberedMapping } from './remembered-mapping';

export type ImportView =
  | { readonly kind: 'loading' }
  | {
      readonly kind: 'ready';
      readonly draft: ImportReply;
      /** Every version of every panel, newest first: one of the same name becomes the parent. */
      readonly versions: readonly PanelVersionSummary[];
    }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

export type ImportWork = 'none' | 'checking' | 'committing' | 'discarding';

/** One import, from its uploaded file to a panel version. */
@Injectable()
export class ImportStore {
  readonly #api = inject(PanelsApi);
  readonly #remembered = inject(RememberedMapping);
  readonly #view = signal<ImportView>({ kind: 'loading' });
  readonly #work = signal<ImportWork>('none');
  readonly #problem = signal<ApiProblem | null>(null);

  readonly view = this.#view.asReadonly();
  /** What is being done to the import just now. */
  readonly work = this.#work.asReadonly();
  /** Why the last step was not done; the import is as it was. */
  readonly problem = this.#problem.asReadonly();

  async open(importId: string): Promise<void> {
    this.#view.set({ kind: 'loading' });
    this.#problem.set(null);
    try {
      const found = await firstValueFrom(
        forkJoin({ draft: this.#api.readImport(importId), list: this.#api.versions() }),
      );
      this.#view.set({ kind: 'ready', draft: found.draft, versions: found.list.versions });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#view.set({ kind: 'failed', problem: error });
    }
  }

  /** Reads the whole file with these columns and shows what was found. */
  async check(importId: string, mapping: ImportMapping): Promise<void> {
    await this.#run('checking', async () => {
      const draft = await firstValueFrom(this.#api.check(importId, mapping));
      this.#remembered.remember(draft.headers, mapping);
      this.#view.update((view) => (view.kind === 'ready' ? { ...view, draft } : view));
    });
  }

  /** @returns the panel version that the import became, or null when it did not. */
  commit(importId: string, note: string): Promise<PanelVersionSummary | null> {
    return this.#run('committing', () => firstValueFrom(this.#api.commit(importId, note)));
  }

  /** @returns whether the import and its file are gone. */
  async discard(importId: string): Promise<boolean> {
    const done = await this.#run('discarding', async () => {
      await firstValueFrom(this.#api.discard(importId), { defaultValue: undefined });
      return true;
    });
    return done ?? false;
  }

  async #run<T>(work: ImportWork, step: () => Promise<T>): Promise<T | null> {
    if (this.#work() !== 'none') return null;
    this.#work.set(work);
    this.#problem.set(null);
    try {
      return await step();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#problem.set(error);
      return null;
    } finally {
      this.#work.set('none');
    }
  }
}
