import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { PanelVersionReply, PanelVersionSummary } from '@contract';
import {
  type Observable,
  Subject,
  catchError,
  forkJoin,
  map,
  of,
  startWith,
  switchMap,
} from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { DeskApi } from '../api/desk-api';
import { PanelsApi } from '../api/panels-api';

export type PanelView =
  | { readonly kind: 'loading' }
  /** The workspace has no panel yet. */
  | { readonly kind: 'empty' }
  | {
      readonly kind: 'ready';
      readonly panel: PanelVersionReply;
      /** Every version of every panel, newest first. */
      readonly versions: readonly PanelVersionSummary[];
      /** Null before a peer group names it, and where this panel does not hold it. */
      readonly ownCompany: string | null;
    }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** One panel version with all there is to say about it. */
@Injectable()
export class PanelStore {
  readonly #panels = inject(PanelsApi);
  readonly #desk = inject(DeskApi);
  readonly #wanted = new Subject<Observable<PanelView>>();
  readonly #view = signal<PanelView>({ kind: 'loading' });

  readonly view = this.#view.asReadonly();

  constructor() {
    this.#wanted
      .pipe(
        switchMap((reading) => reading),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
  }

  /** Opens a panel version, or the newest there is. */
  open(panelVersionId: string | undefined): void {
    this.#wanted.next(this.#read(panelVersionId).pipe(startWith<PanelView>({ kind: 'loading' })));
  }

  /** Goes on to a version that follows from the one that is shown, which stays until the other is there. */
  goOnTo(panelVersionId: string): void {
    this.#wanted.next(this.#read(panelVersionId));
  }

  #read(panelVersionId: string | undefined): Observable<PanelView> {
    return forkJoin({ list: this.#panels.versions(), desk: this.#desk.read() }).pipe(
      switchMap(({ list: { versions }, desk }): Observable<PanelView> => {
        const id = panelVersionId ?? versions.at(0)?.id;
        if (id === undefined) return of<PanelView>({ kind: 'empty' });
        return this.#panels.version(id).pipe(
          map((panel): PanelView => {
            const named = desk.peerGroup?.ownCompany;
            const isHere = named !== undefined && panel.rows.company.includes(named);
            return { kind: 'ready', panel, versions, ownCompany: isHere ? named : null };
          }),
        );
      }),
      catchError((error: unknown) =>
        of<PanelView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
    );
  }
}
