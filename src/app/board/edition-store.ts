import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { EditionReply, WriteComment } from '@contract';
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
      /** Number of the edition that counts now, where another one is signed. */
      readonly signedNumber: number | null;
    }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** What an answer makes of the edition that is shown. */
type Change = (shown: EditionReply) => EditionReply;

/** One edition, and what is done with it. */
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
    return this.#act((id) => this.#api.sign(id, password).pipe(map(asItIsNow)));
  }

  /** @returns the problem that kept it from being returned, or null. */
  sendBack(comment: string): Promise<ApiProblem | null> {
    return this.#act((id) => this.#api.sendBack(id, comment).pipe(map(asItIsNow)));
  }

  /** @returns the problem that kept the comment from being sent, or null. */
  comment(body: WriteComment): Promise<ApiProblem | null> {
    return this.#act((id) => this.#api.comment(id, body).pipe(map(asItIsNow)));
  }

  /** Notes that the person opened a warning. @returns the problem that kept it from being noted, or null. */
  openWarning(warningId: string): Promise<ApiProblem | null> {
    const withOpened: Change = (reply) => ({
      ...reply,
      openedWarnings: [...reply.openedWarnings, warningId],
    });
    return this.#act((id) => this.#api.openWarning(id, warningId).pipe(map(() => withOpened)));
  }

  async #act(send: (id: string) => Observable<Change>): Promise<ApiProblem | null> {
    const view = this.#view();
    if (view.kind !== 'ready') return null;
    const { id } = view.reply.edition;
    try {
      const change = await firstValueFrom(send(id));
      // Meanwhile the page may have gone on to another edition.
      this.#view.update((now) =>
        now.kind === 'ready' && now.reply.edition.id === id
          ? { ...now, reply: change(now.reply) }
          : now,
      );
      return null;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      return error;
    }
  }

  #read(id: string): Observable<EditionView> {
    return forkJoin({ reply: this.#api.read(id), list: this.#api.list() }).pipe(
      map(({ reply, list }): EditionView => {
        const signed = list.editions.find(({ state }) => state === 'signed');
        const signedNumber = signed === undefined || signed.id === id ? null : signed.number;
        return { kind: 'ready', reply, signedNumber };
      }),
      catchError((error: unknown) =>
        of<EditionView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
      startWith<EditionView>({ kind: 'loading' }),
    );
  }
}

function asItIsNow(reply: EditionReply): Change {
  return () => reply;
}
