import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { Router } from '@angular/router';
import { type FitReply, type FitResult, apiRoutes, mayCall } from '@contract';
import { SessionStore } from '../../api/session-store';
import { ProblemNotice } from '../../ui/problem-notice';
import { ProgressLine } from '../../ui/progress-line';
import { DriversBlock } from './drivers-block';
import { EvidenceStore } from './evidence-store';
import { IntervalsBlock } from './intervals-block';
import { ModelsBlock } from './models-block';
import { OneLineBlock } from './one-line-block';
import { QuestionList } from './question-list';
import { questions } from './questions';
import { ResidualsBlock } from './residuals-block';
import { SteadyBlock } from './steady-block';
import { TestsBlock } from './tests-block';
import { TrendsBlock } from './trends-block';
import { VerdictSummary } from './verdict-summary';

/** What speaks for and against a fit, by the questions that a board and an auditor ask. */
@Component({
  selector: 'kv-evidence-section',
  imports: [
    DriversBlock,
    IntervalsBlock,
    ModelsBlock,
    OneLineBlock,
    ProblemNotice,
    ProgressLine,
    QuestionList,
    ResidualsBlock,
    SteadyBlock,
    TestsBlock,
    TrendsBlock,
    VerdictSummary,
  ],
  templateUrl: './evidence-section.html',
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 16px;
      min-inline-size: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvidenceSection {
  readonly #router = inject(Router);
  readonly #session = inject(SessionStore);
  protected readonly store = inject(EvidenceStore);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();

  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();

  protected readonly evidence = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.evidence : null;
  });
  protected readonly asked = computed(() =>
    this.evidence() === null ? [questions.oneLine, questions.drivers] : Object.values(questions),
  );
  protected readonly mayRun = computed(() =>
    mayCall(apiRoutes.startBootstrap, this.#session.roles()),
  );

  /** Leads to the reasons for a peer, in the peer group that this fit was made with. */
  protected openPeer(company: string): void {
    void this.#router.navigate(['/peers', this.reply().peerGroup.id], { queryParams: { company } });
  }
}
