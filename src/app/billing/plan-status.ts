import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SeatsReply } from '@contract';
import { Mark } from '../ui/mark';
import { planWords } from './plan-words';

/** The plan's status in words, and what comes next. */
@Component({
  selector: 'kv-plan-status',
  imports: [Mark],
  template: `
    <p class="status">
      <kv-mark [kind]="words().isCaution ? 'caution' : 'fine'" /> {{ words().status }}
    </p>
    @for (sentence of words().sentences; track sentence) {
      <p>{{ sentence }}</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
    }
    .status {
      display: flex;
      gap: 8px;
      font-weight: 500;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanStatus {
  readonly plan = input.required<SeatsReply['plan']>();

  protected readonly words = computed(() => planWords(this.plan()));
}
