import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import type { CellHistoryReply, PanelColumn } from '@contract';
import { Subject, catchError, map, of, startWith, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { NumberFormat } from '../../ui/number-format';
import { ProblemNotice } from '../../ui/problem-notice';
import { columnTitle, kindOf } from '../panel-rows';
import { historyLines, unitOf } from '../versions/history-lines';
import type { CellPlace } from './panel-edits';
import { figureWords, shiftOf } from './shown-figure';

export interface CellHistoryQuestion {
  readonly panelVersionId: string;
  readonly place: CellPlace;
  readonly column: PanelColumn;
}

type HistoryView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly entries: CellHistoryReply['entries'] }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** One cell through the versions of its panel: what it held, who changed it, why and from where. */
@Component({
  selector: 'kv-cell-history-dialog',
  imports: [
    DatePipe,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    ProblemNotice,
    RouterLink,
  ],
  template: `
    <h2 mat-dialog-title>{{ title }}</h2>
    <mat-dialog-content>
      @let shown = view();
      @switch (shown.kind) {
        @case ('loading') {
          <p role="status">Reading the history…</p>
        }
        @case ('failed') {
          <kv-problem-notice [problem]="shown.problem.shown" [canRetry]="true" (retried)="read()" />
        }
        @case ('ready') {
          <p class="kv-caption">
            Versions in which the cell differs from the one before. {{ unit }}
          </p>
          @for (line of lines(); track line) {
            <p>{{ line }}</p>
          }
          <div class="kv-table-scroll" tabindex="0" role="region" [attr.aria-label]="title">
            <table class="kv-table">
              <thead>
                <tr>
                  <th scope="col">Version</th>
                  <th scope="col" class="kv-number">Value</th>
                  <th scope="col">Made by</th>
                  <th scope="col">Reason</th>
                  <th scope="col">Source</th>
                  <th scope="col">Note to the version</th>
                </tr>
              </thead>
              <tbody>
                @for (entry of shown.entries; track entry.panelVersionId) {
                  <tr>
                    <th scope="row">
                      <a [routerLink]="['/panel', entry.panelVersionId]" mat-dialog-close
                        >v{{ entry.number }}</a
                      >
                    </th>
                    <td class="kv-number">
                      {{ entry.hasRow ? words(entry) : 'no row' }}
                    </td>
                    <td>{{ entry.by }}, {{ entry.at | date: 'd MMM y, HH:mm' }}</td>
                    <td>{{ entry.reason || '–' }}</td>
                    <td>{{ entry.source || '–' }}</td>
                    <td>{{ entry.note || 'No note' }}</td>
                  </tr>
                }
              </tbody>
            </table>
          </div>
        }
      }
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton mat-dialog-close cdkFocusInitial>Close</button>
    </mat-dialog-actions>
  `,
  styles: `
    td {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellHistoryDialog {
  readonly #panels = inject(PanelsApi);
  readonly #numbers = inject(NumberFormat);
  readonly #question = inject<CellHistoryQuestion>(MAT_DIALOG_DATA);
  readonly #wanted = new Subject<void>();

  protected readonly title = `${columnTitle(this.#question.column)}, ${this.#question.place.company} ${this.#question.place.year}`;
  readonly #isMoney = kindOf(this.#question.column) === 'money';
  protected readonly unit = this.#isMoney ? `In ${this.#numbers.unitLabel()}.` : '';
  protected readonly view = signal<HistoryView>({ kind: 'loading' });
  protected readonly lines = computed(() => {
    const view = this.view();
    return view.kind === 'ready' ? historyLines(view.entries, this.#isMoney) : [];
  });

  constructor() {
    const { panelVersionId, place } = this.#question;
    this.#wanted
      .pipe(
        startWith(undefined),
        switchMap(() =>
          this.#panels.cellHistory(panelVersionId, place).pipe(
            map(({ entries }): HistoryView => ({ kind: 'ready', entries })),
            catchError((error: unknown) =>
              of<HistoryView>({ kind: 'failed', problem: toApiProblem(error) }),
            ),
            startWith<HistoryView>({ kind: 'loading' }),
          ),
        ),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.view.set(view);
      });
  }

  protected read(): void {
    this.#wanted.next();
  }

  /** In the unit that is shown; of a version in another unit or currency as it is saved, with that named. */
  protected words(entry: CellHistoryReply['entries'][number]): string {
    const { column } = this.#question;
    const locale = this.#numbers.locale();
    const isOfPage =
      entry.unit === this.#numbers.panelUnit() && entry.currency === this.#numbers.currency();
    if (isOfPage || !this.#isMoney)
      return figureWords(entry.value, shiftOf(column, this.#numbers.factor()), locale);
    return entry.value === null
      ? figureWords(null, 0, locale)
      : `${figureWords(entry.value, 0, locale)} ${unitOf(entry)}`;
  }
}
