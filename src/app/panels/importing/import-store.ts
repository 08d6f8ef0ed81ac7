import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { ImportMapping, ImportReply, PanelVersionSummary, TableReading } from '@contract';
import { EMPTY, Subject, catchError, firstValueFrom, forkJoin, switchMap } from 'rxjs';
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

export type ImportWork =
  'none' | 'reading' | 'checking' | 'committing' | 'cancelling' | 'discarding';

export interface FailedWork {
  readonly work: ImportWork;
  readonly problem: ApiProblem;
}

/** One import, from its uploaded file to a panel version. */
@Injectable()
export class ImportStore {
  readonly #api = inject(PanelsApi);
  readonly #remembered = inject(RememberedMapping);
  readonly #view = signal<ImportView>({ kind: 'loading' });
  readonly #work = signal<ImportWork>('none');
  readonly #failed = signal<FailedWork | null>(null);
  readonly #followed = new Subject<string | null>();

  readonly view = this.#view.asReadonly();
  /** What is being done to the import just now. */
  readonly work = this.#work.asReadonly();
  /** Which step was not done last, and why; the import is as it was. */
  readonly failed = this.#failed.asReadonly();

  constructor() {
    this.#followed
      .pipe(
        switchMap((importId) => (importId === null ? EMPTY : this.#follow(importId))),
        takeUntilDestroyed(),
      )
      .subscribe((draft) => this.#show(draft));
  }

  async open(importId: string): Promise<void> {
    this.#view.set({ kind: 'loading' });
    this.#failed.set(null);
    this.#followed.next(null);
    try {
      const found = await firstValueFrom(
        forkJoin({ draft: this.#api.readImport(importId), list: this.#api.versions() }),
      );
      this.#view.set({ kind: 'ready', draft: found.draft, versions: found.list.versions });
      this.#followWhileCommitting(found.draft);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#view.set({ kind: 'failed', problem: error });
    }
  }

  /** Reads the file another way. */
  async readAs(importId: string, reading: TableReading): Promise<void> {
    await this.#run('reading', async () => {
      this.#show(await firstValueFrom(this.#api.readAs(importId, reading)));
    });
  }

  /** Reads the whole file with these columns and shows what was found. @returns whether it was done. */
  async check(importId: string, mapping: ImportMapping): Promise<boolean> {
    const done = await this.#run('checking', async () => {
      const draft = await firstValueFrom(this.#api.check(importId, mapping));
      this.#remembered.remember(draft.headers, mapping);
      this.#show(draft);
      return true;
    });
    return done ?? false;
  }

  /** Begins to write the panel version, and follows that to its end. */
  async commit(importId: string, note: string): Promise<void> {
    await this.#run('committing', async () => {
      const draft = await firstValueFrom(this.#api.commit(importId, note));
      this.#show(draft);
      this.#followWhileCommitting(draft);
    });
  }

  /** Ends the writing; the import stays as it was checked. */
  async cancelCommit(importId: string): Promise<void> {
    await this.#run('cancelling', async () => {
      await firstValueFrom(this.#api.cancelCommit(importId), { defaultValue: undefined });
      this.#followed.next(null);
      this.#show(await firstValueFrom(this.#api.readImport(importId)));
    });
  }

  /** @returns whether the import and its file are gone. */
  async discard(importId: string): Promise<boolean> {
    const done = await this.#run('discarding', async () => {
      await firstValueFrom(this.#api.discard(importId), { defaultValue: undefined });
      return true;
    });
    return done ?? false;
  }

  #followWhileCommitting(draft: ImportReply): void {
    if (draft.state === 'committing') this.#followed.next(draft.id);
  }

  #follow(importId: string): ReturnType<PanelsApi['follow']> {
    return this.#api.follow(importId).pipe(
      catchError((error: unknown) => {
        if (!(error instanceof ApiProblem)) throw error;
        this.#failed.set({ work: 'committing', problem: error });
        return EMPTY;
      }),
    );
  }

  #show(draft: ImportReply): void {
    this.#view.update((view) => (view.kind === 'ready' ? { ...view, draft } : view));
  }

  async #run<T>(work: ImportWork, step: () => Promise<T>): Promise<T | null> {
    if (this.#work() !== 'none') return null;
    this.#work.set(work);
    this.#failed.set(null);
    try {
      return await step();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#failed.set({ work, problem: error });
      return null;
    } finally {
      this.#work.set('none');
    }
  }
}
