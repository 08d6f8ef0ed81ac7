import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { EvidenceQuestion } from './questions';

/** One question of the evidence: what its answer means for the decision, then what it is read from. */
@Component({
  selector: 'kv-evidence-block',
  template: `
    <section [attr.aria-labelledby]="question().id">
      <h3 tabindex="-1" [id]="question().id">{{ question().words }}</h3>
      <p class="meaning">{{ meaning() }}</p>
      <ng-content />
    </section>
  `,
  styles: `
    section {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 8px;
      min-inline-size: 0;
      padding-block: 16px;
      border-block-start: var(--kv-rule);
    }
    .meaning {
      max-inline-size: 720px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvidenceBlock {
  readonly question = input.required<EvidenceQuestion>();
  /** At most two sentences. */
  readonly meaning = input.required<string>();
}
