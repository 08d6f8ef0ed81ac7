import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** The answer to one question of the evidence: what it means for the decision, then what it is read from. */
@Component({
  selector: 'kv-evidence-block',
  template: `
    <p class="meaning">{{ meaning() }}</p>
    <ng-content />
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 8px;
      min-inline-size: 0;
    }
    .meaning {
      max-inline-size: 720px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvidenceBlock {
  /** At most two sentences. */
  readonly meaning = input.required<string>();
}
