import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import type { Confidentiality } from '@contract';
import { LineageStore } from '../api/lineage-store';
import { EmptyState } from '../ui/empty-state';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { type Remark, RemarkList } from '../ui/remark-list';
import { type Composition, composeRequest, emptyComposition } from './composition';
import { contentContext, fitSteps } from './edition-context';
import { type EditionFigure, EditionSheet } from './edition-sheet';
import { confidentialityEffect, confidentialityWords, modelText } from './edition-words';
import { HeadlineEditor } from './headline-editor';
import { KeptComposition } from './kept-composition';
import { PublishStore } from './publish-store';
import { ScenarioChoice } from './scenario-choice';

/** Composes an edition, shows it as it will stand, and freezes it. */
@Component({
  selector: 'kv-publish-page',
  imports: [
    DatePipe,
    EditionSheet,
    EmptyState,
    HeadlineEditor,
    MatButton,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    PageHeader,
    ProblemNotice,
    RemarkList,
    RouterLink,
    ScenarioChoice,
  ],
  templateUrl: './publish-page.html',
  styleUrls: ['./board-pages.css', './choices.css'],
  providers: [PublishStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PublishPage {
  readonly #context = inject(PageContext);
  readonly #injector = inject(Injector);
  readonly #kept = inject(KeptComposition);
  readonly #lineage = inject(LineageStore);
  readonly #router = inject(Router);
  protected readonly numbers = inject(NumberFormat);
  protected readonly store = inject(PublishStore);

  /** The fit to publish, from the query. */
  readonly fit = input<string>();
  /** A returned edition to answer, from the query. */
  readonly answers = input<string>();

  private readonly editor = viewChild(HeadlineEditor);
  private readonly headlineButton = viewChild<ElementRef<HTMLButtonElement>>('headlineButton');

  protected readonly confidentialityEffect = confidentialityEffect;
  protected readonly confidentialityWords = confidentialityWords;
  protected readonly modelText = modelText;
  protected readonly levels: readonly Confidentiality[] = ['confidential', 'inside-information'];
  protected readonly composition = signal<Composition>(emptyComposition);
  protected readonly isEditing = signal(false);
  readonly #ground = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.ground : null;
  });
  readonly #content = computed(() => this.store.preview().reply?.content ?? null);
  readonly #request = computed(() => {
    const ground = this.#ground();
    return (
      ground &&
      composeRequest(ground.fitId, this.composition(), ground.scenarios, this.numbers.unit())
    );
  });
  protected readonly title = computed(() => {
    const content = this.#content();
    return content === null ? 'Publish an edition' : `Publish edition ${content.number}`;
  });
  protected readonly hindrances = computed(() =>
    (this.store.preview().reply?.hindrances ?? []).map((text): Remark => ({ kind: 'error', text })),
  );
  protected readonly headlineRemarks = computed(() =>
    (this.store.preview().reply?.headlineProblems ?? []).map(({ found, detail }): Remark => ({
      kind: 'error',
      text: `“${found}”: ${detail}`,
    })),
  );
  protected readonly canPublish = computed(() => {
    const { reply, problem } = this.store.preview();
    if (reply === null || problem !== null || this.store.isPublishing()) return false;
    return reply.hindrances.length === 0 && reply.headlineProblems.length === 0;
  });

  constructor() {
    effect(() => {
      const fit = this.fit();
      untracked(() => this.store.load(fit));
    });
    effect(() => {
      const ground = this.#ground();
      const answers = this.answers();
      if (ground !== null)
        untracked(() => {
          this.isEditing.set(false);
          const kept = this.#kept.recall(ground.fitId) ?? emptyComposition;
          const wanted = ground.returned.find(({ id }) => id === answers)?.id;
          this.composition.set({ ...kept, answersEditionId: wanted ?? kept.answersEditionId });
        });
    });
    effect(() => {
      const request = this.#request();
      if (request !== null) untracked(() => this.store.compose(request));
    });
    effect(() => {
      const content = this.#content();
      if (content !== null)
        untracked(() =>
          this.#context.show({ ...contentContext(content), lineage: fitSteps(content) }),
        );
    });
  }

  protected async chooseFit(fitId: string): Promise<void> {
    await this.#router.navigate(['/board/publish'], {
      queryParams: { fit: fitId },
      queryParamsHandling: 'merge',
    });
  }

  protected change(part: Partial<Composition>): void {
    this.composition.update((now) => ({ ...now, ...part }));
    const ground = this.#ground();
    if (ground !== null) this.#kept.keep(ground.fitId, this.composition());
  }

  protected editHeadline(text: string): void {
    const unit = this.composition().headline?.unit ?? this.numbers.unit();
    this.change({ headline: { text, unit } });
  }

  protected openHeadline(): void {
    this.isEditing.set(true);
    afterNextRender(() => this.editor()?.focus(), { injector: this.#injector });
  }

  protected closeHeadline(): void {
    this.isEditing.set(false);
    const focus = () => this.headlineButton()?.nativeElement.focus();
    afterNextRender(focus, { injector: this.#injector });
  }

  protected openFigure({ key, planned }: EditionFigure): void {
    const ground = this.#ground();
    if (ground !== null) this.#lineage.open({ fitId: ground.fitId }, key, planned);
  }

  protected async publish(): Promise<void> {
    const request = this.#request();
    if (request === null || !this.canPublish()) return;
    const published = await this.store.publish(request);
    if (published === null) return;
    this.#kept.drop(request.fitId);
    await this.#router.navigate(['/board', published.edition.id]);
  }
}
