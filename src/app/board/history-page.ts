import { DatePipe, formatDate } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  LOCALE_ID,
  computed,
  effect,
  inject,
  linkedSignal,
  untracked,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { NumberWriter } from '@figures';
import { catchError, map, of, startWith } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { EditionsApi } from '../api/editions-api';
import { IntervalRows } from '../charts/interval-rows/interval-rows';
import { CautionLine } from '../ui/caution-line';
import { EmptyState } from '../ui/empty-state';
import { asDifference, differenceKind } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { counted } from '../ui/phrases';
import { type SignedEdition, historyScales, scaleChanges } from './edition-history';
import { placeText, shareText } from './edition-words';

type HistoryView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly editions: readonly SignedEdition[] }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** The standing over all editions that were signed, and two of them to set side by side. */
@Component({
  selector: 'kv-history-page',
  imports: [
    CautionLine,
    DatePipe,
    EmptyState,
    IntervalRows,
    MatButton,
    PageHeader,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './history-page.html',
  styleUrls: ['./board-pages.css', './history-page.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HistoryPage {
  readonly #context = inject(PageContext);
  readonly #locale = inject(LOCALE_ID);
  readonly #numbers = inject(NumberFormat);

  protected readonly view = toSignal(
    inject(EditionsApi)
      .history()
      .pipe(
        map(({ editions }): HistoryView => ({ kind: 'ready', editions })),
        catchError((error: unknown) =>
          of<HistoryView>({ kind: 'failed', problem: toApiProblem(error) }),
        ),
        startWith<HistoryView>({ kind: 'loading' }),
      ),
    { requireSync: true },
  );
  protected readonly editions = computed(() => {
    const view = this.view();
    return view.kind === 'ready' ? view.editions : [];
  });
  readonly #newest = computed(() => this.editions().at(-1));
  protected readonly finding = computed(() => {
    const newest = this.#newest();
    const all = counted(this.editions().length, 'signed edition');
    return newest === undefined
      ? 'History of the standing'
      : `${newest.ownCompany} stands ${this.standingText(newest)} from its peers in edition ${newest.number}, the last of ${all}`;
  });
  protected readonly changes = computed(() => scaleChanges(this.editions()));
  /** Only a chart in the page's currency can be drawn; the others stand in the table. */
  protected readonly charts = computed(() =>
    historyScales(this.editions(), this.#numbers.panelUnit(), (at) =>
      formatDate(at, 'd MMM y', this.#locale),
    )
      .filter(({ kind, currency }) => kind === 'percent' || currency === this.#numbers.currency())
      .map(({ kind, rows }) => ({
        kind,
        rows,
        text: {
          title: `Standing over ${counted(rows.length, 'signed edition')}${kind === 'percent' ? ' in logs' : ''}`,
          caption: `${kind === 'percent' ? 'percent' : this.#numbers.unitLabel()} · intervals as signed · filled: the edition that counts now`,
          source: `Signed editions ${rows.map(({ name }) => name.replace('Edition ', '')).join(', ')}`,
        },
      })),
  );
  protected readonly left = linkedSignal(() => this.editions().at(-2)?.id ?? '');
  protected readonly right = linkedSignal(() => this.editions().at(-1)?.id ?? '');

  constructor() {
    effect(() => {
      const newest = this.editions().findLast(({ form }) => form !== 'log') ?? this.#newest();
      if (newest !== undefined)
        untracked(() =>
          this.#context.show({
            ownCompany: newest.ownCompany,
            currency: newest.currency,
            unit: newest.unit,
          }),
        );
    });
  }

  /** With its own currency: editions of one workspace may have several. */
  protected standingText({ standing, form, currency, unit }: SignedEdition): string {
    if (standing === null) return 'no standing';
    const settings = this.#numbers.writer().settings;
    const writer = new NumberWriter({ ...settings, currency, panelUnit: unit });
    const written = writer.interval(asDifference(standing, form), differenceKind(form), 3);
    return form === 'log' ? written : `${written} ${writer.unitLabel}`;
  }

  protected placesText({ rankSet, companies }: SignedEdition): string {
    return rankSet === null ? 'no place' : `${placeText(rankSet)} among ${companies}`;
  }

  protected confidenceText({ confidence }: SignedEdition): string {
    return shareText(confidence);
  }
}
