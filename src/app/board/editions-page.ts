import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { type EditionSummary, apiRoutes, mayCall } from '@contract';
import { SessionStore } from '../api/session-store';
import { CautionLine } from '../ui/caution-line';
import { EmptyState } from '../ui/empty-state';
import { Mark, type MarkKind } from '../ui/mark';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { confidentialityWords, shortSha, stateWords } from './edition-words';
import { EditionsStore } from './editions-store';
import { landingEdition } from './landing-edition';

/** All editions with what became of them; as the board's first page it leads readers and the CFO on to theirs. */
@Component({
  selector: 'kv-editions-page',
  imports: [
    CautionLine,
    DatePipe,
    EmptyState,
    Mark,
    MatButton,
    PageHeader,
    ProblemNotice,
    RouterLink,
  ],
  templateUrl: './editions-page.html',
  styleUrl: './board-pages.css',
  providers: [EditionsStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionsPage {
  readonly #router = inject(Router);
  readonly #sessions = inject(SessionStore);
  protected readonly store = inject(EditionsStore);

  /** Whether this is the bare address of the board. */
  readonly isLanding = input<boolean>();

  protected readonly confidentialityWords = confidentialityWords;
  protected readonly shortSha = shortSha;
  protected readonly stateWords = stateWords;
  protected readonly mayPublish = computed(() =>
    mayCall(apiRoutes.publishEdition, this.#sessions.roles()),
  );
  readonly #landing = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready' || this.isLanding() !== true) return undefined;
    return landingEdition(view.editions, this.#sessions.roles());
  });
  protected readonly isLeading = computed(() => this.#landing() !== undefined);
  protected readonly finding = computed(() => {
    const view = this.store.view();
    if (view.kind !== 'ready') return 'Board';
    const waiting = view.editions.filter(({ state }) => state === 'waiting').length;
    const all = counted(view.editions.length);
    return waiting === 0 ? all : `${all}, ${waiting} waiting for a signature`;
  });

  constructor() {
    this.store.load();
    effect(() => {
      const landing = this.#landing();
      if (landing !== undefined)
        void this.#router.navigate(['/board', landing.id], { replaceUrl: true });
    });
  }

  protected markOf({ state }: EditionSummary): MarkKind {
    if (state === 'signed') return 'fine';
    return state === 'superseded' ? 'peer' : 'caution';
  }
}

function counted(count: number): string {
  return count === 1 ? '1 edition' : `${count} editions`;
}
