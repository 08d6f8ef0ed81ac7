import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { EditionReply } from '@contract';
import { catchError, forkJoin, map, of, startWith, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { EditionsApi } from '../api/editions-api';
import { CautionLine } from '../ui/caution-line';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { compareEditions } from './compare-editions';
import { contentContext } from './edition-context';

type CompareView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly both: readonly [EditionReply, EditionReply] }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Two editions side by side: figures, peers, specification and warnings. */
@Component({
  selector: 'kv-compare-page',
  imports: [CautionLine, PageHeader, ProblemNotice, RouterLink],
  templateUrl: './compare-page.html',
  styleUrls: ['./board-pages.css', './compare-page.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComparePage {
  readonly #api = inject(EditionsApi);
  readonly #context = inject(PageContext);
  readonly #numbers = inject(NumberFormat);

  readonly leftId = input.required<string>();
  readonly rightId = input.required<string>();

  readonly #ids = computed(() => ({ left: this.leftId(), right: this.rightId() }));
  protected readonly view = toSignal(
    toObservable(this.#ids).pipe(
      switchMap(({ left, right }) =>
        forkJoin([this.#api.read(left), this.#api.read(right)]).pipe(
          map((both): CompareView => ({ kind: 'ready', both })),
          catchError((error: unknown) =>
            of<CompareView>({ kind: 'failed', problem: toApiProblem(error) }),
          ),
          startWith<CompareView>({ kind: 'loading' }),
        ),
      ),
    ),
    { initialValue: { kind: 'loading' } },
  );
  protected readonly compared = computed(() => {
    const view = this.view();
    if (view.kind !== 'ready') return null;
    const { figures, peers, specification, warnings, headlines } = compareEditions(
      ...view.both,
      this.#numbers.writer().settings,
    );
    return {
      headlines,
      parts: [
        { title: 'Figures', lines: figures },
        { title: 'Peers', lines: peers },
        { title: 'Specification', lines: specification },
        { title: 'Warnings', lines: warnings },
      ],
    };
  });

  constructor() {
    effect(() => {
      const view = this.view();
      if (view.kind === 'ready')
        untracked(() => this.#context.show(contentContext(view.both[1].content)));
    });
  }
}
