import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import type { FitReply, FitResult } from '@contract';
import { ProblemNotice } from '../../ui/problem-notice';
import { ProgressLine } from '../../ui/progress-line';
import { EvidenceStore } from './evidence-store';
import { QuestionPanels } from './question-panels';
import { VerdictSummary } from './verdict-summary';

/** What speaks for and against a fit: the verdict first, then what it rests on, question by question. */
@Component({
  selector: 'kv-evidence-section',
  imports: [ProblemNotice, ProgressLine, QuestionPanels, VerdictSummary],
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
  protected readonly store = inject(EvidenceStore);

  readonly reply = input.required<FitReply>();
  readonly result = input.required<FitResult>();

  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();
}
