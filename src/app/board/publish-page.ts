import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import type { EditionContent } from '@contract';
import { LineageStore } from '../api/lineage-store';
import { SessionStore } from '../api/session-store';
import { EmptyState } from '../ui/empty-state';
import { PageContext } from '../ui/page-context';
import { PageHeader } from '../ui/page-header';
import { ProblemNotice } from '../ui/problem-notice';
import { type Remark, RemarkList } from '../ui/remark-list';
import { contentContext, fitSteps } from './edition-context';
import { type EditionFigure, EditionSheet } from './edition-sheet';
import { confidentialityWords, modelText } from './edition-words';
import { hindrances, previewContent } from './preview-content';
import { PublishStore } from './publish-store';

const mostScenarios = 4;

/** Puts an edition together, shows it as it will stand, and freezes it. */
@Component({
  selector: 'kv-publish-page',
  imports: [
    DatePipe,
    EditionSheet,
    EmptyState,
    MatButton,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    PageHeader,
    ProblemNotice,
    RemarkList,
    RouterLink,
  ],
  templateUrl: './publish-page.html',
  styleUrl: './board-pages.css',
  providers: [PublishStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PublishPage {
  readonly #context = inject(PageContext);
  readonly #lineage = inject(LineageStore);
  readonly #router = inject(Router);
  readonly #sessions = inject(SessionStore);
  protected readonly store = inject(PublishStore);

  /** The fit to publish, from the query. */
  readonly fit = input<string>();

  protected readonly mostScenarios = mostScenarios;
  protected readonly confidentialityWords = confidentialityWords;
  protected readonly modelText = modelText;
  protected readonly levels: readonly EditionContent['confidentiality'][] = [
    'confidential',
    'inside-information',
  ];
  protected readonly chosen = signal<readonly string[]>([]);
  protected readonly confidentiality = signal<EditionContent['confidentiality']>('confidential');
  protected readonly comment = signal('');
  readonly #openedAt = new Date();
  readonly #ground = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.ground : null;
  });
  protected readonly hindrances = computed(() => {
    const ground = this.#ground();
    return ground === null ? [] : hindrances(ground.result, ground.peerGroup);
  });
  protected readonly hindranceRemarks = computed(() =>
    this.hindrances().map((text): Remark => ({ kind: 'error', text })),
  );
  protected readonly preview = computed(() => {
    const ground = this.#ground();
    const session = this.#sessions.session();
    if (ground === null || session === null) return null;
    const byId = new Map(ground.scenarios.map((scenario) => [scenario.id, scenario]));
    return previewContent({
      ...ground,
      scenarios: this.chosen().flatMap((id) => byId.get(id) ?? []),
      workspaceName: session.workspace.name,
      publishedBy: session.person.name,
      publishedAt: this.#openedAt,
      confidentiality: this.confidentiality(),
      comment: this.comment().trim(),
    });
  });

  constructor() {
    effect(() => {
      const fit = this.fit();
      untracked(() => {
        this.chosen.set([]);
        this.store.load(fit);
      });
    });
    effect(() => {
      const preview = this.preview();
      if (preview !== null)
        untracked(() =>
          this.#context.show({ ...contentContext(preview), lineage: fitSteps(preview) }),
        );
    });
  }

  protected async chooseFit(fitId: string): Promise<void> {
    await this.#router.navigate(['/board/publish'], { queryParams: { fit: fitId } });
  }

  protected toggle(scenarioId: string): void {
    this.chosen.update((ids) =>
      ids.includes(scenarioId) ? ids.filter((id) => id !== scenarioId) : [...ids, scenarioId],
    );
  }

  protected openFigure({ key, planned }: EditionFigure): void {
    const ground = this.#ground();
    if (ground !== null) this.#lineage.open({ fitId: ground.fit.fit.id }, key, planned);
  }

  protected async publish(): Promise<void> {
    const ground = this.#ground();
    const preview = this.preview();
    if (ground === null || preview === null || this.hindrances().length > 0) return;
    const published = await this.store.publish({
      fitId: ground.fit.fit.id,
      // The versions that the preview shows: the server refuses to freeze another.
      scenarios: preview.scenarios.map(({ id, version }) => ({ id, version })),
      confidentiality: this.confidentiality(),
      comment: this.comment(),
    });
    if (published !== null) await this.#router.navigate(['/board', published.edition.id]);
  }
}
