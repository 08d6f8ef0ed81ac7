import { Injectable, inject, signal } from '@angular/core';
import { LineageReply, apiRoutes } from '@contract';
import { type Observable, Subject, catchError, map, of, startWith, switchMap } from 'rxjs';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { ApiClient } from './api-client';
import { type ApiProblem, toApiProblem } from './api-problem';
import { SessionStore } from './session-store';

/** Which fit a figure belongs to: one of the workspace, or the one frozen in an edition. */
export type LineageSource = { readonly fitId: string } | { readonly editionId: string };

/** What the screen knows and the server does not: the figures of a plan that is not saved. */
export type PlannedFigure = Pick<LineageReply, 'value'> & {
  readonly label?: string;
  /** Where the screen knows better than the figure's key: a difference of logs is no money. */
  readonly isMoney?: boolean;
  readonly inputs?: LineageReply['inputs'];
};

export type LineageView =
  | { readonly kind: 'closed' }
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly lineage: LineageReply; readonly source: LineageSource }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

interface Request {
  readonly source: LineageSource;
  readonly figure: string;
  readonly planned?: PlannedFigure;
}

/** The lineage drawer's state: one figure at a time, on any model page. */
@Injectable({ providedIn: 'root' })
export class LineageStore {
  readonly #client = inject(ApiClient);
  readonly #requests = new Subject<Request | null>();
  readonly #view = signal<LineageView>({ kind: 'closed' });
  readonly view = this.#view.asReadonly();

  constructor() {
    this.#requests
      .pipe(
        switchMap((request) => (request === null ? of(closed) : this.#read(request))),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
    inject(SessionStore)
      .ended.pipe(takeUntilDestroyed())
      .subscribe(() => {
        this.close();
      });
  }

  /** Opens the figure with this key (`standing`, `slope.0`, `gap.2014` …). */
  open(source: LineageSource, figure: string, planned?: PlannedFigure): void {
    this.#requests.next({ source, figure, ...(planned === undefined ? {} : { planned }) });
  }

  close(): void {
    this.#requests.next(null);
  }

  #read({ source, figure, planned }: Request): Observable<LineageView> {
    const reply =
      'fitId' in source
        ? this.#client.call(apiRoutes.readLineage, LineageReply, {
            path: { fitId: source.fitId, figure },
          })
        : this.#client.call(apiRoutes.readEditionLineage, LineageReply, {
            path: { editionId: source.editionId, figure },
          });
    return reply.pipe(
      map((found): LineageView => ({
        kind: 'ready',
        source,
        lineage: planned === undefined ? found : withPlanned(found, planned),
      })),
      catchError((error: unknown) =>
        of<LineageView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
      startWith<LineageView>({ kind: 'loading' }),
    );
  }
}

const closed: LineageView = { kind: 'closed' };

function withPlanned(found: LineageReply, planned: PlannedFigure): LineageReply {
  return {
    ...found,
    value: planned.value,
    label: planned.label ?? found.label,
    isMoney: planned.isMoney ?? found.isMoney,
    inputs: [...(planned.inputs ?? []), ...found.inputs],
  };
}
