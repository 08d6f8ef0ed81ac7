import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { EditionReply, EditionSummary } from '@contract';
import {
  type Observable,
  Subject,
  catchError,
  firstValueFrom,
  forkJoin,
  map,
  of,
  startWith,
  switchMap,
} from 'rxjs';
import { ApiProblem, toApiProblem } from '../api/api-problem';
import { EditionsApi } from '../api/editions-api';

export type EditionView =
  | { readonly kind: 'loading' }
  | {
      readonly kind: 'ready';
      readonly reply: EditionReply;
      /** The signed edition before this one, where there is one. */
      readonly before: EditionReply | null;
    }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** One edition, and what the CFO does with it. */
@Injectable()
export class EditionStore {
  readonly #api = inject(EditionsApi);
  readonly #ids = new Subject<string>();
  readonly #view = signal<EditionView>({ kind: 'loading' });
  readonly view = this.#view.asReadonly();

  constructor() {
    this.#ids
      .pipe(
        switchMap((id) => this.#read(id)),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
  }

  load(editionId: string): void {
    this.#ids.next(editionId);
  }

  /** @returns the problem that kept it from being signed, or null. */
  sign(password: string): Promise<ApiProblem | null> {
    return this.#decide((id) => this.#api.sign(id, password));
  }

  /** @returns the problem that kept it from being returned, or null. */
  sendBack(comment: string): Promise<ApiProblem | null> {
    return this.#decide((id) => this.#api.sendBack(id, comment));
  }

  async #decide(send: (id: string) => Observable<EditionReply>): Promise<ApiProblem | null> {
    const view = this.#view();
    if (view.kind !== 'ready') return null;
    try {
      const reply = await firstValueFrom(send(view.reply.edition.id));
      // Meanwhile the page may have gone on to another edition.
      this.#view.update((now) =>
        now.kind === 'ready' && now.reply.edition.id === reply.edition.id ? { ...now, reply } : now,
      );
      return null;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      return error;
    }
  }

  #read(id: string): Observable<EditionView> {
    return forkJoin({ reply: this.#api.read(id), list: this.#api.list() }).pipe(
      switchMap(({ reply, list }) => {
        const earlier = signedBefore(list.editions, reply.edition.number);
        const before: Observable<EditionReply | null> =
          earlier === undefined ? of(null) : this.#api.read(earlier.id);
        return before.pipe(map((found): EditionView => ({ kind: 'ready', reply, before: found })));
      }),
      catchError((error: unknown) =>
        of<EditionView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
      startWith<EditionView>({ kind: 'loading' }),
    );
  }
}

function signedBefore(
  editions: readonly EditionSummary[],
  number: number,
): EditionSummary | undefined {
  return editions
    .filter((edition) => edition.number < number && edition.decision?.kind === 'signed')
    .sort((left, right) => right.number - left.number)
    .at(0);
}
