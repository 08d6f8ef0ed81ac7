import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Where there is nothing yet: what will stand here, and in the slot the first action. */
@Component({
  selector: 'kv-empty-state',
  template: `
    <h2>{{ title() }}</h2>
    <p>{{ detail() }}</p>
    <div class="actions"><ng-content /></div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      max-inline-size: 560px;
      padding-block: 24px;
    }
    p {
      color: var(--kv-soft-ink);
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 8px 16px;
      margin-block-start: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmptyState {
  readonly title = input.required<string>();
  readonly detail = input.required<string>();
}
